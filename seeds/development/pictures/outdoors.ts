import { ink, inkOutline, penStroke, smooth, wander, type Point } from './lines.ts';
import { between, normal, seeded, type Random } from './random.ts';
import { label, noisePaint, sheet, SOOT, type Drawing } from './sheet.ts';

/** Kilns where they stand: the slip, the flats, the yard, the hill. Washes first, ink after. */

const W = 1600;
const H = 1067;

interface Light {
  readonly sky: readonly string[];
  readonly water: string;
  readonly flats: string;
  readonly far: string;
  readonly near: string;
}
const DAY: Light = {
  sky: ['#aebabf', '#c6cdcf', '#dde0de', '#cfd4d3', '#bcc6c9'],
  water: '#b9c4c6',
  flats: '#a59f92',
  far: '#8b979a',
  near: '#8f8878',
};
const DUSK: Light = {
  sky: ['#2d3740', '#3c4852', '#56626a', '#475460', '#333e48'],
  water: '#55626b',
  flats: '#343533',
  far: '#27303a',
  near: '#2a2927',
};
const WET: Light = {
  sky: ['#8b9599', '#9da6a8', '#aeb5b5', '#98a1a3', '#858f93'],
  water: '#9aa4a6',
  flats: '#77736a',
  far: '#737e82',
  near: '#69655b',
};

function estuary(random: Random, seed: number, light: Light): { defs: string; ground: string } {
  const horizon = H * 0.5;
  const ridge = (y: number, rise: number, steps: number): string => {
    const points: Point[] = Array.from({ length: steps + 1 }, (_, i) => [
      (W * i) / steps,
      y - Math.abs(normal(random)) * rise,
    ]);
    return `${smooth(points)}L${W} ${H}L0 ${H}Z`;
  };
  const channels = Array.from({ length: 7 }, (_, i) => {
    const y = horizon + 30 + i * i * 5.5 + i * 14;
    const from = between(random, -100, 500);
    const to = from + between(random, 500, 1200);
    return `<path d="${penStroke(random, wander(random, [from, y], [to, y + between(random, -8, 8)], 22, 5), 5 + i * 3.4)}" fill="${light.water}" opacity="0.85"/>`;
  }).join('');
  return {
    defs:
      noisePaint('sky', light.sky, { fx: 0.0011, fy: 0.005, seed, octaves: 5, contrast: 1.9 }) +
      noisePaint('mud', [light.flats, light.near, light.flats], {
        fx: 0.004,
        fy: 0.02,
        seed: seed + 1,
        contrast: 2,
      }),
    ground: `<rect width="${W}" height="${H}" fill="#bbb" filter="url(#sky)"/><path d="${ridge(horizon + 4, 46, 9)}" fill="${light.far}" opacity="0.75"/><path d="${ridge(horizon + 16, 15, 26)}" fill="${light.far}"/><rect y="${horizon + 18}" width="${W}" height="${H}" fill="#888" filter="url(#mud)"/><g filter="url(#soft2)">${channels}</g><rect y="${horizon + 4}" width="${W}" height="26" fill="${light.water}" opacity="0.9" filter="url(#soft2)"/>`,
  };
}

function slip(random: Random, light: Light, y = 850): string {
  const edge: Point[] = Array.from({ length: 13 }, (_, i) => [
    (W * i) / 12,
    y + 26 * Math.sin(i * 0.8) + normal(random) * 5,
  ]);
  const stones = Array.from({ length: 150 }, () => {
    const py = between(random, y + 40, H);
    const size = between(random, 4, 15) * (0.6 + ((py - y) / (H - y)) * 0.9);
    return `<ellipse cx="${between(random, 0, W).toFixed(0)}" cy="${py.toFixed(0)}" rx="${size.toFixed(1)}" ry="${(size * 0.5).toFixed(1)}" fill="${random() < 0.5 ? '#000' : '#fff'}" opacity="${between(random, 0.06, 0.18).toFixed(2)}"/>`;
  }).join('');
  return `<path d="${smooth(edge)}L${W} ${H}L0 ${H}Z" fill="${light.near}"/>${stones}`;
}

/** A fibre-lined drum on blocks. */
function drumKiln(cx: number, base: number, scale = 1, valve?: Point): string {
  const [w, h] = [290 * scale, 370 * scale];
  const [x, y] = [cx - w / 2, base - 70 * scale - h];
  const hose = valve
    ? `${cx - w * 1.5} ${base + 8}S${valve[0] + 150} ${valve[1]} ${valve[0]} ${valve[1]}`
    : `${cx - w * 1.9} ${base + 6}`;
  const ribs = [0.3, 0.66]
    .map(
      (t) =>
        `<path d="M${x} ${y + h * t}q${w / 2} ${22 * scale} ${w} 0" fill="none" stroke="#191715" stroke-width="6" opacity="0.6"/><path d="M${x} ${y + h * t + 8}q${w / 2} ${22 * scale} ${w} 0" fill="none" stroke="#fff" stroke-width="3" opacity="0.2"/>`,
    )
    .join('');
  return `<ellipse cx="${cx + 40}" cy="${base + 6}" rx="${w * 0.85}" ry="${26 * scale}" fill="#0d0c0b" opacity="0.5" filter="url(#soft14)"/>${[0.02, 0.36, 0.7].map((t) => `<rect x="${x + w * t}" y="${base - 70 * scale}" width="${w * 0.28}" height="${70 * scale}" fill="#8d8880" stroke="#24211f" stroke-width="4"/>`).join('')}
<path d="M${x} ${y}L${x} ${y + h}Q${cx} ${y + h + 34 * scale} ${x + w} ${y + h}L${x + w} ${y}Z" fill="url(#drum)"/><path d="M${x} ${y}L${x} ${y + h}Q${cx} ${y + h + 34 * scale} ${x + w} ${y + h}L${x + w} ${y}Z" fill="#221c18" filter="url(#speck)" opacity="0.7"/>${ribs}
<ellipse cx="${cx}" cy="${y}" rx="${w / 2}" ry="${28 * scale}" fill="#d8d1c2" stroke="#24211f" stroke-width="4"/><ellipse cx="${cx}" cy="${y}" rx="${w * 0.17}" ry="${10 * scale}" fill="#15110f"/>
<circle cx="${cx + w * 0.08}" cy="${y + h * 0.47}" r="${13 * scale}" fill="#171310" stroke="#3a3531" stroke-width="${6 * scale}"/><ellipse cx="${cx - w * 0.26}" cy="${y + h * 0.87}" rx="${20 * scale}" ry="${24 * scale}" fill="#14110f" stroke="#3a3531" stroke-width="${5 * scale}"/>
<path d="M${cx - w * 0.3} ${y + h * 0.88}L${cx - w * 0.72} ${y + h * 0.93}" stroke="#596264" stroke-width="${20 * scale}"/><path d="M${cx - w * 0.7} ${y + h * 0.93}C${cx - w * 1.1} ${base} ${cx - w * 1.2} ${base + 36} ${hose}" fill="none" stroke="#1c1a19" stroke-width="${7 * scale}"/>`;
}
const drumDefs = `<linearGradient id="drum" x1="0" x2="1"><stop offset="0" stop-color="#2a2725"/><stop offset="0.25" stop-color="#6f6a64"/><stop offset="0.5" stop-color="#5a5550"/><stop offset="1" stop-color="#1b1918"/></linearGradient><linearGradient id="steel" x1="0" x2="1"><stop offset="0" stop-color="#4a4f51"/><stop offset="0.3" stop-color="#aeb5b6"/><stop offset="0.55" stop-color="#858c8e"/><stop offset="1" stop-color="#3a3e40"/></linearGradient><linearGradient id="plank" x1="0" x2="1" y2="0.2"><stop offset="0" stop-color="#8d8069"/><stop offset="1" stop-color="#6f6350"/></linearGradient>`;

function cylinder(cx: number, base: number, s = 1): string {
  return `<ellipse cx="${cx + 18}" cy="${base + 4}" rx="${88 * s}" ry="${16 * s}" fill="#0d0c0b" opacity="0.45" filter="url(#soft6)"/><path d="M${cx - 62 * s} ${base}V${base - 150 * s}Q${cx - 60 * s} ${base - 196 * s} ${cx} ${base - 198 * s}Q${cx + 60 * s} ${base - 196 * s} ${cx + 62 * s} ${base - 150 * s}V${base}Z" fill="url(#steel)" stroke="#23282a" stroke-width="4"/><rect x="${cx - 36 * s}" y="${base - 232 * s}" width="${72 * s}" height="${38 * s}" fill="none" stroke="#3d4446" stroke-width="${8 * s}"/><rect x="${cx - 9 * s}" y="${base - 226 * s}" width="${18 * s}" height="${30 * s}" fill="#7d7663"/>`;
}

function bin(r: Random, cx: number, base: number, s = 1, lidded = true): string {
  const [w, h] = [200 * s, 190 * s];
  return `<ellipse cx="${cx + 20}" cy="${base + 3}" rx="${w * 0.66}" ry="${18 * s}" fill="#0d0c0b" opacity="0.45" filter="url(#soft14)"/><path d="M${cx - w / 2} ${base - h}L${cx - w * 0.42} ${base}Q${cx} ${base + 18 * s} ${cx + w * 0.42} ${base}L${cx + w / 2} ${base - h}Z" fill="url(#steel)" stroke="#23282a" stroke-width="4"/>${[0.3, 0.62].map((t) => `<path d="M${cx - w * (0.5 - 0.08 * t)} ${base - h * (1 - t)}q${w * 0.5} ${16 * s} ${w * (1 - 0.16 * t)} 0" fill="none" stroke="#2b3032" stroke-width="4" opacity="0.7"/>`).join('')}${
    lidded
      ? `<path d="M${cx - w * 0.57} ${base - h + 6}Q${cx} ${base - h - 56 * s} ${cx + w * 0.57} ${base - h + 6}Q${cx} ${base - h + 26 * s} ${cx - w * 0.57} ${base - h + 6}Z" fill="#7d8587" stroke="#23282a" stroke-width="4"/>${inkOutline(
          r,
          [
            [cx - 26 * s, base - h - 22 * s],
            [cx - 20 * s, base - h - 46 * s],
            [cx + 20 * s, base - h - 46 * s],
            [cx + 26 * s, base - h - 22 * s],
          ],
          7 * s,
          false,
        )}`
      : `<ellipse cx="${cx}" cy="${base - h}" rx="${w / 2}" ry="${20 * s}" fill="#191613" stroke="#23282a" stroke-width="4"/>`
  }`;
}

function smokeFrom(
  r: Random,
  x: number,
  y: number,
  lean: number,
  rise: number,
  colour: string,
  strength = 0.5,
): string {
  const puffs = Array.from({ length: 46 }, (_, i) => {
    const t = i / 45;
    const size = 12 + (70 * r() + 26) * t ** 1.1;
    return `<ellipse cx="${(x + lean * t ** 1.4 + normal(r) * 44 * t).toFixed(0)}" cy="${(y - rise * t + normal(r) * 16 * t).toFixed(0)}" rx="${size.toFixed(0)}" ry="${(size * 0.62).toFixed(0)}" fill="${colour}" opacity="${(strength * 0.5 * (1 - 0.85 * t)).toFixed(2)}"/>`;
  }).join('');
  return `<g filter="url(#soft14)">${puffs}</g>`;
}

function scene(
  key: string,
  seed: number,
  light: Light,
  draw: (r: Random) => string,
  extraDefs = '',
): Drawing {
  const r = seeded(seed);
  const { defs, ground } = estuary(r, seed, light);
  return sheet({
    key,
    seed,
    width: W,
    height: H,
    ground,
    defs: defs + drumDefs + extraDefs,
    body: draw(r),
    wordColour: light === DUSK ? '#cfd2d2' : '#2c2a27',
  });
}

/** Planks on posts to windward. */
function shelter(r: Random, x: number, base: number, w: number, h: number): string {
  const boards = Array.from({ length: 6 }, (_, i) => {
    const y = base - h + (h * i) / 6;
    return `<path d="M${x + between(r, -6, 6)} ${y}L${x + w + between(r, -6, 6)} ${y - 14}V${y + h / 6 - 18}L${x} ${y + h / 6 - 5}Z" fill="url(#plank)" stroke="#2b261f" stroke-width="3"/>`;
  }).join('');
  return `${ink(r, [x + 30, base - h - 40], [x + 30, base + 14], 16, '#473d30')}${ink(r, [x + w - 30, base - h - 50], [x + w - 30, base + 4], 16, '#473d30')}${boards}`;
}

const windLines = (r: Random, n: number, colour: string): string =>
  Array.from({ length: n }, () => {
    const y = between(r, 120, 700);
    const x = between(r, -60, 1300);
    const l = between(r, 160, 380);
    const sway = between(r, 6, 18);
    return `<path d="${smooth([
      [x, y],
      [x + l * 0.3, y - sway],
      [x + l * 0.65, y + sway * 0.6],
      [x + l, y - sway * 0.3],
    ])}" fill="none" stroke="${colour}" stroke-width="3.4" stroke-linecap="round" opacity="0.7"/>`;
  }).join('');

const rain = (r: Random): string =>
  Array.from({ length: 330 }, () => {
    const x = between(r, -60, W);
    const y = between(r, -40, H);
    const l = between(r, 26, 74);
    return `<path d="M${x.toFixed(0)} ${y.toFixed(0)}l${(l * 0.3).toFixed(0)} ${l.toFixed(0)}" stroke="#e6eaea" stroke-width="${between(r, 1.2, 2.6).toFixed(1)}" opacity="${between(r, 0.25, 0.6).toFixed(2)}"/>`;
  }).join('');

function spyhole(): Drawing {
  const r = seeded(307);
  const scratches = Array.from({ length: 70 }, () => {
    const x = between(r, 0, 1600);
    const y = between(r, 0, 1200);
    return `<path d="${penStroke(r, wander(r, [x, y], [x + normal(r) * 90, y + normal(r) * 30], 6, 3), between(r, 1, 3))}" fill="#fff" opacity="0.05"/>`;
  }).join('');
  return sheet({
    key: 'spyhole-glow',
    seed: 307,
    ground: `<rect width="1600" height="1200" fill="#1d1a18"/><rect width="1600" height="1200" fill="#444" filter="url(#iron)" opacity="0.6"/>`,
    defs: `${noisePaint('iron', ['#141211', '#25211e', '#39322d', '#221e1b'], { fx: 0.006, fy: 0.012, seed: 40 })}<radialGradient id="glow" cx="0.5" cy="0.5" r="0.5"><stop offset="0" stop-color="#ffe9b8"/><stop offset="0.45" stop-color="#ffb554"/><stop offset="0.8" stop-color="#e2661c"/><stop offset="1" stop-color="#a3330c"/></radialGradient><radialGradient id="halo" cx="0.5" cy="0.5" r="0.5"><stop offset="0" stop-color="#ff8a33" stop-opacity="0.7"/><stop offset="0.4" stop-color="#c6451a" stop-opacity="0.25"/><stop offset="1" stop-color="#6b1d0b" stop-opacity="0"/></radialGradient><clipPath id="hole"><circle cx="800" cy="570" r="150"/></clipPath>`,
    body: `${scratches}<circle cx="800" cy="570" r="640" fill="url(#halo)"/><circle cx="800" cy="570" r="206" fill="#0f0d0c"/><circle cx="800" cy="570" r="200" fill="#2a211c"/><circle cx="800" cy="570" r="172" fill="#5d2a15"/><g clip-path="url(#hole)"><rect x="640" y="410" width="320" height="320" fill="url(#glow)"/><path d="M690 730L705 600Q715 560 760 560T815 600L835 730Z" fill="#d9551a" opacity="0.75"/><path d="M850 730L862 640Q868 610 905 612T945 650L955 730Z" fill="#c74a17" opacity="0.75"/><ellipse cx="760" cy="566" rx="52" ry="12" fill="#ffcf82" opacity="0.8"/></g><circle cx="800" cy="570" r="150" fill="none" stroke="#3a160a" stroke-width="10"/><circle cx="800" cy="570" r="203" fill="none" stroke="#ff9a4a" stroke-width="3" opacity="0.4"/>`,
    wordColour: '#b9aea3',
  });
}

function drawTiles(): Drawing {
  const r = seeded(311);
  const colours = ['#a59a8b', '#a9a596', '#a8b0a4', '#8fb0a6', '#6ea79f', '#539c97', '#438f8c'];
  const names = ['880', '900', '920', '940', '960', '980', '1000'];
  const tiles = colours
    .map((colour, i) => {
      const [x, y, w, h] = [120 + i * 200, 330 + normal(r) * 9, 152, 420];
      const lines =
        i > 2
          ? Array.from({ length: 5 + i * 4 }, () => {
              const px = between(r, x + 10, x + w - 10);
              const py = between(r, y + 10, y + h - 130);
              return `<path d="${penStroke(r, wander(r, [px, py], [px + normal(r) * 60, py + normal(r) * 60], 8, 3), 2.4)}" fill="#172221" opacity="${0.2 + i * 0.1}"/>`;
            }).join('')
          : '';
      return `<g transform="rotate(${(normal(r) * 0.9).toFixed(2)} ${x + w / 2} ${y + h / 2})"><rect x="${x + 10}" y="${y + 16}" width="${w}" height="${h}" rx="6" fill="#1c1815" opacity="0.45" filter="url(#soft14)"/><rect x="${x}" y="${y}" width="${w}" height="${h}" rx="6" fill="${i < 3 ? '#8d7a68' : '#3a332e'}"/><clipPath id="t${i}"><rect x="${x}" y="${y}" width="${w}" height="${h - 110}" rx="6"/></clipPath><g clip-path="url(#t${i})"><rect x="${x}" y="${y}" width="${w}" height="${h - 110}" fill="${colour}"/>${i < 3 ? `<rect x="${x}" y="${y}" width="${w}" height="${h - 110}" fill="#4d473e" filter="url(#speck)" opacity="${0.9 - i * 0.25}"/>` : ''}${lines}<path d="M${x + 26} ${y + 22}L${x + 34} ${y + h - 150}" stroke="#fff" stroke-width="${8 + i}" stroke-linecap="round" opacity="${Math.max(0, (i - 1) * 0.12).toFixed(2)}" filter="url(#soft6)"/></g><circle cx="${x + w / 2}" cy="${y + h - 44}" r="17" fill="#1a1714"/></g>${label(x + w / 2, 870, names[i] ?? '', { anchor: 'middle', size: 34 })}`;
    })
    .join('');
  return sheet({
    key: 'draw-tiles',
    seed: 311,
    ground: `<defs><linearGradient id="above" x1="0" y1="0" x2="1" y2="1"><stop offset="0" stop-color="#e6e3dc"/><stop offset="1" stop-color="#bdb8ae"/></linearGradient></defs><rect width="1600" height="1200" fill="url(#above)"/>`,
    body: tiles,
  });
}

/** A pot in the tongs between kiln and bin: the one warm thing in the picture. */
function drawAtDusk(r: Random): string {
  const pot = 'M742 470Q700 560 742 640Q780 680 850 640Q892 560 848 470Z';
  return `${slip(r, DUSK, 880)}${drumKiln(330, 930, 0.92)}${bin(r, 1190, 960, 1.15, false)}<circle cx="795" cy="560" r="420" fill="url(#hot)"/><path d="${pot}" fill="url(#ware)"/><ellipse cx="795" cy="470" rx="53" ry="13" fill="#ffcf86"/><ellipse cx="795" cy="472" rx="42" ry="9" fill="#8a2a0e"/>
${ink(r, [1500, 300], [880, 560], 13, '#14110f')}${ink(r, [1500, 360], [880, 600], 13, '#14110f')}<path d="${smooth(
    [
      [890, 556],
      [850, 540],
      [846, 580],
    ],
  )}" fill="none" stroke="#14110f" stroke-width="12"/><path d="${smooth([
    [890, 604],
    [852, 620],
    [742, 600],
  ])}" fill="none" stroke="#14110f" stroke-width="10"/>${smokeFrom(r, 1190, 730, 180, 300, '#8d9496', 0.16)}`;
}

export const outdoorDrawings: readonly (() => Drawing)[] = [
  spyhole,
  drawTiles,
  () =>
    scene(
      'kiln-in-wind',
      313,
      DAY,
      (r) =>
        `${slip(r, DAY)}${windLines(r, 26, '#f3f4f2')}${cylinder(330, 960, 1)}${drumKiln(960, 950, 1.15, [338, 745])}${smokeFrom(r, 965, 430, 330, 60, '#e9eceb', 0.35)}`,
    ),
  () =>
    scene(
      'wind-shelter',
      317,
      DAY,
      (r) =>
        `${slip(r, DAY)}${windLines(r, 12, '#f3f4f2')}${shelter(r, 480, 940, 330, 430)}${cylinder(250, 985, 0.95)}${drumKiln(1060, 950, 1.1, [258, 780])}${smokeFrom(r, 1062, 450, 40, 250, '#eef0ef', 0.28)}`,
    ),
  () =>
    scene(
      'bins-smoking',
      331,
      DAY,
      (r) =>
        `${slip(r, DAY)}${[360, 800, 1240].map((x, i) => smokeFrom(r, x + 60, 740, 230 + i * 30, 520, '#6f6a63', 0.75) + bin(r, x, 950 + (i % 2) * 26, 1.35) + smokeFrom(r, x - 100, 745, 150, 360, '#f3f1ec', 0.8)).join('')}`,
    ),
  () =>
    scene(
      'draw-at-dusk',
      337,
      DUSK,
      drawAtDusk,
      `<radialGradient id="hot" cx="0.5" cy="0.5" r="0.5"><stop offset="0" stop-color="#ff9a40" stop-opacity="0.55"/><stop offset="0.35" stop-color="#d4531c" stop-opacity="0.2"/><stop offset="1" stop-color="#5a1a0a" stop-opacity="0"/></radialGradient><radialGradient id="ware" cx="0.45" cy="0.4" r="0.7"><stop offset="0" stop-color="#ffdc9a"/><stop offset="0.5" stop-color="#ff9a3d"/><stop offset="1" stop-color="#cf4414"/></radialGradient>`,
    ),
  () =>
    scene(
      'kiln-in-rain',
      347,
      WET,
      (r) =>
        `${slip(r, WET)}${ink(r, [420, 330], [450, 960], 16, '#3a342b')}${ink(r, [1190, 260], [1180, 960], 16, '#3a342b')}${drumKiln(800, 950, 1.1)}<path d="M360 352L1280 252L1296 290L380 400Z" fill="#727b7e" stroke="${SOOT}" stroke-width="4"/>${Array.from({ length: 16 }, (_, i) => ink(r, [380 + i * 56, 352 - i * 6], [398 + i * 56, 392 - i * 6.4], 3, '#3c4244')).join('')}${rain(r)}${smokeFrom(r, 800, 470, 90, 150, '#dfe3e3', 0.32)}`,
    ),
  () =>
    scene('frosted-cylinder', 349, WET, (r) => {
      const frost = Array.from({ length: 900 }, () => {
        const x = 800 + normal(r) * 92;
        const y = 900 - Math.abs(normal(r)) * 150;
        return Math.abs(x - 800) < 168 && y > 480
          ? `<circle cx="${x.toFixed(0)}" cy="${y.toFixed(0)}" r="${between(r, 1, 6).toFixed(1)}" fill="#fff" opacity="${between(r, 0.25, 0.9).toFixed(2)}"/>`
          : '';
      }).join('');
      return `${slip(r, WET, 820)}${cylinder(800, 930, 2.75)}<path d="M634 925V660Q800 600 966 660V925Z" fill="#f4f7f7" opacity="0.72" filter="url(#ragged)"/>${frost}<path d="M800 330C1000 330 1060 480 1180 600S1420 900 1640 930" fill="none" stroke="#1c1a19" stroke-width="20"/><circle cx="812" cy="318" r="52" fill="#e7e5df" stroke="#2c2c2b" stroke-width="9"/>${ink(r, [812, 318], [782, 346], 6, '#20201f')}${Array.from(
        { length: 7 },
        (_, i) => {
          const a = Math.PI * (0.75 + i * 0.25);
          return ink(
            r,
            [812 + Math.cos(a) * 36, 318 + Math.sin(a) * 36],
            [812 + Math.cos(a) * 45, 318 + Math.sin(a) * 45],
            3,
          );
        },
      ).join('')}`;
    }),
  () =>
    scene(
      'driftwood-kiln',
      353,
      DUSK,
      (r) => {
        const courses = Array.from({ length: 9 }, (_, row) =>
          Array.from({ length: 7 }, (_c, col) => {
            const tone =
              ['#6d6258', '#7a6d60', '#5f564d', '#857868'][Math.floor(r() * 4)] ?? '#6d6258';
            return `<rect x="${560 + col * 72 - (row % 2) * 36 + between(r, -2, 2)}" y="${520 + row * 46 + between(r, -2, 2)}" width="69" height="42" fill="${tone}" stroke="#1f1b18" stroke-width="3"/>`;
          }).join(''),
        ).join('');
        const logs = Array.from({ length: 16 }, (_, i) => {
          const [row, place] = [
            [0, 0],
            [0, 1],
            [0, 2],
            [0, 3],
            [0, 4],
            [0, 5],
            [1, 0.5],
            [1, 1.5],
            [1, 2.5],
            [1, 3.5],
            [1, 4.5],
            [2, 1],
            [2, 2],
            [2, 3],
            [3, 1.6],
            [3, 2.5],
          ][i] ?? [0, 0];
          const q = between(r, 23, 28);
          const x = 130 + (place ?? 0) * 56 + between(r, -3, 3);
          const y = 950 - (row ?? 0) * 47;
          return `<circle cx="${x.toFixed(0)}" cy="${y.toFixed(0)}" r="${q.toFixed(0)}" fill="#8a7a62" stroke="#26201a" stroke-width="4"/><circle cx="${x.toFixed(0)}" cy="${y.toFixed(0)}" r="${(q * 0.55).toFixed(0)}" fill="none" stroke="#5c4f3d" stroke-width="2.5"/>`;
        }).join('');
        return `${slip(r, DUSK, 880)}${smokeFrom(r, 1020, 240, 260, 220, '#7f878b', 0.3)}<ellipse cx="800" cy="945" rx="420" ry="34" fill="#0b0a09" opacity="0.6" filter="url(#soft14)"/><clipPath id="kiln"><path d="M560 935V600Q560 470 800 466T1040 600V935Z"/></clipPath><path d="M960 640V250H1076V935H1040Z" fill="#6d6258" stroke="#1f1b18" stroke-width="4"/>${Array.from({ length: 8 }, (_, i) => ink(r, [960, 290 + i * 36], [1076, 290 + i * 36], 3, '#241f1b')).join('')}<g clip-path="url(#kiln)"><rect x="540" y="460" width="520" height="480" fill="#5d544b"/>${courses}<rect x="900" y="460" width="160" height="480" fill="#0c0a09" opacity="0.35" filter="url(#soft30)"/></g><circle cx="800" cy="650" r="60" fill="url(#fire)" opacity="0.5" filter="url(#soft14)"/><rect x="742" y="800" width="120" height="84" fill="#120d0a"/><rect x="752" y="808" width="100" height="72" fill="url(#fire)"/><circle cx="800" cy="650" r="15" fill="#ffc06a" stroke="#241712" stroke-width="8"/>${logs}`;
      },
      `<radialGradient id="fire" cx="0.5" cy="0.75" r="0.7"><stop offset="0" stop-color="#ffd58a"/><stop offset="0.5" stop-color="#f0822c"/><stop offset="1" stop-color="#7c260c"/></radialGradient>`,
    ),
  () =>
    scene(
      'hill-in-frost',
      359,
      { ...DAY, flats: '#d6d9d9', near: '#dfe2e2', far: '#7f8c92', water: '#c4cdd0' },
      (r) => {
        const firs = Array.from({ length: 15 }, (_, i) => {
          const x = 40 + i * 112 + normal(r) * 22;
          const h = between(r, 150, 330);
          const base = 640 + normal(r) * 12;
          return `<path d="M${x} ${base - h}L${x - h * 0.2} ${base}H${x + h * 0.2}Z" fill="#4c5a58" opacity="0.85" filter="url(#rough)"/>`;
        }).join('');
        return `${firs}<rect y="610" width="${W}" height="110" fill="#e5e8e8" opacity="0.85" filter="url(#soft30)"/>${slip(r, { ...DAY, near: '#e3e6e5' }, 800)}${cylinder(420, 970, 1.05)}${cylinder(250, 985, 1.05)}${drumKiln(1010, 950, 1.05, [428, 745])}${smokeFrom(r, 1012, 470, 30, 260, '#ffffff', 0.5)}`;
      },
    ),
];
