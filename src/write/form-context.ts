import { createContext, useContext } from 'react';
import type { Kiln } from '#shared/api/kilns.ts';
import type { Draft } from '#shared/api/notes.ts';
import type { Check } from '#shared/note/checks/check.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import type { NoteReading } from '#shared/note/read-note.ts';
import type { Units } from '#shared/units/units.ts';
import type { FieldIssue } from '../ui/field-issue.ts';
import type { DraftKeeper } from './draft-keeper.ts';

/** What every part of the Write page works on. */
export interface WriteForm {
  readonly fields: NoteFields;
  readonly draft: Draft;
  readonly keeper: DraftKeeper;
  readonly change: (update: (fields: NoteFields) => NoteFields) => void;
  readonly units: Units;
  readonly editable: boolean;
  /** Kilns this member may fire. */
  readonly kilns: readonly Kiln[];
  readonly kiln: Kiln | null;
  /** Read in this browser while typing; the server reads again and its reading counts. */
  readonly reading: NoteReading;
  /** Unanswered checks at a pointer, as the field shows them. */
  readonly issuesAt: (pointer: string) => FieldIssue[];
  readonly checks: readonly Check[];
}

export const WriteFormContext = createContext<WriteForm | null>(null);

export function useWriteForm(): WriteForm {
  const form = useContext(WriteFormContext);
  if (!form) throw new Error('A part of the form stands outside the Write page.');
  return form;
}

/** The groups of a note whose members are plain values. */
type Group = 'when' | 'setUp' | 'plan' | 'reduction' | 'result';

/** One member of a group with the way to change it and the checks at it. */
export function useGroupField<G extends Group, Name extends keyof NoteFields[G] & string>(
  group: G,
  name: Name,
) {
  const { fields, change, issuesAt, editable } = useWriteForm();
  return {
    value: fields[group][name],
    set: (value: NoteFields[G][Name]) => {
      change((before) => ({ ...before, [group]: { ...before[group], [name]: value } }));
    },
    issues: issuesAt(`/${group}/${name}`),
    disabled: !editable,
  };
}
