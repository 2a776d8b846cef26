import { useEffect, useRef, useState, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { NoteAnswer, NoteQuestion } from '#shared/api/questions.ts';
import { paths } from '#shared/paths.ts';
import { momentWords } from '../notes/note-words.ts';
import { Button } from '../ui/Button.tsx';
import { FACT_SEPARATOR } from '../ui/fact-separator.ts';
import { AnswerForm } from './AnswerForm.tsx';
import { RemoveQuestion } from './RemoveQuestion.tsx';
import type { OfNote } from './useNoteQuestions.ts';

interface Props {
  readonly question: NoteQuestion;
  readonly ofNote: OfNote;
}

/** One question with its answers, ruled like the sheet: who and when, then the words. */
export function QuestionRow({ question, ofNote }: Props) {
  const [answering, setAnswering] = useState(false);
  const opener = useRef<HTMLButtonElement>(null);
  const wasAnswering = useRef(false);
  // The form goes: the focus goes back to what opened it.
  useEffect(() => {
    if (wasAnswering.current && !answering) opener.current?.focus();
    wasAnswering.current = answering;
  }, [answering]);

  const { answer, remove } = question.abilities;
  const own = question.answers.find(({ mine }) => mine) ?? null;
  return (
    <li className="grid gap-x-5 gap-y-1 border-b border-line py-4 sm:grid-cols-[10.5rem_minmax(0,1fr)]">
      <p className="text-small">
        <Person by={question.by} />
        <Moment at={question.at} />
      </p>
      <div className="min-w-0 max-w-measure space-y-3">
        <p className="break-words whitespace-pre-line">{question.text}</p>
        {question.answers.map((one) => (
          <Answer key={one.id} answer={one} />
        ))}
        {answering && (
          <AnswerForm
            question={question}
            own={own}
            ofNote={ofNote}
            onClose={() => setAnswering(false)}
          />
        )}
        {(answer || remove) && !answering && (
          <div className="not-in-print flex flex-wrap gap-x-5">
            {answer && (
              <Button
                ref={opener}
                kind="quiet"
                label={`${own ? 'Change my answer' : 'Answer'}: ${question.text.slice(0, 80)}`}
                onClick={() => setAnswering(true)}
              >
                {own ? 'Change my answer' : 'Answer'}
              </Button>
            )}
            {remove && <RemoveQuestion question={question} ofNote={ofNote} />}
          </div>
        )}
      </div>
    </li>
  );
}

/** Set off by an upright, as a quotation is. */
function Answer({ answer }: { readonly answer: NoteAnswer }) {
  return (
    <div className="border-l-2 border-verdigris pl-4">
      <p className="break-words whitespace-pre-line">{answer.text}</p>
      <p className="text-note text-soot-2">
        <Person by={answer.by} />
        {answer.by && (answer.byAuthor ? ', the author' : ', moderator')}
        {FACT_SEPARATOR}
        <time dateTime={answer.at} className="whitespace-nowrap">
          {momentWords(answer.at)}
        </time>
        {answer.changed && `${FACT_SEPARATOR}changed since`}
      </p>
    </div>
  );
}

function Person({ by }: { readonly by: NoteQuestion['by'] }): ReactNode {
  if (!by) return 'A former member';
  return (
    <Link to={paths.member(by.id)} className="link break-words">
      {by.name}
    </Link>
  );
}

function Moment({ at }: { readonly at: string }) {
  return (
    <time dateTime={at} className="block text-note text-soot-2">
      {momentWords(at)}
    </time>
  );
}
