import { estimateTextWidth } from './label-lanes.ts';

interface Props {
  readonly x: number;
  readonly top: number;
  readonly height: number;
  /** Width of the drawing: the flag stays inside it. */
  readonly width: number;
  readonly text: string;
}

/** The hairline of a read-off and its figures, on paper of their own so that they always read. */
export function ReadOffFlag({ x, top, height, width, text }: Props) {
  const flagWidth = estimateTextWidth(text, 14) + 18;
  const flagX = Math.max(1, Math.min(x - flagWidth / 2, width - flagWidth - 1));
  const flagY = top + height / 2 - 14;
  return (
    <g aria-hidden="true">
      <path className="stroke-ash" strokeWidth="4" d={`M${x} ${top}v${height}`} />
      <path className="stroke-soot" strokeWidth="1.5" d={`M${x} ${top}v${height}`} />
      <rect className="fill-ash stroke-soot" x={flagX} y={flagY} width={flagWidth} height="28" />
      <text
        className="fill-soot font-reading"
        fontSize="14"
        letterSpacing="-0.4"
        textAnchor="middle"
        x={flagX + flagWidth / 2}
        y={flagY + 19}
      >
        {text}
      </text>
    </g>
  );
}
