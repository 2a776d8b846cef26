import { useDeferredValue, useEffect, useMemo, useRef, useState } from 'react';
import { readTable } from '#shared/record/read-table.ts';
import type { RecordChoice } from '#shared/record/record-choice.ts';
import { RecordError } from '#shared/record/record-error.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';
import { Button } from '../../ui/Button.tsx';
import { FieldRow } from '../../ui/FieldRow.tsx';
import { Notice } from '../../ui/Notice.tsx';
import { NumberField } from '../../ui/NumberField.tsx';
import { optionsOf } from '../../ui/options.ts';
import { SelectField } from '../../ui/SelectField.tsx';
import {
  columnsUnder,
  DELIMITER_WORDS,
  TIME_FORMAT_WORDS,
  withinColumns,
} from './choice-columns.ts';
import { ColumnSamples } from './ColumnSamples.tsx';
import { leaveOut, lineAt, type RecordSource } from './record-source.ts';
import { TablePreview } from './TablePreview.tsx';

interface Props {
  readonly source: RecordSource;
  readonly onSource: (source: RecordSource) => void;
  readonly unit: TemperatureUnit;
  readonly onConfirm: (choice: RecordChoice) => void;
  readonly onCancel: () => void;
  readonly busy?: boolean;
}

const DECIMAL_WORDS = { '.': 'Point', ',': 'Comma' } as const;
const UNIT_WORDS = { C: '°C', F: '°F', K: 'Kelvin' } as const;

function readUnder(source: RecordSource, choice: RecordChoice) {
  try {
    return { table: readTable(source.text, choice), error: null };
  } catch (error) {
    if (!(error instanceof RecordError)) throw error;
    return { table: null, error };
  }
}

/** How a table will be read, as it was found out: all of it to be confirmed or changed. */
export function ChoiceForm({ source, onSource, unit, onConfirm, onCancel, busy = false }: Props) {
  const { choice } = source;
  const columns = useMemo(() => columnsUnder(source.text, choice), [source.text, choice]);
  const asked = useDeferredValue(source);
  const read = useMemo(() => readUnder(asked, asked.choice), [asked]);
  const [everTouched, setEverTouched] = useState(false);
  // It opens under what was pressed, and its own buttons come and go: the focus follows.
  const heading = useRef<HTMLParagraphElement>(null);
  const { leftOut } = source;
  useEffect(() => {
    heading.current?.focus();
  }, [leftOut]);

  const change = (next: Partial<RecordChoice>): void => {
    setEverTouched(true);
    const merged = { ...choice, ...next };
    onSource({
      ...source,
      choice: withinColumns(merged, columnsUnder(source.text, merged).length),
    });
  };
  const columnOptions = columns.map(({ index, name }) => ({
    value: String(index),
    label: `${index + 1}${name ? ` · ${name}` : ''}`,
  }));
  const assumed = everTouched ? [] : source.assumed;

  return (
    <div className="@container space-y-4 border-y border-soot-2 py-4">
      <p ref={heading} tabIndex={-1} className="text-body font-[650] outline-none">
        {source.source === 'file' ? source.fileName : 'The pasted table'}: is it read rightly?
      </p>
      {source.undetected !== null && !everTouched && (
        <Notice kind="caution" heading="Its layout could not be found out">
          {source.undetected} Say below how it is written.
        </Notice>
      )}
      <ColumnSamples columns={columns} choice={choice} />
      <FieldRow>
        <SelectField
          label="Time in column"
          value={String(choice.timeColumn)}
          onValue={(value) => change({ timeColumn: Number(value) })}
          options={columnOptions}
          blank={null}
        />
        <SelectField
          label="Time written as"
          value={choice.timeFormat}
          onValue={(value) => value && change({ timeFormat: value })}
          options={optionsOf(TIME_FORMAT_WORDS)}
          blank={null}
        />
        <SelectField
          label="Date in a column of its own"
          value={choice.dateColumn == null ? null : String(choice.dateColumn)}
          onValue={(value) => change({ dateColumn: value === null ? null : Number(value) })}
          options={columnOptions}
          blank="None"
        />
        <SelectField
          label="Temperature in column"
          value={String(choice.temperatureColumn)}
          onValue={(value) => change({ temperatureColumn: Number(value) })}
          options={columnOptions}
          blank={null}
        />
        <SelectField
          label="Temperature in"
          value={choice.unit}
          onValue={(value) => value && change({ unit: value })}
          options={optionsOf(UNIT_WORDS)}
          blank={null}
        />
        <SelectField
          label="Second probe in column"
          value={choice.secondColumn === null ? null : String(choice.secondColumn)}
          onValue={(value) => change({ secondColumn: value === null ? null : Number(value) })}
          options={columnOptions}
          blank="None"
        />
        <SelectField
          label="Columns parted by"
          value={choice.delimiter}
          onValue={(value) => value && change({ delimiter: value })}
          options={optionsOf(DELIMITER_WORDS)}
          blank={null}
        />
        <SelectField
          label="Decimal sign"
          value={choice.decimal}
          onValue={(value) => value && change({ decimal: value })}
          options={optionsOf(DECIMAL_WORDS)}
          blank={null}
        />
        <NumberField
          label="Line of column names"
          hint="Blank where there is none."
          value={choice.headerLine}
          onValue={(line) =>
            change({
              headerLine: line !== null && Number.isInteger(line) && line > 0 ? line : null,
            })
          }
        />
      </FieldRow>
      {assumed.length > 0 && (
        <Notice kind="info" heading="Taken for granted">
          <ul>
            {assumed.map((words) => (
              <li key={words}>{words}</li>
            ))}
          </ul>
        </Notice>
      )}
      {read.error && (
        <Notice
          kind="error"
          appeared
          heading={
            read.error.line === null
              ? 'It cannot be read so'
              : `Line ${read.error.line} cannot be read`
          }
          action={
            read.error.line !== null && (
              <Button onClick={() => onSource(leaveOut(source, read.error.line ?? 0))}>
                {`Leave line ${read.error.line} out`}
              </Button>
            )
          }
        >
          {read.error.message}
          {read.error.line !== null && (
            <code className="reading mt-1 block overflow-x-auto border-l border-soot-2 pl-2">
              {lineAt(source.text, read.error.line)}
            </code>
          )}
        </Notice>
      )}
      {read.table && <TablePreview table={read.table} unit={unit} leftOut={source.leftOut} />}
      <div className="flex flex-wrap gap-3">
        <Button
          kind="main"
          busy={busy}
          disabled={read.table === null || asked !== source}
          onClick={() => onConfirm(choice)}
        >
          Yes, use it as the record
        </Button>
        <Button onClick={onCancel}>Cancel</Button>
      </div>
    </div>
  );
}
