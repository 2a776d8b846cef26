import type { NoteFields } from '#shared/note/note-fields.ts';
import { LineAt, MeasureAt, OneOfAt, YesNoAt } from './FieldsAt.tsx';
import { useGroupField } from './form-context.ts';

type Group = 'when' | 'setUp' | 'plan' | 'reduction';
/** The members of a group that hold a value of this type. */
type Of<G extends Group, Value> = {
  [Name in keyof NoteFields[G]]: NoteFields[G][Name] extends Value ? Name : never;
}[keyof NoteFields[G]] &
  string;

interface Shared<G extends Group, Name extends string> {
  readonly group: G;
  readonly name: Name;
  readonly label: string;
  readonly hint?: string;
  readonly required?: boolean;
}

const pointerOf = (group: Group, name: string): string => `/${group}/${name}`;

/** A measure of a group, in the member's units, with its range from the schema. */
export function Measure<G extends Group, Name extends Of<G, number | null>>({
  group,
  name,
  ...field
}: Shared<G, Name>) {
  const { value, set } = useGroupField(group, name);
  return (
    <MeasureAt
      {...field}
      pointer={pointerOf(group, name)}
      value={value as number | null}
      onValue={(next) => set(next as NoteFields[G][Name])}
    />
  );
}

/** One of a closed list: all in sight when few, else a menu. */
export function OneOf<G extends Group, Name extends Of<G, string | null>>({
  group,
  name,
  terms,
  ...field
}: Shared<G, Name> & {
  readonly terms: Readonly<Record<NonNullable<NoteFields[G][Name]> & string, string>>;
}) {
  const { value, set } = useGroupField(group, name);
  return (
    <OneOfAt
      {...field}
      pointer={pointerOf(group, name)}
      terms={terms}
      value={value as (NonNullable<NoteFields[G][Name]> & string) | null}
      onValue={(next) => set(next as NoteFields[G][Name])}
    />
  );
}

/** Yes, no, or not said. */
export function YesNo<G extends Group, Name extends Of<G, boolean | null>>({
  group,
  name,
  ...field
}: Shared<G, Name>) {
  const { value, set } = useGroupField(group, name);
  return (
    <YesNoAt
      {...field}
      pointer={pointerOf(group, name)}
      value={value as boolean | null}
      onValue={(next) => set(next as NoteFields[G][Name])}
    />
  );
}

/** A line of text. */
export function Line<G extends Group, Name extends Of<G, string>>({
  group,
  name,
  ...field
}: Shared<G, Name> & { readonly maxLength?: number }) {
  const { value, set } = useGroupField(group, name);
  return (
    <LineAt
      {...field}
      pointer={pointerOf(group, name)}
      value={value as string}
      onValue={(next) => set(next as NoteFields[G][Name])}
    />
  );
}
