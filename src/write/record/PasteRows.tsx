import { useDeferredValue, useMemo, useState } from 'react';
import type { Reading } from '#shared/firing/types.ts';
import { MAX_TYPED_ROWS } from '#shared/note/plan.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';
import { Button } from '../../ui/Button.tsx';
import { Notice } from '../../ui/Notice.tsx';
import { TextArea } from '../../ui/TextArea.tsx';
import { readPasted, sourceOf, type RecordSource } from './record-source.ts';
import { TablePreview } from './TablePreview.tsx';

interface Props {
  readonly unit: TemperatureUnit;
  readonly onReadings: (readings: readonly Reading[]) => void;
  /** It is a table whose columns are to be confirmed. */
  readonly onTable: (source: RecordSource) => void;
}

/** Columns copied out of a sheet or a message, with a preview before anything is taken over. */
export function PasteRows({ unit, onReadings, onTable }: Props) {
  const [text, setText] = useState('');
  const asked = useDeferredValue(text);
  const read = useMemo(() => (asked.trim() === '' ? null : readPasted(asked, unit)), [asked, unit]);
  return (
    <div className="@container space-y-3 [&_textarea]:max-h-64">
      <TextArea
        label="Pasted columns"
        hint={`A minute and a temperature a line, such as “12 310” or “0:12; 310”; °${unit} unless a line says otherwise. A whole table with column names works too.`}
        value={text}
        onValue={setText}
        rows={6}
      />
      {read?.kind === 'unreadable' && (
        <Notice kind="error" heading="This cannot be read yet" appeared>
          {read.because}
        </Notice>
      )}
      {read?.kind === 'table' && (
        <Notice
          kind="info"
          heading="This is a table"
          action={
            <Button kind="main" onClick={() => onTable(read.source)}>
              Look at its columns
            </Button>
          }
        >
          Confirm which columns hold the time and the temperature.
        </Notice>
      )}
      {read?.kind === 'rows' && (
        <>
          <TablePreview table={read} unit={unit} />
          <div className="flex flex-wrap gap-3">
            <Button
              kind="main"
              onClick={() => {
                onReadings(read.readings);
                setText('');
              }}
            >
              {`Use ${read.readings.length === 1 ? 'this reading' : `these ${read.readings.length} readings`}`}
            </Button>
            <Button onClick={() => onTable(sourceOf(asked, 'pasted.csv', 'pasted'))}>
              Choose columns and units
            </Button>
          </div>
          {read.readings.length > MAX_TYPED_ROWS && (
            <p className="text-small text-soot-2">
              More than {MAX_TYPED_ROWS} readings are kept as a file.
            </p>
          )}
        </>
      )}
    </div>
  );
}
