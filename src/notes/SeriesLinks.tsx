import { Link } from 'react-router-dom';
import type { Neighbour } from '#shared/api/notes.ts';
import type { FollowOn, NoteRow } from '#shared/api/note-rows.ts';
import { paths } from '#shared/paths.ts';
import { formatDuration } from '#shared/units/duration.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';
import { NOTE_STATUSES } from '#shared/vocabulary/statuses.ts';
import { stripScaleMinutes } from '#shared/heat/strip-scale.ts';
import { FACT_SEPARATOR } from '../ui/fact-separator.ts';
import { Reading } from '../ui/Reading.tsx';
import { SmallGlowStrip } from '../ui/SmallGlowStrip.tsx';
import { changeWords, dayWords, outcomeWords } from './note-words.ts';

interface Props {
  readonly row: NoteRow;
  readonly kiln: { readonly id: number; readonly name: string };
  readonly earlier: Neighbour | null;
  readonly next: Neighbour | null;
  readonly followOn: FollowOn | null;
  readonly units: Units;
}

const lengthOf = (strip: Neighbour['strip']): number[] => {
  const first = strip?.[0];
  const last = strip?.at(-1);
  return first && last ? [last[0] - first[0]] : [];
};

/** The firings before and after this one in the same kiln, on one scale, with what was changed. */
export function SeriesLinks({ row, kiln, earlier, next, followOn, units }: Props) {
  const scale = stripScaleMinutes(
    [earlier, row, next].flatMap((each) => lengthOf(each?.strip ?? null)),
  );
  return (
    <section aria-labelledby="series" className="space-y-3">
      <h2 id="series" className="text-section">
        In the same kiln
      </h2>
      <ol className="border-t border-soot">
        {earlier && <Firing neighbour={earlier} word="Earlier" scale={scale} units={units} />}
        <li className="grid gap-x-8 gap-y-1 border-b border-line py-4 sm:grid-cols-[minmax(0,17rem)_minmax(0,1fr)]">
          {row.strip ? (
            <SmallGlowStrip points={row.strip} scaleMinutes={scale} alt={row.stripWords} />
          ) : (
            <span />
          )}
          <p>
            <strong className="font-[650]">This firing</strong>
            {row.changes.length > 0 && (
              <span className="block text-small">Changed since: {changeWords(row.changes)}</span>
            )}
          </p>
        </li>
        {next && (
          <Firing
            neighbour={next}
            word="Next"
            scale={scale}
            units={units}
            outcome={followOn?.noteId === next.noteId ? outcomeWords(followOn) : null}
          />
        )}
      </ol>
      {!next && (
        <p className="text-small text-soot-2">No later firing of this kiln is written up yet.</p>
      )}
      <p className="text-small">
        <Link to={paths.kiln(kiln.id)} className="link">
          All firings of {kiln.name}
        </Link>
      </p>
    </section>
  );
}

function Firing({
  neighbour,
  word,
  scale,
  units,
  outcome = null,
}: {
  readonly neighbour: Neighbour;
  readonly word: string;
  readonly scale: number;
  readonly units: Units;
  readonly outcome?: string | null;
}) {
  const unpublished = neighbour.status !== 'published';
  return (
    <li className="grid gap-x-8 gap-y-1 border-b border-line py-4 sm:grid-cols-[minmax(0,17rem)_minmax(0,1fr)]">
      {neighbour.strip && neighbour.strip.length > 1 ? (
        <SmallGlowStrip points={neighbour.strip} scaleMinutes={scale} alt={neighbour.stripWords} />
      ) : (
        <span className="text-note text-soot-2">No strip</span>
      )}
      <div>
        <p>
          <span className="text-soot-2">{word}: </span>
          <Link
            className="link"
            to={
              unpublished
                ? paths.write(neighbour.noteId)
                : paths.note(neighbour.noteId, neighbour.slug)
            }
          >
            {neighbour.title || 'Untitled'}
          </Link>
          {unpublished && (
            <span className="text-small text-soot-2">
              {' '}
              ({NOTE_STATUSES[neighbour.status].toLowerCase()}: only you see this)
            </span>
          )}
        </p>
        <p className="text-small text-soot-2">
          {dayWords(neighbour.firedOn)}
          {neighbour.peakCelsius !== null && (
            <>
              {FACT_SEPARATOR}
              <Reading>{formatTemperature(neighbour.peakCelsius, units.temperature)}</Reading>
            </>
          )}
          {neighbour.timeToTemperatureMinutes !== null && (
            <>
              {' in '}
              <Reading>{formatDuration(neighbour.timeToTemperatureMinutes)}</Reading>
            </>
          )}
        </p>
        {neighbour.changes.length > 0 && (
          <p className="text-small">Changed: {changeWords(neighbour.changes)}</p>
        )}
        {outcome !== null && <p className="text-small font-[650]">{outcome}</p>}
      </div>
    </li>
  );
}
