import type { NoteFields } from '#shared/note/note-fields.ts';
import type { Change } from '#shared/vocabulary/changes.ts';

type Changes = Pick<NoteFields, 'changes' | 'changesNotMeant'>;
export type ChangeAnswer = 'meant' | 'not-meant';

/** How the author answered a proposed change; null while it is not answered. */
export function answerToChange(fields: Changes, change: Change): ChangeAnswer | null {
  if (fields.changes.some((row) => row.change === change)) return 'meant';
  return fields.changesNotMeant.includes(change) ? 'not-meant' : null;
}

/** Says of a change that it was meant, was not, or takes the answer back. Its purpose goes with it. */
export function answerChange<Fields extends Changes>(
  fields: Fields,
  change: Change,
  answer: ChangeAnswer | null,
): Fields {
  const isNamed = fields.changes.some((row) => row.change === change);
  const others = fields.changes.filter((row) => row.change !== change);
  return {
    ...fields,
    changes:
      answer !== 'meant'
        ? others
        : isNamed
          ? fields.changes
          : [...fields.changes, { change, purpose: '' }],
    changesNotMeant: [
      ...fields.changesNotMeant.filter((other) => other !== change),
      ...(answer === 'not-meant' ? [change] : []),
    ],
  };
}

/** The fields with what a change was for. */
export function sayPurpose<Fields extends Changes>(
  fields: Fields,
  change: Change,
  purpose: string,
): Fields {
  return {
    ...fields,
    changes: fields.changes.map((row) => (row.change === change ? { ...row, purpose } : row)),
  };
}
