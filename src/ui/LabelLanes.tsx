import type { PlacedLabel } from './label-lanes.ts';
import { LABEL_SIZE, LANE_HEIGHT } from './lane-size.ts';

interface Props {
  readonly placed: readonly PlacedLabel[];
  readonly texts: ReadonlyMap<string, string>;
  /** Upper edge of the drawing the labels stand on. */
  readonly baseY: number;
}

/** Labels in their lanes above a drawing: leaders first, so that no text is struck through. */
export function LabelLanes({ placed, texts, baseY }: Props) {
  const laneY = (lane: number) => baseY - 7 - lane * LANE_HEIGHT;
  return (
    <g aria-hidden="true">
      <g className="stroke-soot-2" fill="none" strokeWidth="1">
        {placed.map((label) => {
          const y = laneY(label.lane) - 4.5;
          return label.spanToX === null ? (
            <path key={label.id} d={`M${label.x} ${baseY}V${label.over ? y + 8 : y - 4}`} />
          ) : (
            <path
              key={label.id}
              className="stroke-soot"
              strokeWidth="1.5"
              d={`M${label.x} ${y - 5}v10m0 -5H${label.spanToX}m0 -5v10`}
            />
          );
        })}
      </g>
      <g
        className="fill-soot stroke-ash font-sans"
        paintOrder="stroke"
        strokeWidth="4"
        fontSize={LABEL_SIZE}
      >
        {placed.map((label) => (
          <text key={label.id} x={label.textX} y={laneY(label.lane)} textAnchor={label.anchor}>
            {texts.get(label.id)}
          </text>
        ))}
      </g>
    </g>
  );
}
