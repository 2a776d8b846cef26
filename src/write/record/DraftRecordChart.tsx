import { useQuery } from '@tanstack/react-query';
import { useDeferredValue, useMemo } from 'react';
import type { FiringRecord } from '#shared/api/records.ts';
import { stripSignature } from '#shared/firing/strip.ts';
import { stripWords } from '#shared/firing/strip-words.ts';
import { formatDuration } from '#shared/units/duration.ts';
import { CompareMenu } from '../../notes/CompareMenu.tsx';
import { noteQueries } from '../../notes/note-queries.ts';
import { useComparedRecord } from '../../notes/useComparedRecord.ts';
import { useDrawnFindings } from '../../notes/useDrawnFindings.ts';
import { useRecordDetail } from '../../notes/useRecordDetail.ts';
import { Button } from '../../ui/Button.tsx';
import { HeatLegend } from '../../ui/HeatLegend.tsx';
import { Notice } from '../../ui/Notice.tsx';
import { RecordChart } from '../../ui/RecordChart.tsx';
import { Skeleton } from '../../ui/Skeleton.tsx';
import { useWriteForm } from '../form-context.ts';
import { LevelAnswers } from './LevelAnswers.tsx';
import { completeReadings } from './typed-rows.ts';

const CHART_POINTS = 3000;

/** The record as it stands, stored or typed, with what is read off it drawn in. */
export function DraftRecordChart({ record }: { readonly record: FiringRecord | null }) {
  const { fields, draft, reading, units } = useWriteForm();
  const { recordId, typedRows, marks } = fields.record;
  // The server gives points of the record it knows the draft to have.
  const isThere =
    recordId !== null && draft.record?.id === recordId && draft.record.status === 'ready';
  const stored = useQuery({
    ...noteQueries.record(draft.id, 'draft', recordId ?? 0),
    enabled: isThere,
  });
  const rows = useDeferredValue(typedRows);
  const typed = useMemo(() => stripSignature(completeReadings(rows), CHART_POINTS), [rows]);
  const points = recordId === null ? typed : (stored.data?.points ?? record?.strip ?? null);
  // What this browser reads while typing; for a stored record perhaps only the server has read it.
  const findings = reading.reading ? reading.findings : draft.findings;

  const { detail, onWindow } = useRecordDetail(draft.id, 'draft', recordId ?? 0, stored.data);
  const drawn = useDrawnFindings(findings, marks, units);
  const own = useMemo(() => ({ points: points ?? [], marks: drawn.marks }), [points, drawn.marks]);
  const compared = useComparedRecord({ earlier: draft.earlier, next: null }, own);

  if (recordId !== null && record?.status !== 'ready') return null;
  if (points === null) return <Skeleton words="The record is being fetched" shape="strip" />;
  const first = points[0];
  const last = points[points.length - 1];
  if (!first || !last || points.length < 2) return null;
  const alt = reading.reading
    ? stripWords(reading.reading, units)
    : `A record over ${formatDuration(last[0] - first[0])}`;
  return (
    <div className="space-y-3">
      {stored.isError && (
        <Notice
          kind="error"
          action={<Button onClick={() => void stored.refetch()}>Try again</Button>}
        >
          The readings could not be fetched; the chart shows a coarse outline of them.
        </Notice>
      )}
      <RecordChart
        points={points}
        secondProbe={recordId === null ? null : (stored.data?.secondProbe ?? null)}
        alt={alt}
        unit={units.temperature}
        targetCelsius={fields.plan.targetCelsius}
        hold={drawn.hold}
        stretches={drawn.stretches}
        marks={drawn.marks}
        overlay={compared.overlay}
        detail={recordId === null ? null : detail}
        onWindow={onWindow}
        {...(recordId !== null && stored.data
          ? {
              count: stored.data.count,
              csvHref: `/api/notes/${String(draft.id)}/record.csv?of=draft`,
            }
          : {})}
      />
      <HeatLegend unit={units.temperature} withSentence />
      <CompareMenu compared={compared} />
      <LevelAnswers findings={findings} />
    </div>
  );
}
