import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { OutboxState } from '#shared/api/admin.ts';
import { momentWords } from '../notes/note-words.ts';
import { Button } from '../ui/Button.tsx';
import { DataTable } from '../ui/DataTable.tsx';
import { FiringSheet } from '../ui/FiringSheet.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { retryJob } from './admin-mutations.ts';
import { adminQueries } from './admin-queries.ts';
import { AdminFrame } from './AdminFrame.tsx';
import { ReindexControl } from './ReindexControl.tsx';
import { waitWords } from './wait-words.ts';

/** Promised work that is still to be done, and whether the search has caught up. */
export function AdminStatePage() {
  const outbox = useQuery(adminQueries.outbox());
  return (
    <AdminFrame
      title="State"
      lead="Mails and changes of the search index are promised together with what causes them, and done soon after. Looked at again every five seconds."
      query={outbox}
    >
      {outbox.isPending && <Skeleton words="The state is being fetched" shape="sheet" count={6} />}
      {outbox.isRefetchError && (
        <Notice kind="caution" appeared heading="This is how it was a while ago">
          {outbox.error.message}
        </Notice>
      )}
      {outbox.data && <State state={outbox.data} />}
    </AdminFrame>
  );
}

function State({ state }: { readonly state: OutboxState }) {
  const { index } = state;
  const difference = index.inIndex === null ? null : index.inDatabase - index.inIndex;
  return (
    <div className="space-y-10">
      <FiringSheet
        headingLevel={2}
        blanks="dash"
        groups={[
          {
            heading: 'Promised work',
            rows: [
              { label: 'Waiting', value: state.waiting, reading: true },
              {
                label: 'Oldest waits',
                value:
                  state.oldestWaitingSeconds === null
                    ? null
                    : waitWords(state.oldestWaitingSeconds),
                reading: true,
              },
              { label: 'Failed so far', value: state.failed.length, reading: true },
            ],
          },
          {
            heading: 'Search index',
            rows: [
              { label: 'Engine', value: index.available ? 'answers' : 'away' },
              { label: 'Published notes', value: index.inDatabase, reading: true },
              { label: 'In the index', value: index.inIndex, reading: true },
              { label: 'Difference', value: difference, reading: true },
              { label: 'On their way', value: index.behind, reading: true },
            ],
          },
        ]}
      />
      {!index.available && (
        <Notice kind="caution" heading="The search engine is away">
          Notes are published and read as ever. Searching says that it is away, and the index
          catches up by itself once the engine is back.
        </Notice>
      )}
      <ReindexControl engineAvailable={index.available} />
      <FailedJobs failed={state.failed} />
    </div>
  );
}

/** A time that is well past is one of a job that was given up. */
function nextTryWords(nextTryAt: string): string {
  const isPast = Date.now() - new Date(nextTryAt).getTime() > 5 * 60_000;
  return isPast ? 'not by itself' : momentWords(nextTryAt);
}

const TOPICS: Readonly<Record<string, string>> = { mail: 'Mail', 'index-note': 'Search index' };

function FailedJobs({ failed }: { readonly failed: OutboxState['failed'] }) {
  const client = useQueryClient();
  const tell = useMessages();
  const retrying = useMutation({
    mutationFn: retryJob,
    networkMode: 'always',
    onSuccess: ({ message }) => tell({ kind: 'done', text: message }),
    onError: (error, id) =>
      tell({
        kind: 'error',
        text: `It was not tried again: ${error.message}`,
        action: { label: 'Try again', onClick: () => retrying.mutate(id) },
      }),
    onSettled: () => client.invalidateQueries({ queryKey: adminQueries.outbox().queryKey }),
  });
  return (
    <section aria-labelledby="failed" className="space-y-3">
      <h2 id="failed" className="text-section">
        Failed so far
      </h2>
      {failed.length === 0 ? (
        <p className="border-t border-soot pt-3 text-small text-soot-2">
          Nothing has failed. What fails is tried again by itself, with growing waits.
        </p>
      ) : (
        <DataTable
          caption="Jobs that failed at least once and are not done"
          captionHidden
          rows={failed}
          rowKey={({ id }) => id}
          columns={[
            {
              key: 'what',
              heading: 'What',
              cell: ({ topic, key }) => (
                <>
                  {TOPICS[topic] ?? topic}
                  <span className="block font-[400] text-note break-all text-soot-2">{key}</span>
                </>
              ),
            },
            { key: 'tries', heading: 'Tries', figures: true, cell: ({ attempts }) => attempts },
            {
              key: 'why',
              heading: 'Why',
              cell: ({ lastError }) => <span className="break-words">{lastError}</span>,
            },
            { key: 'next', heading: 'Next try', cell: ({ nextTryAt }) => nextTryWords(nextTryAt) },
            {
              key: 'act',
              heading: 'Act',
              cell: (job) => (
                <span className="whitespace-nowrap">
                  <Button
                    kind="quiet"
                    icon="retry"
                    label={`Try now: ${TOPICS[job.topic] ?? job.topic} ${job.key}`}
                    busy={retrying.isPending && retrying.variables === job.id}
                    onClick={() => {
                      if (!retrying.isPending) retrying.mutate(job.id);
                    }}
                  >
                    Try now
                  </Button>
                </span>
              ),
            },
          ]}
        />
      )}
    </section>
  );
}
