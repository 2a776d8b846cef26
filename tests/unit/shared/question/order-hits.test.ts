import { describe, expect, test } from 'vitest';
import {
  distanceTo,
  nearnessCentre,
  orderByNearness,
  orderHits,
} from '#shared/question/order-hits.ts';

const hit = (name: string, outcome: number, levelsC: number[], firedOn = 20_000, foundBy = 0) => ({
  name,
  outcome,
  levelsC,
  firedOn,
  foundBy,
});
const names = (hits: readonly { name: string }[]): string[] => hits.map(({ name }) => name);

describe('orderHits', () => {
  test('puts a cure before a try, a try before a bare record, and that before none', () => {
    const hits = [
      hit('none', 0, [700]),
      hit('record', 1, [700]),
      hit('tried', 2, [700]),
      hit('gone', 3, [719]),
    ];
    expect(names(orderHits(hits, 700))).toEqual(['gone', 'tried', 'record', 'none']);
  });

  test('within one outcome puts the nearest level first, and a note without a level last', () => {
    const hits = [hit('unknown', 3, []), hit('far', 3, [720]), hit('near', 3, [480, 704])];
    expect(names(orderHits(hits, 700))).toEqual(['near', 'far', 'unknown']);
  });

  test('between equals puts the newest first, also when no temperature is asked', () => {
    const hits = [hit('old', 2, [700], 19_000), hit('new', 2, [700], 20_000)];
    expect(names(orderHits(hits, 700))).toEqual(['new', 'old']);
    expect(names(orderHits([hit('far', 2, [900], 1), hit('near', 2, [700], 2)], null))).toEqual([
      'near',
      'far',
    ]);
  });

  test('what the words found stands before what the filter alone found', () => {
    const hits = [hit('filter', 3, [700], 1, 1), hit('words', 0, [], 1, 0)];
    expect(names(orderHits(hits, 700))).toEqual(['words', 'filter']);
  });

  test('keeps the given order of equals and does not touch the list it was given', () => {
    const hits = [hit('a', 1, []), hit('b', 1, [])];
    const given = [...hits];
    expect(names(orderHits(hits, 700))).toEqual(['a', 'b']);
    expect(hits).toEqual(given);
  });
});

describe('orderByNearness', () => {
  test('puts the nearest level first whatever the outcome', () => {
    const hits = [hit('cured', 3, [719]), hit('exact', 0, [700])];
    expect(names(orderByNearness(hits, 700))).toEqual(['exact', 'cured']);
  });
});

test('distanceTo takes the nearest of several levels, and is infinite for none', () => {
  expect(distanceTo([500, 690, 720], 700)).toBe(10);
  expect(distanceTo([], 700)).toBe(Infinity);
});

test('nearnessCentre is the centre asked for, else the middle of the range, else its one end', () => {
  expect(nearnessCentre({ tempC: 740, tempMinC: 690, tempMaxC: 740 })).toBe(740);
  expect(nearnessCentre({ tempC: null, tempMinC: 650, tempMaxC: 720 })).toBe(685);
  expect(nearnessCentre({ tempC: null, tempMinC: 600, tempMaxC: null })).toBe(600);
  expect(nearnessCentre({ tempC: null, tempMinC: null, tempMaxC: null })).toBeNull();
});
