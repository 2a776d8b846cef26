import { useQuery } from '@tanstack/react-query';
import { useDeferredValue, useMemo, useState } from 'react';
import { Link } from 'react-router-dom';
import { MOST_ASKED_READINGS } from '#shared/api/look-alikes.ts';
import { CAUTIONS_IN_BRIEF } from '#shared/cautions.ts';
import { readFiring } from '#shared/firing/read-firing.ts';
import { chartPoints, stripSignature } from '#shared/firing/strip.ts';
import { stripWords } from '#shared/firing/strip-words.ts';
import type { Reading } from '#shared/firing/types.ts';
import { paths } from '#shared/paths.ts';
import type { Units } from '#shared/units/units.ts';
import { useSession } from '../accounts/useSession.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { Button } from '../ui/Button.tsx';
import { CautionNote } from '../ui/CautionNote.tsx';
import { EmptyState } from '../ui/EmptyState.tsx';
import { GlowStrip } from '../ui/GlowStrip.tsx';
import { HeatLegend } from '../ui/HeatLegend.tsx';
import { LiveRegion } from '../ui/LiveRegion.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { TemperatureField } from '../ui/TemperatureField.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { noneAlikeWords } from './alike-words.ts';
import { keepRecord, keptRecord, type AskedRecord } from './kept-record.ts';
import { lookAlikeQueries } from './look-alike-queries.ts';
import { LookAlikeRows } from './LookAlikeRows.tsx';
import { RecordToCompare } from './RecordToCompare.tsx';

/** A record of nobody's note yet: published firings that climbed like it, and what came next. */
export function LookAlikesPage() {
  const { units } = useSession();
  const [asked, setAsked] = useState(keptRecord);
  usePageTitle('Look-alikes');
  const ask = (record: AskedRecord | null): void => {
    keepRecord(record);
    setAsked(record);
  };
  const take = (name: string, readings: readonly Reading[]): void =>
    ask({
      name,
      targetCelsius: null,
      readings: chartPoints(readings, MOST_ASKED_READINGS).map(({ minute, celsius }) => [
        Math.round(minute * 1e4) / 1e4,
        Math.round(celsius * 100) / 100,
      ]),
    });
  return (
    <div className="space-y-8">
      <header className="max-w-measure space-y-3">
        <h1 className="text-title">Firings that climbed like yours</h1>
        <p className="text-lead text-soot-2">
          Give the temperature record of a firing, and see whose climb was most like it, why, what
          they changed next and what came of it.
        </p>
      </header>
      {asked === null ? (
        <>
          <RecordToCompare unit={units.temperature} onRecord={take} />
          <p className="max-w-measure text-small text-soot-2">
            The record is compared and not kept; its readings stay in this tab until you close it.
            To keep it, write a note.
          </p>
        </>
      ) : (
        <Compared
          record={asked}
          units={units}
          onTarget={(targetCelsius) => ask({ ...asked, targetCelsius })}
          onOther={() => ask(null)}
        />
      )}
    </div>
  );
}

interface ComparedProps {
  readonly record: AskedRecord;
  readonly units: Units;
  readonly onTarget: (celsius: number | null) => void;
  readonly onOther: () => void;
}

function Compared({ record, units, onTarget, onOther }: ComparedProps) {
  const { readings, targetCelsius } = record;
  // Typed digit by digit: asked about once it is a temperature a glaze may want.
  const typed = useDeferredValue(targetCelsius);
  const target = typed !== null && typed >= 400 && typed <= 1150 ? typed : null;
  const alike = useQuery(lookAlikeQueries.ofRecord({ readings, targetCelsius: target }));
  const own = useMemo(() => {
    const points = readings.map(([minute, celsius]) => ({ minute, celsius }));
    const reading = readFiring({ readings: points, targetCelsius: target });
    return { strip: stripSignature(points), words: reading ? stripWords(reading, units) : '' };
  }, [readings, target, units]);
  const found = alike.data;
  return (
    <>
      <section aria-labelledby="own" className="space-y-4">
        <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2">
          <h2 id="own" className="min-w-0 text-section [overflow-wrap:anywhere]">
            {record.name}
          </h2>
          <Button onClick={onOther}>Another record</Button>
        </div>
        <GlowStrip
          points={own.strip}
          alt={own.words || 'Too short to be read'}
          targetCelsius={target}
          unit={units.temperature}
        />
        {own.words && <p className="max-w-measure first-letter:uppercase">{own.words}.</p>}
        <div className="@container max-w-measure">
          <TemperatureField
            label="Aimed at"
            hint="Tells a hold from a stall. Blank if unknown."
            celsius={targetCelsius}
            onCelsius={onTarget}
            unit={units.temperature}
            minCelsius={400}
            maxCelsius={1150}
          />
        </div>
      </section>
      <LiveRegion
        text={found ? `${String(found.hits.length)} firings alike found` : ''}
        quietMs={400}
      />
      {alike.isPending && <Skeleton words="Firings alike are being looked for" shape="rows" />}
      {alike.isError && <ProblemPage error={alike.error} onRetry={() => void alike.refetch()} />}
      {found && (found.climb === null || found.hits.length === 0) && (
        <EmptyState
          title={found.climb ? 'No firing climbed like this' : 'There is no climb in this record'}
          action={<Button onClick={onOther}>Another record</Button>}
        >
          {found.climb
            ? noneAlikeWords(found.compared, units)
            : 'It takes at least five minutes of a firing, from its start on.'}{' '}
          <Link to={paths.find()} className="link">
            Ask in words instead
          </Link>
          .
        </EmptyState>
      )}
      {found?.climb && found.hits.length > 0 && (
        <section aria-labelledby="alike" className="space-y-3">
          <h2 id="alike" className="text-section">
            {found.hits.length === 1 ? 'One firing' : `${String(found.hits.length)} firings`} alike,
            of {found.compared} with a record
          </h2>
          <p className="max-w-measure text-small text-soot-2">
            Compared minute by minute from the start, in real temperatures; a few minutes earlier or
            later count for little. Alike is not the same cause.
          </p>
          <LookAlikeRows climb={found.climb} hits={found.hits} units={units} ownWord="yours" />
          <CautionNote>
            <p>{CAUTIONS_IN_BRIEF}</p>
          </CautionNote>
        </section>
      )}
      {!found && <HeatLegend unit={units.temperature} />}
    </>
  );
}
