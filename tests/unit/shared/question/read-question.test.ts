import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { labelOf } from '#shared/question/part-labels.ts';
import { readQuestion } from '#shared/question/read-question.ts';
import { withoutParts } from '#shared/question/without-parts.ts';
import { IMPERIAL_UNITS, METRIC_UNITS } from '#shared/units/units.ts';

/** Words that meet the grammar from all sides, for random questions. */
const WORDS = (
  'stalled stuck at about 700 1300F °C °F 06 cone ^ won’t get past not no without but , . " \' - / between and 650 720 ' +
  'from to plate bottle gas crack crackle 12" 30 cm 1h20 1:20 h 3 degrees a minute half an hour ½ 1/2 K26 K ~ ish ' +
  'six eighty hundred thousand glaze dropped shelf tongs took hours'
).split(' ');

function labels(question: string, units = METRIC_UNITS): string[] {
  return readQuestion(question).parts.map((part) => labelOf(part, units).replaceAll('\u00A0', ' '));
}

describe('readQuestion', () => {
  test('never throws, whatever is typed, and keeps the text as typed', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 500 }), (text) => {
        expect(readQuestion(text).q).toBe(text);
      }),
      { numRuns: 300 },
    );
  });

  test('never throws on the words of the trade in any order, and every part lies in the text', () => {
    fc.assert(
      fc.property(fc.array(fc.constantFrom(...WORDS), { maxLength: 80 }), (words) => {
        const text = words.join(' ').slice(0, 500);
        const reading = readQuestion(text);
        const keys = reading.parts.map(({ key }) => key);
        expect(new Set(keys).size).toBe(keys.length);
        for (const { span, label } of reading.parts) {
          expect(label).not.toBe('');
          expect(span[0]).toBeGreaterThanOrEqual(0);
          expect(span[1]).toBeGreaterThanOrEqual(span[0]);
          expect(span[1]).toBeLessThanOrEqual(text.length);
        }
        for (const kind of reading.notTrouble) expect(reading.trouble).not.toContain(kind);
        expect(withoutParts(reading, keys).parts).toEqual([]);
      }),
      { numRuns: 300 },
    );
  });

  test('takes time in proportion to the text: 500 characters of the worst kind read in a moment', () => {
    const worst = [
      'a'.repeat(500),
      "a'".repeat(250),
      '1 '.repeat(250),
      'stuck '.repeat(83),
      'pull take lift open remove out too '.repeat(14),
      'no not never without '.repeat(24),
      'xcracke '.repeat(62),
    ];
    readQuestion('warm up');
    for (const text of worst) {
      const start = performance.now();
      readQuestion(text);
      expect(performance.now() - start).toBeLessThan(250);
    }
  });

  test('reads a bare number in the unit the asker prefers, and only where it can be one', () => {
    expect(readQuestion('stuck at 900', { preferredUnit: 'F' })).toMatchObject({
      tempC: 482,
      tempUnit: 'guessed',
    });
    expect(readQuestion('stuck at 900')).toMatchObject({ tempC: 900, tempUnit: 'guessed' });
    expect(readQuestion('stuck at 1151')).toMatchObject({ tempC: 622, tempUnit: 'guessed' });
    expect(readQuestion('stuck at 900 C', { preferredUnit: 'F' })).toMatchObject({
      tempC: 900,
      tempUnit: 'C',
    });
  });

  test('judges roundness in the unit typed: 1300 °F is round although 704 °C is not', () => {
    expect(readQuestion('1300 °F').toleranceC).toBe(20);
    expect(readQuestion('704 °C').toleranceC).toBe(10);
    expect(readQuestion('about 704 °C').toleranceC).toBe(35);
  });

  test('a question in °C and the same one in °F find one another', () => {
    const celsius = readQuestion('stalled at 700 °C');
    const fahrenheit = readQuestion('stuck at 1300F');
    const apart = Math.abs((celsius.tempC ?? 0) - (fahrenheit.tempC ?? Infinity));
    expect(apart).toBeLessThan(celsius.toleranceC ?? 0);
  });

  test('American and British spelling, joined and parted words read alike', () => {
    const pairs = [
      ['copper luster went gray', 'copper lustre went grey'],
      ['no color on copper matte', 'no colour on copper matt'],
      ['under-fired', 'underfired'],
      ['saw dust', 'sawdust'],
      ['tea bowl pale', 'teabowl pale'],
      ['over fired', 'overfired'],
      ['leveled off at 700', 'levelled off at 700'],
      ['cracked plates', 'cracked plate'],
      ["can't reach 900", 'cannot reach 900'],
      ['will not climb', "won't climb"],
    ] as const;
    for (const [one, other] of pairs) {
      // The words searched as text stay as they are spelt; the engine has its synonyms for them.
      const unlike = { q: '', parts: [], allWords: '' };
      expect({ ...readQuestion(one), ...unlike }).toEqual({ ...readQuestion(other), ...unlike });
    }
  });

  test('keeps the words nothing was read from, and nothing else', () => {
    expect(readQuestion('stalled at 700 °C').words).toBe('');
    expect(readQuestion('copper went green').words).toBe('copper');
    expect(readQuestion('stalled at 700 in a soft brick kiln').words).toBe('soft brick');
    expect(readQuestion('ice on the propane bottle').words).toBe('propane');
    expect(readQuestion('stalled at 700 in a soft brick kiln').allWords).toBe('stalled soft brick');
  });

  test('shows each part in words, in the reader’s own units', () => {
    expect(labels('stalled at 700 °C on plates')).toEqual(['stall', 'near 700 °C ± 20', 'plates']);
    expect(labels('stalled at 700 °C', IMPERIAL_UNITS)).toEqual(['stall', 'near 1292 °F ± 36']);
    expect(labels('between 650 and 720 very slow')).toEqual(['650 to 720 °C', 'slow climb']);
    expect(labels('slow after 600')).toEqual(['slow climb', 'from 600 °C up']);
    expect(labels('not stalling just slow')).toEqual(['not stall', 'slow climb']);
    expect(labels('cone 06 dull')).toEqual(['cone 06 (about 998 °C)', 'dull glaze']);
    expect(labels('took 2 hours')).toEqual(['slow climb', 'over 120 min']);
    expect(labels('12" tile')).toEqual(['about 30 cm', 'tiles']);
  });

  test('says where in the text each part stands', () => {
    const text = 'stalled at 700 °C on plates';
    const spans = readQuestion(text).parts.map(({ span }) => text.slice(span[0], span[1]));
    expect(spans).toEqual(['stalled', '700 °C', 'plates']);
  });
});

describe('withoutParts', () => {
  test('empties the fields of a part and leaves the others', () => {
    const reading = readQuestion('plate stalled at 700 °C');
    const without = withoutParts(reading, ['temperature']);
    expect(without).toMatchObject({
      trouble: ['stall'],
      form: 'plate',
      tempC: null,
      tempUnit: null,
    });
    expect(without.parts.map(({ key }) => key)).toEqual(['form', 'trouble:stall']);
  });

  test('searches the words of a part that is switched off as text', () => {
    expect(withoutParts(readQuestion('sugar stalled at 700'), ['glaze']).words).toBe('sugar');
  });

  test('ignores keys the question does not have', () => {
    const reading = readQuestion('stalled');
    expect(withoutParts(reading, ['form', '', '__proto__'])).toBe(reading);
  });
});
