import { describe, expect, test } from 'vitest';
import { readQuestion } from '#shared/question/read-question.ts';
import { tiersFor } from '#shared/question/search-request.ts';
import { bothFilters, filterText, quoted } from '../../../search/filters.ts';

describe('filterText', () => {
  test('writes a stall near a temperature in the engine’s language', () => {
    expect(filterText(tiersFor(readQuestion('stalled at 700 °C')).close?.filter ?? null)).toBe(
      '(troubles IN ["stall"] AND (stallC 680 TO 720 OR eventC 680 TO 720 OR ' +
        '(stallC IS EMPTY AND peakC 680 TO 720)))',
    );
  });

  test('writes bounds, exclusions and open ends', () => {
    expect(filterText({ kind: 'between', field: 'peakC', min: 600, max: null })).toBe(
      'peakC >= 600',
    );
    expect(filterText({ kind: 'between', field: 'peakC', min: null, max: 600 })).toBe(
      'peakC <= 600',
    );
    expect(filterText({ kind: 'between', field: 'peakC', min: null, max: null })).toBe('');
    expect(filterText({ kind: 'not-in', field: 'troubles', values: ['stall', 'sag'] })).toBe(
      'troubles NOT IN ["stall", "sag"]',
    );
    expect(filterText(null)).toBe('');
  });

  test('drops empty parts instead of writing broken syntax', () => {
    const open = { kind: 'between', field: 'peakC', min: null, max: null } as const;
    expect(
      filterText({ kind: 'all', of: [open, { kind: 'in', field: 'fuel', values: ['wood'] }] }),
    ).toBe('fuel IN ["wood"]');
    expect(filterText({ kind: 'any', of: [open] })).toBe('');
  });

  test('a value cannot break out of its quotes', () => {
    expect(quoted('a" OR noteId = 1')).toBe('"a\\" OR noteId = 1"');
    expect(quoted('a\\')).toBe('"a\\\\"');
    expect(quoted('x, y] OR z')).toBe('"x, y] OR z"');
  });

  test('refuses numbers that are none', () => {
    expect(() => filterText({ kind: 'between', field: 'peakC', min: NaN, max: 1 })).toThrow(
      RangeError,
    );
  });
});

test('bothFilters joins two filters, and is the other where one is absent', () => {
  const fuel = { kind: 'in', field: 'fuel', values: ['wood'] } as const;
  expect(bothFilters(null, fuel)).toBe(fuel);
  expect(filterText(bothFilters(fuel, { kind: 'empty', field: 'sagC' }))).toBe(
    '(fuel IN ["wood"] AND sagC IS EMPTY)',
  );
});
