import type { RecordFields } from '#shared/note/plan.ts';
import type { MarkKind } from '#shared/vocabulary/marks.ts';

export type TypedMark = RecordFields['marks'][number];

/** By minute; marks of one minute stay in the order they were written in. */
export function marksInOrder(marks: readonly TypedMark[]): TypedMark[] {
  return [...marks].sort((a, b) => a.minute - b.minute);
}

export function areMarksInOrder(marks: readonly TypedMark[]): boolean {
  return marks.every((mark, index) => mark.minute >= (marks[index - 1]?.minute ?? -Infinity));
}

/** Whether a mark says how far the flue was covered. */
export function hasPercent(kind: MarkKind): boolean {
  return kind === 'flue-opened' || kind === 'flue-closed';
}
