import type { FiringFacts } from './facts.ts';
import type { NoteSummary } from './in-short.ts';
import type { NoteFields } from './note-fields.ts';

/**
 * What the sentences "in short" are made of, from a note's fields and facts. `hasEarlier`: whether
 * the kiln has an earlier firing, so that "no change named" means something.
 */
export function noteSummary(
  fields: NoteFields,
  facts: FiringFacts,
  hasEarlier: boolean,
): NoteSummary {
  const aim = facts.aimCelsius;
  const peak = facts.peakCelsius;
  return {
    peakCelsius: peak,
    targetCelsius: facts.targetCelsius,
    reached:
      aim === null || peak === null
        ? null
        : facts.hasRecord
          ? facts.reachedMinute !== null
          : peak >= aim - 5,
    aimCelsius: aim,
    timeToTemperatureMinutes: facts.timeToTemperatureMinutes,
    holdMinutes: facts.holdMinutes,
    levels: facts.stalls.map((stall) => ({
      levelCelsius: stall.levelCelsius,
      atMinute: facts.startMinute === null ? null : stall.fromMinute - facts.startMinute,
      minutes: stall.minutes,
    })),
    sags: facts.sags.map(({ topCelsius, dropCelsius }) => ({ topCelsius, dropCelsius })),
    pieces: fields.pieces.map((piece) => ({
      form: piece.form,
      count: piece.count ?? 1,
      whole: piece.whole,
      melt: piece.melt,
      cracked: piece.cracked === true,
      crackPlace: piece.cracks[0]?.place ?? null,
    })),
    changes:
      hasEarlier || fields.changes.length > 0 ? fields.changes.map((row) => row.change) : null,
  };
}
