import { createContext, useContext } from 'react';
import type { ReactNode } from 'react';
import type { Kiln } from '#shared/api/kilns.ts';
import type { Draft } from '#shared/api/notes.ts';
import type { Check } from '#shared/note/checks/check.ts';
import type { KilnFields } from '#shared/note/kiln-fields.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import type { NoteReading } from '#shared/note/read-note.ts';
import type { Units } from '#shared/units/units.ts';
import type { FieldIssue } from '../ui/field-issue.ts';
import type { DraftKeeper } from './draft-keeper.ts';

/** A kiln as the form needs it: one's own, or one that the draft named before it was lent no longer. */
export interface FormKiln {
  readonly id: number;
  readonly fields: KilnFields;
  readonly volumeLitres: number | null;
}

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
  readonly kiln: FormKiln | null;
  /** Read in this browser while typing; the server reads again and its reading counts. */
  readonly reading: NoteReading;
  /** Checks at a pointer, as the field shows them; answered ones are marked as settled. */
  readonly issuesAt: (pointer: string) => FieldIssue[];
  /** What else stands in the margin at a pointer: findings, remarks from the desk. */
  readonly marginAt: (pointer: string) => ReactNode;
  /** Every check that asks the author, answered or not. */
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
  const { fields, change, issuesAt, marginAt, editable } = useWriteForm();
  const pointer = `/${group}/${name}`;
  return {
    value: fields[group][name],
    set: (value: NoteFields[G][Name]) => {
      change((before) => ({ ...before, [group]: { ...before[group], [name]: value } }));
    },
    issues: issuesAt(pointer),
    margin: marginAt(pointer),
    disabled: !editable,
  };
}
