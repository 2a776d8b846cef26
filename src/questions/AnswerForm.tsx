import { useEffect, useRef, useState, type SyntheticEvent } from 'react';
import { MAX_NOTE_ANSWER, type NoteAnswer, type NoteQuestion } from '#shared/api/questions.ts';
import { Button } from '../ui/Button.tsx';
import { TextArea } from '../ui/TextArea.tsx';
import { useMessages } from '../ui/useMessages.ts';
import type { OfNote } from './useNoteQuestions.ts';

interface Props {
  readonly question: NoteQuestion;
  /** What this member has answered so far. */
  readonly own: NoteAnswer | null;
  readonly ofNote: OfNote;
  readonly onClose: () => void;
}

/** One's answer, new or changed. What is typed stays until the server has it. */
export function AnswerForm({ question, own, ofNote: { answer }, onClose }: Props) {
  const [text, setText] = useState(own?.text ?? '');
  const tell = useMessages();
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => {
    form.current?.querySelector('textarea')?.focus();
  }, []);
  // The mutation is shared by all rows: another row's failure is not said here.
  const failed = answer.isError && answer.variables.questionId === question.id;

  const onSubmit = (event: SyntheticEvent): void => {
    event.preventDefault();
    if (text.trim() === '' || answer.isPending) return;
    answer.mutate(
      { questionId: question.id, text: text.trim() },
      {
        onSuccess: () => {
          tell({ kind: 'done', text: own ? 'Your answer is changed.' : 'Your answer is given.' });
          onClose();
        },
      },
    );
  };
  return (
    <form
      ref={form}
      noValidate
      onSubmit={onSubmit}
      className="not-in-print @container space-y-2 border-l-2 border-verdigris pl-4"
    >
      <TextArea
        label="Your answer"
        value={text}
        onValue={setText}
        rows={3}
        maxLength={MAX_NOTE_ANSWER}
      />
      {failed && (
        <p role="alert" className="text-small font-[650] text-caution">
          It was not kept: {answer.error.message}
        </p>
      )}
      <div className="flex flex-wrap gap-3">
        <Button type="submit" kind="main" busy={answer.isPending} disabled={text.trim() === ''}>
          {own ? 'Keep the change' : 'Answer'}
        </Button>
        <Button onClick={onClose}>Cancel</Button>
      </div>
    </form>
  );
}
