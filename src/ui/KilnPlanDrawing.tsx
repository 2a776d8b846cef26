import type { KilnDimensions } from './kiln-dimensions.ts';
import { burnerPlan, outsideHalves } from './kiln-plan.ts';
import type { BurnerPlan, Spot } from './kiln-plan.ts';

const BURNER_MM = 170;
const BOX = { width: 320, height: 260 } as const;

interface Props {
  readonly id: string;
  readonly kiln: KilnDimensions;
  readonly hatch: string;
}

/** The kiln from above without its lid: wall, port, burner at its angle, the way of the flame. */
export function KilnPlanDrawing({ id, kiln, hatch }: Props) {
  const halves = outsideHalves(kiln);
  const burner = burnerPlan(kiln);
  const count = Math.min(4, Math.max(1, kiln.burner?.count ?? 1));
  const reach = burner ? BURNER_MM + Math.max(0, kiln.burner?.setbackMm ?? 0) : 0;
  const across = 2 * halves.width + reach * (count > 1 ? 2 : 1);
  const deep = 2 * halves.depth + (count > 1 ? reach * 2 : reach * 0.8);
  const scale = Math.min((BOX.width - 16) / across, (BOX.height - 16) / deep);
  const centre = {
    x: BOX.width - 8 - (halves.width + (count > 1 ? reach : 0)) * scale,
    y: BOX.height - 8 - (halves.depth + reach * (count > 1 ? 1 : 0.8)) * scale,
  };
  const at = (spot: Spot) =>
    `${(centre.x + spot.x * scale).toFixed(1)} ${(centre.y + spot.y * scale).toFixed(1)}`;
  const ring = (halfWidth: number, halfDepth: number, outBy = 0) => {
    const [w, d] = [halfWidth * scale + outBy, halfDepth * scale + outBy];
    return kiln.shape === 'round'
      ? `M${centre.x - w} ${centre.y}a${w} ${w} 0 1 0 ${2 * w} 0a${w} ${w} 0 1 0 ${-2 * w} 0Z`
      : `M${centre.x - w} ${centre.y - d}h${2 * w}v${2 * d}h${-2 * w}Z`;
  };
  return (
    <svg
      viewBox={`0 0 ${BOX.width} ${BOX.height}`}
      className="ink-drawing block h-auto w-full"
      aria-hidden="true"
    >
      <defs>
        <clipPath id={`${id}-wall`}>
          <path
            clipRule="evenodd"
            d={
              ring(halves.width, halves.depth, 1) + ring(halves.insideWidth, halves.insideDepth, -1)
            }
          />
        </clipPath>
      </defs>
      <path
        className="stroke-soot"
        strokeWidth="1.5"
        fill={hatch}
        fillRule="evenodd"
        d={ring(halves.width, halves.depth) + ring(halves.insideWidth, halves.insideDepth)}
      />
      {burner &&
        Array.from({ length: count }, (_, index) => (
          <g key={index} transform={`rotate(${(360 / count) * index} ${centre.x} ${centre.y})`}>
            <BurnerFromAbove
              wallClip={`url(#${id}-wall)`}
              burner={burner}
              portMm={kiln.port?.openingMm ?? 60}
              scale={scale}
              at={at}
            />
          </g>
        ))}
    </svg>
  );
}

interface BurnerProps {
  /** The wall seen from above: the port is cut out of it and nowhere else. */
  readonly wallClip: string;
  readonly burner: BurnerPlan;
  readonly portMm: number;
  readonly scale: number;
  readonly at: (spot: Spot) => string;
}

function BurnerFromAbove({ wallClip, burner, portMm, scale, at }: BurnerProps) {
  const { aim, port, tip, meets } = burner;
  const side = { x: -aim.y, y: aim.x };
  const along = (from: Spot, forward: number, aside: number): Spot => ({
    x: from.x + aim.x * forward + side.x * aside,
    y: from.y + aim.y * forward + side.y * aside,
  });
  const bar = (from: Spot, back: number, front: number, half: number) =>
    `M${at(along(from, back, -half))}L${at(along(from, front, -half))}L${at(along(from, front, half))}L${at(along(from, back, half))}Z`;
  // One edge of a slanting port reaches the chamber later than its axis; the wall clips the rest.
  const through = burner.throughWallMm + portMm * 0.9;
  const head = (lengthMm: number) => lengthMm / scale;
  return (
    <>
      <g clipPath={wallClip}>
        <path className="fill-ash" d={bar(port, -portMm, through, portMm / 2)} />
        <path
          className="stroke-soot"
          strokeWidth="1.25"
          fill="none"
          d={`M${at(along(port, -portMm, -portMm / 2))}L${at(along(port, through, -portMm / 2))}M${at(along(port, -portMm, portMm / 2))}L${at(along(port, through, portMm / 2))}`}
        />
      </g>
      <path
        className="fill-ash stroke-soot"
        strokeWidth="1.5"
        d={bar(tip, -BURNER_MM, -60, 11) + bar(tip, -60, 0, 20)}
      />
      <path
        className="stroke-verdigris"
        strokeWidth="2"
        strokeDasharray="6 4"
        fill="none"
        d={`M${at(along(tip, 10, 0))}L${at(along(meets, -head(6), 0))}`}
      />
      <path
        className="stroke-verdigris"
        strokeWidth="2"
        fill="none"
        d={`M${at(along(meets, -head(14), -head(5)))}L${at(along(meets, -head(6), 0))}L${at(along(meets, -head(14), head(5)))}`}
      />
    </>
  );
}
