import { useState } from 'react';
import type { Reading } from '#shared/firing/types.ts';
import { readTable } from '#shared/record/read-table.ts';
import { RecordError } from '#shared/record/record-error.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';
import { Notice } from '../ui/Notice.tsx';
import { ChoiceForm } from '../write/record/ChoiceForm.tsx';
import { ChooseFile } from '../write/record/ChooseFile.tsx';
import { PasteRows } from '../write/record/PasteRows.tsx';
import { sourceOfFile, type RecordSource } from '../write/record/record-source.ts';
import { WayChoice, type Way } from '../write/record/WayChoice.tsx';
import { looksLikeTable, useFileDrop } from '../write/story/useFileDrop.ts';

interface Props {
  readonly unit: TemperatureUnit;
  readonly onRecord: (name: string, readings: readonly Reading[]) => void;
}

/** A logger's file or pasted columns, read in this browser the way a note's record is. */
export function RecordToCompare({ unit, onRecord }: Props) {
  const [way, setWay] = useState<Way>('file');
  const [source, setSource] = useState<RecordSource | null>(null);
  const [refused, setRefused] = useState<string | null>(null);
  const [looking, setLooking] = useState(false);

  const look = async (file: File): Promise<void> => {
    setLooking(true);
    setRefused(null);
    try {
      setSource(await sourceOfFile(file));
    } catch (error) {
      setSource(null);
      setRefused(error instanceof RecordError ? error.message : 'This file could not be opened.');
    } finally {
      setLooking(false);
    }
  };
  useFileDrop({
    takes: looksLikeTable,
    onFiles: ([file]) => {
      if (file) void look(file);
    },
  });

  return (
    <div className="space-y-4">
      {source === null && (
        <>
          <WayChoice
            label="How the readings come in"
            ways={['file', 'paste']}
            way={way}
            onWay={setWay}
          />
          {way === 'file' ? (
            <ChooseFile onFile={(file) => void look(file)} busy={looking} />
          ) : (
            <PasteRows
              unit={unit}
              onReadings={(readings) => onRecord('The pasted readings', readings)}
              onTable={setSource}
            />
          )}
        </>
      )}
      {refused !== null && (
        <Notice kind="error" heading="This file cannot be a record" appeared>
          {refused}
        </Notice>
      )}
      {source && (
        <ChoiceForm
          source={source}
          onSource={setSource}
          unit={unit}
          onConfirm={(choice) =>
            onRecord(
              source.source === 'file' ? source.fileName : 'The pasted table',
              readTable(source.text, choice).readings,
            )
          }
          onCancel={() => setSource(null)}
        />
      )}
    </div>
  );
}
