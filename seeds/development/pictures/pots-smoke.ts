import { crackleLines, inkCrackle } from './crackle.ts';
import { penStroke, smooth, wander, type Point } from './lines.ts';
import { between, normal, seeded, type Random } from './random.ts';
import { noisePaint, OVER, sheet, tableGround, type Drawing } from './sheet.ts';
import { bodyPath, drawVessel, onVessel, wrap, type Vessel } from './vessel.ts';

/** Pots whose surface is smoke and carbon: horsehair, feather, slip-resist, dipped, saggar. */

/** A burnt line: a hair lies, curls, and leaves a dark thread in a soft brown edge. */
function hairs(random: Random, vessel: Vessel, count: number, curl: number): string {
  const { width, height, place } = wrap(vessel);
  let soft = '';
  let hard = '';
  for (let i = 0; i < count; i += 1) {
    let x = random() * width;
    let y = between(random, -0.02, 0.75) * height;
    let heading = between(random, -0.5, Math.PI * 0.9);
    const points: Point[] = [];
    const length = Math.round(between(random, 14, 60));
    let bend = normal(random) * 0.08;
    for (let step = 0; step < length; step += 1) {
      const at = place([x, y]);
      if (at) points.push(at);
      bend = bend * 0.93 + normal(random) * 0.03 * curl;
      heading += bend;
      x += Math.cos(heading) * 11;
      y += Math.sin(heading) * 11;
    }
    if (points.length < 4) continue;
    const weight = between(random, 1.6, 4.6);
    hard += `<path d="${penStroke(random, points, weight)}" fill="#1c1816" opacity="${between(random, 0.65, 0.95).toFixed(2)}"/>`;
    soft += `<path d="${smooth(points)}" fill="none" stroke="#5b4030" stroke-width="${(weight * between(random, 3, 6)).toFixed(1)}" opacity="0.4"/>`;
    if (random() < 0.45) {
      const spot = points[Math.floor(random() * points.length)] ?? [0, 0];
      soft += `<circle cx="${spot[0].toFixed(1)}" cy="${spot[1].toFixed(1)}" r="${between(random, 5, 15).toFixed(1)}" fill="#2a1d16" opacity="0.75"/>`;
    }
  }
  return `<g filter="url(#soft6)">${soft}</g>${hard}`;
}

/** Clouds of smoke on the wall, at (u, v) with a size in pixels. */
function clouds(
  vessel: Vessel,
  spots: readonly (readonly [number, number, number, number])[],
  colour: string,
): string {
  return `<g filter="url(#smoke)">${spots
    .map(([u, v, size, strength]) => {
      const [x, y] = onVessel(vessel, u, v);
      return `<ellipse cx="${x.toFixed(0)}" cy="${y.toFixed(0)}" rx="${size}" ry="${(size * 0.7).toFixed(0)}" fill="${colour}" opacity="${strength}"/>`;
    })
    .join('')}</g>`;
}

const egg: Vessel = {
  cx: 800,
  top: 300,
  height: 660,
  radius: 350,
  profile: [0.3, 0.55, 0.8, 0.95, 1, 0.98, 0.9, 0.76, 0.58, 0.4],
  tilt: 0.15,
};
const tall: Vessel = {
  cx: 600,
  top: 270,
  height: 1070,
  radius: 275,
  profile: [0.46, 0.38, 0.42, 0.6, 0.82, 0.96, 1, 0.95, 0.82, 0.66, 0.52, 0.48],
  tilt: 0.13,
};
const wide: Vessel = {
  cx: 800,
  top: 520,
  height: 380,
  radius: 440,
  profile: [1, 0.99, 0.95, 0.87, 0.74, 0.56, 0.4, 0.38],
  tilt: 0.26,
};

function horsehair(): Drawing {
  const random = seeded(71);
  const surface =
    clouds(
      egg,
      [
        [-0.6, 0.25, 120, 0.35],
        [0.7, 0.55, 150, 0.4],
        [0.1, 0.85, 190, 0.35],
      ],
      '#7b6552',
    ) + hairs(random, egg, 46, 1);
  return sheet({
    key: 'horsehair-pot',
    seed: 71,
    ground: tableGround(1600, 1200, ['#cfccc6', '#e6e3dd', '#bfbbb3']),
    body: drawVessel({
      vessel: egg,
      id: 'p',
      fill: '#ece5d8',
      surface,
      bareFrom: 0.97,
      bareColour: '#d9cfbf',
      inside: '#8a7a68',
      gloss: 0.35,
    }),
  });
}

/** A feather's print: a quill and barbs, dark where it lay closest. */
function feather(
  random: Random,
  vessel: Vessel,
  u: number,
  v: number,
  lean: number,
  size: number,
): string {
  let barbs = '';
  const quill: Point[] = [];
  for (let i = 0; i <= 26; i += 1) {
    const t = i / 26;
    const at: Point = onVessel(vessel, u + lean * t + 0.05 * Math.sin(t * 3), v + size * t);
    quill.push(at);
    const reach = 0.16 * Math.sin(Math.PI * Math.min(1, t * 0.9 + 0.12)) ** 0.7;
    for (const side of [-1, 1]) {
      for (let k = 0; k < 3; k += 1) {
        if (random() < 0.12) continue;
        const tip = onVessel(
          vessel,
          u + lean * t + side * reach * between(random, 0.75, 1.05),
          v + size * (t - 0.1 - k * 0.008) - 0.012 * random(),
        );
        barbs += `<path d="${penStroke(random, wander(random, at, tip, 6, 1.6), between(random, 1.2, 3))}" fill="#231b16" opacity="${between(random, 0.35, 0.85).toFixed(2)}"/>`;
      }
    }
  }
  return `<g opacity="0.55" filter="url(#soft14)">${barbs}</g>${barbs}<path d="${penStroke(random, quill, 7)}" fill="#1c1613"/>`;
}

function featherBottle(): Drawing {
  const random = seeded(83);
  const surface =
    clouds(
      tall,
      [
        [0.5, 0.4, 110, 0.3],
        [-0.5, 0.7, 140, 0.32],
      ],
      '#84705d',
    ) +
    feather(random, tall, -0.42, 0.3, 0.24, 0.36) +
    feather(random, tall, 0.5, 0.46, -0.2, 0.33) +
    hairs(random, tall, 8, 0.6);
  return sheet({
    key: 'feather-bottle',
    seed: 83,
    width: 1200,
    height: 1600,
    ground: tableGround(1200, 1600, ['#cbc9c4', '#e5e2dc', '#bab6ae']),
    body: drawVessel({
      vessel: tall,
      id: 'p',
      fill: '#eae3d6',
      surface,
      bareFrom: 0.985,
      bareColour: '#d6ccbc',
      inside: '#6a5b4d',
      gloss: 0.35,
    }),
  });
}

/** Slip-resist: grey smoked lines a finger wide in soft halo, and bands left white under tape. */
function slipResist(
  key: string,
  seed: number,
  vessel: Vessel,
  width: number,
  height: number,
): Drawing {
  const random = seeded(seed);
  const { width: w, height: h, place, scale } = wrap(vessel);
  const lines = crackleLines(random, {
    width: w,
    height: h,
    cells: 46,
    fine: 2.2,
    line: 9,
    clustering: 0.7,
  });
  const web = inkCrackle(random, lines, place, {
    colour: '#26211e',
    halo: 0.75,
    strength: 0.85,
    scale,
  });
  const band = (from: number, to: number): string => {
    const edge = (v: number, reverse: boolean): Point[] => {
      const out = Array.from({ length: 33 }, (_, i) =>
        onVessel(vessel, -Math.PI / 2 + (Math.PI * i) / 32, v + 0.012 * Math.sin(i * 0.5 + v * 9)),
      );
      return reverse ? out.reverse() : out;
    };
    const points = [...edge(from, false), ...edge(to, true)];
    return `M${points.map(([x, y]) => `${x.toFixed(1)} ${y.toFixed(1)}`).join('L')}Z`;
  };
  const surface = `${clouds(
    vessel,
    [
      [-0.9, 0.5, 150, 0.28],
      [0.4, 0.2, 120, 0.22],
      [0.9, 0.75, 170, 0.36],
    ],
    '#5a524c',
  )}${web}
<path d="${band(0.3, 0.36)}" fill="#2a2522" filter="url(#rough)"/><path d="${band(0.33, 0.47)}" fill="#2a2522" opacity="0.5" filter="url(#soft14)"/><path d="${band(0.36, 0.45)}" fill="#efe9de" filter="url(#rough)"/><path d="${band(0.45, 0.475)}" fill="#2a2522" filter="url(#rough)"/>`;
  return sheet({
    key,
    seed,
    width,
    height,
    ground: tableGround(width, height, ['#c6c4bf', '#dfdcd6', '#b4b1a9']),
    body: drawVessel({
      vessel,
      id: 'p',
      fill: '#e9e2d6',
      surface,
      bareFrom: 0.94,
      bareColour: '#2e2926',
      inside: '#4a423c',
      gloss: 0.3,
    }),
  });
}

/** Dipped hot in fermented batter: scorched lace, cream to brown to black. */
function dipped(): Drawing {
  const random = seeded(97);
  const { width, height, place, scale } = wrap(wide);
  const net = crackleLines(random, {
    width,
    height,
    cells: 190,
    fine: 0,
    line: 11,
    clustering: 0.9,
  });
  const surface = `<g filter="url(#rough)" opacity="0.85">${inkCrackle(random, net, place, { colour: '#3a2317', halo: 0.9, strength: 0.8, scale })}</g>
${clouds(
  wide,
  [
    [-0.7, 0.15, 150, 0.6],
    [0.2, 0.75, 220, 0.6],
    [0.8, 0.3, 130, 0.5],
  ],
  '#3b2417',
)}`;
  return sheet({
    key: 'dipped-bowl',
    seed: 97,
    ground: tableGround(1600, 1200, ['#cdc9c0', '#e4dfd5', '#bdb7ab']),
    defs: noisePaint('batter', ['#2b1a12', '#6b432a', '#b98a5c', '#e2c9a0', '#8d5c38', '#d3b284'], {
      fx: 0.011,
      fy: 0.014,
      seed: 5,
      contrast: 2.6,
    }),
    body: drawVessel({
      vessel: wide,
      id: 'p',
      fill: '#c9a374',
      paint: 'batter',
      surface,
      inside: '#5b3c28',
      rimColour: '#4a3020',
      bareFrom: 0.985,
      bareColour: '#4a3020',
      gloss: 0.18,
    }),
  });
}

/** Foil saggar: salt, copper wire and seaweed leave blushes, and the foil's folds leave edges. */
function saggar(): Drawing {
  const random = seeded(101);
  const wires = hairs(random, egg, 7, 0.5).replaceAll('#1c1816', '#4d2a26');
  const folds = Array.from({ length: 9 }, () => {
    const from = onVessel(egg, between(random, -1.3, 1.3), between(random, 0.05, 0.8));
    const to: Point = [from[0] + normal(random) * 130, from[1] + between(random, 60, 260)];
    return `<path d="${penStroke(random, wander(random, from, to, 7, 8), between(random, 4, 14))}" fill="#4b4643" opacity="0.34" filter="url(#soft2)"/>`;
  }).join('');
  return sheet({
    key: 'saggar-pot',
    seed: 101,
    ground: tableGround(1600, 1200, ['#c9c7c3', '#e2dfda', '#b7b3ac']),
    defs: noisePaint(
      'blush',
      ['#4c4a4b', '#87817d', '#d7c8b8', '#e9d8c6', '#d7a58c', '#a9605a', '#6d4a57'],
      { fx: 0.0042, fy: 0.0052, seed: 21, contrast: 2.7 },
    ),
    body: drawVessel({
      vessel: egg,
      id: 'p',
      fill: '#d9c6b4',
      paint: 'blush',
      surface: folds + wires,
      inside: '#594c46',
      rimColour: '#9d8576',
      bareFrom: 0.985,
      bareColour: '#8b766a',
      gloss: 0.22,
    }),
  });
}

/** Sprayed with ferric salts while hot: rust and gold, with a drift of overspray. */
function sprayed(): Drawing {
  const random = seeded(109);
  const drops = Array.from({ length: 240 }, () => {
    const [x, y] = onVessel(tall, between(random, -1.5, 1.5), random());
    return `<circle cx="${x.toFixed(1)}" cy="${y.toFixed(1)}" r="${(1 + random() ** 3 * 8).toFixed(1)}" fill="#5a2c14" opacity="${between(random, 0.25, 0.7).toFixed(2)}"/>`;
  }).join('');
  return sheet({
    key: 'sprayed-vase',
    seed: 109,
    width: 1200,
    height: 1600,
    ground: tableGround(1200, 1600, ['#cac7c2', '#e2dfd9', '#b9b5ad']),
    defs: noisePaint('rust', ['#3c2013', '#7d3f1c', '#b8692c', '#d59a4e', '#e5c384', '#caa06a'], {
      fx: 0.005,
      fy: 0.0022,
      seed: 31,
      contrast: 2.3,
    }),
    body: drawVessel({
      vessel: tall,
      id: 'p',
      fill: '#c98c4a',
      paint: 'rust',
      surface: drops + hairs(random, tall, 12, 1),
      inside: '#4a2a18',
      rimColour: '#8d562c',
      bareFrom: 0.99,
      bareColour: '#7a4a28',
      gloss: 0.25,
    }),
  });
}

/** The shell of slip and glaze coming off a slip-resist pot. */
function shelling(): Drawing {
  const random = seeded(127);
  const base = slipResist('slip-resist-shell', 127, egg, 1600, 1200);
  const shards = Array.from({ length: 15 }, () => {
    const x = 800 + normal(random) * 330;
    const y = 985 + Math.abs(normal(random)) * 55;
    const r = between(random, 18, 52);
    const corners = Array.from({ length: 7 }, (_, k): Point => {
      const a = (k / 7) * Math.PI * 2;
      return [
        x + Math.cos(a) * r * between(random, 0.6, 1.2),
        y + Math.sin(a) * r * 0.45 * between(random, 0.6, 1.2),
      ];
    });
    return `<path d="${smooth(corners, true)}" fill="#3b3531" opacity="0.35" transform="translate(8 9)" filter="url(#soft6)"/><path d="${smooth(corners, true)}" fill="${random() < 0.5 ? '#d8cfc0' : '#c3b6a3'}" stroke="#5a5048" stroke-width="2"/>`;
  }).join('');
  const patch = Array.from({ length: 26 }, (_, i): Point => {
    const a = (i / 26) * Math.PI * 2;
    return onVessel(
      egg,
      0.55 + 0.62 * Math.cos(a) * (1 + 0.14 * Math.sin(i * 2.3)),
      0.62 + 0.21 * Math.sin(a) * (1 + 0.2 * Math.cos(i * 1.7)),
    );
  });
  const shell = `<clipPath id="egg"><path d="${bodyPath(egg)}"/></clipPath><g clip-path="url(#egg)"><path d="${smooth(patch, true)}" transform="translate(-7 8)" fill="#1d1917" opacity="0.55" filter="url(#soft6)"/><path d="${smooth(patch, true)}" fill="#cfc3b1" filter="url(#rough)"/><path d="${smooth(patch, true)}" fill="#3b332d" filter="url(#speck)" opacity="0.8"/><path d="${bodyPath(egg)}" fill="url(#ps)" opacity="0.7"/></g>`;
  return { ...base, svg: base.svg.replace(OVER, `${shell}${shards}`) };
}

export const smokePots: readonly (() => Drawing)[] = [
  horsehair,
  featherBottle,
  () => slipResist('slip-resist-vase', 61, tall, 1200, 1600),
  shelling,
  dipped,
  saggar,
  sprayed,
];
