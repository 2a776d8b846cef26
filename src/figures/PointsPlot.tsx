import type { Spread } from '#shared/api/figure-topics.ts';
import { useWidth } from '../ui/useWidth.ts';
import { spreadMarks, type DrawnBox } from './spread-marks.ts';

interface Props {
  readonly spread: Spread;
  readonly low: number;
  readonly high: number;
  /** Said in place of the drawing; without it the drawing is passed over. */
  readonly label?: string;
  readonly box?: DrawnBox | null;
}

const POINTS_PX = 40;
const BOX_PX = 16;
const INSET_PX = 4;

/** Every point of a row stacked on a rule, and under it the quartiles, the median and its interval. */
export function PointsPlot({ spread, low, high, label, box = null }: Props) {
  const [ref, width] = useWidth<SVGSVGElement>(320);
  const span = high - low || 1;
  const xOf = (value: number): number =>
    INSET_PX + ((value - low) / span) * Math.max(1, width - 2 * INSET_PX);
  const marks = spreadMarks(spread, xOf, POINTS_PX);
  const height = POINTS_PX + (box ? BOX_PX : 2);
  const hidden = label === undefined;
  return (
    <svg
      ref={ref}
      role={hidden ? undefined : 'img'}
      aria-hidden={hidden}
      aria-label={label}
      className="ink-drawing shaded block w-full overflow-visible"
      height={height}
    >
      <line className="stroke-line" x1="0" x2={width} y1={POINTS_PX} y2={POINTS_PX} />
      {marks.map(({ x, y, width: wide, height: tall }) => (
        <rect
          key={`${String(x)} ${String(y)}`}
          className="fill-soot-2"
          x={x}
          y={y}
          width={wide}
          height={tall}
        />
      ))}
      {box && (
        <>
          <rect
            className="fill-verdigris-tint stroke-verdigris"
            x={xOf(box.q1)}
            y={POINTS_PX + 4.5}
            width={Math.max(1, xOf(box.q3) - xOf(box.q1))}
            height="9"
          />
          {box.interval && (
            <line
              className="stroke-verdigris"
              strokeWidth="3"
              x1={xOf(box.interval.low)}
              x2={xOf(box.interval.high)}
              y1={POINTS_PX + 9}
              y2={POINTS_PX + 9}
            />
          )}
          <line
            className="stroke-soot"
            strokeWidth="3"
            x1={xOf(box.median)}
            x2={xOf(box.median)}
            y1={POINTS_PX + 1}
            y2={POINTS_PX + BOX_PX}
          />
        </>
      )}
    </svg>
  );
}
