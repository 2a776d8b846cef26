import { courseOf } from '../firing/course.ts';
import { readFiring } from '../firing/read-firing.ts';
import type { FiringInput } from '../firing/types.ts';
import { climbSignature, type ClimbSignature } from './climb-signature.ts';
import { climbTraits, type ClimbTraits } from './climb-traits.ts';

export interface ReadClimb {
  readonly signature: ClimbSignature;
  readonly traits: ClimbTraits;
}

/** The climb of a record and what was read off it; null where there is none to compare. */
export function readClimb(input: FiringInput): ReadClimb | null {
  const course = courseOf(input);
  const signature = course && climbSignature(course);
  const reading = signature && readFiring(input);
  return signature && reading ? { signature, traits: climbTraits(reading) } : null;
}
