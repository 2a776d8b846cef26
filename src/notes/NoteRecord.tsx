import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { NotePageData } from '#shared/api/notes.ts';
import type { Units } from '#shared/units/units.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { lookAlikeQueries } from '../look-alikes/look-alike-queries.ts';
import { HeatLegend } from '../ui/HeatLegend.tsx';
import { RecordChart } from '../ui/RecordChart.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { CompareMenu } from './CompareMenu.tsx';
import { noteQueries, type RecordOf } from './note-queries.ts';
import { NoteFindings } from './NoteFindings.tsx';
import { useComparedRecord } from './useComparedRecord.ts';
import { useDrawnFindings } from './useDrawnFindings.ts';
import { useRecordDetail } from './useRecordDetail.ts';

/** Look-alikes offered to be laid over the record; the panel below tells of more. */
const OFFERED_ALIKE = 3;

interface Props {
  readonly page: NotePageData;
  readonly units: Units;
  readonly of: RecordOf;
}

/** The record as a chart with what was read off it, and the findings in sentences. */
export function NoteRecord({ page, units, of }: Props) {
  const record = useQuery({
    ...noteQueries.record(page.id, of, page.revision),
    enabled: page.hasRecord,
  });
  const points = record.data?.points ?? (page.hasRecord ? null : page.row.strip);
  const { detail, onWindow } = useRecordDetail(page.id, of, page.revision, record.data);
  const { findings, marks } = page;
  const drawn = useDrawnFindings(findings, marks, units);
  const own = useMemo(() => ({ points: points ?? [], marks: drawn.marks }), [points, drawn.marks]);
  const alike = useQuery({
    ...lookAlikeQueries.ofNote(page.id, page.revision),
    enabled: of === 'published' && (points?.length ?? 0) > 1,
  });
  const others = (alike.data?.hits ?? [])
    .slice(0, OFFERED_ALIKE)
    .map(({ note }) => ({ noteId: note.id, title: note.title, firedOn: note.firedOn }));
  const { earlier, next } = page;
  const compared = useComparedRecord({ earlier, next, alike: others }, own);
  const csvHref = `/api/notes/${String(page.id)}/record.csv?of=${of}`;
  return (
    <section aria-labelledby="record" className="space-y-4">
      <h2 id="record" className="text-section">
        Record
      </h2>
      {record.isError && <ProblemPage error={record.error} onRetry={() => void record.refetch()} />}
      {page.hasRecord && record.isPending && (
        <Skeleton words="The record is being fetched" shape="strip" />
      )}
      {points && points.length > 1 && (
        <>
          <RecordChart
            points={points}
            secondProbe={record.data?.secondProbe ?? null}
            alt={page.row.stripWords}
            unit={units.temperature}
            targetCelsius={page.row.targetCelsius}
            hold={drawn.hold}
            stretches={drawn.stretches}
            marks={drawn.marks}
            overlay={compared.overlay}
            detail={detail}
            onWindow={onWindow}
            {...(record.data ? { count: record.data.count, csvHref } : {})}
          />
          <HeatLegend unit={units.temperature} withSentence />
          <CompareMenu compared={compared} />
        </>
      )}
      {!page.hasRecord && (!points || points.length < 2) && (
        <p className="text-soot-2">
          No record was kept: peak, time and hold are the author’s word, and nothing could be read
          off.
        </p>
      )}
      <NoteFindings page={page} units={units} of={of} />
      {page.hasRecord && (
        <p className="not-in-print text-small">
          <a className="link" href={csvHref}>
            All readings as CSV
          </a>
          {record.data && <span className="text-soot-2"> ({record.data.count} readings, °C)</span>}
        </p>
      )}
    </section>
  );
}
