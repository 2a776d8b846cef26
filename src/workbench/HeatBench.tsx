import { heatColour, heatName, textOnHeat } from '#shared/heat/heat-colour.ts';
import { stripScaleMinutes } from '#shared/heat/strip-scale.ts';
import { GlowStrip } from '../ui/GlowStrip.tsx';
import { HeatLegend } from '../ui/HeatLegend.tsx';
import { SmallGlowStrip } from '../ui/SmallGlowStrip.tsx';
import { Bench } from './Bench.tsx';
import {
  COLD,
  LONG,
  QUICK,
  SAGGED,
  STALLED_MARKS,
  STALLED_THEN_WENT_ON,
} from './invented-records.ts';

const ROWS = [
  { title: 'The slab drank it', points: STALLED_THEN_WENT_ON, facts: 'stall 708 °C, 17 min' },
  { title: 'Twenty-five minutes flat', points: QUICK, facts: 'reached 1002 °C in 24 min' },
  { title: 'A long red wait in a side wind', points: SAGGED, facts: 'sag to 688 °C' },
  { title: 'First firing of a wet kiln', points: LONG, facts: 'slow climb' },
  { title: 'The cylinder froze', points: COLD, facts: 'gave up at 390 °C' },
  { title: 'By eye, no pyrometer', points: [], facts: 'no record' },
];

export function HeatBench() {
  const scale = stripScaleMinutes(
    ROWS.map(({ points }) => (points.at(-1)?.[0] ?? 0) - (points[0]?.[0] ?? 0)),
  );
  return (
    <>
      <Bench title="Glow strip">
        <GlowStrip
          points={STALLED_THEN_WENT_ON}
          alt="Climbs to 708 °C in 29 min, stays there 17 min, goes on to 1006 °C in 61 min, held 5 min, shut off."
          targetCelsius={1005}
          hold={{ fromMinute: 61, toMinute: 66 }}
          marks={STALLED_MARKS}
        />
        <HeatLegend withSentence />
        <GlowStrip
          points={QUICK}
          alt="Climbs to 1836 °F in 24 min."
          targetCelsius={1010}
          marks={[{ minute: 14, label: 'air more' }]}
          unit="F"
        />
        <GlowStrip
          points={COLD}
          alt="Climbs to 390 °C in 44 min and gives up."
          targetCelsius={1000}
        />
        <GlowStrip points={[]} alt="No record: fired by eye." />
      </Bench>
      <Bench title="Small strips in rows">
        <ul className="border-t border-line">
          {ROWS.map((row) => (
            <li
              key={row.title}
              className="grid items-center gap-x-8 gap-y-2 border-b border-line py-4 sm:grid-cols-[20rem_1fr]"
            >
              <SmallGlowStrip
                points={row.points}
                scaleMinutes={scale}
                alt={`${row.title}: ${row.facts}`}
              />
              <div>
                <p className="text-lead font-[600]">{row.title}</p>
                <p className="text-small text-soot-2">{row.facts}</p>
              </div>
            </li>
          ))}
        </ul>
        <HeatLegend unit="F" />
      </Bench>
      <Bench title="Heat scale">
        <ul className="grid grid-cols-3 sm:grid-cols-6">
          {[
            20, 480, 525, 573, 600, 650, 700, 720, 750, 800, 850, 900, 950, 1000, 1020, 1050, 1100,
            1200,
          ].map((celsius) => (
            <li
              key={celsius}
              className="heat border border-soot-2 p-3"
              style={{ background: heatColour(celsius), color: textOnHeat(celsius) }}
            >
              <span className="reading">{celsius} °C</span>
              <span className="block text-note">{heatName(celsius) ?? 'black'}</span>
            </li>
          ))}
        </ul>
      </Bench>
    </>
  );
}
