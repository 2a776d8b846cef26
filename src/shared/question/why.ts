import { formatDifference, formatTemperature } from '../units/temperature.ts';
import type { Units } from '../units/units.ts';
import { CAUSES, TROUBLE_SHORT, TROUBLES } from '../vocabulary/troubles.ts';
import { FORM_FAMILIES } from '../vocabulary/ware.ts';
import { nearnessCentre } from './order-hits.ts';
import type { QuestionReading } from './reading-types.ts';
import type { Tier } from './search-request.ts';

/** What the sentence needs to know of a found note. */
export interface FoundNote {
  readonly troubles: readonly string[];
  readonly forms: readonly string[];
  readonly causes: readonly string[];
  readonly stallC: readonly number[];
  readonly sagC: readonly number[];
  readonly peakC: number | null;
  readonly outcome: number;
}

function nearestLevel(levels: readonly number[], asked: number): number | null {
  return levels.reduce<number | null>(
    (best, level) =>
      best === null || Math.abs(level - asked) < Math.abs(best - asked) ? level : best,
    null,
  );
}

function withDistance(said: string, level: number, asked: number, units: Units): string {
  const away = Math.round(Math.abs(level - asked));
  const at = `${said} ${formatTemperature(level, units.temperature)}`;
  return away === 0
    ? `${at}, just what you asked`
    : `${at}, ${formatDifference(away, units.temperature)} from what you asked`;
}

function temperatureReason(reading: QuestionReading, note: FoundNote, units: Units): string | null {
  const asked = nearnessCentre(reading);
  if (asked === null) return null;
  const levels: readonly (readonly [boolean, string, readonly number[]])[] = [
    [reading.trouble.includes('stall'), 'levelled off at', note.stallC],
    [reading.trouble.includes('sag'), 'fell back from', note.sagC],
    [true, 'peaked at', note.peakC === null ? [] : [note.peakC]],
  ];
  for (const [wanted, said, values] of levels) {
    const level = wanted ? nearestLevel(values, asked) : null;
    if (level === null) continue;
    // A bound or a range was asked for: the distance from its middle would mean nothing.
    return reading.tempC === null
      ? `${said} ${formatTemperature(level, units.temperature)}`
      : withDistance(said, level, asked, units);
  }
  return null;
}

function endReason(note: FoundNote): string | null {
  if (note.outcome === 3) return 'gone in the next firing';
  return note.outcome === 2 ? 'a change was tried' : null;
}

/**
 * Why a note was found, as a short sentence without a full stop: "levelled off at 704 °C, 4 °C from
 * what you asked; gone in the next firing". `seen` are the question's words found in the note's text.
 */
export function whyFound(
  reading: QuestionReading,
  note: FoundNote,
  tier: Tier,
  units: Units,
  seen: readonly string[] = [],
): string {
  const reasons: string[] = [];
  const shared = reading.trouble.filter((trouble) => note.troubles.includes(trouble));
  const heat = tier === 'close' ? temperatureReason(reading, note, units) : null;
  if (heat !== null) reasons.push(heat);
  else if (shared[0] !== undefined) {
    reasons.push(
      tier === 'close'
        ? TROUBLES[shared[0]].toLowerCase()
        : `same trouble: ${TROUBLE_SHORT[shared[0]]}`,
    );
  }
  if (reading.form !== null && note.forms.includes(reading.form)) {
    reasons.push(`with ${FORM_FAMILIES[reading.form].toLowerCase()}`);
  }
  const cause = reading.causes.find((id) => note.causes.includes(id));
  if (cause !== undefined) reasons.push(`suspected cause: ${CAUSES[cause].toLowerCase()}`);
  const end = shared.length > 0 ? endReason(note) : null;
  if (end !== null) reasons.push(end);
  if (reasons.length === 0) {
    return seen.length > 0 ? `has your words: ${seen.join(', ')}` : 'has words of your question';
  }
  return reasons.join('; ');
}
