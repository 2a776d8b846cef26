import { formatDuration } from '../units/duration.ts';
import { formatTemperature } from '../units/temperature.ts';
import type { Units } from '../units/units.ts';
import type { FiringReading } from './types.ts';

interface Event {
  readonly minute: number;
  readonly toMinute: number;
  readonly celsius: number;
  readonly kind: 'level' | 'sag' | 'peak';
  readonly topCelsius?: number;
}

/** A level and the hold may be the same stretch: within so many minutes they are told once. */
const SAME_MINUTES = 1;
/** Changes of level smaller than this are not told, °C. */
const WORTH_TELLING = 15;

/**
 * The glow strip in words, for those who cannot see it: "climbs to 712 °C in 31 min, stays there
 * 14 min, shut off".
 */
export function stripWords(reading: FiringReading, units: Units): string {
  const degrees = (celsius: number) => formatTemperature(celsius, units.temperature);
  const parts: string[] = [];
  let at = reading.start.minute;
  let level: number | null = null;
  for (const event of eventsOf(reading)) {
    const target = event.topCelsius ?? event.celsius;
    if (level === null || target > level + WORTH_TELLING) {
      const time = formatDuration(Math.max(0, event.minute - at));
      parts.push(`climbs ${level === null ? 'to' : 'on to'} ${degrees(target)} in ${time}`);
    } else if (target < level - WORTH_TELLING) {
      parts.push(`falls to ${degrees(target)}`);
    }
    const lasted = formatDuration(event.toMinute - event.minute);
    if (event.kind === 'level') parts.push(`stays there ${lasted}`);
    if (event.kind === 'sag') parts.push(`falls back to ${degrees(event.celsius)} in ${lasted}`);
    level = event.celsius;
    at = event.toMinute;
  }
  const isOpenEnd = reading.shutOff.inferred && reading.shutOff.minute >= reading.lastMinute;
  parts.push(isOpenEnd ? 'the record ends' : 'shut off');
  return parts.join(', ');
}

function eventsOf(reading: FiringReading): Event[] {
  const events: Event[] = reading.levels.map((level) => ({
    minute: level.fromMinute,
    toMinute: level.toMinute,
    celsius: level.levelCelsius,
    kind: 'level' as const,
  }));
  const { hold, peak } = reading;
  const overlaps = (from: number, to: number) =>
    events.some(
      (event) => event.minute < to + SAME_MINUTES && event.toMinute > from - SAME_MINUTES,
    );
  if (hold !== null && !overlaps(hold.fromMinute, hold.toMinute)) {
    events.push({
      minute: hold.fromMinute,
      toMinute: hold.toMinute,
      celsius: hold.levelCelsius,
      kind: 'level',
    });
  }
  for (const sag of reading.sags) {
    events.push({
      minute: sag.fromMinute,
      toMinute: sag.toMinute,
      celsius: sag.bottomCelsius,
      topCelsius: sag.topCelsius,
      kind: 'sag',
    });
  }
  if (
    !events.some((event) => (event.topCelsius ?? event.celsius) >= peak.celsius - WORTH_TELLING)
  ) {
    events.push({
      minute: peak.minute,
      toMinute: peak.minute,
      celsius: peak.celsius,
      kind: 'peak',
    });
  }
  return events.sort((a, b) => a.minute - b.minute);
}
