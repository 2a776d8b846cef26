import type { NoteFields } from '#shared/note/note-fields.ts';
import { rangeAt } from '#shared/note/ranges.ts';
import { ChoiceField } from '../ui/ChoiceField.tsx';
import { NumberField } from '../ui/NumberField.tsx';
import { optionsOf } from '../ui/options.ts';
import { SelectField } from '../ui/SelectField.tsx';
import { TextField } from '../ui/TextField.tsx';
import { useGroupField, useWriteForm } from './form-context.ts';
import { shownUnit } from './measure-units.ts';

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

/** A measure of a group, in the member's units, with its range from the schema. */
export function Measure<G extends Group, Name extends Of<G, number | null>>({
  group,
  name,
  ...field
}: Shared<G, Name>) {
  const { units } = useWriteForm();
  const { value, set, ...rest } = useGroupField(group, name);
  const range = rangeAt(`/${group}/${name}`);
  const shown = shownUnit(range?.unit ?? '', units);
  return (
    <NumberField
      // Another unit is another field: a half-typed text must not change its meaning.
      key={shown.unit}
      {...field}
      {...rest}
      value={value as number | null}
      onValue={(next) => set(next as NoteFields[G][Name])}
      unit={shown.unit || undefined}
      min={range ? Math.round(shown.toShown(range.range[0]) * 10) / 10 : undefined}
      max={range ? Math.round(shown.toShown(range.range[1]) * 10) / 10 : undefined}
      decimals={shown.decimals}
      toShown={shown.toShown}
      toStored={shown.toStored}
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
  const { value, set, ...rest } = useGroupField(group, name);
  const options = optionsOf(terms);
  const Field = options.length <= 5 ? ChoiceField : SelectField;
  return (
    <Field
      {...field}
      {...rest}
      value={value as (typeof options)[number]['value'] | null}
      onValue={(next) => set(next as NoteFields[G][Name])}
      options={options}
    />
  );
}

const YES_NO = { yes: 'Yes', no: 'No' } as const;

/** Yes, no, or not said. */
export function YesNo<G extends Group, Name extends Of<G, boolean | null>>({
  group,
  name,
  ...field
}: Shared<G, Name>) {
  const { value, set, ...rest } = useGroupField(group, name);
  return (
    <ChoiceField
      {...field}
      {...rest}
      value={value === null ? null : value ? 'yes' : 'no'}
      onValue={(next) => set((next === null ? null : next === 'yes') as NoteFields[G][Name])}
      options={optionsOf(YES_NO)}
    />
  );
}

/** A line of text. */
export function Line<G extends Group, Name extends Of<G, string>>({
  group,
  name,
  ...field
}: Shared<G, Name> & { readonly maxLength?: number }) {
  const { value, set, ...rest } = useGroupField(group, name);
  return (
    <TextField
      {...field}
      {...rest}
      value={value as string}
      onValue={(next) => set(next as NoteFields[G][Name])}
    />
  );
}
