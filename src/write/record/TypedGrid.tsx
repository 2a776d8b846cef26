import { useRef, useState, type ClipboardEvent, type KeyboardEvent } from 'react';
import type { Reading } from '#shared/firing/types.ts';
import { MAX_TYPED_ROWS } from '#shared/note/plan.ts';
import { parsePastedRows } from '#shared/record/parse-pasted-rows.ts';
import type { SkippedLine } from '#shared/record/read-table.ts';
import { RecordError } from '#shared/record/record-error.ts';
import { formatClock } from '#shared/units/duration.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';
import { Button } from '../../ui/Button.tsx';
import { IconButton } from '../../ui/IconButton.tsx';
import { Notice } from '../../ui/Notice.tsx';
import { CellInput } from './CellInput.tsx';
import { SkippedLines } from './SkippedLines.tsx';
import { minuteCell, temperatureCell } from './typed-cells.ts';
import {
  clockStart,
  completeReadings,
  isBlank,
  isInOrder,
  setCell,
  sortedByMinute,
  withReadings,
  type TypedRow,
} from './typed-rows.ts';

interface Props {
  readonly rows: readonly TypedRow[];
  readonly onRows: (rows: TypedRow[]) => void;
  readonly unit: TemperatureUnit;
  readonly disabled?: boolean;
  /** Places of cells that a check points at: "3:minute". */
  readonly invalid?: ReadonlySet<string>;
  /** More readings than typed rows may be: they go as a file instead. */
  readonly onTooMany: (readings: readonly Reading[]) => void;
  /** Counts readings and marks from this minute as 0. */
  readonly onCountFrom: (minute: number) => void;
}

interface Keyed {
  readonly keys: readonly number[];
  readonly next: number;
}
const freshKeys = (count: number, from = 0): Keyed => ({
  keys: Array.from({ length: count }, (_, index) => from + index),
  next: from + count,
});

/**
 * Minute and temperature as fast as they can be typed: Enter goes to the next cell, a blank row is
 * always waiting at the end, two pasted columns fill rows, a row with both cells cleared goes.
 */
export function TypedGrid(props: Props) {
  const { rows, onRows, unit, disabled = false } = props;
  const shown = rows.length < MAX_TYPED_ROWS && !disabled ? rows.length + 1 : rows.length;
  // Each row on the screen keeps its identity while others come and go around it.
  const [keyed, setKeyed] = useState(() => freshKeys(shown));
  const keys = keyed.keys.length === shown ? keyed : freshKeys(shown, keyed.next);
  if (keys !== keyed) setKeyed(keys);
  const [pasted, setPasted] = useState<{ count: number; skipped: readonly SkippedLine[] } | null>(
    null,
  );
  const body = useRef<HTMLTableSectionElement>(null);
  const temperature = temperatureCell(unit);
  const start = clockStart(rows);

  const focusOn = (place: string): void => {
    body.current?.querySelector<HTMLElement>(`[data-place="${place}"]`)?.focus();
  };
  const put = (next: TypedRow[], nextKeys: readonly number[]): void => {
    const wanted = next.length < MAX_TYPED_ROWS ? next.length + 1 : next.length;
    const more = Math.max(0, wanted - nextKeys.length);
    const added = freshKeys(more, keys.next);
    setKeyed({ keys: [...nextKeys, ...added.keys].slice(0, wanted), next: keys.next + more });
    onRows(next);
  };
  const remove = (index: number): void => {
    put(
      rows.filter((_, at) => at !== index),
      keys.keys.filter((_, at) => at !== index),
    );
  };

  const paste = (event: ClipboardEvent<HTMLInputElement>, index: number): void => {
    const text = event.clipboardData.getData('text/plain');
    if (!/[\n\t;]/.test(text.trim())) return;
    event.preventDefault();
    let readings: readonly Reading[] = [];
    let skipped: readonly SkippedLine[] = [];
    try {
      ({ readings, skipped } = parsePastedRows(text, unit));
    } catch (error) {
      if (!(error instanceof RecordError)) throw error;
      skipped = [{ line: error.line ?? 1, reason: error.message }];
    }
    setPasted({ count: readings.length, skipped });
    if (readings.length === 0) return;
    const next = withReadings(rows, index, readings);
    if (next.length > MAX_TYPED_ROWS) props.onTooMany(completeReadings(next));
    else {
      onRows(next);
      requestAnimationFrame(() => focusOn(`${index + readings.length}:minute`));
    }
  };

  const move = (event: KeyboardEvent, index: number, column: keyof TypedRow): void => {
    if (event.ctrlKey || event.metaKey || event.altKey || event.shiftKey) return;
    const target =
      event.key === 'Enter'
        ? column === 'minute'
          ? `${index}:celsius`
          : `${index + 1}:minute`
        : event.key === 'ArrowDown'
          ? `${index + 1}:${column}`
          : event.key === 'ArrowUp'
            ? `${index - 1}:${column}`
            : // Past the row's button, which the way back still meets.
              event.key === 'Tab' && column === 'celsius' && index < rows.length
              ? `${index + 1}:minute`
              : null;
    if (event.key === 'Tab' && index + 1 >= shown) return;
    if (target === null) return;
    event.preventDefault();
    focusOn(target);
  };

  return (
    <div className="space-y-3">
      <div className="max-h-112 max-w-112 overflow-y-auto">
        <table className="w-full text-small">
          <caption className="sr-only">
            Readings: minute and temperature. Enter goes on to the next cell.
          </caption>
          <thead className="sticky top-0 z-10 bg-ash">
            <tr className="border-b border-soot text-left text-soot-2">
              <th scope="col" className="w-10 py-1.5 pr-2 text-right font-[550]">
                Row
              </th>
              <th scope="col" className="px-2 py-1.5 font-[550]">
                Minute
              </th>
              <th scope="col" className="px-2 py-1.5 font-[550]">
                °{unit}
              </th>
              <td />
            </tr>
          </thead>
          <tbody ref={body}>
            {keys.keys.map((key, index) => {
              const row = rows[index] ?? null;
              const cell = (column: keyof TypedRow) => (
                <td className="w-1/2 px-2 py-0.5">
                  <CellInput
                    key={column === 'celsius' ? unit : column}
                    label={
                      column === 'minute'
                        ? `Minute, row ${index + 1}`
                        : `Degrees ${unit}, row ${index + 1}`
                    }
                    kind={column === 'minute' ? minuteCell : temperature}
                    value={row?.[column] ?? null}
                    invalid={props.invalid?.has(`${index}:${column}`) ?? false}
                    disabled={disabled}
                    place={`${index}:${column}`}
                    onValue={(value) => put(setCell(rows, index, column, value), keys.keys)}
                    onKeyDown={(event) => move(event, index, column)}
                    onPaste={(event) => paste(event, index)}
                  />
                </td>
              );
              return (
                <tr
                  key={key}
                  onBlur={(event) => {
                    const leaves = !event.currentTarget.contains(event.relatedTarget);
                    if (leaves && row && isBlank(row)) remove(index);
                  }}
                >
                  <th scope="row" className="reading py-0.5 pr-2 text-right font-[400] text-soot-2">
                    {index + 1}
                  </th>
                  {cell('minute')}
                  {cell('celsius')}
                  <td className="py-0.5">
                    {row && !disabled && (
                      <IconButton
                        icon="remove"
                        label={`Remove row ${index + 1}`}
                        onClick={() => {
                          remove(index);
                          focusOn(`${Math.max(0, index - 1)}:minute`);
                        }}
                      />
                    )}
                  </td>
                </tr>
              );
            })}
          </tbody>
        </table>
      </div>
      {rows.length >= MAX_TYPED_ROWS && (
        <p className="text-small text-soot-2">
          {MAX_TYPED_ROWS} rows are the most to be typed. Paste or upload a longer record.
        </p>
      )}
      {!disabled && (!isInOrder(rows) || start !== null) && (
        <div className="flex flex-wrap gap-3">
          {!isInOrder(rows) && (
            <Button onClick={() => onRows(sortedByMinute(rows))}>Sort by minute</Button>
          )}
          {start !== null && (
            <Button onClick={() => props.onCountFrom(start)}>
              {`Count from ${formatClock(start)} as 0`}
            </Button>
          )}
        </div>
      )}
      {pasted && (
        <Notice kind={pasted.count > 0 ? 'done' : 'error'} appeared>
          {pasted.count === 0
            ? 'None of these lines holds a minute and a temperature.'
            : `${pasted.count} rows pasted.`}
          <SkippedLines skipped={pasted.skipped} count={pasted.skipped.length} />
        </Notice>
      )}
    </div>
  );
}
