import type { KilnFields } from './kiln-fields.ts';
import type { NoteFields } from './note-fields.ts';

/** Where a day begins first: what is still to come here is still to come everywhere. */
const FIRST_ZONE = 'Pacific/Kiritimati';

/**
 * Today where the kiln stands, `YYYY-MM-DD`: by the note's own zone, else its kiln's. Where neither
 * says one that is known, the day that has begun anywhere, so that no firing of this morning is
 * taken for one to come.
 */
export function todayAtKiln(
  fields: NoteFields,
  kiln: KilnFields | null,
  now: Date = new Date(),
): string {
  for (const zone of [fields.when.timeZone, kiln?.timeZone ?? '']) {
    const day = zone === '' ? null : dayIn(zone, now);
    if (day !== null) return day;
  }
  return dayIn(FIRST_ZONE, now) ?? now.toISOString().slice(0, 10);
}

/** Null for a zone that nobody knows. */
function dayIn(timeZone: string, now: Date): string | null {
  try {
    return new Intl.DateTimeFormat('en-CA', {
      timeZone,
      year: 'numeric',
      month: '2-digit',
      day: '2-digit',
    }).format(now);
  } catch {
    return null;
  }
}
