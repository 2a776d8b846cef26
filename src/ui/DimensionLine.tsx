import type { Spot } from './kiln-plan.ts';

interface Props {
  readonly from: Spot;
  readonly to: Spot;
  readonly words: string;
}

/** A dimension as draughtsmen write it: a line between two slant strokes, its figure on paper. */
export function DimensionLine({ from, to, words }: Props) {
  const upright = from.x === to.x;
  const middle = { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 };
  return (
    <g>
      <path
        className="stroke-soot-2"
        fill="none"
        d={`M${from.x} ${from.y}L${to.x} ${to.y}M${from.x - 4} ${from.y + 4}l8-8M${to.x - 4} ${to.y + 4}l8-8`}
      />
      {!upright && (
        <rect
          className="fill-ash"
          x={middle.x - words.length * 3.8}
          y={middle.y - 7}
          width={words.length * 7.6}
          height="14"
        />
      )}
      <text
        className="fill-soot font-reading"
        fontSize="12"
        letterSpacing="-0.3"
        textAnchor={upright ? 'start' : 'middle'}
        x={upright ? middle.x + 7 : middle.x}
        y={middle.y + 4}
      >
        {words}
      </text>
    </g>
  );
}
