import { useState } from 'react';
import type { LookAlike, LookAlikes } from '#shared/api/look-alikes.ts';
import { whyAlike } from '#shared/look-alike/why-alike.ts';
import { stripScaleMinutes } from '#shared/heat/strip-scale.ts';
import { formatDifference } from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';
import { NoteRowItem } from '../notes/NoteRowItem.tsx';
import { Button } from '../ui/Button.tsx';
import { FACT_SEPARATOR } from '../ui/fact-separator.ts';
import { HeatLegend } from '../ui/HeatLegend.tsx';
import { Reading } from '../ui/Reading.tsx';
import { ClimbPair } from './ClimbPair.tsx';
import { climbPoints } from './climb-points.ts';

interface Props {
  readonly climb: NonNullable<LookAlikes['climb']>;
  readonly hits: LookAlikes['hits'];
  readonly units: Units;
  /** How the climb asked about is called: "yours", "this one". */
  readonly ownWord: string;
  /** More than these are folded away until asked for. */
  readonly shownFirst?: number;
  readonly headingLevel?: 2 | 3;
}

/** Look-alikes as rows, each under the climb asked about, all on one scale of minutes. */
export function LookAlikeRows(props: Props) {
  const { climb, hits, units, ownWord, shownFirst = hits.length, headingLevel = 3 } = props;
  const [showsAll, setShowsAll] = useState(false);
  const shown = showsAll ? hits : hits.slice(0, shownFirst);
  const own = climbPoints(climb.celsius);
  const scaleMinutes = stripScaleMinutes([
    climb.celsius.length - 1,
    ...hits.map(({ celsius }) => celsius.length - 1),
  ]);
  return (
    <div className="space-y-3">
      <p className="text-note text-soot-2">
        The narrow band is {ownWord}, the wide one below it the other firing, each from its start.
      </p>
      <ul className="border-t border-soot">
        {shown.map((hit) => (
          <NoteRowItem
            key={hit.note.id}
            row={hit.note}
            units={units}
            scaleMinutes={scaleMinutes}
            headingLevel={headingLevel}
            drawing={
              <ClimbPair
                own={own}
                other={climbPoints(hit.celsius)}
                scaleMinutes={scaleMinutes}
                alt={`${hit.note.stripWords}; drawn below ${ownWord}`}
              />
            }
          >
            <Why climb={climb} hit={hit} units={units} />
          </NoteRowItem>
        ))}
      </ul>
      {shown.length < hits.length && (
        <Button onClick={() => setShowsAll(true)}>{`Show all ${String(hits.length)}`}</Button>
      )}
      <HeatLegend unit={units.temperature} />
    </div>
  );
}

interface WhyProps {
  readonly climb: Props['climb'];
  readonly hit: LookAlike;
  readonly units: Units;
}

/** What was read off both that is the same, how far apart they are, and whether it is one kiln. */
function Why({ climb, hit, units }: WhyProps) {
  const sentences = whyAlike(climb.traits, hit.traits, units);
  return (
    <>
      {sentences.length > 0 && <p className="text-small">{sentences.join(' ')}</p>}
      <p className="text-note text-soot-2">
        About <Reading>{formatDifference(hit.apartCelsius, units.temperature)}</Reading> apart
        minute by minute
        {hit.sameKiln && (
          <>
            {FACT_SEPARATOR}
            <span className="text-soot">the same kiln</span>
          </>
        )}
      </p>
    </>
  );
}
