import { z } from 'zod';
import { ALIKE_WITHIN_CELSIUS } from '../look-alike/constants.ts';
import { climbTraitsSchema } from '../look-alike/climb-traits.ts';
import { noteRowSchema } from './note-rows.ts';

/** A longer record is thinned to this many readings, keeping its extremes, before it is asked about. */
export const MOST_ASKED_READINGS = 5000;
/** Look-alikes given at most; all of them within `ALIKE_WITHIN_CELSIUS`. */
export const MOST_LOOK_ALIKES = 12;
export { ALIKE_WITHIN_CELSIUS };

/** A record that belongs to no note: [minute, °C]. What is no temperature is set aside when read. */
export const lookAlikesBodySchema = z.strictObject({
  readings: z
    .array(z.tuple([z.number().min(-100_000).max(100_000), z.number().min(-500).max(5000)]))
    .min(3, { message: 'A climb needs at least three readings.' })
    .max(MOST_ASKED_READINGS),
  /** Tells a stay at the top that was meant from one that fell short. */
  targetCelsius: z.number().min(100).max(1400).nullable().default(null),
});
export type LookAlikesBody = z.input<typeof lookAlikesBodySchema>;

export const lookAlikesOfQuerySchema = z.strictObject({
  of: z.enum(['published', 'draft']).default('published'),
});

/** °C at each minute from the start of the firing: what is compared. */
const climbSchema = z.object({ celsius: z.array(z.number()), traits: climbTraitsSchema });

export const lookAlikesSchema = z.object({
  /** The climb that was asked about; null where there is no record, or no climb in it. */
  climb: climbSchema.nullable(),
  /** Published firings with a record that it was compared with. */
  compared: z.number(),
  hits: z.array(
    climbSchema.extend({
      note: noteRowSchema,
      /** Root mean square difference per matched minute. */
      apartCelsius: z.number(),
      sameKiln: z.boolean(),
    }),
  ),
});
export type LookAlikes = z.infer<typeof lookAlikesSchema>;
export type LookAlike = LookAlikes['hits'][number];
