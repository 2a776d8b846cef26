import { normal, type Random } from './random.ts';

export type Point = readonly [number, number];

const n = (value: number): string => value.toFixed(1);

/** A smooth path through points (Catmull-Rom as Béziers). */
export function smooth(points: readonly Point[], closed = false): string {
  const count = points.length;
  const at = (i: number): Point => {
    const index = closed ? (i + count) % count : Math.max(0, Math.min(count - 1, i));
    return points[index] ?? [0, 0];
  };
  let d = `M${n(at(0)[0])} ${n(at(0)[1])}`;
  for (let i = 0; i < (closed ? count : count - 1); i += 1) {
    const [p0, p1, p2, p3] = [at(i - 1), at(i), at(i + 1), at(i + 2)];
    const c1: Point = [p1[0] + (p2[0] - p0[0]) / 6, p1[1] + (p2[1] - p0[1]) / 6];
    const c2: Point = [p2[0] - (p3[0] - p1[0]) / 6, p2[1] - (p3[1] - p1[1]) / 6];
    d += `C${n(c1[0])} ${n(c1[1])} ${n(c2[0])} ${n(c2[1])} ${n(p2[0])} ${n(p2[1])}`;
  }
  return closed ? `${d}Z` : d;
}

export function polygon(points: readonly Point[]): string {
  return `M${points.map(([x, y]) => `${n(x)} ${n(y)}`).join('L')}Z`;
}

/** Points between two ends, pushed off the straight line as a crack or a hand does. */
export function wander(
  random: Random,
  from: Point,
  to: Point,
  steps: number,
  sway: number,
): Point[] {
  const dx = to[0] - from[0];
  const dy = to[1] - from[1];
  const length = Math.hypot(dx, dy) || 1;
  const out: Point[] = [];
  let drift = 0;
  for (let i = 0; i <= steps; i += 1) {
    const t = i / steps;
    drift = drift * 0.6 + normal(random) * sway;
    const hold = Math.sin(Math.PI * t);
    out.push([
      from[0] + dx * t + (-dy / length) * drift * hold,
      from[1] + dy * t + (dx / length) * drift * hold,
    ]);
  }
  return out;
}

/** An ink stroke with a pen's swelling: a closed shape along the points. */
export function penStroke(random: Random, points: readonly Point[], width: number): string {
  const left: Point[] = [];
  const right: Point[] = [];
  points.forEach((point, i) => {
    const before = points[Math.max(0, i - 1)] ?? point;
    const after = points[Math.min(points.length - 1, i + 1)] ?? point;
    const dx = after[0] - before[0];
    const dy = after[1] - before[1];
    const length = Math.hypot(dx, dy) || 1;
    const end = i === 0 || i === points.length - 1 ? 0.55 : 1;
    const half = (width / 2) * end * (0.8 + 0.4 * random());
    left.push([point[0] - (dy / length) * half, point[1] + (dx / length) * half]);
    right.push([point[0] + (dy / length) * half, point[1] - (dx / length) * half]);
  });
  return polygon([...left, ...right.reverse()]);
}

/** A hand-drawn straight line: `ink(random, [x, y], [x, y])` as an SVG path. */
export function ink(random: Random, from: Point, to: Point, width = 5, colour = '#2a2826'): string {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]);
  const steps = Math.max(4, Math.round(length / 40));
  const points = wander(random, from, to, steps, 1.3);
  return `<path d="${penStroke(random, points, width)}" fill="${colour}"/>`;
}

/** A hand-drawn outline through corners. */
export function inkOutline(
  random: Random,
  corners: readonly Point[],
  width = 5,
  closed = true,
  colour = '#2a2826',
): string {
  let out = '';
  for (let i = 0; i < corners.length - (closed ? 0 : 1); i += 1) {
    const from = corners[i] ?? [0, 0];
    const to = corners[(i + 1) % corners.length] ?? [0, 0];
    out += ink(random, from, to, width, colour);
  }
  return out;
}

/** A hand-drawn curve through points. */
export function inkCurve(
  points: readonly Point[],
  width = 5,
  colour = '#2a2826',
  closed = false,
): string {
  return `<path d="${smooth(points, closed)}" fill="none" stroke="${colour}" stroke-width="${width}" stroke-linecap="round" stroke-linejoin="round"/>`;
}
