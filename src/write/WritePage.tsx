import { useQuery } from '@tanstack/react-query';
import { useEffect, useMemo, useState } from 'react';
import { useParams } from 'react-router-dom';
import type { Me } from '#shared/api/accounts.ts';
import type { Kiln } from '#shared/api/kilns.ts';
import type { Draft } from '#shared/api/notes.ts';
import { useSession } from '../accounts/useSession.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { noteQueries } from '../notes/note-queries.ts';
import { Skeleton } from '../ui/Skeleton.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';
import { ConflictScreen } from './ConflictScreen.tsx';
import { DraftForm } from './DraftForm.tsx';
import type { DraftKeeper } from './draft-keeper.ts';
import type { FormKiln } from './form-context.ts';
import { kilnQueries } from '../kilns/kiln-queries.ts';
import { ReadOnlyDraft } from './ReadOnlyDraft.tsx';
import { useDraftActs } from './useDraftActs.ts';
import { useDraftKeeper } from './useDraftKeeper.ts';
import type { KeptDraft } from './save-state.ts';

/** One's own note: written here, or, while it cannot be edited, shown with what can be done. */
export function WritePage() {
  const { id } = useParams();
  const noteId = Number(id);
  const { me } = useSession();
  // Never from a cache: a form must stand on what the server has now.
  const draft = useQuery({ ...noteQueries.draft(noteId), gcTime: 0 });
  const kilns = useQuery(kilnQueries.mine());
  usePageTitle(draft.data ? draft.data.fields.title || 'A new note' : null);
  const failed = [draft, kilns].find(({ isError, data }) => isError && data === undefined);
  if (failed) {
    return (
      <ProblemPage
        error={failed.error}
        onRetry={() => {
          void draft.refetch();
          void kilns.refetch();
        }}
      />
    );
  }
  if (!draft.data || !kilns.data || !me) {
    return (
      <div className="space-y-8">
        <Skeleton words="Your note is being fetched" shape="text" count={2} />
        <Skeleton words="Its strip is being fetched" shape="strip" />
        <Skeleton words="Its fields are being fetched" shape="sheet" count={10} />
      </div>
    );
  }
  return (
    <KeptNote
      key={`${String(me.id)} ${String(noteId)}`}
      latest={draft.data}
      kilns={kilns.data.kilns}
      me={me}
      onAskAgain={() => void draft.refetch()}
    />
  );
}

interface Props {
  /** What the server said last; the keeper takes it over unless something here is unsent. */
  readonly latest: Draft;
  readonly kilns: readonly Kiln[];
  readonly me: Me;
  readonly onAskAgain: () => void;
}

function KeptNote({ latest, kilns, me, onAskAgain }: Props) {
  const { temperature, system } = useSession().units;
  // One object as long as it says the same: parts of the form are drawn anew when it changes.
  const units = useMemo(() => ({ temperature, system }), [temperature, system]);
  const [kept, keeper] = useDraftKeeper(me.id, latest);
  const acts = useDraftActs(keeper, latest.id);
  const kiln = useFormKiln(kilns, kept);
  useNewerDraft(keeper, latest);
  // Never under the typist's hands: the form stays until its author asks to see both versions.
  const [seesBoth, setSeesBoth] = useState(kept.state.kind === 'conflict');
  if (kept.state.kind === 'conflict' && seesBoth) {
    return (
      <ConflictScreen
        mine={kept.fields}
        theirs={kept.state.theirs}
        theirsAt={kept.state.theirsAt}
        units={units}
        onSettle={(choice) => {
          keeper.settle(choice);
          setSeesBoth(false);
          if (choice === 'theirs') onAskAgain();
        }}
      />
    );
  }
  if (!kept.draft.abilities.edit) {
    return <ReadOnlyDraft draft={kept.draft} units={units} acts={acts} />;
  }
  return (
    <DraftForm
      kept={kept}
      keeper={keeper}
      kilns={kilns}
      kiln={kiln}
      units={units}
      emailVerified={me.emailVerified}
      acts={acts}
      onSeeBoth={() => setSeesBoth(true)}
    />
  );
}

/** Takes over what the server said when it was asked again, unless that is older or work is unsent. */
function useNewerDraft(keeper: DraftKeeper, latest: Draft): void {
  useEffect(() => {
    const { draft } = keeper.current();
    if (latest !== draft && !keeper.hasUnsent && latest.version >= draft.version) {
      keeper.accept(latest);
    }
  }, [keeper, latest]);
}

/** The kiln of the draft: among one's own, or asked for by itself when it is lent no longer. */
function useFormKiln(kilns: readonly Kiln[], { fields }: KeptDraft): FormKiln | null {
  const mine = kilns.find(({ id }) => id === fields.kilnId) ?? null;
  const other = useQuery({
    ...kilnQueries.page(fields.kilnId ?? 0),
    enabled: fields.kilnId !== null && mine === null,
  });
  if (fields.kilnId === null) return null;
  return mine ?? other.data ?? null;
}
