import { estimateTextWidth } from '../label-lanes.ts';
import type { ChartFrame } from './chart-frame.ts';

const LINE_PX = 20;
const TYPE_PX = 14;
const FROM_HAIRLINE = 12;

interface Props {
  readonly frame: ChartFrame;
  readonly x: number;
  /** Where the curve stands there, px; null beside the record. */
  readonly y: number | null;
  /** One a line; the first with its figures. */
  readonly parts: readonly string[];
}

/** The hairline of a read-off with what stands there, beside it, so that the curve stays in sight. */
export function ChartReadOff({ frame, x, y, parts }: Props) {
  const { plot, width } = frame;
  const longest = Math.floor((width - 20) / (TYPE_PX * 0.56));
  const lines = parts.map((part) =>
    part.length > longest ? `${part.slice(0, longest - 1)}…` : part,
  );
  const boxWidth = Math.max(...lines.map((line) => estimateTextWidth(line, TYPE_PX))) + 18;
  const boxHeight = lines.length * LINE_PX + 10;
  const right = x + FROM_HAIRLINE + boxWidth <= width - 1;
  const beside = right ? x + FROM_HAIRLINE : x - FROM_HAIRLINE - boxWidth;
  const boxX = Math.max(1, Math.min(beside, width - boxWidth - 1));
  const curveY = y ?? plot.bottom;
  // Away from the curve: above it on the left of a climb, below it on the right.
  const wantedY = right ? curveY + 14 : curveY - boxHeight - 14;
  const boxY = Math.max(plot.top + 2, Math.min(wantedY, plot.bottom - boxHeight - 4));
  return (
    <g>
      <path className="stroke-ash" strokeWidth="4" d={`M${x} ${plot.top}V${plot.bottom}`} />
      <path className="stroke-soot" strokeWidth="1.5" d={`M${x} ${plot.top}V${plot.bottom}`} />
      {y !== null && (
        <path
          className="fill-verdigris stroke-ash"
          strokeWidth="2"
          d={`M${x - 6} ${y}l6-6 6 6-6 6z`}
        />
      )}
      <rect
        className="fill-ash stroke-soot"
        x={boxX}
        y={boxY}
        width={boxWidth}
        height={boxHeight}
      />
      {lines.map((line, index) => (
        <text
          key={index}
          className={index === 0 ? 'fill-soot font-reading' : 'fill-soot font-sans'}
          fontSize={TYPE_PX}
          letterSpacing={index === 0 ? '-0.4' : undefined}
          x={boxX + 9}
          y={boxY + 20 + index * LINE_PX}
        >
          {line}
        </text>
      ))}
    </g>
  );
}
