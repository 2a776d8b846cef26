import { useId, useState, type FormEvent } from 'react';
import type { FindRange, Histogram } from '#shared/api/search.ts';
import type { Units } from '#shared/units/units.ts';
import { IconButton } from '../ui/IconButton.tsx';
import { readTypedNumber, writeTypedNumber } from '../ui/typed-number.ts';
import type { RangeEnds } from './find-address.ts';
import { RANGE_LABELS, rangeUnit } from './range-words.ts';
import { RangeHistogram } from './RangeHistogram.tsx';

interface Props {
  readonly range: FindRange;
  readonly ends: RangeEnds;
  /** Absent where none of these notes has the measure. */
  readonly histogram: Histogram | undefined;
  readonly units: Units;
  readonly onRange: (ends: RangeEnds) => void;
}

const ANY: RangeEnds = { min: null, max: null };

/** A measure with its histogram and the two ends one may set. */
export function RangeFilter({ range, ends, histogram, units, onRange }: Props) {
  const { unit } = rangeUnit(range, units);
  const isSet = ends.min !== null || ends.max !== null;
  return (
    <fieldset className="min-w-0 border-t border-soot pt-2">
      <legend className="float-left w-full text-small font-[650]">
        {RANGE_LABELS[range]} <span className="font-[450] text-soot-2">({unit})</span>
      </legend>
      <div className="clear-both space-y-2 pt-1">
        {/* One bar says nothing. */}
        {histogram && histogram.counts.length > 1 && (
          <RangeHistogram histogram={histogram} ends={ends} units={units} onRange={onRange} />
        )}
        <div className="flex items-end gap-2">
          {/* What was typed is dropped when the range changes by other means. */}
          <EndsForm
            key={`${String(ends.min)} ${String(ends.max)} ${unit}`}
            {...{ range, ends, units, onRange }}
          />
          {isSet && (
            <IconButton
              icon="close"
              label={`Any ${RANGE_LABELS[range].toLowerCase()}`}
              onClick={() => onRange(ANY)}
            />
          )}
        </div>
      </div>
    </fieldset>
  );
}

function EndsForm({ range, ends, units, onRange }: Omit<Props, 'histogram'>) {
  const { toShown, toStored } = rangeUnit(range, units);
  const hintId = useId();
  const written = (end: number | null): string =>
    writeTypedNumber(end === null ? null : toShown(end), 1);
  const [min, setMin] = useState(written(ends.min));
  const [max, setMax] = useState(written(ends.max));
  const [fault, setFault] = useState<string | null>(null);
  const endOf = (text: string, before: number | null): number | null | 'unreadable' => {
    if (text === written(before)) return before;
    const read = readTypedNumber(text);
    if (read.kind === 'unreadable') return 'unreadable';
    return read.kind === 'number'
      ? Math.max(0, Math.round(toStored(read.value) * 100) / 100)
      : null;
  };
  const set = (): void => {
    const next = { min: endOf(min, ends.min), max: endOf(max, ends.max) };
    if (next.min === 'unreadable' || next.max === 'unreadable') {
      setFault('Numbers only.');
      return;
    }
    setFault(null);
    if (next.min !== ends.min || next.max !== ends.max) onRange({ min: next.min, max: next.max });
  };
  const field = (label: string, text: string, setText: (text: string) => void) => (
    <label className="min-w-0 grow text-note text-soot-2">
      {label} <span className="sr-only">{RANGE_LABELS[range]}</span>
      <input
        className="field-corner reading block w-full min-w-0 text-small text-soot"
        inputMode="decimal"
        autoComplete="off"
        maxLength={8}
        value={text}
        aria-invalid={fault !== null}
        aria-describedby={fault === null ? undefined : hintId}
        onChange={(event) => setText(event.currentTarget.value)}
        onBlur={set}
      />
    </label>
  );
  return (
    <form
      className="min-w-0 grow"
      onSubmit={(event: FormEvent) => {
        event.preventDefault();
        set();
      }}
    >
      <div className="flex gap-2">
        {field('from', min, setMin)}
        {field('to', max, setMax)}
      </div>
      {/* Enter sets the range, as leaving the field does. */}
      <button type="submit" hidden />
      {fault !== null && (
        <p id={hintId} role="alert" className="text-note text-caution">
          {fault}
        </p>
      )}
    </form>
  );
}
