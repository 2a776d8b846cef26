import { describe, expect, test } from 'vitest';
import { readQuestion } from '#shared/question/read-question.ts';
import { tiersFor } from '#shared/question/search-request.ts';
import { withoutParts } from '#shared/question/without-parts.ts';

const tiers = (question: string) => tiersFor(readQuestion(question));

describe('tiersFor', () => {
  test('close asks for the trouble at its own level, never at the peak of a firing that stalled lower', () => {
    expect(tiers('stalled at 700 °C').close).toEqual({
      tier: 'close',
      filter: {
        kind: 'all',
        of: [
          { kind: 'in', field: 'troubles', values: ['stall'] },
          {
            kind: 'any',
            of: [
              { kind: 'between', field: 'stallC', min: 680, max: 720 },
              { kind: 'between', field: 'eventC', min: 680, max: 720 },
              {
                kind: 'all',
                of: [
                  { kind: 'empty', field: 'stallC' },
                  { kind: 'between', field: 'peakC', min: 680, max: 720 },
                ],
              },
            ],
          },
        ],
      },
      texts: [''],
      strategy: 'last',
    });
  });

  test('same trouble drops temperature, glaze and size, and keeps the form', () => {
    const { sameTrouble } = tiers('30 cm plate with clear glaze cracked at 573');
    expect(sameTrouble?.filter).toEqual({
      kind: 'all',
      of: [
        { kind: 'in', field: 'troubles', values: ['crack-in-firing'] },
        { kind: 'in', field: 'forms', values: ['plate'] },
      ],
    });
  });

  test('a trouble ruled out is left out of close and of same trouble', () => {
    const { close, sameTrouble } = tiers('not stalling just slow');
    const without = { kind: 'not-in', field: 'troubles', values: ['stall'] };
    expect(JSON.stringify(close?.filter)).toContain(JSON.stringify(without));
    expect(JSON.stringify(sameTrouble?.filter)).toContain(JSON.stringify(without));
  });

  test('a piece of about the size asked for is one within 30 percent', () => {
    expect(JSON.stringify(tiers('30 cm plate cracked').close?.filter)).toContain(
      '{"kind":"between","field":"widestCm","min":21,"max":39}',
    );
  });

  test('a cone steers by its rough target, and never by a number of degrees', () => {
    const filter = JSON.stringify(tiers('cone 06 raku stalled').close?.filter);
    expect(filter).toContain('{"kind":"between","field":"aimC","min":983,"max":1013}');
    expect(filter).not.toContain('stallC');
  });

  test('minutes bound the time to the peak', () => {
    expect(JSON.stringify(tiers('took 2 hours to reach temperature').close?.filter)).toContain(
      '{"kind":"between","field":"minutesToPeak","min":120,"max":null}',
    );
    expect(JSON.stringify(tiers('stalled after 40 minutes').close?.filter)).not.toContain(
      'minutes',
    );
    expect(JSON.stringify(tiers('soak for 10 min').close?.filter)).toContain('holdMinutes');
  });

  test('a question for a faster firing finds the cures of slow climbs second', () => {
    expect(tiers('how to fire faster than 45 minutes').sameTrouble?.filter).toEqual({
      kind: 'in',
      field: 'troubles',
      values: ['slow-climb'],
    });
  });

  test('causes select only where no temperature does, and weather counts as a cause', () => {
    expect(JSON.stringify(tiers('temperature drops when windy').close?.filter)).toContain(
      '{"kind":"in","field":"wind","values":["gusty","strong"]}',
    );
    expect(JSON.stringify(tiers('stalled at 700 in the wind').close?.filter)).not.toContain(
      'causes',
    );
    expect(tiers('stalled at 700 in the wind').sameTrouble?.texts).toEqual(['wind', '']);
  });

  test('by words sends the whole question less units and numbers, unfiltered', () => {
    expect(tiers('12" tile warped in the kiln at 700 -750').byWords).toEqual({
      tier: 'by-words',
      filter: null,
      texts: ['tile warped'],
      strategy: 'frequency',
    });
  });

  test('a part that is switched off is in no filter', () => {
    const reading = withoutParts(readQuestion('plate stalled at 700'), ['temperature', 'form']);
    expect(tiersFor(reading).close?.filter).toEqual({
      kind: 'in',
      field: 'troubles',
      values: ['stall'],
    });
  });

  test('a change asked about without a trouble is sought itself, where it was made and where it came next', () => {
    const { close, sameTrouble } = tiers('put up a windbreak');
    expect(close?.filter).toEqual({ kind: 'in', field: 'changes', values: ['wind-shelter'] });
    expect(sameTrouble?.filter).toEqual({
      kind: 'in',
      field: 'nextChanges',
      values: ['wind-shelter'],
    });
  });

  test('beside a trouble, notes with the change asked about come first, and the others stay', () => {
    const { close } = tiers('stalled at 700, more gas');
    expect(JSON.stringify(close?.first)).toContain('"nextChanges","values":["gas-more"]');
    expect(JSON.stringify(close?.filter)).not.toContain('hanges');
  });

  test('without a trouble firings that went well come first; dull glaze is not a stall’s first', () => {
    expect(tiers('naked raku').close?.first).toEqual({ kind: 'empty', field: 'troubles' });
    expect(tiers('raku in the rain').close?.first).toBeUndefined();
    expect(tiers('dull glaze').close?.first).toEqual({
      kind: 'not-in',
      field: 'troubles',
      values: ['stall'],
    });
    expect(tiers('stalled, glaze dull').close?.first).toBeUndefined();
  });

  test('numbers are sought as typed where no record tells of them, never beside a measured level', () => {
    expect(tiers('plate cracked between 540 and 600').close?.texts[0]).toBe('540 600');
    expect(tiers('stalled at 700').close?.texts).toEqual(['']);
    expect(tiers('cone 06 stalled').close?.texts[0]).toBe('06 cone');
  });

  test('an empty question asks for nothing', () => {
    expect(tiers('')).toEqual({ close: null, sameTrouble: null, byWords: null });
  });
});
