import { Delaunay } from 'd3-delaunay';
import { penStroke, wander, type Point } from './lines.ts';
import { between, type Random } from './random.ts';

/**
 * A crackle network. Cells of a Voronoi diagram over unevenly strewn points; their edges wander, a
 * few are left out, and a finer network lies in the coarse one, as glaze does when it goes on
 * crazing after the first cracks have taken the smoke.
 */
export interface CrackleLine {
  readonly points: readonly Point[];
  readonly width: number;
  readonly coarse: boolean;
}

interface CrackleOptions {
  readonly width: number;
  readonly height: number;
  /** Coarse cells over the whole field. */
  readonly cells: number;
  /** Fine cells for each coarse one; 0 for none. */
  readonly fine: number;
  /** Stroke width of a coarse line in pixels. */
  readonly line: number;
  /** How much denser the network is towards some places, 0 to 1. */
  readonly clustering?: number;
}

function strewn(random: Random, options: CrackleOptions, count: number): Float64Array {
  const { width, height, clustering = 0.5 } = options;
  const centres = Array.from({ length: 4 }, () => [random() * width, random() * height] as const);
  const out: number[] = [];
  const spacing = Math.sqrt((width * height) / count);
  let tries = 0;
  while (out.length < count * 2 && tries < count * 60) {
    tries += 1;
    const x = random() * width;
    const y = random() * height;
    const nearest = Math.min(...centres.map(([cx, cy]) => Math.hypot(x - cx, y - cy)));
    const loosen = 1 - clustering * 0.6 * Math.exp(-nearest / (0.22 * Math.min(width, height)));
    const least = spacing * 0.62 * loosen;
    let clear = true;
    for (let i = 0; i < out.length && clear; i += 2) {
      clear = Math.hypot(x - (out[i] ?? 0), y - (out[i + 1] ?? 0)) >= least;
    }
    if (clear) out.push(x, y);
  }
  return Float64Array.from(out);
}

function edges(points: Float64Array, width: number, height: number): [Point, Point][] {
  const delaunay = new Delaunay(points);
  const voronoi = delaunay.voronoi([-width, -height, 2 * width, 2 * height]);
  const { halfedges } = delaunay;
  const centre = (triangle: number): Point => [
    voronoi.circumcenters[triangle * 2] ?? 0,
    voronoi.circumcenters[triangle * 2 + 1] ?? 0,
  ];
  const out: [Point, Point][] = [];
  for (let e = 0; e < halfedges.length; e += 1) {
    const other = halfedges[e] ?? -1;
    if (other > e) out.push([centre(Math.floor(e / 3)), centre(Math.floor(other / 3))]);
  }
  return out;
}

export function crackleLines(random: Random, options: CrackleOptions): CrackleLine[] {
  const { width, height, cells, fine, line } = options;
  const lines: CrackleLine[] = [];
  const add = (count: number, coarse: boolean) => {
    for (const [from, to] of edges(strewn(random, options, count), width, height)) {
      const length = Math.hypot(to[0] - from[0], to[1] - from[1]);
      if (length > width * 0.6 || (!coarse && random() < 0.3) || (coarse && random() < 0.04))
        continue;
      const steps = Math.max(2, Math.round(length / 16));
      const weight = coarse ? 0.35 + 1.1 * random() ** 2 : between(random, 0.16, 0.4);
      lines.push({
        points: wander(random, from, to, steps, Math.min(5, length * 0.035)),
        width: line * weight,
        coarse,
      });
    }
  };
  if (fine > 0) add(Math.round(cells * fine), false);
  add(cells, true);
  return lines;
}

/** Ink the network: a faint smoke halo beneath soot-filled lines. `place` bends it onto a form. */
export function inkCrackle(
  random: Random,
  lines: readonly CrackleLine[],
  place: (point: Point) => Point | null,
  ink: {
    readonly colour: string;
    readonly halo: number;
    readonly strength: number;
    readonly scale?: (point: Point) => number;
  },
): string {
  let halo = '';
  let strokes = '';
  for (const { points, width, coarse } of lines) {
    const placed: Point[] = [];
    for (const point of points) {
      const at = place(point);
      if (at) placed.push(at);
    }
    if (placed.length < 2) continue;
    const opacity = (coarse ? 0.92 : 0.6) * ink.strength * between(random, 0.8, 1.05);
    const thin = points[0] && ink.scale ? ink.scale(points[0]) : 1;
    const d = penStroke(random, placed, width * thin);
    strokes += `<path d="${d}" fill="${ink.colour}" fill-opacity="${Math.min(1, opacity).toFixed(2)}"/>`;
    if (coarse && ink.halo > 0) {
      halo += `<path d="${penStroke(random, placed, width * thin * 4.6)}" fill="${ink.colour}"/>`;
    }
  }
  const under = halo ? `<g opacity="${ink.halo}" filter="url(#soft6)">${halo}</g>` : '';
  return `${under}<g>${strokes}</g>`;
}
