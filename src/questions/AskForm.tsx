import { useState, type SyntheticEvent } from 'react';
import { MAX_NOTE_QUESTION, MIN_NOTE_QUESTION } from '#shared/api/questions.ts';
import { useRepeatKey } from '../http/useRepeatKey.ts';
import { Button } from '../ui/Button.tsx';
import { TextArea } from '../ui/TextArea.tsx';
import { useMessages } from '../ui/useMessages.ts';
import type { OfNote } from './useNoteQuestions.ts';

/** A question in plain text. It stays in the field until the server has it. */
export function AskForm({ ofNote: { ask } }: { readonly ofNote: OfNote }) {
  const [text, setText] = useState('');
  const [early, setEarly] = useState(false);
  const tell = useMessages();
  const keyFor = useRepeatKey();
  const question = text.trim();
  const tooShort = [...question].length < MIN_NOTE_QUESTION;

  const onSubmit = (event: SyntheticEvent): void => {
    event.preventDefault();
    setEarly(tooShort);
    if (tooShort || ask.isPending) return;
    ask.mutate(
      { text: question, key: keyFor(question) },
      {
        onSuccess: () => {
          setText('');
          tell({ kind: 'done', text: 'Your question is on the page, and its author is told.' });
        },
      },
    );
  };
  return (
    <form noValidate onSubmit={onSubmit} className="not-in-print @container max-w-measure">
      <TextArea
        label="Your question"
        hint="Plain text that everybody can read. You get a mail when it is answered."
        value={text}
        onValue={(value) => {
          setText(value);
          setEarly(false);
        }}
        rows={2}
        maxLength={MAX_NOTE_QUESTION}
        issues={
          early
            ? [
                {
                  kind: 'must-mend',
                  text: `A question has at least ${String(MIN_NOTE_QUESTION)} characters.`,
                },
              ]
            : []
        }
      />
      <div className="space-y-2 pt-1 @2xl:pl-[11.75rem]">
        {ask.isError && (
          <p role="alert" className="text-small font-[650] text-caution">
            It was not asked: {ask.error.message}
          </p>
        )}
        <Button type="submit" busy={ask.isPending}>
          {ask.isError ? 'Try again' : 'Ask'}
        </Button>
      </div>
    </form>
  );
}
