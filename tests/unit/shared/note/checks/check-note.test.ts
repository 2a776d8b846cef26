import { describe, expect, it } from 'vitest';
import type { FiringReading } from '#shared/firing/types.ts';
import { canHandIn, openChecks } from '#shared/note/checks/check.ts';
import type { Check, CheckContext } from '#shared/note/checks/check.ts';
import { checkNote } from '#shared/note/checks/check-note.ts';
import { emptyNoteFields } from '#shared/note/note-fields.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { aKiln, aNote, aPiece, aReading, aStall } from '../a-note.ts';

interface Given {
  readonly change?: (fields: NoteFields) => void;
  readonly reading?: Partial<FiringReading>;
  readonly context?: Partial<CheckContext>;
}
const checksOf = ({ change, reading, context }: Given = {}): Check[] =>
  checkNote({
    fields: aNote(change),
    kiln: aKiln(),
    reading: reading ? aReading(reading) : null,
    hasRecord: reading !== undefined,
    earlier: null,
    today: '2024-06-01',
    ...context,
  });
const codesOf = (given: Given): string[] => checksOf(given).map(({ code }) => code);

describe('checking a note', () => {
  it('asks nothing of a complete note, with a record and without', () => {
    expect(checksOf()).toEqual([]);
    expect(checksOf({ reading: {} })).toEqual([]);
  });

  it('asks for every starred field of the empty note, in the order of the note', () => {
    const checks = checkNote({
      fields: emptyNoteFields(),
      kiln: null,
      reading: null,
      hasRecord: false,
      earlier: null,
      today: '2024-06-01',
    });
    expect(checks.map(({ code }) => code)).toEqual([
      'date-missing',
      'start-time-missing',
      'start-class-missing',
      'kiln-missing',
      'drawn-because-missing',
      'target-missing',
      'peak-missing',
      'time-to-temperature-missing',
      'hold-missing',
      'pieces-missing',
      'title-missing',
      'story-missing',
      'cautions-not-read',
    ]);
    expect(checks.every(({ kind }) => kind === 'must-mend')).toBe(true);
  });

  it.each<[string, string, Given]>([
    ['date-in-future', '/when/date', { change: (f) => (f.when.date = '2024-06-02') }],
    [
      'unreported-firings-missing',
      '/when/unreportedFirings',
      {
        change: (f) => (f.when.unreportedFirings = null),
        context: { earlier: { fields: aNote(), kiln: aKiln() } },
      },
    ],
    ['target-missing', '/plan/targetCone', { change: (f) => (f.plan.targetBy = 'cone') }],
    ['peak-missing', '/plan/peakCelsius', { change: (f) => (f.plan.peakCelsius = null) }],
    ['form-missing', '/pieces/0/form', { change: (f) => (f.pieces = [aPiece({ form: null })]) }],
    ['count-missing', '/pieces/0/count', { change: (f) => (f.pieces = [aPiece({ count: null })]) }],
    ['whole-missing', '/pieces/0/whole', { change: (f) => (f.pieces = [aPiece({ whole: null })]) }],
    ['melt-missing', '/pieces/0/melt', { change: (f) => (f.pieces = [aPiece({ melt: null })]) }],
    [
      'cracks-missing',
      '/pieces/0/cracked',
      { change: (f) => (f.pieces = [aPiece({ cracked: null })]) },
    ],
    [
      'crack-without-place',
      '/pieces/1/cracks',
      { change: (f) => (f.pieces = [aPiece(), aPiece({ cracked: true })]) },
    ],
    ['route-missing', '/pieces/0/route', { change: (f) => (f.pieces = [aPiece({ route: null })]) }],
    [
      'container-missing',
      '/reduction/container',
      { change: (f) => (f.reduction.container = null) },
    ],
    [
      'combustible-missing',
      '/pieces/0/recipe/combustibles',
      {
        change: (f) => {
          f.pieces = [aPiece({ recipe: { ...f.reduction, combustibles: [] } })];
        },
      },
    ],
    ['out-of-range', '/setUp/airCelsius', { change: (f) => (f.setUp.airCelsius = 46) }],
    [
      'picture-without-alt',
      '/story/content/1/attrs/alt',
      {
        change: (f) =>
          f.story.content.push({ type: 'picture', attrs: { name: 'a', alt: ' ', caption: 'x' } }),
      },
    ],
    [
      'time-backwards',
      '/record/typedRows/2/minute',
      {
        change: (f) =>
          (f.record.typedRows = [
            { minute: 0, celsius: 20 },
            { minute: 10, celsius: 300 },
            { minute: 9, celsius: 320 },
          ]),
      },
    ],
    [
      'reading-outside',
      '/record/typedRows/1/celsius',
      {
        change: (f) =>
          (f.record.typedRows = [
            { minute: 0, celsius: 20 },
            { minute: 10, celsius: 1401 },
          ]),
      },
    ],
  ])('must mend: %s at %s', (code, pointer, given) => {
    const checks = checksOf(given);
    expect(checks.map((check) => [check.code, check.kind, check.pointer])).toEqual([
      [code, 'must-mend', pointer],
    ]);
    expect(checks[0]?.text).toMatch(/^\S.*[.?]$/);
  });

  it('accepts readings at the bounds, and a row set aside by leaving its temperature blank', () => {
    const given: Given = {
      change: (f) =>
        (f.record.typedRows = [
          { minute: 0, celsius: -40 },
          { minute: 5, celsius: null },
          { minute: 10, celsius: 1400 },
        ]),
    };
    expect(codesOf(given)).toEqual([]);
  });

  it('asks no melt of bare ware, and no recipe of ware left in air', () => {
    const given: Given = {
      change: (f) => {
        f.pieces = [aPiece({ melt: null, glazeFamily: 'none', route: 'air-only' })];
        f.reduction.container = null;
      },
    };
    expect(codesOf(given)).toEqual([]);
  });

  it('takes peak, time and hold from the record when the author left them blank', () => {
    const blank = (f: NoteFields): void => {
      f.plan.peakBy = null;
      f.plan.peakCelsius = null;
      f.plan.timeToTemperatureMinutes = null;
      f.plan.holdKeptMinutes = null;
    };
    expect(codesOf({ change: blank, reading: {} })).toEqual([]);
    expect(codesOf({ change: blank })).toEqual([
      'peak-missing',
      'time-to-temperature-missing',
      'hold-missing',
    ]);
  });

  it('asks no time to temperature of a firing that never got there', () => {
    const given: Given = {
      change: (f) => {
        f.plan.drawnBecause = 'gave-up';
        f.plan.peakCelsius = 708;
        f.plan.timeToTemperatureMinutes = null;
        f.plan.holdKeptMinutes = null;
        f.plan.noHold = true;
      },
    };
    expect(codesOf(given)).toEqual([]);
  });
});

describe('the two degrees', () => {
  it('offers 1010 °C for 1850 typed as °C', () => {
    const [check] = checksOf({ change: (f) => (f.plan.targetCelsius = 1850) });
    expect(check).toMatchObject({
      code: 'fahrenheit-as-celsius',
      kind: 'must-mend',
      pointer: '/plan/targetCelsius',
      offer: {
        pointer: '/plan/targetCelsius',
        value: 1010,
        label: '1850\u00A0°F is 1010\u00A0°C',
      },
    });
  });

  it('offers 1000 °C for 1000 typed as °F, which is 538 °C', () => {
    const [check] = checksOf({
      change: (f) => {
        f.plan.typedIn = 'F';
        f.plan.peakCelsius = (1000 - 32) / 1.8;
      },
    });
    expect(check?.code).toBe('celsius-as-fahrenheit');
    expect(check?.offer?.value).toBe(1000);
  });

  it('asks once, not as a range too, and offers nothing when neither degree makes sense', () => {
    const checks = checksOf({ change: (f) => (f.plan.peakCelsius = 9999) });
    expect(checks).toHaveLength(1);
    expect(checks[0]?.offer).toBeUndefined();
  });

  it('takes 1150 °C and 1100 °F as they are', () => {
    expect(codesOf({ change: (f) => (f.plan.targetCelsius = 1150) })).toEqual([]);
    const inFahrenheit: Given = {
      change: (f) => {
        f.plan.typedIn = 'F';
        f.plan.targetCelsius = (1100 - 32) / 1.8;
      },
    };
    expect(codesOf(inFahrenheit)).toEqual([]);
  });
});

describe('the record against the note', () => {
  it.each<[string, Given]>([
    ['peak-disagrees', { reading: { peak: { celsius: 1021, minute: 43 } } }],
    ['time-disagrees', { reading: { timeToTemperatureMinutes: 45 } }],
    ['hold-disagrees', { reading: { hold: null } }],
    ['too-fast-for-a-kiln', { reading: { fastestPerMinute: 201 } }],
    ['gap-in-record', { reading: { longestGapMinutes: 10.5 } }],
    [
      'peak-after-shut-off',
      {
        reading: {
          shutOff: { minute: 39, inferred: false },
          celsiusAtShutOff: 985,
        },
      },
    ],
    ['stall-not-named', { reading: { levels: [aStall()] } }],
    ['sag-not-shown', { reading: {}, change: (f) => (f.result.troubles = ['sag']) }],
    ['record-not-read', { context: { hasRecord: true } }],
    [
      'fast-through-quartz',
      {
        reading: { steepest450To700: 41 },
        change: (f) => (f.pieces = [aPiece({ form: 'flat-plate' })]),
      },
    ],
    [
      'fast-through-quartz',
      { reading: { steepest450To700: 41 }, change: (f) => (f.pieces = [aPiece({ spanMm: 251 })]) },
    ],
  ])('looks again: %s', (code, given) => {
    const checks = checksOf(given);
    expect(checks.map((check) => [check.code, check.kind])).toEqual([[code, 'look-again']]);
  });

  it.each<[string, Given]>([
    ['a peak 15 °C apart', { reading: { peak: { celsius: 1020, minute: 43 } } }],
    ['a time 10 % apart', { reading: { timeToTemperatureMinutes: 44 } }],
    ['a hold 2 min apart', { reading: { hold: { ...holdOf(5) } } }],
    ['200 °C a minute', { reading: { fastestPerMinute: 200 } }],
    ['a gap of ten minutes', { reading: { longestGapMinutes: 10 } }],
    ['a bowl raced through 573 °C', { reading: { steepest450To700: 60 } }],
    [
      'a gap shorter than a tenth of a long climb',
      {
        reading: { longestGapMinutes: 19, peak: { celsius: 1005, minute: 200 } },
        change: (f) => (f.plan.timeToTemperatureMinutes = null),
      },
    ],
    [
      'a peak after a shut-off that was only inferred',
      { reading: { shutOff: { minute: 39, inferred: true }, celsiusAtShutOff: 900 } },
    ],
    [
      'uneven heat named with one probe',
      { reading: {}, change: (f) => (f.result.troubles = ['uneven-heat']) },
    ],
    [
      'a slow climb named of a wood kiln',
      {
        reading: {},
        change: (f) => (f.result.troubles = ['slow-climb']),
        context: { kiln: aKiln({ fuel: 'wood' }) },
      },
    ],
  ])('lets pass %s', (_what, given) => {
    expect(codesOf(given)).toEqual([]);
  });

  it('offers to add the trouble to those already named', () => {
    const [check] = checksOf({
      reading: { levels: [aStall()] },
      change: (f) => (f.result.troubles = ['dull-glaze']),
    });
    expect(check?.text).toContain('708\u00A0°C for 17\u00A0min');
    expect(check?.offer?.value).toEqual(['dull-glaze', 'stall']);
  });
});

describe('open checks', () => {
  const given: Given = { reading: { levels: [aStall()] } };

  it('closes a look-again with a sentence, and not with a blank one', () => {
    const checks = checksOf(given);
    const answer = (text: string) => [
      { code: 'stall-not-named', pointer: '/result/troubles', answer: text },
    ];
    expect(canHandIn(checks, [])).toBe(false);
    expect(canHandIn(checks, answer('  '))).toBe(false);
    expect(canHandIn(checks, answer('I meant to soak it there.'))).toBe(true);
  });

  it('closes no must-mend with a sentence', () => {
    const checks = checksOf({ change: (f) => (f.title = '') });
    const answers = [{ code: 'title-missing', pointer: '/title', answer: 'It needs none.' }];
    expect(openChecks(checks, answers)).toHaveLength(1);
  });

  it('shows unsafe words to the moderators and does not hold the author up', () => {
    const checks = checksOf({
      change: (f) => (f.result.surprised = 'It rained, so we fired in the garage.'),
    });
    expect(checks).toMatchObject([
      { code: 'unsafe-practice', pointer: '/result/surprised', forModerators: true },
    ]);
    expect(checks[0]?.text).toContain('fired in the garage');
    expect(canHandIn(checks, [])).toBe(true);
  });

  it('is plain data that survives being stored', () => {
    const checks = checksOf(given);
    expect(JSON.parse(JSON.stringify(checks))).toEqual(checks);
  });
});

function holdOf(minutes: number) {
  return {
    fromMinute: 40,
    toMinute: 40 + minutes,
    minutes,
    levelCelsius: 1002,
    offAimCelsius: 2,
    confidence: 'high' as const,
    sdCelsius: 1,
  };
}
