import { describe, expect, it } from 'vitest';
import type { WhatHelpedRow } from '#shared/api/figures.ts';
import {
  inReadingOrder,
  levelWords,
  rowAsides,
  rowSentence,
} from '../../../src/figures/helped-words.ts';

const row = (over: Partial<WhatHelpedRow> = {}): WhatHelpedRow => ({
  change: 'floor-insulated',
  firings: 8,
  members: 7,
  gone: 7,
  share: 7 / 8,
  interval: { low: 0.53, high: 0.98 },
  difference: { share: 0.75, low: 0.11, high: 0.91 },
  verdict: 'better',
  alone: { gone: 5, firings: 6 },
  shareIfMissingFailed: 0.7,
  caution: null,
  noteIds: [],
  ...over,
});

describe('the sentence of a change', () => {
  it('gives counts of firings and of members, the difference with its range, and the verdict', () => {
    expect(rowSentence(row(), 'stall')).toBe(
      'After “floor insulated”, “stall” was gone in 7 of 8 firings by 7 members, 75 more in a hundred than with no change named (anything from 11 more to 91 more fits the counts): better than changing nothing.',
    );
  });

  it('says that a change cannot be told from none when its range holds nought', () => {
    const text = rowSentence(
      row({ verdict: 'cannot-be-told', difference: { share: -0.13, low: -0.58, high: 0.41 } }),
      'stall',
    );
    expect(text).toContain('13 fewer in a hundred');
    expect(text).toContain('anything from 58 fewer to 41 more');
    expect(text).toMatch(/cannot be told from changing nothing\.$/);
  });

  it('never calls a change better where there is nothing to hold it against', () => {
    const text = rowSentence(row({ difference: null, verdict: 'cannot-be-told' }), 'stall');
    expect(text).toContain('too few firings with no change named');
    expect(text).not.toContain('better');
  });

  it('says of the first row how it went without a change, and when nobody knows', () => {
    const none = row({ change: null, verdict: 'reference', difference: null, gone: 1, members: 1 });
    expect(rowSentence(none, 'stall')).toBe(
      'With no change named, “stall” was gone in 1 of 8 firings by 1 member.',
    );
    expect(rowSentence({ ...none, firings: 0, gone: 0, members: 0 }, 'stall')).toContain(
      'nothing to hold the changes against',
    );
  });
});

describe('the figures beside a change', () => {
  it('tell it tried alone, and what it becomes if every missing follow-on had failed', () => {
    expect(rowAsides(row())).toEqual([
      'tried alone: 5 of 6',
      'if every missing follow-on had failed: 70\u00a0%',
    ]);
  });
  it('say nothing of missing follow-ons where none is missing', () => {
    expect(rowAsides(row({ shareIfMissingFailed: 7 / 8, alone: { gone: 0, firings: 0 } }))).toEqual(
      ['never tried alone'],
    );
  });
});

describe('the page of a trouble', () => {
  it('names the level 1 − 0.05/m for m changes shown (Bonferroni)', () => {
    expect(levelWords(1)).toBe('95\u00a0%');
    expect(levelWords(5)).toBe('99\u00a0%');
    expect(levelWords(6)).toBe('99.2\u00a0%');
  });

  it('shows cold starts before hot ones, and measured before named', () => {
    const table = (startClass: 'cold' | 'hot', source: 'measured' | 'named') => ({
      startClass,
      source,
      ranked: [],
      tooFew: [],
      pairs: 1,
      leftOut: [],
    });
    const mixed = [table('hot', 'named'), table('cold', 'named'), table('cold', 'measured')];
    expect(inReadingOrder(mixed).map((one) => `${one.startClass} ${one.source}`)).toEqual([
      'cold measured',
      'cold named',
      'hot named',
    ]);
  });
});
