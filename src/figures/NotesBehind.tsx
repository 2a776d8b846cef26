import { Link } from 'react-router-dom';
import type { WhatHelped } from '#shared/api/figures.ts';
import { paths } from '#shared/paths.ts';
import { Disclosure } from '../ui/Disclosure.tsx';

interface Props {
  readonly noteIds: readonly number[];
  readonly notes: WhatHelped['notes'];
  /** What the notes are behind, for those who hear the summary alone. */
  readonly of: string;
}

/** The notes behind a number, folded away. */
export function NotesBehind({ noteIds, notes, of }: Props) {
  const known = noteIds.flatMap((id) => notes[String(id)] ?? []);
  if (known.length === 0) return null;
  return (
    <Disclosure
      summary={
        <>
          {known.length === 1
            ? 'The note behind it'
            : `The ${String(known.length)} notes behind it`}
          <span className="sr-only">: {of}</span>
        </>
      }
    >
      <ul className="gap-x-10 sm:columns-2">
        {known.map((note) => (
          <li key={note.id} className="break-inside-avoid py-0.5">
            <Link
              to={paths.note(note.id, note.slug)}
              className="link inline-flex min-h-6 items-center touch:min-h-11"
            >
              {note.title}
            </Link>
          </li>
        ))}
      </ul>
    </Disclosure>
  );
}
