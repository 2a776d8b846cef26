import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Kiln } from '#shared/api/kilns.ts';
import { paths } from '#shared/paths.ts';
import { formatChamber } from '#shared/units/volume.ts';
import type { Units } from '#shared/units/units.ts';
import { FUELS, WALLS } from '#shared/vocabulary/kiln.ts';
import { useSession } from '../accounts/useSession.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { FACT_SEPARATOR } from '../ui/fact-separator.ts';
import { EmptyState } from '../ui/EmptyState.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Reading } from '../ui/Reading.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { kilnQueries } from './kiln-queries.ts';

/** The kilns one keeps, and those lent to one. */
export function KilnsPage() {
  usePageTitle('Kilns');
  const { me, units } = useSession();
  const kilns = useQuery(kilnQueries.mine());
  if (kilns.isError && !kilns.data) {
    return <ProblemPage error={kilns.error} onRetry={() => void kilns.refetch()} />;
  }
  const all = kilns.data?.kilns ?? [];
  const own = all.filter(({ keeper }) => keeper !== null && keeper.id === me?.id);
  const lent = all.filter((kiln) => !own.includes(kiln));
  const addLink = (
    <LinkButton to={paths.newKiln} kind={all.length === 0 ? 'main' : 'plain'} icon="add">
      Describe a kiln
    </LinkButton>
  );
  return (
    <div className="space-y-8">
      <div className="flex flex-wrap items-center justify-between gap-4">
        <h1 className="text-title">Kilns</h1>
        {all.length > 0 && addLink}
      </div>
      {kilns.isPending && <Skeleton words="Your kilns are being fetched" shape="sheet" />}
      {kilns.data && all.length === 0 && (
        <EmptyState title="No kiln yet" action={addLink}>
          A kiln is described once: its inside, wall, flue and burner. Notes then belong to it, and
          its firings stand in order.
        </EmptyState>
      )}
      {own.length > 0 && <KilnList heading="Yours" kilns={own} units={units} />}
      {lent.length > 0 && <KilnList heading="Lent to you" kilns={lent} units={units} />}
    </div>
  );
}

interface ListProps {
  readonly heading: string;
  readonly kilns: readonly Kiln[];
  readonly units: Units;
}

function KilnList({ heading, kilns, units }: ListProps) {
  return (
    <section className="space-y-3">
      <h2 className="text-section">{heading}</h2>
      <ul className="border-t border-soot">
        {kilns.map((kiln) => (
          <li
            key={kiln.id}
            className="flex flex-wrap items-center justify-between gap-x-8 gap-y-2 border-b border-line py-4"
          >
            <div className="min-w-0 space-y-1">
              <h3 className="text-lead">
                <Link
                  to={paths.kiln(kiln.id)}
                  className="text-soot underline decoration-line decoration-1 underline-offset-4 hover:decoration-verdigris hover:decoration-2"
                >
                  {kiln.fields.name}
                </Link>
              </h3>
              <p className="text-small text-soot-2">
                {kiln.volumeLitres !== null && (
                  <>
                    <Reading>{formatChamber(kiln.volumeLitres, units)}</Reading>
                    {', '}
                  </>
                )}
                {kiln.fields.wall !== null && `${WALLS[kiln.fields.wall].toLowerCase()}, `}
                {FUELS[kiln.fields.fuel].toLowerCase()}
                {kiln.lentTo.length > 0 &&
                  `${FACT_SEPARATOR}lent to ${kiln.lentTo.map(({ name }) => name).join(', ')}`}
                {heading !== 'Yours' &&
                  kiln.keeper &&
                  `${FACT_SEPARATOR}kept by ${kiln.keeper.name}`}
              </p>
            </div>
            <div className="flex flex-wrap gap-3">
              {kiln.abilities.edit && <LinkButton to={paths.editKiln(kiln.id)}>Alter</LinkButton>}
              {kiln.abilities.fire && (
                <LinkButton to={paths.newNote({ kilnId: kiln.id })}>Write up a firing</LinkButton>
              )}
            </div>
          </li>
        ))}
      </ul>
    </section>
  );
}
