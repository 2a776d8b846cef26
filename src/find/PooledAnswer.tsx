import { Link } from 'react-router-dom';
import type { FindAnswer } from '#shared/api/search.ts';
import { paths } from '#shared/paths.ts';
import { CHANGES } from '#shared/vocabulary/changes.ts';
import { TROUBLE_SHORT } from '#shared/vocabulary/troubles.ts';
import { ChangeCaution } from '../figures/ChangeCaution.tsx';
import { SOURCE_WORDS } from '../figures/helped-words.ts';
import { Reading } from '../ui/Reading.tsx';

type Pooled = NonNullable<FindAnswer['pooled']>;

const VERDICTS: Readonly<Record<Pooled['rows'][number]['verdict'], string | null>> = {
  better: 'better than no change',
  worse: 'worse than no change',
  'cannot-be-told': 'cannot be told from no change',
  'too-few': 'too few to say',
  reference: null,
};

/** What was tried next for the trouble asked about, in two lines, with no change beside it. */
export function PooledAnswer({ pooled }: { readonly pooled: Pooled }) {
  const trouble = TROUBLE_SHORT[pooled.trouble];
  const tried = pooled.rows.filter((row) => row.change !== null);
  const unchanged = pooled.rows.find((row) => row.change === null);
  const cautions = tried.flatMap(({ caution }) => (caution === null ? [] : [caution]));
  const counted = (
    <>
      <Reading>{String(pooled.pairs)}</Reading> {pooled.pairs === 1 ? 'firing' : 'firings'} with “
      {trouble}” ({SOURCE_WORDS[pooled.source]}, {pooled.startClass} starts)
    </>
  );
  return (
    <section aria-labelledby="pooled" className="space-y-2 border-y border-soot py-3">
      <h2 id="pooled" className="sr-only">
        What was tried next
      </h2>
      <p>
        {tried.length > 0 ? (
          <>Of {counted} that have a next firing to compare, what was tried next: </>
        ) : (
          <>Too few to say what helped: {counted} so far, with a next firing to compare; </>
        )}
        {tried.map((row) => (
          <span key={row.change}>
            <strong className="font-[650]">
              {row.change === null ? '' : CHANGES[row.change].toLowerCase()}
            </strong>
            , gone <Reading>{`${String(row.gone)} of ${String(row.firings)}`}</Reading>{' '}
            <span className="text-small text-soot-2">
              ({row.members} members
              {VERDICTS[row.verdict] ? `; ${VERDICTS[row.verdict] ?? ''}` : ''})
            </span>
            {'; '}
          </span>
        ))}
        <strong className="font-[650]">no change named</strong>
        {unchanged && unchanged.firings > 0 ? (
          <>
            , gone <Reading>{`${String(unchanged.gone)} of ${String(unchanged.firings)}`}</Reading>
          </>
        ) : (
          ', none to compare with'
        )}
        .
      </p>
      {cautions.map((caution) => (
        <ChangeCaution key={caution} caution={caution} />
      ))}
      <p className="text-small text-soot-2">
        <Link to={paths.whatHelpedWith(pooled.trouble)} className="link">
          What helped with {trouble}: every change, its interval and its notes
        </Link>
        . What members report, not proof.
      </p>
    </section>
  );
}
