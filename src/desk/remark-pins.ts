import type { NotePageData } from '#shared/api/notes.ts';
import { labelOf } from '#shared/note/field-labels.ts';
import { NOTE_RANGES } from '#shared/note/ranges.ts';
import { FORMS } from '#shared/vocabulary/ware.ts';
import type { Option } from '../ui/options.ts';

/** Fields that are no measures, by pointer. */
const OTHER_FIELDS: Readonly<Record<string, string>> = {
  '': 'The note as a whole',
  '/title': 'Title',
  '/kilnId': 'Kiln',
  '/when/date': 'Day of the firing',
  '/when/startClass': 'Cold or hot start',
  '/plan/drawnBecause': 'Drawn because',
  '/record': 'Record and marks',
  '/pieces': 'Pieces',
  '/reduction': 'After the draw',
  '/result/troubles': 'Troubles',
  '/result/causes': 'Suspected causes',
  '/result/surprised': 'What surprised',
  '/result/nextTime': 'What to do next time',
  '/changes': 'Changes',
  '/story': 'Story',
};

/** What a remark is pinned to, in words. */
export function pinWords(pointer: string): string {
  return OTHER_FIELDS[pointer] ?? labelOf(pointer);
}

/** Everything of a note that a remark can be pinned to, in the order of the note. */
export function remarkPins(fields: NotePageData['fields']): Option<string>[] {
  const measures = [...NOTE_RANGES.keys()].filter((pointer) => !pointer.includes('*'));
  const rows = fields.pieces.map(({ form }, index) => ({
    value: `/pieces/${String(index)}`,
    label: `Piece row ${String(index + 1)}${form === null ? '' : ` (${FORMS[form].toLowerCase()})`}`,
  }));
  const others = Object.entries(OTHER_FIELDS).map(([value, label]) => ({ value, label }));
  const own = measures.map((value) => ({ value, label: labelOf(value) }));
  return [...others, ...rows, ...own];
}
