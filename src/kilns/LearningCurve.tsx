import { Link } from 'react-router-dom';
import type { NoteRow } from '#shared/api/note-rows.ts';
import { stripScaleMinutes } from '#shared/heat/strip-scale.ts';
import { paths } from '#shared/paths.ts';
import { formatDuration } from '#shared/units/duration.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';
import { changeWords, dayWords, troubleWords } from '../notes/note-words.ts';
import { FACT_SEPARATOR } from '../ui/fact-separator.ts';
import { minuteTicks } from '../ui/axis-ticks.ts';
import { HeatLegend } from '../ui/HeatLegend.tsx';
import { MinuteRuler } from '../ui/MinuteRuler.tsx';
import { SmallGlowStrip } from '../ui/SmallGlowStrip.tsx';

/** The width of a small strip's drawing, which the ruler above shares. */
const RULER_WIDTH = 320;

interface Props {
  /** In order of firing, oldest first. */
  readonly firings: readonly NoteRow[];
  readonly units: Units;
}

/** The firings of one kiln under each other on one scale of minutes, with what was changed between. */
export function LearningCurve({ firings, units }: Props) {
  const scaleMinutes = stripScaleMinutes(
    firings.flatMap(({ strip }) => {
      const first = strip?.[0];
      const last = strip?.at(-1);
      return first && last ? [last[0] - first[0]] : [];
    }),
  );
  const xOf = (minute: number): number => 1 + (minute / scaleMinutes) * (RULER_WIDTH - 2);
  return (
    <div>
      <div className="grid gap-x-8 border-b border-soot sm:grid-cols-[minmax(0,20rem)_minmax(0,1fr)]">
        <svg
          aria-hidden="true"
          viewBox={`0 0 ${String(RULER_WIDTH)} 30`}
          className="block h-auto w-full max-w-[20rem]"
        >
          <MinuteRuler
            ticks={minuteTicks(0, scaleMinutes, RULER_WIDTH)}
            xOf={xOf}
            y={0}
            width={RULER_WIDTH}
          />
        </svg>
      </div>
      <ol>
        {firings.map((row, index) => (
          <li key={row.id} className="border-b border-line">
            {index > 0 && <Between row={row} />}
            <Firing row={row} units={units} scaleMinutes={scaleMinutes} />
          </li>
        ))}
      </ol>
      <div className="pt-3">
        <HeatLegend unit={units.temperature} withSentence />
      </div>
    </div>
  );
}

/** What this firing changed from the one above it. */
function Between({ row }: { readonly row: NoteRow }) {
  const isChanged = row.changes.length > 0;
  return (
    <p className="flex gap-3 pt-3 text-small">
      <span aria-hidden="true" className="mt-[0.7em] h-0.5 w-7 shrink-0 bg-verdigris" />
      <span className={isChanged ? 'font-[600] first-letter:uppercase' : 'text-soot-2'}>
        {isChanged ? changeWords(row.changes) : 'No change named'}
      </span>
    </p>
  );
}

interface FiringProps extends Omit<Props, 'firings'> {
  readonly row: NoteRow;
  readonly scaleMinutes: number;
}

function Firing({ row, units, scaleMinutes }: FiringProps) {
  const troubles = troubleWords(row, units);
  const figures = [
    row.peakCelsius === null
      ? null
      : `peak ${formatTemperature(row.peakCelsius, units.temperature)}`,
    row.timeToTemperatureMinutes === null
      ? null
      : `${formatDuration(row.timeToTemperatureMinutes)} to temperature`,
  ].filter((figure) => figure !== null);
  return (
    <div className="grid items-start gap-x-8 gap-y-1.5 py-3 sm:grid-cols-[minmax(0,20rem)_minmax(0,1fr)]">
      {row.strip && row.strip.length > 1 ? (
        <SmallGlowStrip points={row.strip} scaleMinutes={scaleMinutes} alt={row.stripWords} />
      ) : (
        <p className="border-y border-dashed border-line py-1.5 text-note text-soot-2">
          No record kept
        </p>
      )}
      <div className="min-w-0 space-y-0.5">
        <p className="flex flex-wrap items-baseline gap-x-3">
          <Link to={paths.note(row.id, row.slug)} className="link font-[600]">
            {row.title}
          </Link>
          <span className="text-small text-soot-2">{dayWords(row.firedOn)}</span>
        </p>
        <p className="flex flex-wrap gap-x-4 text-small">
          {figures.map((figure) => (
            <span key={figure} className="reading text-soot-2">
              {figure}
            </span>
          ))}
          {troubles.length > 0 && (
            <span className="font-[600]">{troubles.join(FACT_SEPARATOR)}</span>
          )}
        </p>
      </div>
    </div>
  );
}
