import { rangeAt } from '#shared/note/ranges.ts';
import { ChoiceField } from '../ui/ChoiceField.tsx';
import { ManyChoiceField } from '../ui/ManyChoiceField.tsx';
import { NumberField } from '../ui/NumberField.tsx';
import { optionsOf } from '../ui/options.ts';
import { SelectField } from '../ui/SelectField.tsx';
import { TextArea } from '../ui/TextArea.tsx';
import { TextField } from '../ui/TextField.tsx';
import { useWriteForm } from './form-context.ts';
import { shownUnit } from './measure-units.ts';
import { PinnedField } from './PinnedField.tsx';

interface At<Value> {
  /** Where in the note it stands: its checks and its range are found by it. */
  readonly pointer: string;
  readonly label: string;
  readonly value: Value;
  readonly onValue: (value: Value) => void;
  readonly hint?: string | undefined;
  readonly required?: boolean | undefined;
}

/** Checks, margin and rights of the field at a pointer. */
function useFieldAt(pointer: string) {
  const { issuesAt, marginAt, editable } = useWriteForm();
  return { issues: issuesAt(pointer), margin: marginAt(pointer), disabled: !editable };
}

/** Few enough to stand in sight; more go into a menu. */
const MOST_IN_SIGHT = 5;

/** A number in the member's units, with its range from the schema. Blank is not zero. */
export function MeasureAt({ pointer, ...field }: At<number | null>) {
  const { units } = useWriteForm();
  const rest = useFieldAt(pointer);
  const range = rangeAt(pointer);
  const shown = shownUnit(range?.unit ?? '', units);
  const bound = (limit: number) => Math.round(shown.toShown(limit) * 10) / 10;
  return (
    <PinnedField pointer={pointer}>
      <NumberField
        // Another unit is another field: a half-typed text must not change its meaning.
        key={shown.unit}
        {...rest}
        {...field}
        unit={shown.unit || undefined}
        min={range ? bound(range.range[0]) : undefined}
        max={range ? bound(range.range[1]) : undefined}
        decimals={shown.decimals}
        toShown={shown.toShown}
        toStored={shown.toStored}
      />
    </PinnedField>
  );
}

/** One of a closed list: all in sight when few, else a menu. */
export function OneOfAt<Id extends string>({
  pointer,
  terms,
  menu = false,
  ...field
}: At<Id | null> & {
  readonly terms: Readonly<Record<Id, string>>;
  /** A menu however few there are: in rows of short fields. */
  readonly menu?: boolean;
}) {
  const rest = useFieldAt(pointer);
  const options = optionsOf(terms);
  const Field = options.length <= MOST_IN_SIGHT && !menu ? ChoiceField : SelectField;
  return (
    <PinnedField pointer={pointer}>
      <Field {...rest} {...field} options={options} />
    </PinnedField>
  );
}

const YES_NO = { yes: 'Yes', no: 'No' } as const;

/** Yes, no, or not said. */
export function YesNoAt({ value, onValue, ...field }: At<boolean | null>) {
  return (
    <OneOfAt
      {...field}
      terms={YES_NO}
      value={value === null ? null : value ? 'yes' : 'no'}
      onValue={(next) => onValue(next === null ? null : next === 'yes')}
    />
  );
}

/** A line of text. */
export function LineAt({ pointer, ...field }: At<string> & { readonly maxLength?: number }) {
  const rest = useFieldAt(pointer);
  return (
    <PinnedField pointer={pointer}>
      <TextField {...rest} {...field} />
    </PinnedField>
  );
}

/** A few sentences. */
export function LinesAt({ pointer, ...field }: At<string> & { readonly maxLength: number }) {
  const rest = useFieldAt(pointer);
  return (
    <PinnedField pointer={pointer}>
      <TextArea rows={3} {...rest} {...field} />
    </PinnedField>
  );
}

/** Any number of a closed list. */
export function ManyOfAt<Id extends string>({
  pointer,
  terms,
  value,
  onValue,
  ...field
}: At<Id[]> & { readonly terms: Readonly<Record<Id, string>> }) {
  const rest = useFieldAt(pointer);
  return (
    <PinnedField pointer={pointer}>
      <ManyChoiceField
        {...rest}
        {...field}
        values={value}
        onValues={(values) => onValue([...values])}
        options={optionsOf(terms)}
      />
    </PinnedField>
  );
}
