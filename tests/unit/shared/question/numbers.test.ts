import { describe, expect, test } from 'vitest';
import { durationAt } from '#shared/question/durations.ts';
import { numberAt } from '#shared/question/number-words.ts';
import { tokenise } from '#shared/question/tokenise.ts';

describe('numberAt', () => {
  test.each([
    ['six hundred', 600],
    ['six eighty', 680],
    ['eight-fifty', 850],
    ['nine hundred and sixty', 960],
    ['1,050', 1050],
    ['ten fifty', 1050],
    ['a thousand', 1000],
    ['one thousand and fifty', 1050],
    ['thirteen hundred', 1300],
    ['six eighty-five', 685],
    ['twenty five', 25],
    ['7 hundred', 700],
    ['two and a half', 2.5],
    ['1½', 1.5],
    ['1 1/2', 1.5],
    ['06', 6],
  ])('reads "%s" as %d', (text, value) => {
    expect(numberAt(tokenise(text), 0)?.value).toBe(value);
  });

  test('keeps a number typed in digits as typed', () => {
    expect(numberAt(tokenise('010'), 0)?.text).toBe('010');
  });

  test.each(['a', 'hundredweight', 'stall', '', '-'])('finds no number in "%s"', (text) => {
    expect(numberAt(tokenise(text), 0)).toBeNull();
  });
});

describe('durationAt', () => {
  test.each([
    ['45 min', 45],
    ['45-minute', 45],
    ['2 hours', 120],
    ['two and a half hours', 150],
    ['half an hour', 30],
    ['an hour and a half', 90],
    ['three quarters of an hour', 45],
    ['1h20', 80],
    ['1 h 20 min', 80],
    ['an hour and twenty minutes', 80],
    ['1:20 h', 80],
    ['1.5 hrs', 90],
    ['a couple of hours', 120],
  ])('reads "%s" as %d minutes', (text, minutes) => {
    expect(durationAt(tokenise(text), 0)?.minutes).toBe(minutes);
  });

  test.each(['1:20', '14:30', '700 °C', 'hour', '20 m'])(
    'finds no length of time in "%s"',
    (text) => {
      expect(durationAt(tokenise(text), 0)).toBeNull();
    },
  );
});
