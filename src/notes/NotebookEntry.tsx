import { Link } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { formatDuration } from '#shared/units/duration.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';
import { NOTE_STATUSES } from '#shared/vocabulary/statuses.ts';
import { FACT_SEPARATOR } from '../ui/fact-separator.ts';
import { Reading } from '../ui/Reading.tsx';
import { SmallGlowStrip } from '../ui/SmallGlowStrip.tsx';
import { changeWords, dayWords, momentWords } from './note-words.ts';
import { isInWork, type NotebookNote } from './notebook-groups.ts';

interface Props {
  readonly note: NotebookNote;
  readonly units: Units;
  readonly scaleMinutes: number;
  /** From the firing before it in this list, in words. */
  readonly gap: string | null;
}

/** What the desk or the checks still want of its author, in a few words. */
function stillOpen({ openChecks, openRemarks }: NotebookNote): string | null {
  const count = (number: number, one: string, many: string): string | null =>
    number === 0 ? null : `${String(number)} ${number === 1 ? one : many}`;
  const parts = [
    count(openRemarks, 'remark to mend', 'remarks to mend'),
    count(openChecks, 'check open', 'checks open'),
  ].filter((part) => part !== null);
  return parts.length > 0 ? parts.join(', ') : null;
}

/** One's own note on the time line of its kiln. */
export function NotebookEntry({ note, units, scaleMinutes, gap }: Props) {
  const { status, published, revising } = note;
  const open = stillOpen(note);
  const inWork = isInWork(note);
  return (
    <li className="relative grid gap-x-8 gap-y-2 border-b border-line py-4 pl-6 sm:grid-cols-[9.5rem_minmax(0,14rem)_minmax(0,1fr)]">
      {/* The line runs through; each firing is a tick on it. */}
      <span
        aria-hidden="true"
        className="absolute top-0 bottom-0 left-1.5 border-l border-soot-2"
      />
      <span
        aria-hidden="true"
        className={`absolute top-7 left-0 w-3.5 border-t-2 ${inWork ? 'border-dashed border-verdigris' : 'border-soot'}`}
      />
      <div className="text-small">
        <p className="font-[600]">{note.firedOn ? dayWords(note.firedOn) : 'No day yet'}</p>
        {gap !== null && <p className="text-note text-soot-2">{gap}</p>}
      </div>
      <div className="max-w-56 self-start pt-1">
        {note.strip && note.strip.length > 1 ? (
          <SmallGlowStrip points={note.strip} scaleMinutes={scaleMinutes} alt={note.stripWords} />
        ) : (
          <span className="block border-b border-dashed border-soot-2 pb-1 text-note text-soot-2">
            No strip yet
          </span>
        )}
      </div>
      <div className="min-w-0 space-y-1">
        <p>
          <Link
            className="link font-[600]"
            to={published && !revising ? paths.note(note.id, note.slug) : paths.write(note.id)}
          >
            {note.title || 'Untitled'}
          </Link>
        </p>
        <p className="text-small">
          <span className={inWork ? 'font-[650]' : 'text-soot-2'}>
            {revising ? `Revision: ${NOTE_STATUSES[status].toLowerCase()}` : NOTE_STATUSES[status]}
          </span>
          {inWork && <span className="text-soot-2">, saved {momentWords(note.savedAt)}</span>}
          {note.peakCelsius !== null && (
            <span className="text-soot-2">
              {FACT_SEPARATOR}peak{' '}
              <Reading>{formatTemperature(note.peakCelsius, units.temperature)}</Reading>
            </span>
          )}
          {note.timeToTemperatureMinutes !== null && (
            <span className="text-soot-2">
              {FACT_SEPARATOR}
              <Reading>{formatDuration(note.timeToTemperatureMinutes)}</Reading> to temperature
            </span>
          )}
          {published && (
            <>
              <span className="text-soot-2">{FACT_SEPARATOR}</span>
              {revising ? (
                <Link className="link" to={paths.note(note.id, note.slug)}>
                  The published note
                </Link>
              ) : (
                <Link
                  className="link"
                  to={paths.write(note.id)}
                  aria-label={`Revise “${note.title || 'Untitled'}”`}
                >
                  Revise
                </Link>
              )}
            </>
          )}
        </p>
        {note.changes.length > 0 && (
          <p className="text-small">Changed: {changeWords(note.changes)}</p>
        )}
        {open !== null && <p className="text-small font-[650] text-caution">{open}</p>}
        {note.decisionReason !== null && (
          <p className="max-w-measure border-l-2 border-caution pl-2.5 text-small whitespace-pre-line">
            <span className="text-soot-2">The desk: </span>
            {note.decisionReason}
          </p>
        )}
      </div>
    </li>
  );
}
