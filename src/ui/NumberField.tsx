import { useState } from 'react';
import type { FieldIssue, FieldProps } from './field-issue.ts';
import { FieldFrame } from './FieldFrame.tsx';
import { readTypedNumber, writeTypedNumber } from './typed-number.ts';
import { useFieldIds } from './useFieldIds.ts';

interface Props extends FieldProps {
  /** In the stored unit; null is blank, which is not zero. */
  readonly value: number | null;
  readonly onValue: (value: number | null) => void;
  /** Stands after the field: "mm", "°C". */
  readonly unit?: string | undefined;
  /** Range in the shown unit; said under the field unless there is a hint. */
  readonly min?: number | undefined;
  readonly max?: number | undefined;
  /** Most decimals shown; what is typed is kept in full. */
  readonly decimals?: number | undefined;
  /** Where the shown unit is another than the stored one. */
  readonly toShown?: ((stored: number) => number) | undefined;
  readonly toStored?: ((shown: number) => number) | undefined;
}

const same = (value: number) => value;

/**
 * Never rewrites what is being typed: the text is the typist's until the field is left, and stays
 * after that while it cannot be read.
 */
export function NumberField(props: Props) {
  const { value, min, max, unit, decimals = 3, toShown = same, toStored = same } = props;
  const [typed, setTyped] = useState<string | null>(null);
  const [focused, setFocused] = useState(false);

  const read = readTypedNumber(typed ?? '');
  const keepTyped = typed !== null && (focused || (read.kind === 'unreadable' && value === null));
  const shown = value === null ? null : toShown(value);
  const text = keepTyped ? typed : writeTypedNumber(shown, decimals);

  const range = rangeWords(min, max, unit);
  const given = props.issues ?? [];
  const issues = focused || given.length > 0 ? given : ownIssues();
  const field: FieldProps = { ...props, hint: props.hint ?? range, issues };
  const ids = useFieldIds(field);

  function ownIssues(): readonly FieldIssue[] {
    if (keepTyped && read.kind === 'unreadable') return [{ kind: 'must-mend', text: read.because }];
    const outside = shown !== null && ((min ?? -Infinity) > shown || shown > (max ?? Infinity));
    return outside && range ? [{ kind: 'must-mend', text: `Outside ${range}.` }] : [];
  }

  function type(next: string) {
    setTyped(next);
    const now = readTypedNumber(next);
    props.onValue(now.kind === 'number' ? toStored(now.value) : null);
  }

  return (
    <FieldFrame field={field} ids={ids}>
      <span className="field-corner inline-flex w-40 items-baseline gap-1.5">
        <input
          {...ids.control}
          className="reading min-w-0 grow bg-transparent text-body outline-none"
          inputMode="decimal"
          autoComplete="off"
          value={text}
          onFocus={() => {
            setTyped(text);
            setFocused(true);
          }}
          onChange={(event) => type(event.currentTarget.value)}
          onBlur={() => setFocused(false)}
          disabled={props.disabled}
        />
        {unit && <span className="shrink-0 text-small text-soot-2">{unit}</span>}
      </span>
    </FieldFrame>
  );
}

function rangeWords(min: number | undefined, max: number | undefined, unit = '') {
  const suffix = unit && `\u00a0${unit}`;
  if (min !== undefined && max !== undefined) return `${signed(min)} to ${signed(max)}${suffix}`;
  if (min !== undefined) return `${signed(min)}${suffix} or more`;
  return max === undefined ? undefined : `up to ${signed(max)}${suffix}`;
}

const signed = (value: number) => String(value).replace('-', '−');
