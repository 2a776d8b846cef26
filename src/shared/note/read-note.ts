import { findingsOf, type Finding } from '../firing/findings.ts';
import { readFiring } from '../firing/read-firing.ts';
import type { FiringInput, FiringReading, Reading } from '../firing/types.ts';
import type { Check } from './checks/check.ts';
import { checkNote } from './checks/check-note.ts';
import type { KilnFields } from './kiln-fields.ts';
import type { NoteFields } from './note-fields.ts';
import { proposeChanges, type ProposedChange } from './proposed-changes.ts';

/** Readings of a stored record, as the server keeps them or the browser was sent them. */
export interface StoredReadings {
  readonly readings: readonly Reading[];
  readonly secondProbe: readonly Reading[] | null;
}
export interface EarlierFiring {
  readonly fields: NoteFields;
  readonly kiln: KilnFields;
}
export interface NoteToRead {
  readonly fields: NoteFields;
  readonly kiln: KilnFields | null;
  readonly stored: StoredReadings | null;
  readonly earlier: EarlierFiring | null;
  /** `YYYY-MM-DD`, so that a firing in the future can be asked about. */
  readonly today: string;
}
export interface NoteReading {
  readonly reading: FiringReading | null;
  readonly findings: readonly Finding[];
  readonly checks: readonly Check[];
  readonly proposedChanges: readonly ProposedChange[];
}

/** The readings a note stands on: its stored record, else its complete typed rows. */
export function readingsOf(fields: NoteFields, stored: StoredReadings | null): readonly Reading[] {
  if (stored) return stored.readings;
  return fields.record.typedRows.flatMap(({ minute, celsius }) =>
    minute === null || celsius === null ? [] : [{ minute, celsius }],
  );
}

/** What the firing reader is given of a note. */
export function firingInputOf(
  fields: NoteFields,
  kiln: KilnFields | null,
  stored: StoredReadings | null,
): FiringInput {
  return {
    readings: readingsOf(fields, stored),
    secondProbe: stored?.secondProbe ?? null,
    marks: fields.record.marks,
    targetCelsius: fields.plan.targetCelsius,
    fuel: kiln?.fuel ?? null,
    startClass: fields.when.startClass,
    drawnBecause: fields.plan.drawnBecause,
    probe: kiln?.probe ?? null,
    answers: fields.record.levelAnswers,
  };
}

/**
 * Reads and checks a note: the same on the server, where it counts, and in the browser, where it
 * is shown beside the fields while the author types.
 */
export function readNote(note: NoteToRead): NoteReading {
  const { fields, kiln, stored, earlier, today } = note;
  const reading = readFiring(firingInputOf(fields, kiln, stored));
  return {
    reading,
    findings: reading ? findingsOf(reading) : [],
    checks: checkNote({
      fields,
      kiln,
      reading,
      hasRecord: readingsOf(fields, stored).length > 0,
      earlier,
      today,
    }),
    proposedChanges: earlier && kiln ? proposeChanges(earlier, { fields, kiln }) : [],
  };
}
