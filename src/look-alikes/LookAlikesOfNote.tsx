import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import type { Units } from '#shared/units/units.ts';
import { Button } from '../ui/Button.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { noneAlikeWords } from './alike-words.ts';
import { lookAlikeQueries } from './look-alike-queries.ts';
import { LookAlikeRows } from './LookAlikeRows.tsx';

const SHOWN_FIRST = 3;

interface Props {
  readonly noteId: number;
  readonly revision: number;
  readonly units: Units;
}

/** Under a published note with a record: firings that climbed like it, its own kiln's among them. */
export function LookAlikesOfNote({ noteId, revision, units }: Props) {
  const alike = useQuery(lookAlikeQueries.ofNote(noteId, revision));
  // A record too short to have a climb.
  if (alike.data?.climb === null) return null;
  return (
    <section aria-labelledby="look-alikes" className="not-in-print space-y-3">
      <h2 id="look-alikes" className="text-section">
        Firings that climbed like this
      </h2>
      {alike.isPending && (
        <Skeleton words="Firings alike are being looked for" shape="rows" count={SHOWN_FIRST} />
      )}
      {alike.isError && (
        <Notice
          kind="error"
          action={<Button onClick={() => void alike.refetch()}>Try again</Button>}
        >
          The firings alike could not be looked for. {alike.error.message}
        </Notice>
      )}
      {alike.data &&
        (alike.data.hits.length > 0 ? (
          <LookAlikeRows
            climb={alike.data.climb}
            hits={alike.data.hits}
            units={units}
            ownWord="this one"
            shownFirst={SHOWN_FIRST}
          />
        ) : (
          <p className="max-w-measure text-soot-2">{noneAlikeWords(alike.data.compared, units)}</p>
        ))}
      <p className="text-small">
        <Link to={paths.lookAlikes} className="link">
          Compare a record of yours
        </Link>
      </p>
    </section>
  );
}
