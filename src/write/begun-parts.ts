import type { Check } from '#shared/note/checks/check.ts';
import { emptyNoteFields, type NoteFields } from '#shared/note/note-fields.ts';
import type { Piece } from '#shared/note/pieces.ts';
import { blankPiece } from './blank-piece.ts';

type Part = keyof NoteFields;
/** Filled in by the kiln or by the member's settings, not by typing. */
const NOT_TYPED: Readonly<Partial<Record<Part, readonly string[]>>> = {
  when: ['timeZone'],
  plan: ['typedIn'],
};

const same = (one: unknown, other: unknown): boolean =>
  JSON.stringify(one) === JSON.stringify(other);

/** True once something was said of a row of pieces besides that it is there. */
function isRowBegun(piece: Piece | undefined): boolean {
  if (!piece) return false;
  const blank = blankPiece();
  return !same({ ...piece, key: '' }, { ...blank, key: '' });
}

function isPartBegun(fields: NoteFields, part: Part): boolean {
  const blank: Record<string, unknown> = { ...emptyNoteFields() };
  const value = fields[part];
  if (typeof value !== 'object' || value === null || Array.isArray(value)) {
    return !same(value, blank[part]);
  }
  const blankMembers = blank[part] as Readonly<Record<string, unknown>>;
  return Object.entries(value).some(
    ([name, member]) =>
      NOT_TYPED[part]?.includes(name) !== true && !same(member, blankMembers[name]),
  );
}

/**
 * Whether a check has its place beside the field yet. What is wrong always has; what is merely
 * still blank has once its part of the note was begun, so that a fresh form does not scold.
 */
export function isDueBeside(check: Check, fields: NoteFields): boolean {
  if (!/-missing$|-not-read$/.test(check.code)) return true;
  const [, part = '', row] = check.pointer.split('/');
  if (part === 'pieces' && row !== undefined) return isRowBegun(fields.pieces[Number(row)]);
  return Object.hasOwn(fields, part) && isPartBegun(fields, part as Part);
}
