import { useQuery } from '@tanstack/react-query';
import {
  useDeferredValue,
  useId,
  useRef,
  useState,
  type KeyboardEvent,
  type SyntheticEvent,
} from 'react';
import { useNavigate } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { MAX_QUESTION, type SuggestAnswer } from '#shared/api/search.ts';
import { Button } from '../ui/Button.tsx';
import { findQueries } from './find-queries.ts';
import { useSlashKey } from './useSlashKey.ts';

type Suggestion = SuggestAnswer['suggestions'][number];

interface Props {
  readonly initial?: string;
  /** A large field for the front page. */
  readonly large?: boolean;
  readonly onAsk: (question: string) => void;
}

/** "What happened in the kiln?": the question, with suggestions while it is typed. */
export function QuestionField({ initial = '', large = false, onAsk }: Props) {
  const [text, setText] = useState(initial);
  const [seen, setSeen] = useState(initial);
  const field = useRef<HTMLInputElement>(null);
  useSlashKey(field);
  // Going back changes the question of the page: the field follows it.
  if (seen !== initial) {
    setSeen(initial);
    setText(initial);
  }
  const [open, setOpen] = useState(false);
  const [chosen, setChosen] = useState(-1);
  const navigate = useNavigate();
  const listId = useId();
  const typed = useDeferredValue(text);
  const { data } = useQuery(findQueries.suggestions(open ? typed : ''));
  const suggestions = open && text.trim().length > 1 ? (data?.suggestions ?? []) : [];

  const ask = (question: string): void => {
    setOpen(false);
    onAsk(question.trim());
  };
  const take = (suggestion: Suggestion): void => {
    setOpen(false);
    if (suggestion.noteId !== null) {
      void navigate(paths.note(suggestion.noteId, ''));
      return;
    }
    setText(suggestion.text);
    ask(suggestion.text);
  };
  const onKeyDown = (event: KeyboardEvent): void => {
    if (event.key === 'Escape') {
      setOpen(false);
      setChosen(-1);
    } else if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      if (suggestions.length === 0) return;
      event.preventDefault();
      const step = event.key === 'ArrowDown' ? 1 : -1;
      // One place more than there are suggestions: the typed text itself.
      const places = suggestions.length + 1;
      setChosen((now) => ((now + 1 + step + places) % places) - 1);
    }
  };
  const onSubmit = (event: SyntheticEvent): void => {
    event.preventDefault();
    const suggestion = suggestions[chosen];
    if (suggestion) take(suggestion);
    else ask(text);
  };

  return (
    <form role="search" onSubmit={onSubmit} className="relative max-w-measure">
      <label htmlFor={`${listId}-field`} className={large ? 'text-lead font-[600]' : 'text-small'}>
        What happened in the kiln?
      </label>
      <div className="mt-2 flex items-end gap-3">
        <input
          ref={field}
          aria-keyshortcuts="/"
          id={`${listId}-field`}
          className={`field-corner min-w-0 grow [&::-webkit-search-cancel-button]:appearance-none ${large ? 'min-h-13! text-lead!' : ''}`}
          type="search"
          role="combobox"
          aria-expanded={suggestions.length > 0}
          aria-controls={listId}
          aria-autocomplete="list"
          aria-activedescendant={chosen >= 0 ? `${listId}-${String(chosen)}` : undefined}
          autoComplete="off"
          enterKeyHint="search"
          maxLength={MAX_QUESTION}
          placeholder="stalled at 700 °C"
          value={text}
          onChange={(event) => {
            setText(event.currentTarget.value);
            setOpen(true);
            setChosen(-1);
          }}
          onKeyDown={onKeyDown}
          onBlur={() => {
            setOpen(false);
          }}
        />
        <Button kind="main" type="submit">
          Find
        </Button>
      </div>
      <ul
        id={listId}
        role="listbox"
        aria-label="Suggestions"
        className={`absolute inset-x-0 top-full z-30 mt-1 border border-soot-2 bg-ash-2 ${suggestions.length > 0 ? '' : 'hidden'}`}
      >
        {suggestions.map((suggestion, index) => (
          <li
            key={`${suggestion.kind}-${suggestion.text}`}
            id={`${listId}-${String(index)}`}
            role="option"
            aria-selected={index === chosen}
            // Before the field loses its focus, so that the list is still there to be pressed.
            onMouseDown={(event) => {
              event.preventDefault();
              take(suggestion);
            }}
            className={`flex min-h-11 cursor-pointer items-baseline justify-between gap-4 border-b border-line px-3 py-2 last:border-b-0 ${index === chosen ? 'bg-verdigris-tint text-verdigris-ink' : ''}`}
          >
            <span>{suggestion.text}</span>
            <span className="text-note text-soot-2">
              {suggestion.kind === 'trouble' ? 'trouble' : 'note'}
            </span>
          </li>
        ))}
      </ul>
    </form>
  );
}
