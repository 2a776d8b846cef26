import { describe, expect, test } from 'vitest';
import { readQuestion } from '#shared/question/read-question.ts';
import type { FoundNote } from '#shared/question/why.ts';
import { whyFound } from '#shared/question/why.ts';
import { IMPERIAL_UNITS, METRIC_UNITS } from '#shared/units/units.ts';

const note: FoundNote = {
  troubles: ['stall'],
  forms: ['plate'],
  causes: ['wind'],
  stallC: [480, 704],
  sagC: [],
  peakC: 990,
  outcome: 3,
};
const why = (
  question: string,
  found: FoundNote,
  tier: 'close' | 'same-trouble' | 'by-words',
  units = METRIC_UNITS,
) => whyFound(readQuestion(question), found, tier, units).replaceAll('\u00A0', ' ');

describe('whyFound', () => {
  test('says the level, how far it is from what was asked, and how it ended', () => {
    expect(why('stalled at 700 °C', note, 'close')).toBe(
      'levelled off at 704 °C, 4 °C from what you asked; gone in the next firing',
    );
  });

  test('says it in the reader’s units', () => {
    expect(why('stalled at 700 °C', { ...note, outcome: 1 }, 'close', IMPERIAL_UNITS)).toBe(
      'levelled off at 1299 °F, 7 °F from what you asked',
    );
  });

  test('names no distance from the middle of a range', () => {
    expect(why('stalled between 650 and 720', { ...note, outcome: 0 }, 'close')).toBe(
      'levelled off at 704 °C',
    );
  });

  test('in the second tier names the trouble, form and cause shared', () => {
    expect(why('plate stalled in the wind', { ...note, outcome: 2 }, 'same-trouble')).toBe(
      'same trouble: stall; with plates; suspected cause: wind; a change was tried',
    );
  });

  test('where only words matched it says which', () => {
    const reading = readQuestion('soft brick');
    expect(whyFound(reading, { ...note, troubles: [] }, 'by-words', METRIC_UNITS, ['brick'])).toBe(
      'has your words: brick',
    );
  });
});
