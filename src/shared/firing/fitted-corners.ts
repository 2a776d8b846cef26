import type { Corners, Points, RoughCorners } from './straight-stretches.ts';

/** Gauss-Newton steps: the first three do nearly all. */
const STEPS = 4;
/** What is known of a corner's height before the readings, °C, and of its moment, minutes. */
const HEIGHT_DOUBT = 30;
const MOMENT_DOUBT = 1;
/** No step moves a corner by more than this share of the way to its neighbour. */
const FARTHEST_MOVE = 0.4;

/**
 * Heights and moments of the corners by least squares of one unbroken line through all points.
 * Lines fitted apart meet a little beside the true corner; held together they find it. Each point
 * touches only the two corners around it, so the normal equations are block tridiagonal.
 */
export function fittedCorners(points: Points, corners: RoughCorners): Corners {
  const k = corners.minutes.length;
  if (k < 2) return corners;
  const minutes = corners.minutes.slice();
  const celsius = corners.celsius.slice();
  for (let step = 0; step < STEPS; step += 1) {
    const { blocks, beside, right } = normalEquations(points, minutes, celsius, corners.mayMove);
    const change = solved(blocks, beside, right);
    for (let c = 0; c < k; c += 1) {
      celsius[c] = at(celsius, c) + at(change, 2 * c);
    }
    const before = minutes.slice();
    for (let c = 1; c < k - 1; c += 1) {
      if (corners.mayMove[c] !== true) continue;
      const back = FARTHEST_MOVE * (at(before, c - 1) - at(before, c));
      const on = FARTHEST_MOVE * (at(before, c + 1) - at(before, c));
      minutes[c] = at(before, c) + Math.min(on, Math.max(back, at(change, 2 * c + 1)));
    }
  }
  return { minutes, celsius };
}

interface Equations {
  /** For each corner the symmetric 2 × 2 block [hh, hm, mm] of height h and moment m. */
  readonly blocks: Float64Array;
  /** For each corner its block with the next, [hh, hm, mh, mm]. */
  readonly beside: Float64Array;
  readonly right: Float64Array;
}

function normalEquations(
  points: Points,
  minutes: Float64Array,
  celsius: Float64Array,
  mayMove: readonly boolean[],
): Equations {
  const k = minutes.length;
  const blocks = new Float64Array(3 * k);
  const beside = new Float64Array(4 * k);
  const right = new Float64Array(2 * k);
  for (let c = 0; c < k; c += 1) {
    blocks[3 * c] = 1 / HEIGHT_DOUBT ** 2;
    blocks[3 * c + 2] = 1 / MOMENT_DOUBT ** 2;
  }
  let c = 0;
  for (let i = 0; i < points.minutes.length; i += 1) {
    const minute = at(points.minutes, i);
    while (c < k - 2 && at(minutes, c + 1) <= minute) c += 1;
    const length = at(minutes, c + 1) - at(minutes, c);
    const share = Math.min(1, Math.max(0, (minute - at(minutes, c)) / length));
    const slope = (at(celsius, c + 1) - at(celsius, c)) / length;
    const weight = 1 / at(points.errors, i) ** 2;
    const off = at(points.celsius, i) - at(celsius, c) - slope * share * length;
    const h0 = 1 - share;
    const h1 = share;
    const m0 = mayMove[c] === true ? -slope * h0 : 0;
    const m1 = mayMove[c + 1] === true ? -slope * h1 : 0;
    add(blocks, 3 * c, weight * h0 * h0);
    add(blocks, 3 * c + 1, weight * h0 * m0);
    add(blocks, 3 * c + 2, weight * m0 * m0);
    add(blocks, 3 * c + 3, weight * h1 * h1);
    add(blocks, 3 * c + 4, weight * h1 * m1);
    add(blocks, 3 * c + 5, weight * m1 * m1);
    add(beside, 4 * c, weight * h0 * h1);
    add(beside, 4 * c + 1, weight * h0 * m1);
    add(beside, 4 * c + 2, weight * m0 * h1);
    add(beside, 4 * c + 3, weight * m0 * m1);
    add(right, 2 * c, weight * h0 * off);
    add(right, 2 * c + 1, weight * m0 * off);
    add(right, 2 * c + 2, weight * h1 * off);
    add(right, 2 * c + 3, weight * m1 * off);
  }
  return { blocks, beside, right };
}

/** Elimination, block by block from the first corner on, and back. Changes its arguments. */
function solved(blocks: Float64Array, beside: Float64Array, right: Float64Array): Float64Array {
  const k = blocks.length / 3;
  for (let c = 0; c + 1 < k; c += 1) {
    const [b00, b01, b10, b11] = [0, 1, 2, 3].map((j) => at(beside, 4 * c + j)) as [
      number,
      number,
      number,
      number,
    ];
    // Rows of F = Bᵀ·D⁻¹, by which the next block and right side lose this one.
    const [f00, f01] = divided(blocks, c, b00, b10);
    const [f10, f11] = divided(blocks, c, b01, b11);
    const r0 = at(right, 2 * c);
    const r1 = at(right, 2 * c + 1);
    add(blocks, 3 * c + 3, -(f00 * b00 + f01 * b10));
    add(blocks, 3 * c + 4, -(f00 * b01 + f01 * b11));
    add(blocks, 3 * c + 5, -(f10 * b01 + f11 * b11));
    add(right, 2 * c + 2, -(f00 * r0 + f01 * r1));
    add(right, 2 * c + 3, -(f10 * r0 + f11 * r1));
  }
  const out = new Float64Array(2 * k);
  for (let c = k - 1; c >= 0; c -= 1) {
    const h = at(out, 2 * c + 2);
    const m = at(out, 2 * c + 3);
    const r0 = at(right, 2 * c) - at(beside, 4 * c) * h - at(beside, 4 * c + 1) * m;
    const r1 = at(right, 2 * c + 1) - at(beside, 4 * c + 2) * h - at(beside, 4 * c + 3) * m;
    [out[2 * c], out[2 * c + 1]] = divided(blocks, c, r0, r1);
  }
  return out;
}

/** D⁻¹·(x, y) for the block of corner c. */
function divided(blocks: Float64Array, c: number, x: number, y: number): [number, number] {
  const hh = at(blocks, 3 * c);
  const hm = at(blocks, 3 * c + 1);
  const mm = at(blocks, 3 * c + 2);
  const size = hh * mm - hm * hm;
  if (!(size > 0)) return [hh > 0 ? x / hh : 0, 0];
  return [(mm * x - hm * y) / size, (hh * y - hm * x) / size];
}

function add(values: Float64Array, i: number, value: number): void {
  values[i] = (values[i] ?? 0) + value;
}

function at(values: Float64Array, i: number): number {
  return values[i] ?? 0;
}
