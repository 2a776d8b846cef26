import { z } from 'zod';
import { DRAWN_BECAUSE } from '../vocabulary/kiln.ts';
import { MARK_IDS } from '../vocabulary/marks.ts';
import { choice, measure, optionalText } from './field-types.ts';

/** How a temperature was known: read, by a cone's number, or judged by eye. */
export const KNOWN_BY = { temperature: 'Temperature', cone: 'Cone', eye: 'By eye' } as const;

/** Typed rows belong to the draft; anything longer is a stored record. */
export const MAX_TYPED_ROWS = 600;
export const MAX_MARKS = 200;

/** Times are minutes of the record; the pen may start before the fire. */
const minuteOf = z.number().min(-1440).max(20_160);

export const planSchema = z
  .strictObject({
    drawnBecause: choice(DRAWN_BECAUSE),
    targetBy: choice(KNOWN_BY),
    targetCelsius: measure(400, 1150, '°C'),
    targetCone: optionalText(8),
    peakBy: choice(KNOWN_BY),
    peakCelsius: measure(400, 1150, '°C'),
    peakCone: optionalText(8),
    /** The unit the author typed temperatures in: 1850 typed as °C is asked about as °F. */
    typedIn: z.enum(['C', 'F']).default('C'),
    timeToTemperatureMinutes: measure(1, 2880, 'min'),
    /** Neither planned nor kept is an answer of its own, not a zero. */
    noHold: z.boolean().default(false),
    holdPlannedMinutes: measure(0, 600, 'min'),
    holdKeptMinutes: measure(0, 600, 'min'),
  })
  .prefault({});
export type Plan = z.output<typeof planSchema>;

export const markSchema = z.strictObject({
  minute: minuteOf,
  kind: z.enum(MARK_IDS),
  percent: z.number().min(0).max(100).nullable().default(null),
  detail: optionalText(80),
});

/** What the draft knows of its record. Stored readings live apart, found by `recordId`. */
export const recordFieldsSchema = z
  .strictObject({
    recordId: z.number().int().positive().nullable().default(null),
    typedRows: z
      .array(
        z.strictObject({
          minute: minuteOf.nullable(),
          celsius: z.number().min(-1e4).max(1e4).nullable(),
        }),
      )
      .max(MAX_TYPED_ROWS)
      .default([]),
    marks: z.array(markSchema).max(MAX_MARKS).default([]),
    levelAnswers: z
      .array(z.strictObject({ fromMinute: minuteOf, answer: z.enum(['meant', 'stuck']) }))
      .max(20)
      .default([]),
  })
  .prefault({});
export type RecordFields = z.output<typeof recordFieldsSchema>;
