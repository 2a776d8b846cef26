import { labelOf } from '#shared/note/field-labels.ts';
import { noteFieldsSchema, type NoteFields } from '#shared/note/note-fields.ts';
import { storyTexts } from '#shared/note/story.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';
import { rangeAt } from '#shared/note/ranges.ts';
import { formatNumber } from '#shared/units/number.ts';
import { CHANGES } from '#shared/vocabulary/changes.ts';
import { TROUBLES } from '#shared/vocabulary/troubles.ts';
import { shownUnit } from './measure-units.ts';

/** One field in which two versions of a note differ. '' is blank. */
export interface FieldDifference {
  readonly pointer: string;
  readonly label: string;
  readonly mine: string;
  readonly theirs: string;
}

/** The same document, whatever the order in which its members were written. */
export function sameFields(one: NoteFields, other: NoteFields): boolean {
  if (one === other) return true;
  const plain = (fields: NoteFields): string => JSON.stringify(noteFieldsSchema.parse(fields));
  return plain(one) === plain(other);
}

const WORDS: Readonly<Record<string, string>> = { ...CHANGES, ...TROUBLES };

function valueWords(pointer: string, value: string | number | boolean, units: Units): string {
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'string') return WORDS[value] ?? value;
  const unit = rangeAt(pointer)?.unit ?? '';
  if (unit === '°C') return formatTemperature(value, units.temperature);
  const shown = shownUnit(unit, units);
  const number = formatNumber(shown.toShown(value), shown.decimals);
  return shown.unit ? `${number}\u00a0${shown.unit}` : number;
}

/** Long lists are told by their length and their last row: nobody reads 300 readings twice. */
function readingsWords({ typedRows }: NoteFields['record'], units: Units): string {
  if (typedRows.length === 0) return '';
  const last = typedRows.at(-1);
  const end =
    last?.minute != null && last.celsius !== null
      ? `, the last ${formatTemperature(last.celsius, units.temperature)} at ${formatNumber(last.minute, 1)}\u00a0min`
      : '';
  return `${String(typedRows.length)} rows${end}`;
}

type Leaves = Map<string, string>;

function leavesOf(value: unknown, pointer: string, units: Units, into: Leaves): void {
  if (typeof value === 'object' && value !== null) {
    const flat = Array.isArray(value) && value.every((item) => typeof item !== 'object');
    if (flat) {
      const words = value.map((item) => valueWords(pointer, item as string, units));
      if (words.length > 0) into.set(pointer, words.join(', '));
      return;
    }
    for (const [key, inner] of Object.entries(value)) {
      if (key !== 'key') leavesOf(inner, `${pointer}/${key}`, units, into);
    }
  } else if (value !== null && value !== undefined && value !== '') {
    into.set(pointer, valueWords(pointer, value as string | number | boolean, units));
  }
}

function leaves(fields: NoteFields, units: Units): Leaves {
  const into: Leaves = new Map();
  const { story, record, ...rest } = fields;
  leavesOf(rest, '', units, into);
  const { typedRows, ...recordRest } = record;
  leavesOf(recordRest, '/record', units, into);
  if (typedRows.length > 0) into.set('/record/typedRows', readingsWords(record, units));
  const words = storyTexts(story)
    .map(({ text }) => text)
    .join('\n');
  if (words) into.set('/story', words);
  return into;
}

/** What differs between two versions of a note, field by field, in the order of the note. */
export function fieldDifferences(
  mine: NoteFields,
  theirs: NoteFields,
  units: Units,
): FieldDifference[] {
  const here = leaves(mine, units);
  const there = leaves(theirs, units);
  const found = [...new Set([...here.keys(), ...there.keys()])]
    .filter((pointer) => here.get(pointer) !== there.get(pointer))
    .map((pointer) => ({
      pointer,
      label: labelOf(pointer),
      mine: here.get(pointer) ?? '',
      theirs: there.get(pointer) ?? '',
    }));
  // Differences that these words do not show: a link, a picture's place, a reading in the middle.
  const told = new Set(found.map(({ pointer }) => pointer));
  const hidden = (['story', 'record'] as const).filter((part) => {
    const pointer = part === 'record' ? '/record/typedRows' : '/story';
    const of = (fields: NoteFields) =>
      JSON.stringify(part === 'record' ? fields.record.typedRows : fields.story);
    return !told.has(pointer) && of(mine) !== of(theirs);
  });
  return [
    ...found,
    ...hidden.map((part) => ({
      pointer: part === 'record' ? '/record/typedRows' : '/story',
      label: labelOf(part === 'record' ? '/record/typedRows' : '/story'),
      mine: part === 'record' ? 'other readings in between' : 'other links, pictures or emphasis',
      theirs: part === 'record' ? 'other readings in between' : 'other links, pictures or emphasis',
    })),
  ];
}
