import { QUARTZ_INVERSION_CELSIUS } from '#shared/heat/heat-colour.ts';
import { firstMinuteAt, type HeatPoint } from '#shared/heat/heat-stops.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';
import { HeatGradient } from '../HeatGradient.tsx';
import { estimateTextWidth } from '../label-lanes.ts';
import { DASHES } from './chart-dashes.ts';
import { linePath, plotWidth, type ChartFrame } from './chart-frame.ts';
import { ChartLevel } from './ChartLevel.tsx';
import type { DrawnLines } from './drawn-lines.ts';
import { labelSpot } from './label-spot.ts';

/** Readings at least this far apart, px, are drawn one by one. */
const APART_PX = 9;
const NAME_PX = 13;
const LONGEST_NAME = 34;

interface Props {
  readonly id: string;
  readonly frame: ChartFrame;
  readonly lines: DrawnLines;
  readonly unit: TemperatureUnit;
  readonly overlayLabel: string | null;
  /** First minute at 573 °C of the whole record. */
  readonly quartzMinute: number | null;
  readonly targetCelsius: number | null;
}

/** Heat beneath, ink above: the heat colour itself never draws a line. */
export function ChartLines({ id, frame, lines, unit, quartzMinute, ...named }: Props) {
  const { overlayLabel, targetCelsius } = named;
  const { xOf, yOf, plot } = frame;
  const { smooth, readings, second, smoothSecond, overlay } = lines;
  const [first, last] = [smooth[0], smooth[smooth.length - 1]];
  const path = linePath(smooth, xOf, yOf);
  // Names keep clear of the rules as well.
  const rules = [targetCelsius, QUARTZ_INVERSION_CELSIUS].flatMap((celsius): HeatPoint[][] =>
    celsius === null
      ? []
      : [
          [
            [frame.startMinute, celsius],
            [frame.endMinute, celsius],
          ],
        ],
  );
  return (
    <g fill="none" aria-hidden="true">
      <defs>
        <HeatGradient id={`${id}-heat`} points={smooth} xOf={xOf} />
        <clipPath id={`${id}-plot`}>
          <rect
            x={plot.left}
            y={plot.top}
            width={plot.right - plot.left}
            height={plot.bottom - plot.top}
          />
        </clipPath>
      </defs>
      <g clipPath={`url(#${id}-plot)`}>
        {first && last && (
          <>
            <path
              className="heat"
              fill={`url(#${id}-heat)`}
              d={`${path}V${plot.bottom}H${xOf(first[0])}Z`}
            />
            <path className="stroke-soot-2" d={`M${xOf(last[0])} ${plot.bottom}V${yOf(last[1])}`} />
          </>
        )}
        {overlay && <Compared points={overlay} dash={DASHES.overlay} frame={frame} />}
        {second && <Readings points={second} frame={frame} />}
        {smoothSecond && <Compared points={smoothSecond} dash={DASHES.second} frame={frame} />}
        <path className="stroke-ash" strokeWidth="5" strokeLinejoin="round" d={path} />
        <Readings points={readings} frame={frame} />
        <path className="stroke-soot" strokeWidth="2.25" strokeLinejoin="round" d={path} />
      </g>
      {quartzMinute !== null && quartzMinute >= frame.startMinute && (
        <>
          <ChartLevel
            frame={frame}
            celsius={QUARTZ_INVERSION_CELSIUS}
            unit={unit}
            dash="1 3"
            toX={Math.min(plot.right, xOf(quartzMinute))}
          />
          {quartzMinute <= frame.endMinute && (
            <path
              className="stroke-soot"
              strokeWidth="2"
              d={`M${xOf(quartzMinute)} ${yOf(QUARTZ_INVERSION_CELSIUS) - 8}v16`}
            />
          )}
        </>
      )}
      {overlay && overlayLabel && (
        <Name
          text={overlayLabel}
          line={overlay}
          others={[smooth, smoothSecond ?? [], ...rules]}
          frame={frame}
        />
      )}
      {second && (
        <Name
          text="second probe"
          line={second}
          others={[smooth, overlay ?? [], ...rules]}
          frame={frame}
        />
      )}
    </g>
  );
}

/** The first minute at which a record reaches 573 °C. */
export const quartzMinuteOf = (points: readonly HeatPoint[]): number | null =>
  firstMinuteAt(points, QUARTZ_INVERSION_CELSIUS);

interface LineProps {
  readonly points: readonly HeatPoint[];
  readonly frame: ChartFrame;
}

/** Whether the readings in sight have room to be drawn one by one. */
export const haveRoom = (readings: readonly HeatPoint[], width: number): boolean =>
  readings.length * APART_PX <= plotWidth(width);

/** What the probe showed, one by one where there is room, else as a hairline from low to high. */
function Readings({ points, frame }: LineProps) {
  const { xOf, yOf } = frame;
  if (haveRoom(points, frame.width)) {
    const squares = points
      .map(([minute, celsius]) => `M${xOf(minute) - 2} ${yOf(celsius) - 2}h4v4h-4z`)
      .join('');
    return <path className="readings fill-soot stroke-ash" strokeWidth="1" d={squares} />;
  }
  const path = linePath(points, xOf, yOf);
  return (
    <>
      <path className="stroke-ash" strokeWidth="2.5" strokeLinejoin="round" d={path} />
      <path className="readings stroke-soot-2" strokeLinejoin="round" d={path} />
    </>
  );
}

/** A dashed line on paper of its own width, so that it reads over heat and page alike. */
function Compared({ points, dash, frame }: LineProps & { readonly dash: string }) {
  const path = linePath(points, frame.xOf, frame.yOf);
  return (
    <>
      <path className="stroke-ash" strokeWidth="4" d={path} />
      <path className="stroke-soot" strokeWidth="2" strokeDasharray={dash} d={path} />
    </>
  );
}

interface NameProps {
  readonly text: string;
  readonly line: readonly HeatPoint[];
  readonly others: readonly (readonly HeatPoint[])[];
  readonly frame: ChartFrame;
}

/** The name of a dashed line, on it. */
function Name({ text, line, others, frame }: NameProps) {
  const short = text.length > LONGEST_NAME ? `${text.slice(0, LONGEST_NAME - 1)}…` : text;
  const spot = labelSpot(line, others, frame, estimateTextWidth(short, NAME_PX));
  if (!spot) return null;
  return (
    <text
      className="fill-soot stroke-ash font-sans"
      paintOrder="stroke"
      strokeWidth="4"
      fontSize={NAME_PX}
      textAnchor={spot.anchor}
      x={spot.x}
      y={spot.y}
    >
      {short}
    </text>
  );
}
