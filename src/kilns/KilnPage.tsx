import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import type { KilnPage as KilnPageData } from '#shared/api/kilns.ts';
import { paths } from '#shared/paths.ts';
import type { Units } from '#shared/units/units.ts';
import { useSession } from '../accounts/useSession.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { dayWords } from '../notes/note-words.ts';
import { kilnGroup } from '../notes/sheet-groups.ts';
import { FACT_SEPARATOR } from '../ui/fact-separator.ts';
import { Disclosure } from '../ui/Disclosure.tsx';
import { FiringSheet } from '../ui/FiringSheet.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { KilnDrawingFigure } from './KilnDrawingFigure.tsx';
import { KilnPhotograph } from './KilnPhotograph.tsx';
import { kilnQueries } from './kiln-queries.ts';
import { LearningCurve } from './LearningCurve.tsx';

/** A kiln: what it is, to scale, and everything fired in it, in order. */
export function KilnPage() {
  const kilnId = Number(useParams()['id']);
  const { units } = useSession();
  const kiln = useQuery(kilnQueries.page(kilnId));
  usePageTitle(kiln.data?.fields.name ?? null);
  if (kiln.isPending) {
    return (
      <div className="space-y-8">
        <Skeleton words="The kiln is being fetched" shape="sheet" count={6} />
        <Skeleton words="Its firings are being fetched" shape="rows" />
      </div>
    );
  }
  if (!kiln.data) return <ProblemPage error={kiln.error} onRetry={() => void kiln.refetch()} />;
  const { fields, abilities, firings } = kiln.data;
  return (
    <div className="space-y-12">
      <header className="space-y-3">
        <h1 className="text-title sm:text-face">{fields.name}</h1>
        <p className="text-small text-soot-2">
          {kiln.data.keeper ? (
            <>
              Kept by{' '}
              <Link to={paths.member(kiln.data.keeper.id)} className="link">
                {kiln.data.keeper.name}
              </Link>
            </>
          ) : (
            'Its keeper has left'
          )}
          {kiln.data.lentTo.length > 0 &&
            `${FACT_SEPARATOR}lent to ${kiln.data.lentTo.map(({ name }) => name).join(', ')}`}
        </p>
        {kiln.data.removed && <Notice kind="info">This kiln is no longer in use.</Notice>}
        {(abilities.fire || abilities.edit) && (
          <div className="not-in-print flex flex-wrap gap-3">
            {abilities.fire && (
              <LinkButton kind="main" to={paths.newNote({ kilnId })}>
                Write up a firing
              </LinkButton>
            )}
            {abilities.edit && <LinkButton to={paths.editKiln(kilnId)}>Alter or lend</LinkButton>}
          </div>
        )}
      </header>
      <Described kiln={kiln.data} units={units} />
      <section aria-labelledby="firings" className="space-y-4">
        <h2 id="firings" className="text-section">
          Its firings
        </h2>
        {firings.length === 0 ? (
          <p className="text-soot-2">None is published yet.</p>
        ) : (
          <>
            <p className="max-w-measure text-small text-soot-2">
              In the order they were fired, all on one scale of minutes; between them what was
              changed, as its firer named it.
            </p>
            <LearningCurve firings={firings} units={units} />
          </>
        )}
      </section>
    </div>
  );
}

interface DescribedProps {
  readonly kiln: KilnPageData;
  readonly units: Units;
}

function Described({ kiln, units }: DescribedProps) {
  const { fields, picture, versions } = kiln;
  return (
    <section aria-labelledby="described" className="space-y-6">
      <h2 id="described" className="text-section">
        As it stands
      </h2>
      <KilnDrawingFigure fields={fields} />
      <div className="grid items-start gap-x-12 gap-y-6 lg:grid-cols-2">
        <FiringSheet groups={[kilnGroup(kiln, units)]} />
        <div className="space-y-4">
          {picture && <KilnPhotograph picture={picture} name={fields.name} />}
          {fields.lid && (
            <p className="text-small">
              <span className="text-soot-2">Lid: </span>
              {fields.lid}
            </p>
          )}
          {fields.about && (
            <p className="max-w-measure whitespace-pre-line font-story text-story">
              {fields.about}
            </p>
          )}
          {versions.length > 1 && (
            <Disclosure summary={`Altered ${timesWords(versions.length - 1)}`}>
              <ol className="border-t border-line">
                {versions.map(({ version, madeOn, changed }) => (
                  <li key={version} className="border-b border-line py-2">
                    <span className="text-soot-2">{dayWords(madeOn)}: </span>
                    {version === versions[0]?.version
                      ? 'described'
                      : changed.join(', ') || 'nothing that shows'}
                  </li>
                ))}
              </ol>
            </Disclosure>
          )}
        </div>
      </div>
    </section>
  );
}

const timesWords = (times: number): string => (times === 1 ? 'once' : `${String(times)} times`);
