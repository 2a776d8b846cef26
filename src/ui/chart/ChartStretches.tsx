import type { ChartFrame } from './chart-frame.ts';

interface Span {
  readonly fromMinute: number;
  readonly toMinute: number;
}

interface Props {
  readonly id: string;
  readonly frame: ChartFrame;
  /** Hatched: what went wrong. */
  readonly stretches: readonly Span[];
  /** Plain: what was meant. */
  readonly hold: Span | null;
}

/** Bands of minutes behind a curve; their words stand in the lanes above. */
export function ChartStretches({ id, frame, stretches, hold }: Props) {
  return (
    <g className="shaded" aria-hidden="true">
      <defs>
        <pattern id={`${id}-hatch`} width="7" height="7" patternUnits="userSpaceOnUse">
          <path className="fill-line" opacity="0.45" d="M0 0h7v7H0z" />
          <path className="stroke-soot-2" opacity="0.6" d="M-1 8L8 -1M-1 1L1 -1M6 8L8 6" />
        </pattern>
      </defs>
      {hold && <Band span={hold} frame={frame} fill="var(--verdigris-tint)" />}
      {stretches.map((span) => (
        <Band key={span.fromMinute} span={span} frame={frame} fill={`url(#${id}-hatch)`} />
      ))}
    </g>
  );
}

interface BandProps {
  readonly span: Span;
  readonly frame: ChartFrame;
  readonly fill: string;
}

function Band({ span, frame, fill }: BandProps) {
  const { xOf, plot, startMinute, endMinute } = frame;
  if (span.toMinute < startMinute || span.fromMinute > endMinute) return null;
  const from = xOf(Math.max(startMinute, span.fromMinute));
  const to = xOf(Math.min(endMinute, span.toMinute));
  return (
    <>
      <rect
        fill={fill}
        x={from}
        y={plot.top}
        width={Math.max(1, to - from)}
        height={plot.bottom - plot.top}
      />
      <path
        className="stroke-soot-2"
        strokeDasharray="1 3"
        d={`M${from} ${plot.top}V${plot.bottom}M${to} ${plot.top}V${plot.bottom}`}
      />
    </>
  );
}
