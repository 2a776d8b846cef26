import type { Point } from './lines.ts';
import { polygon, smooth } from './lines.ts';

/**
 * A thrown form seen a little from above: a profile turned about its axis. Surface decoration is
 * drawn in (u, v), u the angle round the pot (−π/2 left edge, π/2 right edge), v from rim to foot,
 * and bent onto the form, so that a crackle tightens towards the edges as it does on a real pot.
 */
export interface Vessel {
  readonly cx: number;
  readonly top: number;
  readonly height: number;
  /** Largest radius in pixels. */
  readonly radius: number;
  /** Profile: radius as a share of the largest, at v = 0 … 1, evenly spaced. */
  readonly profile: readonly number[];
  /** Camera's height: 0 level with the rim, 0.3 well above. */
  readonly tilt: number;
}

export function radiusAt(vessel: Vessel, v: number): number {
  const { profile, radius } = vessel;
  const position = Math.max(0, Math.min(1, v)) * (profile.length - 1);
  const i = Math.floor(position);
  const f = position - i;
  const at = (k: number) => profile[Math.max(0, Math.min(profile.length - 1, k))] ?? 0;
  const [a, b, c, d] = [at(i - 1), at(i), at(i + 1), at(i + 2)];
  const bent = b + 0.5 * f * (c - a + f * (2 * a - 5 * b + 4 * c - d + f * (3 * (b - c) + d - a)));
  return Math.max(0, bent) * radius;
}

export function onVessel(vessel: Vessel, u: number, v: number): Point {
  const r = radiusAt(vessel, v);
  return [
    vessel.cx + r * Math.sin(u),
    vessel.top + vessel.height * v + vessel.tilt * r * Math.cos(u),
  ];
}

/** Flat decoration coordinates (x along the girth, y down the wall, pixels) bent onto the vessel. */
export function wrap(vessel: Vessel): {
  readonly width: number;
  readonly height: number;
  readonly place: (point: Point) => Point | null;
  /** How much narrower the pot is here than at its widest: lines thin with it. */
  readonly scale: (point: Point) => number;
} {
  const width = Math.PI * vessel.radius;
  return {
    width,
    height: vessel.height,
    scale: ([x, y]) =>
      Math.max(0.35, radiusAt(vessel, y / vessel.height) / vessel.radius) *
      (0.45 + 0.55 * Math.cos(Math.max(-1.57, Math.min(1.57, x / vessel.radius - Math.PI / 2)))),
    place: ([x, y]) => {
      const u = x / vessel.radius - Math.PI / 2;
      const v = y / vessel.height;
      if (u < -1.62 || u > 1.62 || v < -0.02 || v > 1.02) return null;
      return onVessel(vessel, Math.max(-1.57, Math.min(1.57, u)), v);
    },
  };
}

/** Outline of the body between two heights. */
export function bodyPath(vessel: Vessel, from = 0, to = 1): string {
  const left: Point[] = [];
  const right: Point[] = [];
  for (let i = 0; i <= 60; i += 1) {
    const v = from + ((to - from) * i) / 60;
    left.push(onVessel(vessel, -Math.PI / 2, v));
    right.push(onVessel(vessel, Math.PI / 2, v));
  }
  const arc = (v: number, from_: number, to_: number): Point[] =>
    Array.from({ length: 31 }, (_, i) => onVessel(vessel, from_ + ((to_ - from_) * i) / 30, v));
  return polygon([
    ...left,
    ...arc(to, -Math.PI / 2, Math.PI / 2),
    ...right.reverse(),
    ...(from === 0 ? arc(0, Math.PI / 2, Math.PI * 1.5) : arc(from, Math.PI / 2, -Math.PI / 2)),
  ]);
}

export function ring(vessel: Vessel, v: number, grow = 0): string {
  const r = radiusAt(vessel, v) + grow;
  const y = vessel.top + vessel.height * v;
  return `cx="${vessel.cx}" cy="${y.toFixed(1)}" rx="${Math.max(1, r).toFixed(1)}" ry="${Math.max(1, r * vessel.tilt).toFixed(1)}"`;
}

export interface VesselLook {
  readonly vessel: Vessel;
  readonly id: string;
  /** Fill of the glazed body: a colour, or `url(#…)`. */
  readonly fill: string;
  /** A noise filter to paint the body with, instead of its fill. */
  readonly paint?: string;
  /** Drawn on the body, clipped to it. */
  readonly surface: string;
  readonly inside?: string;
  readonly insideSurface?: string;
  /** Bare smoked clay from this height down. */
  readonly bareFrom?: number;
  readonly bareColour?: string;
  readonly gloss?: number;
  readonly rimColour?: string;
  readonly rimWidth?: number;
}

/** The pot with its light, its shadow and its inside. */
export function drawVessel(look: VesselLook): string {
  const { vessel, id } = look;
  const bareFrom = look.bareFrom ?? 0.9;
  const footY = vessel.top + vessel.height;
  const footR = radiusAt(vessel, 1);
  const rimR = radiusAt(vessel, 0);
  const wall = look.rimWidth ?? Math.max(5, vessel.radius * 0.03);
  const open = rimR > 12;
  const x0 = vessel.cx - vessel.radius;
  const y0 = vessel.top - rimR * vessel.tilt - 10;
  const boxW = vessel.radius * 2;
  const boxH = vessel.height + (rimR + vessel.radius) * vessel.tilt + 40;
  const edge: Point[] = Array.from({ length: 41 }, (_, i) =>
    onVessel(
      vessel,
      -Math.PI / 2 + (Math.PI * i) / 40,
      bareFrom +
        Math.min(1, (1 - bareFrom) * 9) *
          (0.011 * Math.sin(i * 0.55 + vessel.cx) + 0.008 * Math.sin(i * 1.23 + vessel.top)),
    ),
  );
  const bare = polygon([
    ...edge,
    [vessel.cx + vessel.radius + 20, footY + vessel.radius],
    [vessel.cx - vessel.radius - 20, footY + vessel.radius],
  ]);
  const highlight: Point[] = [];
  for (let i = 0; i <= 24; i += 1)
    highlight.push(onVessel(vessel, -0.72, 0.06 + (i / 24) * (bareFrom - 0.14)));
  return `<defs><clipPath id="${id}c"><path d="${bodyPath(vessel)}"/></clipPath>
<clipPath id="${id}m"><ellipse ${ring(vessel, 0, -wall)}/></clipPath>
<linearGradient id="${id}s" x1="0" y1="0" x2="1" y2="0"><stop offset="0" stop-color="#1d1a18" stop-opacity="0.5"/><stop offset="0.14" stop-color="#1d1a18" stop-opacity="0.13"/><stop offset="0.34" stop-color="#fff" stop-opacity="0.06"/><stop offset="0.56" stop-color="#1d1a18" stop-opacity="0.06"/><stop offset="0.82" stop-color="#1d1a18" stop-opacity="0.42"/><stop offset="1" stop-color="#1d1a18" stop-opacity="0.72"/></linearGradient>
<linearGradient id="${id}v" x1="0" y1="0" x2="0" y2="1"><stop offset="0.55" stop-color="#1d1a18" stop-opacity="0"/><stop offset="1" stop-color="#1d1a18" stop-opacity="0.34"/></linearGradient>
<linearGradient id="${id}i" x1="0" y1="0" x2="1" y2="0.35"><stop offset="0" stop-color="#0d0c0b" stop-opacity="0.88"/><stop offset="0.5" stop-color="#0d0c0b" stop-opacity="0.66"/><stop offset="1" stop-color="#0d0c0b" stop-opacity="0.2"/></linearGradient></defs>
<ellipse cx="${vessel.cx + vessel.radius * 0.42}" cy="${footY + footR * vessel.tilt * 0.8}" rx="${vessel.radius * 1.22}" ry="${vessel.radius * (0.1 + vessel.tilt * 0.5)}" fill="#26221e" opacity="0.34" filter="url(#soft30)"/>
<ellipse cx="${vessel.cx + 10}" cy="${footY + footR * vessel.tilt * 0.75}" rx="${footR * 1.1}" ry="${Math.max(10, footR * vessel.tilt * 0.7)}" fill="#15120f" opacity="0.55" filter="url(#soft14)"/>
<g clip-path="url(#${id}c)"><rect x="${x0}" y="${y0}" width="${boxW}" height="${boxH}" fill="${look.fill}"${look.paint ? ` filter="url(#${look.paint})"` : ''}/>
${look.surface}
<path d="${bare}" fill="${look.bareColour ?? '#2b2725'}" filter="url(#rough)"/>
<rect x="${x0}" y="${y0}" width="${boxW}" height="${boxH}" fill="url(#${id}s)"/><rect x="${x0}" y="${y0}" width="${boxW}" height="${boxH}" fill="url(#${id}v)"/>
<path d="${smooth(highlight)}" fill="none" stroke="#fff" stroke-width="${vessel.radius * 0.09}" stroke-linecap="round" opacity="${look.gloss ?? 0.5}" filter="url(#soft14)"/>
<path d="${smooth(highlight.slice(3, 13))}" fill="none" stroke="#fff" stroke-width="${vessel.radius * 0.025}" stroke-linecap="round" opacity="${(look.gloss ?? 0.5) * 1.3}" filter="url(#soft2)"/></g>
${
  open
    ? `<ellipse ${ring(vessel, 0)} fill="${look.rimColour ?? look.fill}"/><ellipse ${ring(vessel, 0, -wall)} fill="${look.inside ?? '#3b3632'}"/>
<g clip-path="url(#${id}m)">${look.insideSurface ?? ''}<ellipse ${ring(vessel, 0, -wall)} fill="url(#${id}i)"/></g>
<ellipse ${ring(vessel, 0, -wall / 2)} fill="none" stroke="#fff" stroke-opacity="0.28" stroke-width="2"/>`
    : ''
}`;
}
