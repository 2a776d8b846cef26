import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { NoteRow } from '#shared/api/note-rows.ts';
import { paths } from '#shared/paths.ts';
import { formatChamber } from '#shared/units/volume.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import { formatDuration } from '#shared/units/duration.ts';
import type { Units } from '#shared/units/units.ts';
import { FACT_SEPARATOR } from '../ui/fact-separator.ts';
import { Reading } from '../ui/Reading.tsx';
import { SmallGlowStrip } from '../ui/SmallGlowStrip.tsx';
import {
  changeWords,
  dayWords,
  disputedWords,
  outcomeWords,
  rowFigures,
  troubleWords,
} from './note-words.ts';

interface Props {
  readonly row: NoteRow;
  readonly units: Units;
  readonly scaleMinutes: number;
  /** Why it was found, the passage that matched: between the facts and what came next. */
  readonly children?: ReactNode;
  readonly headingLevel?: 2 | 3;
  /** In place of its strip. */
  readonly drawing?: ReactNode;
}

/** A published note as a row: its strip, title, troubles, figures, and what was changed next. */
export function NoteRowItem(props: Props) {
  const { row, units, scaleMinutes, children, headingLevel = 3, drawing } = props;
  const Heading = `h${headingLevel}` as const;
  const troubles = troubleWords(row, units);
  const disputed = disputedWords(row);
  return (
    <li className="grid gap-x-8 gap-y-2 border-b border-line py-5 sm:grid-cols-[minmax(0,17rem)_minmax(0,1fr)]">
      <div>
        {drawing ??
          (row.strip && row.strip.length > 1 ? (
            <SmallGlowStrip points={row.strip} scaleMinutes={scaleMinutes} alt={row.stripWords} />
          ) : (
            <p className="border-y border-dashed border-line py-2 text-note text-soot-2">
              No record kept
            </p>
          ))}
        <p className="mt-1.5 flex flex-wrap gap-x-3 text-note text-soot-2">
          {rowFigures(row, units).map((figure) => (
            <Reading key={figure}>{figure}</Reading>
          ))}
        </p>
      </div>
      <div className="min-w-0 space-y-1">
        <Heading className="text-lead">
          <Link
            to={paths.note(row.id, row.slug)}
            className="text-soot underline decoration-line decoration-1 underline-offset-4 hover:decoration-verdigris hover:decoration-2"
          >
            {row.title}
          </Link>
        </Heading>
        <p className="text-small text-soot-2">
          {row.author?.name ?? 'A former member'}
          {FACT_SEPARATOR}
          {row.kiln.name}
          {row.kiln.volumeLitres !== null && `, ${formatChamber(row.kiln.volumeLitres, units)}`}
          {FACT_SEPARATOR}
          {dayWords(row.firedOn)}
        </p>
        {troubles.length > 0 && (
          <p className="text-small font-[600]">{troubles.join(FACT_SEPARATOR)}</p>
        )}
        {disputed !== null && <p className="text-small text-soot-2">{disputed}</p>}
        {children}
        <NextLine row={row} units={units} />
      </div>
    </li>
  );
}

/** What was changed next, and what came of it. */
function NextLine({ row, units }: { readonly row: NoteRow; readonly units: Units }) {
  const { followOn } = row;
  if (!followOn) return null;
  const outcome = outcomeWords(followOn);
  const changed = followOn.changes.length > 0;
  return (
    <p className="flex gap-3 text-small">
      <span aria-hidden="true" className="mt-[0.7em] h-0.5 w-7 shrink-0 bg-verdigris" />
      <span>
        {changed ? `Next: ${changeWords(followOn.changes)}` : 'Next firing, no change named'}
        {followOn.peakCelsius !== null && (
          <>
            ; <Reading>{formatTemperature(followOn.peakCelsius, units.temperature)}</Reading>
            {followOn.timeToTemperatureMinutes !== null && (
              <>
                {' '}
                in <Reading>{formatDuration(followOn.timeToTemperatureMinutes)}</Reading>
              </>
            )}
          </>
        )}
        {outcome !== null && (
          <>
            ; <strong className="font-[650]">{outcome}</strong>
          </>
        )}
      </span>
    </p>
  );
}
