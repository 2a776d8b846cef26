import { useId } from 'react';
import { heatColour } from '#shared/heat/heat-colour.ts';
import { fromCelsius, roundTemperature } from '#shared/units/temperature.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';

const LOW = 400;
const HIGH = 1200;
const WIDTH = 200;
const STEP = 25;
const TICKS = { C: [500, 700, 900, 1100], F: [900, 1300, 1700, 2000] } as const;

interface Props {
  readonly unit?: TemperatureUnit;
  /** Says what the colours are; leave it out only where another legend on the page says so. */
  readonly withSentence?: boolean;
}

/** What a warm pixel means. Stands near every strip and chart. */
export function HeatLegend({ unit = 'C', withSentence = false }: Props) {
  const gradientId = useId();
  const low = fromCelsius(LOW, unit);
  const high = fromCelsius(HIGH, unit);
  const ticks = TICKS[unit];
  const stops = Array.from({ length: (HIGH - LOW) / STEP + 1 }, (_, index) => LOW + index * STEP);
  const xOf = (degrees: number) => ((degrees - low) / (high - low)) * WIDTH;
  return (
    <p className="flex flex-wrap items-start gap-x-4 gap-y-1 text-note text-soot-2">
      <svg
        className="ink-drawing h-[1.875rem] w-[12.5rem] shrink-0"
        viewBox={`0 0 ${WIDTH} 30`}
        role="img"
        aria-label={`Colour scale from black at ${roundTemperature(LOW, unit)} °${unit} through deep red and orange to nearly white at ${roundTemperature(HIGH, unit)} °${unit}`}
      >
        <defs>
          <linearGradient id={gradientId}>
            {stops.map((celsius) => (
              <stop
                key={celsius}
                offset={(celsius - LOW) / (HIGH - LOW)}
                stopColor={heatColour(celsius)}
              />
            ))}
          </linearGradient>
        </defs>
        <rect
          className="heat stroke-soot-2"
          x="0.5"
          y="0.5"
          width={WIDTH - 1}
          height="10"
          fill={`url(#${gradientId})`}
        />
        <g
          className="fill-soot-2 font-reading"
          fontSize="11"
          letterSpacing="-0.3"
          textAnchor="middle"
        >
          {ticks.map((degrees, index) => (
            <g key={degrees}>
              <path className="stroke-soot-2" d={`M${xOf(degrees)} 11v4`} />
              {index === ticks.length - 1 ? (
                <text x={WIDTH} y="26" textAnchor="end">
                  {degrees}&nbsp;°{unit}
                </text>
              ) : (
                <text x={xOf(degrees)} y="26">
                  {degrees}
                </text>
              )}
            </g>
          ))}
        </g>
      </svg>
      {withSentence && (
        <span className="max-w-[34rem]">
          Colour is temperature, on a scale modelled on incandescence. It is a drawing: do not judge
          a kiln by it.
        </span>
      )}
    </p>
  );
}
