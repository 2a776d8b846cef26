import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  climbOfNote,
  emptyClimbStore,
  putClimb,
  removeClimb,
} from '#shared/look-alike/climb-store.ts';
import { BAND_MINUTES, MOST_MINUTES } from '#shared/look-alike/constants.ts';
import { nearestClimbs, searchClimbs } from '#shared/look-alike/nearest-climbs.ts';
import { signatureDistance } from '#shared/look-alike/signature-distance.ts';
import { fullDistance } from './full-distance.ts';

/** Climbs as they are: a rate that changes now and then, a reading a minute. */
const climbs = fc
  .record({
    start: fc.integer({ min: -10, max: 500 }),
    stretches: fc.array(
      fc.record({
        minutes: fc.integer({ min: 1, max: 60 }),
        rate: fc.integer({ min: -15, max: 60 }),
      }),
      { minLength: 1, maxLength: 6 },
    ),
  })
  .map(({ start, stretches }) => {
    const values = [start];
    for (const { minutes, rate } of stretches) {
      for (let i = 0; i < minutes; i += 1) values.push((values.at(-1) ?? 0) + rate);
    }
    return Int16Array.from(values.slice(0, MOST_MINUTES));
  });
/** Few levels and lengths, so that many distances are equal. */
const coarseClimbs = fc
  .array(fc.constantFrom(0, 100, 200), { minLength: 6, maxLength: 9 })
  .map((values) => Int16Array.from(values));

function storeOf(all: readonly Int16Array[]) {
  const store = emptyClimbStore(2);
  all.forEach((signature, index) => putClimb(store, index + 1, signature));
  return store;
}
function byMeasuringAll(all: readonly Int16Array[], query: Int16Array, count: number) {
  return all
    .map((signature, index) => ({
      noteId: index + 1,
      apartCelsius: signatureDistance(query, signature),
    }))
    .sort((a, b) => a.apartCelsius - b.apartCelsius || a.noteId - b.noteId)
    .slice(0, count);
}

describe('the distance of two climbs', () => {
  test('is 0 between a climb and itself, and never between two that last differently', () => {
    fc.assert(
      fc.property(climbs, climbs, (one, other) => {
        expect(signatureDistance(one, one)).toBe(0);
        if (one.length !== other.length) expect(signatureDistance(one, other)).toBeGreaterThan(0);
      }),
    );
  });

  test('is the same both ways, to the last digit', () => {
    fc.assert(
      fc.property(climbs, climbs, (one, other) => {
        expect(signatureDistance(one, other)).toBe(signatureDistance(other, one));
      }),
    );
  });

  test('equals the least over the whole table of warped paths', () => {
    fc.assert(
      fc.property(climbs, climbs, (one, other) => {
        expect(signatureDistance(one, other)).toBeCloseTo(fullDistance(one, other), 9);
      }),
    );
  });

  test('given the best so far, is Infinity beyond it and exact up to it', () => {
    fc.assert(
      fc.property(climbs, climbs, fc.double({ min: 0, max: 400, noNaN: true }), (a, b, best) => {
        const exact = signatureDistance(a, b);
        expect(signatureDistance(a, b, best)).toBe(exact <= best ? exact : Infinity);
        expect(signatureDistance(a, b, exact)).toBe(exact);
      }),
    );
  });

  test('of one climb a few minutes later is a small part of what minute by minute would say', () => {
    const climb = (delay: number) =>
      Int16Array.from({ length: 60 }, (_value, minute) => {
        const at = Math.max(0, minute - delay);
        return at < 25 ? 20 + 28 * at : 720 + Math.min(280, 10 * Math.max(0, at - 35));
      });
    const [here, later] = [climb(0), climb(BAND_MINUTES - 1)];
    const straight = Math.sqrt(
      here.reduce((sum, value, i) => sum + (value - (later[i] ?? 0)) ** 2, 0) / here.length,
    );
    expect(straight).toBeGreaterThan(40);
    expect(signatureDistance(here, later)).toBeLessThan(straight / 3);
    // A delay beyond the band is no small shift, and is told.
    expect(signatureDistance(here, climb(15))).toBeGreaterThan(60);
  });

  test('of a stay of 20 minutes and one of an hour is not 0, though both stand at one level', () => {
    const stay = (minutes: number) =>
      Int16Array.from({ length: 25 + minutes }, (_value, i) => Math.min(710, 30 + 28 * i));
    expect(signatureDistance(stay(20), stay(60))).toBeGreaterThan(10);
    expect(signatureDistance(stay(20), stay(24))).toBeLessThan(8);
  });
});

describe('the nearest climbs of a store', () => {
  test('are exactly those that measuring every one gives', () => {
    fc.assert(
      fc.property(
        fc.array(climbs, { maxLength: 60 }),
        climbs,
        fc.integer({ min: 1, max: 9 }),
        (all, query, count) => {
          expect(nearestClimbs(storeOf(all), query, { count })).toEqual(
            byMeasuringAll(all, query, count),
          );
        },
      ),
      { numRuns: 300 },
    );
  });

  test('are in order of note where several are as near', () => {
    fc.assert(
      fc.property(
        fc.array(coarseClimbs, { maxLength: 80 }),
        coarseClimbs,
        fc.integer({ min: 1, max: 12 }),
        (all, query, count) => {
          expect(nearestClimbs(storeOf(all), query, { count })).toEqual(
            byMeasuringAll(all, query, count),
          );
        },
      ),
      { numRuns: 300 },
    );
  });

  test('leave out what is farther than asked and what is not to be told of', () => {
    fc.assert(
      fc.property(
        fc.array(climbs, { maxLength: 40 }),
        climbs,
        fc.double({ min: 1, max: 300, noNaN: true }),
        (all, query, withinCelsius) => {
          const without = new Set([1, 2, 3]);
          expect(nearestClimbs(storeOf(all), query, { count: 5, withinCelsius, without })).toEqual(
            byMeasuringAll(all, query, all.length)
              .filter(({ noteId, apartCelsius }) => noteId > 3 && apartCelsius <= withinCelsius)
              .slice(0, 5),
          );
        },
      ),
    );
  });

  test('follow every putting in, replacing and taking out', () => {
    const acts = fc.array(
      fc.record({ noteId: fc.integer({ min: 1, max: 12 }), climb: fc.option(climbs) }),
      { maxLength: 60 },
    );
    fc.assert(
      fc.property(acts, climbs, (done, query) => {
        const store = emptyClimbStore(2);
        const kept = new Map<number, Int16Array>();
        for (const { noteId, climb } of done) {
          if (climb === null) {
            removeClimb(store, noteId);
            kept.delete(noteId);
          } else {
            putClimb(store, noteId, climb);
            kept.set(noteId, climb);
          }
        }
        expect(store.size).toBe(kept.size);
        for (const [noteId, climb] of kept) expect(climbOfNote(store, noteId)).toEqual(climb);
        expect(nearestClimbs(store, query, { count: 12 })).toEqual(
          [...kept]
            .map(([noteId, climb]) => ({ noteId, apartCelsius: signatureDistance(query, climb) }))
            .sort((a, b) => a.apartCelsius - b.apartCelsius || a.noteId - b.noteId),
        );
      }),
    );
  });

  test('are found in pieces, so that others can be answered in between', () => {
    const store = emptyClimbStore();
    for (let id = 1; id <= 2000; id += 1) {
      putClimb(
        store,
        id,
        Int16Array.from({ length: 30 }, (_value, i) => 20 + (i * id) / 100),
      );
    }
    const search = searchClimbs(
      store,
      Int16Array.from({ length: 30 }, (_v, i) => 20 + i * 9),
      {
        count: 1000,
      },
    );
    let pieces = 0;
    while (search.next().done !== true) pieces += 1;
    expect(pieces).toBeGreaterThan(3);
  });
});
