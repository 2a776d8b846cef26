import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { CAUTIOUS_CHANGES, CHANGES, type Change } from '#shared/vocabulary/changes.ts';
import { dayWords } from '../notes/note-words.ts';
import { noteQueries } from '../notes/note-queries.ts';
import { Button } from '../ui/Button.tsx';
import { ChoiceField } from '../ui/ChoiceField.tsx';
import { IssueList } from '../ui/IssueList.tsx';
import { optionsOf } from '../ui/options.ts';
import { SelectField } from '../ui/SelectField.tsx';
import { answerChange, answerToChange, sayPurpose } from './change-answers.ts';
import { LineAt } from './FieldsAt.tsx';
import { useWriteForm } from './form-context.ts';
import { PinnedField } from './PinnedField.tsx';
import { WriteSection } from './WriteSection.tsx';

const ANSWERS = { meant: 'Meant', 'not-meant': 'Not on purpose' } as const;
const MOST_CHANGES = 20;

/** What was done differently from the firing before, and what each change was for. */
export function ChangesSection() {
  const { fields, draft, reading, issuesAt, marginAt } = useWriteForm();
  const { earlier } = draft;
  const proposed = new Set(reading.proposedChanges.map(({ change }) => change));
  const added = fields.changes.filter(({ change }) => !proposed.has(change));
  return (
    <WriteSection
      id="changes"
      title="Changes since the firing before"
      lead={
        earlier ? (
          <>
            Compared with{' '}
            <Link
              className="link"
              to={
                earlier.status === 'published'
                  ? paths.note(earlier.noteId, earlier.slug)
                  : paths.write(earlier.noteId)
              }
            >
              {earlier.title || 'an untitled note'}
            </Link>{' '}
            of {dayWords(earlier.firedOn)}. What was changed during the firing is read from its
            marks.
          </>
        ) : (
          'No earlier firing of this kiln is written up, so nothing is proposed. You can still name what you did differently.'
        )
      }
    >
      <PinnedField pointer="/changes">
        <IssueList issues={issuesAt('/changes')} />
        {marginAt('/changes')}
        <ul className="border-t border-soot-2">
          {reading.proposedChanges.map(({ change, text }) => (
            <Proposal key={change} change={change} text={text} />
          ))}
          {added.map(({ change }) => (
            <li key={change} className="space-y-1 border-b border-line py-3">
              <div className="flex flex-wrap items-baseline justify-between gap-x-6">
                <p className="font-[600]">{CHANGES[change]}</p>
                <Removal change={change} />
              </div>
              <Purpose change={change} />
            </li>
          ))}
        </ul>
        <AnotherChange />
        <TriedNote />
      </PinnedField>
    </WriteSection>
  );
}

/** A difference the server found: meant, or not on purpose. */
function Proposal({ change, text }: { readonly change: Change; readonly text: string }) {
  const { fields, change: put } = useWriteForm();
  const answer = answerToChange(fields, change);
  return (
    <li className="space-y-1 border-b border-line py-3">
      <p>
        <span className="font-[600]">{CHANGES[change]}</span>
        <span className="text-small text-soot-2">: {text}</span>
      </p>
      <ChoiceField
        label={`${CHANGES[change]}: was it meant?`}
        labelHidden
        value={answer}
        onValue={(next) => put((now) => answerChange(now, change, next))}
        options={optionsOf(ANSWERS)}
      />
      {answer === 'meant' && <Purpose change={change} />}
    </li>
  );
}

/** What it was for; with its caution where a change can hurt somebody. */
function Purpose({ change }: { readonly change: Change }) {
  const { fields, change: put } = useWriteForm();
  const row = fields.changes.findIndex((each) => each.change === change);
  const caution = CAUTIOUS_CHANGES[change];
  return (
    <>
      <LineAt
        pointer={`/changes/${String(row)}/purpose`}
        label="What it was for"
        maxLength={200}
        value={fields.changes[row]?.purpose ?? ''}
        onValue={(purpose) => put((now) => sayPurpose(now, change, purpose))}
      />
      {caution && (
        <p className="max-w-measure border-l-2 border-caution pl-2.5 text-small text-caution">
          <strong className="font-[650]">Take care.</strong> {caution}
        </p>
      )}
    </>
  );
}

function Removal({ change }: { readonly change: Change }) {
  const { change: put } = useWriteForm();
  return (
    <Button
      kind="quiet"
      icon="remove"
      label={`Take out: ${CHANGES[change]}`}
      onClick={() => put((now) => answerChange(now, change, null))}
    >
      Take out
    </Button>
  );
}

function AnotherChange() {
  const { fields, change: put } = useWriteForm();
  const [chosen, setChosen] = useState<Change | null>(null);
  const left = optionsOf(CHANGES).filter(
    ({ value }) => !fields.changes.some(({ change }) => change === value),
  );
  const isFull = fields.changes.length >= MOST_CHANGES;
  return (
    <div className="space-y-2 py-3">
      <SelectField
        label="Another change"
        value={chosen}
        onValue={setChosen}
        options={left}
        disabled={isFull}
        {...(isFull ? { hint: `At most ${String(MOST_CHANGES)} changes.` } : {})}
      />
      <Button
        icon="add"
        disabled={chosen === null || isFull}
        onClick={() => {
          if (chosen === null) return;
          put((now) => answerChange(now, chosen, 'meant'));
          setChosen(null);
        }}
      >
        Add this change
      </Button>
    </div>
  );
}

/** The note whose change this firing tried; the author may say that it did not, after all. */
function TriedNote() {
  const { fields, change: put, issuesAt, marginAt } = useWriteForm();
  const { triedNoteId } = fields;
  const tried = useQuery({
    ...noteQueries.page(triedNoteId ?? 0),
    enabled: triedNoteId !== null,
  });
  if (triedNoteId === null) return null;
  return (
    <PinnedField pointer="/triedNoteId">
      <div className="space-y-1 border-t border-line py-3 text-small">
        <p>
          This firing tried a change from{' '}
          <Link className="link" to={paths.note(triedNoteId, tried.data?.slug ?? '')}>
            {tried.data?.row.title ?? 'another member’s note'}
          </Link>
          .
        </p>
        <Button kind="quiet" onClick={() => put((now) => ({ ...now, triedNoteId: null }))}>
          It did not, after all
        </Button>
        <IssueList issues={issuesAt('/triedNoteId')} />
        {marginAt('/triedNoteId')}
      </div>
    </PinnedField>
  );
}
