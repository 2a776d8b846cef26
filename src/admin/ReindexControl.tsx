import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { ReindexState } from '#shared/api/admin.ts';
import { momentWords } from '../notes/note-words.ts';
import { Button } from '../ui/Button.tsx';
import { ProgressBar } from '../ui/ProgressBar.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { cancelReindex, startReindex } from './admin-mutations.ts';
import { adminQueries } from './admin-queries.ts';

const OUTCOMES: Readonly<Record<NonNullable<ReindexState['last']>['outcome'], string>> = {
  finished: 'The last one was finished',
  cancelled: 'The last one was stopped, and the index left as it was,',
  failed: 'The last one failed, and the index was left as it was,',
};

/** Makes the index anew from the database while the old one goes on answering. */
export function ReindexControl({ engineAvailable }: { readonly engineAvailable: boolean }) {
  const client = useQueryClient();
  const tell = useMessages();
  const state = useQuery(adminQueries.reindex());
  const keep = (next: ReindexState): void => {
    client.setQueryData(adminQueries.reindex().queryKey, next);
  };
  const starting = useMutation({
    mutationFn: startReindex,
    networkMode: 'always',
    onSuccess: keep,
    onError: (error) =>
      tell({
        kind: 'error',
        text: `It was not started: ${error.message}`,
        action: { label: 'Try again', onClick: () => starting.mutate() },
      }),
  });
  const stopping = useMutation({
    mutationFn: cancelReindex,
    networkMode: 'always',
    onSuccess: keep,
    onError: (error) => tell({ kind: 'error', text: error.message }),
    onSettled: () => client.invalidateQueries({ queryKey: adminQueries.reindex().queryKey }),
  });
  const running = state.data?.running ?? false;
  const last = state.data?.last ?? null;
  return (
    <section aria-labelledby="reindex" className="space-y-3">
      <h2 id="reindex" className="text-section">
        Make the index anew
      </h2>
      <p className="max-w-measure text-small text-soot-2">
        For when the difference does not go away. The index in use answers until the new one takes
        its place.
      </p>
      {running && state.data ? (
        <div className="max-w-measure">
          <ProgressBar
            label="Notes put into the new index"
            done={state.data.done}
            of={state.data.of}
            words={
              state.data.of === 0
                ? 'beginning'
                : `${String(state.data.done)} of ${String(state.data.of)}`
            }
            cancel={
              <Button
                busy={stopping.isPending}
                onClick={() => {
                  if (!stopping.isPending) stopping.mutate();
                }}
              >
                Stop
              </Button>
            }
          />
        </div>
      ) : (
        <Button
          icon="retry"
          disabled={!engineAvailable || state.isPending}
          busy={starting.isPending}
          describedBy="reindex-last"
          onClick={() => starting.mutate()}
        >
          Make it anew
        </Button>
      )}
      <p id="reindex-last" role="status" className="text-small text-soot-2">
        {!engineAvailable && !running && 'Not while the engine is away. '}
        {!running && last && `${OUTCOMES[last.outcome]} on ${momentWords(last.at)}.`}
      </p>
    </section>
  );
}
