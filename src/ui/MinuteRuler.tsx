interface Props {
  readonly ticks: readonly number[];
  readonly xOf: (minute: number) => number;
  readonly y: number;
  /** Right end of the drawing, which no figure passes. */
  readonly width: number;
}

/** A ruled scale of minutes; the unit stands with the last figure that has room for it. */
export function MinuteRuler({ ticks, xOf, y, width }: Props) {
  const figureWidth = (tick: number) => String(tick).length * 7;
  const last = ticks[ticks.length - 1];
  return (
    <g aria-hidden="true">
      {ticks.map((tick) => {
        const x = xOf(tick);
        const label = tick === last ? `${tick}\u00a0min` : String(tick);
        const half = tick === last ? figureWidth(tick) / 2 + 26 : figureWidth(tick) / 2;
        const anchor = x < 12 ? 'start' : x + half > width ? 'end' : 'middle';
        return (
          <g key={tick}>
            <path className="stroke-soot-2" d={`M${x} ${y}v6`} />
            <text
              className="fill-soot-2 font-reading"
              fontSize="12"
              letterSpacing="-0.3"
              x={anchor === 'start' ? 0 : anchor === 'end' ? width : x}
              y={y + 20}
              textAnchor={anchor}
            >
              {label}
            </text>
          </g>
        );
      })}
    </g>
  );
}
