import { QUARTZ_INVERSION_CELSIUS } from '#shared/heat/heat-colour.ts';
import { firstMinuteAt, simplifyPoints } from '#shared/heat/heat-stops.ts';
import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import { DASHES } from './chart-dashes.ts';
import { linePath } from './chart-frame.ts';
import type { ChartFrame } from './chart-frame.ts';
import { HeatGradient } from './HeatGradient.tsx';
import type { RecordChartProps } from './record-chart-props.ts';

interface Props {
  readonly id: string;
  readonly frame: ChartFrame;
  readonly props: RecordChartProps;
}

/** Heat beneath, ink above: the heat colour itself never draws a line. */
export function ChartLines({ id, frame, props }: Props) {
  const { xOf, yOf, plot } = frame;
  const { points, secondProbe, overlay, unit = 'C' } = props;
  const drawn = simplifyPoints(points, 1.5);
  const line = linePath(drawn, xOf, yOf);
  const [first, last] = [points[0], points[points.length - 1]];
  if (!first || !last) return null;
  const quartzMinute = firstMinuteAt(points, QUARTZ_INVERSION_CELSIUS);
  return (
    <g fill="none" aria-hidden="true">
      <defs>
        <HeatGradient id={`${id}-heat`} points={points} xOf={xOf} />
      </defs>
      <path
        className="heat"
        fill={`url(#${id}-heat)`}
        d={`${line}V${plot.bottom}H${xOf(first[0])}Z`}
      />
      <path className="stroke-soot-2" d={`M${xOf(last[0])} ${plot.bottom}V${yOf(last[1])}`} />
      {overlay && <Compared points={overlay.points} dash={DASHES.overlay} frame={frame} />}
      {secondProbe && <Compared points={secondProbe} dash={DASHES.second} frame={frame} />}
      <path className="stroke-ash" strokeWidth="5" strokeLinejoin="round" d={line} />
      <path className="stroke-soot" strokeWidth="2.25" strokeLinejoin="round" d={line} />
      {quartzMinute !== null && (
        <>
          <path
            className="stroke-soot-2"
            strokeDasharray="1 3"
            d={`M${plot.left} ${yOf(QUARTZ_INVERSION_CELSIUS)}H${xOf(quartzMinute)}`}
          />
          <path
            className="stroke-soot"
            strokeWidth="2"
            d={`M${xOf(quartzMinute)} ${yOf(QUARTZ_INVERSION_CELSIUS) - 8}v16`}
          />
          <text
            className="fill-soot stroke-ash font-sans"
            paintOrder="stroke"
            strokeWidth="4"
            fontSize="13"
            x={plot.left + 6}
            y={yOf(QUARTZ_INVERSION_CELSIUS) - 6}
          >
            {formatTemperature(QUARTZ_INVERSION_CELSIUS, unit)}
          </text>
        </>
      )}
    </g>
  );
}

/** A dashed line on paper of its own width, so that it reads over heat and page alike. */
function Compared({
  points,
  dash,
  frame,
}: {
  readonly points: readonly HeatPoint[];
  readonly dash: string;
  readonly frame: ChartFrame;
}) {
  const path = linePath(simplifyPoints(points, 1.5), frame.xOf, frame.yOf);
  return (
    <>
      <path className="stroke-ash" strokeWidth="4" d={path} />
      <path className="stroke-soot" strokeWidth="2" strokeDasharray={dash} d={path} />
    </>
  );
}
