import { useId } from 'react';
import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import { HeatGradient } from '../ui/HeatGradient.tsx';
import { stripOutline } from '../ui/strip-shape.ts';

const WIDTH = 320;
const OWN_HEIGHT = 10;
const OTHER_HEIGHT = 22;

interface Props {
  /** Minute and °C from the start of each firing. */
  readonly own: readonly HeatPoint[];
  readonly other: readonly HeatPoint[];
  /** One scale for all pairs shown together. */
  readonly scaleMinutes: number;
  readonly alt: string;
}

/**
 * The climb asked about as a narrow band on top of another one, minute over minute: a stall shows
 * as one long red in both. One image, no tab stop.
 */
export function ClimbPair({ own, other, scaleMinutes, alt }: Props) {
  return (
    <svg
      role="img"
      aria-label={alt}
      viewBox={`0 0 ${WIDTH} ${OWN_HEIGHT + OTHER_HEIGHT + 3}`}
      className="ink-drawing block h-auto w-full"
    >
      <Band points={own} scaleMinutes={scaleMinutes} top={1} height={OWN_HEIGHT} />
      <Band points={other} scaleMinutes={scaleMinutes} top={OWN_HEIGHT + 2} height={OTHER_HEIGHT} />
    </svg>
  );
}

interface BandProps {
  readonly points: readonly HeatPoint[];
  readonly scaleMinutes: number;
  readonly top: number;
  readonly height: number;
}

function Band({ points, scaleMinutes, top, height }: BandProps) {
  const gradientId = useId();
  const last = points[points.length - 1];
  if (!last) return null;
  const torn = last[0] > scaleMinutes;
  const xOf = (minute: number) => 1 + (minute / scaleMinutes) * (WIDTH - 2);
  const end = torn ? WIDTH - 1 : Math.max(3, xOf(last[0]));
  return (
    <>
      <defs>
        <HeatGradient id={gradientId} points={points} xOf={xOf} toleranceCelsius={8} />
      </defs>
      <path
        className="heat stroke-soot-2"
        d={stripOutline(1, end, top, height, torn)}
        fill={`url(#${gradientId})`}
        strokeWidth="1"
        vectorEffect="non-scaling-stroke"
      />
    </>
  );
}
