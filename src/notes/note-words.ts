import type { FollowOn, NoteRow } from '#shared/api/note-rows.ts';
import { formatDuration } from '#shared/units/duration.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';
import { CHANGES, type Change } from '#shared/vocabulary/changes.ts';
import { TROUBLE_SHORT } from '#shared/vocabulary/troubles.ts';

/** Changes in a sentence: "floor insulated, burner swept round the wall". */
export function changeWords(changes: readonly Change[]): string {
  return changes.map((change) => CHANGES[change].toLowerCase()).join(', ');
}

/**
 * A day as people say it: "14 September 2026"; the day of the firing, in no time zone. It stays on
 * one line.
 */
export function dayWords(day: string): string {
  const date = new Date(`${day}T12:00:00Z`);
  if (Number.isNaN(date.getTime())) return '';
  return new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeZone: 'UTC' })
    .format(date)
    .replaceAll(' ', '\u00a0');
}

/** A moment in the reader's own time zone. */
export function momentWords(iso: string): string {
  return new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeStyle: 'short' }).format(
    new Date(iso),
  );
}

/** The figures of a row: "peak 1004 °C · 32 min · hold 5 min". */
export function rowFigures(row: NoteRow, units: Units): string[] {
  return [
    row.peakCelsius === null
      ? null
      : `peak ${formatTemperature(row.peakCelsius, units.temperature)}`,
    row.timeToTemperatureMinutes === null
      ? null
      : `${formatDuration(row.timeToTemperatureMinutes)} to temperature`,
    row.holdMinutes === null || row.holdMinutes === 0
      ? null
      : `hold ${formatDuration(row.holdMinutes)}`,
  ].filter((part) => part !== null);
}

/** Troubles in short words; a stall with its level. */
export function troubleWords(row: NoteRow, units: Units): string[] {
  return row.troubles.map((trouble) => {
    const [level] = row.stallCelsius;
    return trouble === 'stall' && level !== undefined
      ? `stall at ${formatTemperature(level, units.temperature)}`
      : TROUBLE_SHORT[trouble];
  });
}

/** Troubles that the record shows by disputed findings only: told apart, for they count nowhere. */
export function disputedWords(row: NoteRow): string | null {
  const disputed = row.disputedTroubles ?? [];
  return disputed.length === 0
    ? null
    : `Disputed by the author: ${disputed.map((trouble) => TROUBLE_SHORT[trouble]).join(', ')}`;
}

/** What came of it: "gone", "not gone", or null when it cannot be said. */
export function outcomeWords(followOn: FollowOn): string | null {
  const said = followOn.outcomes.filter(({ outcome }) => outcome !== 'cannot-say');
  if (said.length === 0) return null;
  const gone = said
    .filter(({ outcome }) => outcome === 'gone')
    .map(({ trouble }) => TROUBLE_SHORT[trouble]);
  const still = said
    .filter(({ outcome }) => outcome === 'not-gone')
    .map(({ trouble }) => TROUBLE_SHORT[trouble]);
  return [
    gone.length > 0 ? `${gone.join(', ')} gone` : null,
    still.length > 0 ? `${still.join(', ')} not gone` : null,
  ]
    .filter((part) => part !== null)
    .join('; ');
}
