import { useId } from 'react';
import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import { HeatGradient } from './HeatGradient.tsx';
import { stripOutline } from './strip-shape.ts';

const WIDTH = 320;
const HEIGHT = 28;

interface Props {
  /** Minute and °C from the start of the climb. */
  readonly points: readonly HeatPoint[];
  /** One scale for all strips shown together: see `stripScaleMinutes`. */
  readonly scaleMinutes: number;
  /** Says what the strip shows, in words. */
  readonly alt: string;
}

/** A climb as a band in a list: one image, no tab stop. Longer than the scale, it ends torn. */
export function SmallGlowStrip({ points, scaleMinutes, alt }: Props) {
  const gradientId = useId();
  const first = points[0];
  const last = points[points.length - 1];
  if (!first || !last) return <NoStrip alt={alt} />;
  const start = first[0];
  const minutes = last[0] - start;
  const torn = minutes > scaleMinutes;
  const xOf = (minute: number) => 1 + ((minute - start) / scaleMinutes) * (WIDTH - 2);
  const outline = stripOutline(
    1,
    torn ? WIDTH - 1 : Math.max(3, xOf(last[0])),
    1,
    HEIGHT - 2,
    torn,
  );
  return (
    <span className="relative block">
      <svg
        role="img"
        aria-label={torn ? `${alt} (${Math.round(minutes)} min, longer than the scale)` : alt}
        viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
        className="ink-drawing block h-auto w-full"
      >
        <defs>
          <HeatGradient id={gradientId} points={points} xOf={xOf} toleranceCelsius={8} />
        </defs>
        <path
          className="heat stroke-soot-2"
          d={outline}
          fill={`url(#${gradientId})`}
          strokeWidth="1"
          vectorEffect="non-scaling-stroke"
        />
      </svg>
      {torn && (
        <span
          aria-hidden="true"
          className="reading absolute right-[7%] top-1/2 -translate-y-1/2 bg-ash px-1 text-note leading-tight text-soot"
        >
          {Math.round(minutes)} min
        </span>
      )}
    </span>
  );
}

/** A note without a record still has its place in the column: an empty rule, said in words. */
function NoStrip({ alt }: { readonly alt: string }) {
  return (
    <svg
      role="img"
      aria-label={alt}
      viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
      className="block h-auto w-full"
    >
      <path className="stroke-soot-2" d={`M0 ${HEIGHT / 2}H${WIDTH}`} strokeDasharray="2 6" />
    </svg>
  );
}
