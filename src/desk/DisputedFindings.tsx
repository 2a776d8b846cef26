import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { DisputedFindings as List } from '#shared/api/disputes.ts';
import { findingText } from '#shared/firing/findings.ts';
import { DISPUTE_SENTENCE, isReason } from '#shared/note/finding-disputes.ts';
import { paths } from '#shared/paths.ts';
import type { Units } from '#shared/units/units.ts';
import { DisputeWords } from '../notes/FindingList.tsx';
import { momentWords } from '../notes/note-words.ts';
import { FACT_SEPARATOR } from '../ui/fact-separator.ts';
import { Button } from '../ui/Button.tsx';
import { Disclosure } from '../ui/Disclosure.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { TextArea } from '../ui/TextArea.tsx';
import { disputeQueries, useAnswerDispute } from './dispute-queries.ts';

type Row = List['disputes'][number];

/** What authors dispute in published notes: to be restored to the figures, or left out. */
export function DisputedFindings({ units }: { readonly units: Units }) {
  const list = useQuery(disputeQueries.list());
  const disputes = list.data?.disputes ?? [];
  const open = disputes.filter(({ dispute }) => dispute.state === 'disputed');
  const answered = disputes.filter(({ dispute }) => dispute.state !== 'disputed');
  return (
    <section aria-labelledby="disputed" className="space-y-3">
      <h2 id="disputed" className="text-section">
        Disputed findings
      </h2>
      <p className="max-w-measure text-small text-soot-2">
        Their authors disagree with these. They count in no figure until you restore them; the
        author is told either way.
      </p>
      {list.isPending && <Skeleton words="The disputed findings are being fetched" shape="text" />}
      {list.isError && !list.data && (
        <Notice
          kind="error"
          action={<Button onClick={() => void list.refetch()}>Try again</Button>}
        >
          {list.error.message}
        </Notice>
      )}
      {list.data && open.length === 0 && (
        <p className="text-small">
          {answered.length === 0 ? 'None is disputed.' : 'Every one has been looked at.'}
        </p>
      )}
      {open.length > 0 && (
        <ul className="border-t border-soot">
          {open.map((row) => (
            <DisputeRow key={row.dispute.id} row={row} units={units} />
          ))}
        </ul>
      )}
      {answered.length > 0 && (
        <Disclosure summary={`Looked at: ${String(answered.length)}`}>
          <ul className="border-t border-line text-body">
            {answered.map((row) => (
              <DisputeRow key={row.dispute.id} row={row} units={units} />
            ))}
          </ul>
        </Disclosure>
      )}
    </section>
  );
}

interface RowProps {
  readonly row: Row;
  readonly units: Units;
}

function DisputeRow({ row, units }: RowProps) {
  const { note, finding, dispute, author, own } = row;
  return (
    <li className="grid gap-x-10 gap-y-3 border-b border-line py-4 lg:grid-cols-2">
      <div className="min-w-0 space-y-1">
        <h3 className="text-lead">
          <Link
            to={paths.note(note.id, note.slug)}
            className="text-soot underline decoration-line decoration-1 underline-offset-4 hover:decoration-verdigris hover:decoration-2"
          >
            {note.title || 'Untitled'}
          </Link>
        </h3>
        <p className="text-small text-soot-2">
          {[author?.name ?? 'A former member', momentWords(dispute.at)].join(FACT_SEPARATOR)}
        </p>
        <p className="max-w-measure text-small font-[600]">{findingText(finding, units)}</p>
        <div className="max-w-measure text-small">
          <DisputeWords dispute={dispute} />
        </div>
      </div>
      {own ? (
        <p className="text-small text-soot-2">Your own: another moderator looks at it.</p>
      ) : (
        <AnswerForm row={row} said={findingText(finding, units)} />
      )}
    </li>
  );
}

function AnswerForm({ row, said }: { readonly row: Row; readonly said: string }) {
  const { id, version, state } = row.dispute;
  const [sentence, setSentence] = useState('');
  const [asked, setAsked] = useState(false);
  const answer = useAnswerDispute();
  const give = (decision: 'restore' | 'leave'): void => {
    if (decision === 'restore') {
      setAsked(true);
      if (!isReason(sentence)) return;
    }
    answer.mutate(
      { id, version, body: { decision, sentence: sentence.trim() } },
      {
        onSuccess: () => {
          setSentence('');
          setAsked(false);
        },
      },
    );
  };
  return (
    <form
      className="@container min-w-0 space-y-3"
      aria-label={`Answer: ${said}`}
      onSubmit={(event) => {
        event.preventDefault();
        give('restore');
      }}
    >
      <TextArea
        label="Your sentence"
        hint={`Readers and the author see it. Needed to keep the finding: ${String(DISPUTE_SENTENCE.fewest)} characters or more.`}
        value={sentence}
        onValue={setSentence}
        rows={2}
        maxLength={DISPUTE_SENTENCE.most}
        issues={
          asked && !isReason(sentence)
            ? [{ kind: 'must-mend', text: 'Say in a sentence why the finding is kept.' }]
            : undefined
        }
      />
      {answer.isError && (
        <Notice kind="error" appeared>
          {answer.error.message} What you wrote is still here.
        </Notice>
      )}
      <div className="flex flex-wrap gap-3">
        {state !== 'restored' && (
          <Button kind="main" type="submit" busy={answer.isPending}>
            Keep the finding
          </Button>
        )}
        {state !== 'left' && (
          <Button busy={answer.isPending} onClick={() => give('leave')}>
            Leave it out
          </Button>
        )}
      </div>
    </form>
  );
}
