import { useQuery } from '@tanstack/react-query';
import type { NotePageData } from '#shared/api/notes.ts';
import { findingText, type Finding } from '#shared/firing/findings.ts';
import { formatDuration } from '#shared/units/duration.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';
import { MARKS } from '#shared/vocabulary/marks.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { HeatLegend } from '../ui/HeatLegend.tsx';
import { RecordChart } from '../ui/RecordChart.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { noteQueries, type RecordOf } from './note-queries.ts';

interface Props {
  readonly page: NotePageData;
  readonly units: Units;
  readonly of: RecordOf;
}

/** Stretches that are shaded on the chart, with their word and figure. */
export function stretchesOf(findings: readonly Finding[], units: Units) {
  return findings
    .filter(({ code }) => ['stall', 'sag', 'pause', 'just-short'].includes(code))
    .map(({ code, fromMinute, toMinute, numbers }) => {
      const celsius = numbers[code === 'sag' ? 'topCelsius' : 'levelCelsius'] ?? 0;
      const word = code === 'just-short' ? 'just short' : code;
      return {
        fromMinute,
        toMinute,
        label: `${word} ${formatTemperature(celsius, units.temperature)}, ${formatDuration(toMinute - fromMinute)}`,
      };
    });
}

/** The hold found in a record, as the chart and the strip draw it. */
export function holdOf(findings: readonly Finding[]) {
  const hold = findings.find(({ code }) => code === 'hold');
  return hold ? { fromMinute: hold.fromMinute, toMinute: hold.toMinute } : null;
}

/** Marks with their words and figures. */
export function drawnMarks(marks: NotePageData['marks']) {
  return marks.map((mark) => ({
    minute: mark.minute,
    label: [
      MARKS[mark.kind].toLowerCase(),
      mark.percent === null ? '' : `${String(mark.percent)}\u00a0%`,
      mark.detail,
    ]
      .filter((part) => part !== '')
      .join(' '),
  }));
}

/** The record as a chart with what was read off it, and the findings in sentences. */
export function NoteRecord({ page, units, of }: Props) {
  const record = useQuery({
    ...noteQueries.record(page.id, of, page.revision),
    enabled: page.hasRecord,
  });
  const points = record.data?.points ?? (page.hasRecord ? null : page.row.strip);
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
            hold={holdOf(page.findings)}
            stretches={stretchesOf(page.findings, units)}
            marks={drawnMarks(page.marks)}
          />
          <HeatLegend unit={units.temperature} withSentence />
        </>
      )}
      {!page.hasRecord && (!points || points.length < 2) && (
        <p className="text-soot-2">
          No record was kept: peak, time and hold are the author’s word, and nothing could be read
          off.
        </p>
      )}
      {page.findings.length > 0 && (
        <>
          <h3 className="pt-2 text-body">What was read off it</h3>
          <ul className="max-w-measure text-small">
            {page.findings.map((finding) => (
              <li
                key={`${finding.code}-${String(finding.fromMinute)}`}
                className={`border-b border-line py-1.5 ${finding.trouble ? 'font-[600]' : ''}`}
              >
                {findingText(finding, units)}
              </li>
            ))}
          </ul>
        </>
      )}
      {page.hasRecord && (
        <p className="not-in-print text-small">
          <a className="link" href={`/api/notes/${String(page.id)}/record.csv?of=${of}`}>
            All readings as CSV
          </a>
          {record.data && <span className="text-soot-2"> ({record.data.count} readings, °C)</span>}
        </p>
      )}
    </section>
  );
}
