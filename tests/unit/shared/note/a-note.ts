import type { FiringReading, LevelStretch } from '#shared/firing/types.ts';
import { kilnFieldsSchema } from '#shared/note/kiln-fields.ts';
import type { KilnFields } from '#shared/note/kiln-fields.ts';
import { noteFieldsSchema } from '#shared/note/note-fields.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { pieceSchema } from '#shared/note/pieces.ts';
import type { Piece } from '#shared/note/pieces.ts';

/** A whole, matured bowl; `over` replaces fields. */
export function aPiece(over: Partial<Piece> = {}): Piece {
  const bowl = pieceSchema.parse({
    key: 'a',
    form: 'bowl',
    count: 1,
    route: 'covered',
    melt: 'matured',
    cracked: false,
    whole: true,
  });
  return { ...bowl, ...over };
}

/** A note that can be handed in as it is, without a record; `change` alters it in place. */
export function aNote(change: (fields: NoteFields) => void = () => undefined): NoteFields {
  const fields = noteFieldsSchema.parse({
    title: 'A calm evening',
    kilnId: 1,
    when: {
      date: '2024-05-04',
      startTime: '18:30',
      timeZone: 'Europe/London',
      unreportedFirings: 0,
      startClass: 'cold',
    },
    plan: {
      drawnBecause: 'melt',
      targetBy: 'temperature',
      targetCelsius: 1000,
      peakBy: 'temperature',
      peakCelsius: 1005,
      timeToTemperatureMinutes: 40,
      holdKeptMinutes: 3,
    },
    pieces: [aPiece()],
    reduction: {
      container: 'steel-bin',
      containerLitres: 50,
      combustibles: [
        { kind: 'sawdust', other: '', litres: 5, dampness: 'dry', placement: 'under' },
      ],
      minutesCovered: 20,
    },
    story: {
      type: 'doc',
      content: [{ type: 'paragraph', content: [{ type: 'text', text: 'It went up evenly.' }] }],
    },
    cautionsRead: true,
  });
  change(fields);
  return fields;
}

/** A small fibre kiln on propane. */
export function aKiln(over: Partial<KilnFields> = {}): KilnFields {
  return { ...kilnFieldsSchema.parse({ name: 'Drum', fuel: 'propane' }), ...over };
}

/** The reading of an uneventful firing: 1005 °C, reached in 40 min, held for 3. */
export function aReading(over: Partial<FiringReading> = {}): FiringReading {
  return {
    count: 100,
    spanMinutes: 60,
    lastMinute: 60,
    start: { minute: 0, inferred: false },
    shutOff: { minute: 45, inferred: false },
    aimCelsius: 1000,
    peak: { celsius: 1005, minute: 43 },
    reachedMinute: 40,
    timeToTemperatureMinutes: 40,
    paceCelsiusPerMinute: 25,
    climb: { averagePerMinute: 24, steepestPerMinute: 60, shape: 'steady' },
    hundreds: [],
    quartzCrossings: [],
    rate400To700: 26,
    levels: [],
    sags: [],
    hold: {
      fromMinute: 40,
      toMinute: 43,
      minutes: 3,
      levelCelsius: 1002,
      offAimCelsius: 2,
      confidence: 'high',
      sdCelsius: 1,
    },
    overshootCelsius: null,
    slowClimbMinutes: null,
    unevenHeat: null,
    levellingOff: null,
    minutesAboveAimLess50: 6,
    waveringCelsius: null,
    probeToleranceCelsius: 7.5,
    coolingToDraw: null,
    celsiusAtShutOff: 1003,
    steepest450To700: 30,
    fastestPerMinute: 70,
    longestGapMinutes: 1,
    setAsideCount: 0,
    assumed: [],
    ...over,
  };
}

/** A stall at 708 °C from minute 29 for 17 min. */
export function aStall(over: Partial<LevelStretch> = {}): LevelStretch {
  return {
    confidence: 'high',
    kind: 'stall',
    fromMinute: 29,
    toMinute: 46,
    minutes: 17,
    levelCelsius: 708,
    then: 'shut-off',
    ...over,
  };
}
