import { Link, useLocation } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { useSession } from '../accounts/useSession.ts';
import { Button } from '../ui/Button.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { AskForm } from './AskForm.tsx';
import { QuestionRow } from './QuestionRow.tsx';
import { useNoteQuestions } from './useNoteQuestions.ts';

/** What readers asked about a published note, what was answered, and a way to ask. */
export function NoteQuestions({ noteId }: { readonly noteId: number }) {
  const ofNote = useNoteQuestions(noteId);
  const { list } = ofNote;
  return (
    <section aria-labelledby="questions" className="space-y-3">
      <h2 id="questions" tabIndex={-1} className="text-section outline-none">
        Questions
      </h2>
      {list.isPending && <Skeleton words="Questions are being fetched" shape="sheet" count={2} />}
      {list.isError && !list.data && (
        <Notice
          kind="error"
          action={<Button onClick={() => void list.refetch()}>Try again</Button>}
        >
          The questions could not be fetched: {list.error.message}
        </Notice>
      )}
      {list.data && (
        <>
          {list.data.questions.length > 0 ? (
            <ol className="border-t border-soot">
              {list.data.questions.map((question) => (
                <QuestionRow key={question.id} question={question} ofNote={ofNote} />
              ))}
            </ol>
          ) : (
            <p className="text-soot-2">None asked yet.</p>
          )}
          {list.data.abilities.ask ? <AskForm ofNote={ofNote} /> : <WhyNot />}
        </>
      )}
    </section>
  );
}

/** For readers who cannot ask: what would let them. Nothing for the note's own author. */
function WhyNot() {
  const { me, known } = useSession();
  const { pathname } = useLocation();
  if (!known || me?.emailVerified) return null;
  return (
    <p className="not-in-print text-small">
      {me ? (
        <>
          <Link to={`${paths.settings}#address`} className="link">
            Confirm your address
          </Link>{' '}
          to ask a question.
        </>
      ) : (
        <>
          <Link to={paths.signIn(pathname)} className="link">
            Sign in
          </Link>{' '}
          to ask the author a question.
        </>
      )}
    </p>
  );
}
