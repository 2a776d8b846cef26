import type { ClimbSignature } from './climb-signature.ts';
import { MOST_MINUTES } from './constants.ts';
import { drawOut, type DrawnOut } from './warped-cost.ts';

/** Means are kept over stretches of this many minutes, for the first rough look. */
export const STRETCH_MINUTES = 5;
export const STRETCHES = MOST_MINUTES / STRETCH_MINUTES;

/**
 * Signatures of many notes side by side in typed arrays, to be searched. Places are filled without
 * gaps: what is removed gives its place to the last one.
 */
export interface ClimbStore {
  size: number;
  noteIds: Float64Array;
  /** Minutes of each, up to `MOST_MINUTES`. */
  lengths: Uint8Array;
  /** `MOST_MINUTES` degrees each. */
  celsius: DrawnOut;
  /** `STRETCHES` mean degrees each. */
  means: Float32Array;
  readonly placeOf: Map<number, number>;
}

export function emptyClimbStore(room = 256): ClimbStore {
  return {
    size: 0,
    noteIds: new Float64Array(room),
    lengths: new Uint8Array(room),
    celsius: new Int16Array(room * MOST_MINUTES),
    means: new Float32Array(room * STRETCHES),
    placeOf: new Map(),
  };
}

/** Adds the signature of a note or puts it in place of the one it had. */
export function putClimb(store: ClimbStore, noteId: number, signature: ClimbSignature): void {
  let place = store.placeOf.get(noteId);
  if (place === undefined) {
    place = store.size;
    if (place >= store.noteIds.length) grow(store, place * 2);
    store.size += 1;
    store.placeOf.set(noteId, place);
    store.noteIds[place] = noteId;
  }
  store.lengths[place] = Math.min(signature.length, MOST_MINUTES);
  drawOut(store.celsius, place, signature);
  for (let stretch = 0; stretch < STRETCHES; stretch += 1) {
    let sum = 0;
    const from = place * MOST_MINUTES + stretch * STRETCH_MINUTES;
    for (let i = from; i < from + STRETCH_MINUTES; i += 1) sum += store.celsius[i] ?? 0;
    store.means[place * STRETCHES + stretch] = sum / STRETCH_MINUTES;
  }
}

export function removeClimb(store: ClimbStore, noteId: number): void {
  const place = store.placeOf.get(noteId);
  if (place === undefined) return;
  const last = store.size - 1;
  store.placeOf.delete(noteId);
  store.size = last;
  if (place === last) return;
  const moved = store.noteIds[last] ?? 0;
  store.noteIds[place] = moved;
  store.lengths[place] = store.lengths[last] ?? 0;
  store.celsius.copyWithin(place * MOST_MINUTES, last * MOST_MINUTES, (last + 1) * MOST_MINUTES);
  store.means.copyWithin(place * STRETCHES, last * STRETCHES, (last + 1) * STRETCHES);
  store.placeOf.set(moved, place);
}

/** The signature a note has in the store. */
export function climbOfNote(store: ClimbStore, noteId: number): ClimbSignature | null {
  const place = store.placeOf.get(noteId);
  if (place === undefined) return null;
  const base = place * MOST_MINUTES;
  return store.celsius.slice(base, base + (store.lengths[place] ?? 0));
}

function grow(store: ClimbStore, room: number): void {
  const wider = emptyClimbStore(room);
  wider.noteIds.set(store.noteIds);
  wider.lengths.set(store.lengths);
  wider.celsius.set(store.celsius);
  wider.means.set(store.means);
  store.noteIds = wider.noteIds;
  store.lengths = wider.lengths;
  store.celsius = wider.celsius;
  store.means = wider.means;
}
