import type { ReactNode } from 'react';
import type { FindingDispute } from '#shared/api/disputes.ts';
import type { NotePageData } from '#shared/api/notes.ts';
import { findingText, type Finding } from '#shared/firing/findings.ts';
import { disputeAbout, leavesFigures, levelAnswerAbout } from '#shared/note/finding-disputes.ts';
import type { Units } from '#shared/units/units.ts';

interface Props {
  readonly page: Pick<NotePageData, 'findings' | 'disputes' | 'levelAnswers'>;
  readonly units: Units;
  /** What can be done about one: disagreed with, taken back. */
  readonly actOn?: (finding: Finding, dispute: FindingDispute | null) => ReactNode;
}

const ANSWERED = {
  meant: 'The author says it was meant.',
  stuck: 'The author says it was stuck.',
} as const;

/** What was read off a record, in sentences, each with what its author and a moderator say to it. */
export function FindingList({ page, units, actOn }: Props) {
  const { findings, disputes, levelAnswers } = page;
  return (
    <ul className="max-w-measure text-small">
      {findings.map((finding) => {
        const dispute = disputeAbout(finding, findings, disputes);
        const answer = levelAnswerAbout(finding, levelAnswers);
        const counts = dispute === null || !leavesFigures(dispute);
        return (
          <li
            key={`${finding.code}-${String(finding.fromMinute)}`}
            className="grid items-start gap-x-6 border-b border-line py-1.5 sm:grid-cols-[minmax(0,1fr)_auto]"
          >
            <div className="min-w-0">
              <p className={finding.trouble && counts ? 'font-[600]' : ''}>
                {findingText(finding, units)}
              </p>
              {answer && <p className="text-soot-2">{ANSWERED[answer.answer]}</p>}
              {dispute && <DisputeWords dispute={dispute} />}
            </div>
            {actOn?.(finding, dispute)}
          </li>
        );
      })}
    </ul>
  );
}

/** The author’s disagreement and the moderator’s answer, set off from the server’s sentence. */
export function DisputeWords({ dispute }: { readonly dispute: FindingDispute }) {
  return (
    <div className="mt-1 mb-1.5 space-y-1 border-l-2 border-soot-2 pl-3">
      <p>
        <span className="text-soot-2">The author disagrees: </span>“{dispute.sentence}”
      </p>
      <AnswerWords dispute={dispute} />
    </div>
  );
}

function AnswerWords({ dispute }: { readonly dispute: FindingDispute }) {
  const { answer, state, id } = dispute;
  if (state === 'restored') {
    return (
      <p>
        <span className="text-soot-2">A moderator looked and keeps the finding: </span>“
        {answer?.sentence ?? ''}”
      </p>
    );
  }
  if (state === 'left') {
    const said = answer?.sentence ?? '';
    return (
      <p>
        <span className="text-soot-2">
          A moderator looked and leaves it out of the figures{said === '' ? '.' : ': '}
        </span>
        {said !== '' && `“${said}”`}
      </p>
    );
  }
  return (
    <p className="text-soot-2">
      {id === null
        ? 'Once published it counts in no figure, until a moderator restores it.'
        : 'It counts in no figure, until a moderator restores it.'}
    </p>
  );
}
