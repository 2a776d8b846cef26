import type { Course } from '../firing/course.ts';
import { valueAt } from '../firing/curve.ts';
import { FEWEST_MINUTES, MOST_MINUTES } from './constants.ts';

/**
 * Goes up when the signature or the traits of the same record would become others: kept ones are
 * then made anew.
 */
export const SIGNATURE_VERSION = 2;

/** °C at each minute from the start of a firing to its end, rounded to whole degrees. */
export type ClimbSignature = Int16Array;

/**
 * The climb of a firing as what is compared: the smoothed curve at every minute from its start to
 * its end, at most three hours of it. Cooling after the end is not part of it.
 * @returns null for a firing too short to have a climb
 */
export function climbSignature(
  course: Pick<Course, 'fine' | 'start' | 'shutOff'>,
): ClimbSignature | null {
  const { fine, start, shutOff } = course;
  const last = Math.min(shutOff.minute, fine.minutes[fine.minutes.length - 1] ?? start.minute);
  const minutes = Math.floor(last - start.minute + 1e-6);
  if (!(minutes >= FEWEST_MINUTES)) return null;
  const samples = Math.min(minutes + 1, MOST_MINUTES);
  return Int16Array.from({ length: samples }, (_value, minute) =>
    Math.round(Math.max(-300, Math.min(2000, valueAt(fine, start.minute + minute)))),
  );
}

/** Two bytes a minute, least significant first. */
export function signatureBytes(signature: ClimbSignature): Uint8Array {
  const bytes = new Uint8Array(signature.length * 2);
  const view = new DataView(bytes.buffer);
  signature.forEach((celsius, minute) => view.setInt16(minute * 2, celsius, true));
  return bytes;
}

/** The signature that `signatureBytes` made; a trailing odd byte is left out. */
export function signatureFromBytes(bytes: Uint8Array): ClimbSignature {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const samples = Math.min(MOST_MINUTES, Math.floor(bytes.byteLength / 2));
  return Int16Array.from({ length: samples }, (_value, minute) => view.getInt16(minute * 2, true));
}
