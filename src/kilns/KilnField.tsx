import type { KilnFields } from '#shared/note/kiln-fields.ts';
import { KILN_LABELS } from '#shared/note/kiln-labels.ts';
import { KILN_RANGES, rangeAt } from '#shared/note/ranges.ts';
import type { Units } from '#shared/units/units.ts';
import { ChoiceField } from '../ui/ChoiceField.tsx';
import { NumberField } from '../ui/NumberField.tsx';
import { optionsOf } from '../ui/options.ts';
import { TextField } from '../ui/TextField.tsx';
import { shownUnit } from '../write/measure-units.ts';
import type { KilnIssues } from './kiln-form-fields.ts';

/** What every field of the kiln form works on. */
export interface KilnFormPart {
  readonly fields: KilnFields;
  readonly change: (part: Partial<KilnFields>) => void;
  readonly issues: KilnIssues;
  readonly units: Units;
}

type Of<Value> = {
  [Name in keyof KilnFields]: KilnFields[Name] extends Value ? Name : never;
}[keyof KilnFields];

interface Shared<Name> {
  readonly form: KilnFormPart;
  readonly name: Name;
  readonly hint?: string;
}

/** A measure in the member's units, with its range from the schema. */
export function KilnMeasure({ form, name, hint }: Shared<Of<number | null>>) {
  const { fields, change, issues, units } = form;
  const asked = rangeAt(`/${name}`, KILN_RANGES);
  const shown = shownUnit(asked?.unit ?? '', units);
  const bound = (at: 0 | 1): number | undefined =>
    asked ? Math.round(shown.toShown(asked.range[at]) * 10) / 10 : undefined;
  return (
    <NumberField
      // Another unit is another field: a half-typed text must not change its meaning.
      key={shown.unit}
      label={KILN_LABELS[name]}
      hint={hint}
      issues={issues[name]}
      value={fields[name]}
      onValue={(value) => change({ [name]: value })}
      unit={shown.unit || undefined}
      min={bound(0)}
      max={bound(1)}
      decimals={shown.decimals}
      toShown={shown.toShown}
      toStored={shown.toStored}
    />
  );
}

/** A line of text. */
export function KilnLine({
  form,
  name,
  hint,
  required,
  maxLength,
}: Shared<'name' | 'lid' | 'jet'> & { readonly required?: boolean; readonly maxLength: number }) {
  return (
    <TextField
      label={KILN_LABELS[name]}
      hint={hint}
      required={required}
      issues={form.issues[name]}
      maxLength={maxLength}
      value={form.fields[name]}
      onValue={(value) => form.change({ [name]: value })}
    />
  );
}

type Choice = 'opening' | 'shape' | 'wall' | 'flue' | 'burnerKind' | 'probe';

/** One of a few, or not said. */
export function KilnChoice<Name extends Choice>({
  form,
  name,
  hint,
  terms,
}: Shared<Name> & { readonly terms: Readonly<Record<NonNullable<KilnFields[Name]>, string>> }) {
  return (
    <ChoiceField
      label={KILN_LABELS[name]}
      hint={hint}
      issues={form.issues[name]}
      value={form.fields[name] as NonNullable<KilnFields[Name]> | null}
      onValue={(value) => form.change({ [name]: value })}
      options={optionsOf<NonNullable<KilnFields[Name]>>(terms)}
    />
  );
}
