const MINUTE_STEPS = [0.5, 1, 2, 5, 10, 15, 20, 30, 60, 120, 240, 480, 1440];
const DEGREE_STEPS = [10, 20, 50, 100, 200, 500];

/** The finest step of a list that leaves each of its ticks `room` px; the coarsest if none does. */
function stepFor(steps: readonly number[], span: number, width: number, room: number): number {
  const fitting = steps.find((step) => (step / span) * width >= room);
  return fitting ?? steps[steps.length - 1] ?? span;
}

function multiplesBetween(from: number, to: number, step: number): readonly number[] {
  const ticks: number[] = [];
  for (let tick = Math.ceil(from / step) * step; tick <= to + 1e-9; tick += step)
    ticks.push(tick === 0 ? 0 : tick);
  return ticks;
}

/** Round minutes between two ends, far enough apart for their figures. */
export function minuteTicks(from: number, to: number, width: number, room = 64): readonly number[] {
  if (!(to > from) || width <= 0) return [];
  return multiplesBetween(from, to, stepFor(MINUTE_STEPS, to - from, width, room));
}

/** Round degrees (of either unit) between two ends. */
export function degreeTicks(
  from: number,
  to: number,
  height: number,
  room = 34,
): readonly number[] {
  if (!(to > from) || height <= 0) return [];
  return multiplesBetween(from, to, stepFor(DEGREE_STEPS, to - from, height, room));
}
