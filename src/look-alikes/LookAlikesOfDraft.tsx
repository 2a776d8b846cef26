import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Draft } from '#shared/api/notes.ts';
import type { Units } from '#shared/units/units.ts';
import { Button } from '../ui/Button.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { noneAlikeWords } from './alike-words.ts';
import { lookAlikeQueries } from './look-alike-queries.ts';
import { LookAlikeRows } from './LookAlikeRows.tsx';

const SHOWN_FIRST = 4;

interface Props {
  readonly draft: Draft;
  readonly units: Units;
}

/** In Write beside the record: published firings that climbed like it, looked for when asked. */
export function LookAlikesOfDraft({ draft, units }: Props) {
  const [isOpen, setIsOpen] = useState(false);
  const { record, plan } = draft.fields;
  const hasRecord =
    record.recordId === null
      ? record.typedRows.filter(({ minute, celsius }) => minute !== null && celsius !== null)
          .length > 2
      : draft.record?.status === 'ready';
  const saved = JSON.stringify([record, plan.targetCelsius, plan.drawnBecause]);
  const alike = useQuery({
    ...lookAlikeQueries.ofDraft(draft.id, saved),
    enabled: isOpen && hasRecord,
  });
  if (!hasRecord) return null;
  return (
    <section aria-label="Firings that climbed like this" className="space-y-3">
      <Button expanded={isOpen} onClick={() => setIsOpen(!isOpen)}>
        {isOpen ? 'Fold the firings alike away' : 'Find firings that climbed like this'}
      </Button>
      {isOpen && alike.isPending && (
        <Skeleton words="Firings alike are being looked for" shape="rows" count={SHOWN_FIRST} />
      )}
      {isOpen && alike.isError && (
        <Notice
          kind="error"
          appeared
          action={<Button onClick={() => void alike.refetch()}>Try again</Button>}
        >
          The firings alike could not be looked for. {alike.error.message}
        </Notice>
      )}
      {isOpen &&
        alike.data &&
        (alike.data.climb === null ? (
          <p className="max-w-measure text-soot-2">
            There is no climb in this record yet: it takes at least five minutes of one.
          </p>
        ) : alike.data.hits.length > 0 ? (
          <LookAlikeRows
            climb={alike.data.climb}
            hits={alike.data.hits}
            units={units}
            ownWord="yours"
            shownFirst={SHOWN_FIRST}
          />
        ) : (
          <p className="max-w-measure text-soot-2">{noneAlikeWords(alike.data.compared, units)}</p>
        ))}
    </section>
  );
}
