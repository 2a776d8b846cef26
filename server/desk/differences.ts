import { labelOf } from '#shared/note/field-labels.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';

export interface Difference {
  readonly pointer: string;
  readonly label: string;
  readonly before: string;
  readonly after: string;
}

/** Shown apart or of no interest to a moderator. */
const LEFT_OUT = new Set([
  'story',
  'checkAnswers',
  'cautionsRead',
  'changesNotMeant',
  'findingDisputes',
]);
const MOST = 200;

type Leaves = Map<string, string>;

function leavesOf(value: unknown, pointer: string, into: Leaves): void {
  if (Array.isArray(value) && value.every((item) => typeof item !== 'object')) {
    if (value.length > 0) into.set(pointer, value.join(', '));
  } else if (typeof value === 'object' && value !== null) {
    for (const [key, inner] of Object.entries(value)) {
      if (key !== 'key') leavesOf(inner, `${pointer}/${key}`, into);
    }
  } else if (typeof value === 'boolean') {
    into.set(pointer, value ? 'yes' : 'no');
  } else if (typeof value === 'number' || (typeof value === 'string' && value !== '')) {
    into.set(pointer, String(value));
  }
}

function leaves(fields: NoteFields): Leaves {
  const into: Leaves = new Map();
  for (const [key, value] of Object.entries(fields)) {
    if (!LEFT_OUT.has(key)) leavesOf(value, `/${key}`, into);
  }
  return into;
}

/** What differs between two revisions, field by field, in the order of the note; at most 200. */
export function differencesBetween(before: NoteFields, after: NoteFields): Difference[] {
  const old = leaves(before);
  const now = leaves(after);
  return [...new Set([...old.keys(), ...now.keys()])]
    .filter((pointer) => old.get(pointer) !== now.get(pointer))
    .slice(0, MOST)
    .map((pointer) => ({
      pointer,
      label: labelOf(pointer),
      before: old.get(pointer) ?? '',
      after: now.get(pointer) ?? '',
    }));
}
