import { z } from 'zod';
import type { FiringReading } from '../firing/types.ts';

/**
 * What was read off a climb, of what makes two of them alike: kept beside its signature. Minutes
 * count from the start of the firing, temperatures are °C.
 */
export const climbTraitsSchema = z.object({
  minutes: z.number(),
  peakCelsius: z.number(),
  peakMinute: z.number(),
  aimCelsius: z.number().nullable(),
  reachedMinute: z.number().nullable(),
  shape: z.enum(['steady', 'racing-then-creeping', 'stepped']).nullable(),
  rate400To700: z.number().nullable(),
  levels: z.array(
    z.object({
      kind: z.enum(['approach', 'hold', 'just-short', 'warm-up', 'pause', 'stall']),
      atMinute: z.number(),
      minutes: z.number(),
      levelCelsius: z.number(),
      then: z.enum(['climbed', 'fell', 'shut-off']).nullable(),
    }),
  ),
  sags: z.array(
    z.object({ atMinute: z.number(), topCelsius: z.number(), dropCelsius: z.number() }),
  ),
  hold: z.object({ minutes: z.number(), levelCelsius: z.number() }).nullable(),
});
export type ClimbTraits = z.infer<typeof climbTraitsSchema>;

export function climbTraits(reading: FiringReading): ClimbTraits {
  const since = (minute: number) => minute - reading.start.minute;
  // A record that just ends does not say that anything was shut off.
  const endsOpen = reading.shutOff.inferred && reading.shutOff.minute >= reading.lastMinute;
  return {
    minutes: since(reading.shutOff.minute),
    peakCelsius: reading.peak.celsius,
    peakMinute: since(reading.peak.minute),
    aimCelsius: reading.aimCelsius,
    reachedMinute: reading.timeToTemperatureMinutes,
    shape: reading.climb.shape,
    rate400To700: reading.rate400To700,
    levels: reading.levels.map(({ kind, fromMinute, minutes, levelCelsius, then }) => ({
      kind,
      atMinute: since(fromMinute),
      minutes,
      levelCelsius,
      then: then === 'shut-off' && endsOpen ? null : then,
    })),
    sags: reading.sags.map(({ fromMinute, topCelsius, dropCelsius }) => ({
      atMinute: since(fromMinute),
      topCelsius,
      dropCelsius,
    })),
    hold: reading.hold && {
      minutes: reading.hold.minutes,
      levelCelsius: reading.hold.levelCelsius,
    },
  };
}
