import { useMemo } from 'react';
import { stripSignature } from '#shared/firing/strip.ts';
import { stripWords } from '#shared/firing/strip-words.ts';
import type { StoredReadings } from '#shared/note/read-note.ts';
import { drawnMarks, holdOf } from '../notes/drawn-findings.ts';
import { GlowStrip } from '../ui/GlowStrip.tsx';
import { HeatLegend } from '../ui/HeatLegend.tsx';
import { useWriteForm } from './form-context.ts';
import { completeReadings } from './record/typed-rows.ts';

/** The note's face as it grows while the record is typed or read. */
export function StripSoFar({ stored }: { readonly stored: StoredReadings | null }) {
  const { fields, draft, reading, units } = useWriteForm();
  const { record } = fields;
  const { recordId, typedRows } = record;
  const known = draft.record?.strip;
  const points = useMemo(() => {
    if (stored) return stripSignature(stored.readings);
    return recordId === null ? stripSignature(completeReadings(typedRows)) : (known ?? []);
  }, [recordId, typedRows, stored, known]);
  if (points.length < 2) {
    return (
      <p className="flex min-h-24 items-center border border-dashed border-soot-2 px-4 text-small text-soot-2">
        The glow strip grows here as soon as there are readings.
      </p>
    );
  }
  return (
    <div className="space-y-2">
      <GlowStrip
        points={points}
        alt={
          reading.reading ? stripWords(reading.reading, units) : 'The record as far as it is known'
        }
        targetCelsius={fields.plan.targetBy === 'temperature' ? fields.plan.targetCelsius : null}
        hold={holdOf(reading.findings)}
        marks={drawnMarks(record.marks)}
        unit={units.temperature}
      />
      <HeatLegend unit={units.temperature} />
    </div>
  );
}
