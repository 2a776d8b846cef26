import { setImmediate as letOthers } from 'node:timers/promises';
import type { ClimbSignature } from '#shared/look-alike/climb-signature.ts';
import {
  climbOfNote,
  emptyClimbStore,
  putClimb,
  removeClimb,
  type ClimbStore,
} from '#shared/look-alike/climb-store.ts';
import {
  searchClimbs,
  type NearClimb,
  type NearestOptions,
} from '#shared/look-alike/nearest-climbs.ts';
import type { Deps } from '../deps.ts';
import { climbsAfter, climbsKeptSince, climbsOfNotes, type KeptClimb } from './climb-repository.ts';

const LOADED_AT_ONCE = 2000;
/** A search gives way to other requests after so long; its pieces are far shorter. */
const AT_A_STRETCH_MILLISECONDS = 4;
/**
 * A row bears the moment it was written, but is seen only once its transaction has committed: what
 * was written up to so long before the newest row seen is looked at again. Lock waits and requests
 * are cut off well before.
 */
const LATE_MILLISECONDS = 5 * 60_000;

/** The climbs of all published notes, as this process last saw them. */
interface Memory {
  readonly store: ClimbStore;
  /** What each note's climb was read from and when; notes without a record have this too. */
  readonly seen: Map<number, { readonly revisionId: number; readonly keptAt: number }>;
  newest: Date | null;
  isLoaded: boolean;
}
interface Turns {
  readonly memory: Memory;
  last: Promise<unknown>;
}

/** One a process, for its `deps`; loaded when first asked. */
const turnsOf = new WeakMap<Deps, Turns>();

export interface ClimbMemory {
  /** How many climbs there are to compare with. */
  readonly size: number;
  climbOf: (noteId: number) => { signature: ClimbSignature; revisionId: number } | null;
  nearest: (query: ClimbSignature, options: NearestOptions) => Promise<NearClimb[]>;
  /** It is not published as it is known here: forgotten until it is kept anew. */
  forget: (noteId: number) => void;
}

/**
 * Works with the climbs as they are in the database at this moment. One at a time: nothing changes
 * under a search, and two searches never take twice as long of everybody else's time.
 */
export function withClimbs<T>(deps: Deps, work: (climbs: ClimbMemory) => Promise<T>): Promise<T> {
  let turns = turnsOf.get(deps);
  if (turns === undefined) {
    const memory = {
      store: emptyClimbStore(),
      seen: new Map(),
      newest: null,
      isLoaded: false,
    };
    turns = { memory, last: Promise.resolve() };
    turnsOf.set(deps, turns);
  }
  const { memory, last } = turns;
  const mine = last.then(async () => {
    await bringUpToDate(deps, memory);
    return work(workOn(memory));
  });
  turns.last = mine.catch(() => undefined);
  return mine;
}

async function bringUpToDate({ db }: Deps, memory: Memory): Promise<void> {
  if (!memory.isLoaded) {
    let after = 0;
    for (;;) {
      const climbs = await climbsAfter(db, after, LOADED_AT_ONCE);
      for (const climb of climbs) take(memory, climb);
      after = climbs.at(-1)?.noteId ?? after;
      if (climbs.length < LOADED_AT_ONCE) break;
    }
    memory.isLoaded = true;
    return;
  }
  const since = new Date((memory.newest?.getTime() ?? 0) - LATE_MILLISECONDS);
  const kept = await climbsKeptSince(db, since);
  const changed = kept.filter(
    ({ noteId, keptAt }) => memory.seen.get(noteId)?.keptAt !== keptAt.getTime(),
  );
  for (let from = 0; from < changed.length; from += LOADED_AT_ONCE) {
    const noteIds = changed.slice(from, from + LOADED_AT_ONCE).map(({ noteId }) => noteId);
    for (const climb of await climbsOfNotes(db, noteIds)) take(memory, climb);
  }
}

function take(memory: Memory, { noteId, revisionId, signature, keptAt }: KeptClimb): void {
  if (signature) putClimb(memory.store, noteId, signature);
  else removeClimb(memory.store, noteId);
  memory.seen.set(noteId, { revisionId, keptAt: keptAt.getTime() });
  if (memory.newest === null || keptAt > memory.newest) memory.newest = keptAt;
}

const workOn = (memory: Memory): ClimbMemory => ({
  get size() {
    return memory.store.size;
  },
  climbOf(noteId) {
    const signature = climbOfNote(memory.store, noteId);
    const seen = memory.seen.get(noteId);
    return signature && seen ? { signature, revisionId: seen.revisionId } : null;
  },
  async nearest(query, options) {
    const search = searchClimbs(memory.store, query, options);
    let since = performance.now();
    for (;;) {
      const step = search.next();
      if (step.done === true) return step.value;
      if (performance.now() - since < AT_A_STRETCH_MILLISECONDS) continue;
      await letOthers();
      since = performance.now();
    }
  },
  forget(noteId) {
    removeClimb(memory.store, noteId);
    memory.seen.delete(noteId);
  },
});
