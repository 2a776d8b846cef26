import { crackleLines, inkCrackle } from './crackle.ts';
import { penStroke, smooth, wander, type Point } from './lines.ts';
import { between, normal, seeded, type Random } from './random.ts';
import { label, noisePaint, sheet, tableGround, type Drawing } from './sheet.ts';
import { drawVessel, onVessel, wrap, type Vessel } from './vessel.ts';

/** What went wrong, drawn: dull and bright, crawled, blistered, stuck, split, broken. */

function crackleOn(
  random: Random,
  vessel: Vessel,
  options: { cells: number; fine: number; line: number; ink?: string; strength?: number },
): string {
  const { width, height, place, scale } = wrap(vessel);
  const lines = crackleLines(random, { width, height, ...options });
  return inkCrackle(random, lines, place, {
    colour: options.ink ?? '#1f1c1a',
    halo: 0.22,
    strength: options.strength ?? 1,
    scale,
  });
}

const blob = (
  random: Random,
  vessel: Vessel,
  u: number,
  v: number,
  du: number,
  dv: number,
): Point[] =>
  Array.from({ length: 18 }, (_, i) => {
    const a = (i / 18) * Math.PI * 2;
    const wobble =
      1 +
      0.2 * Math.sin(a * 2 + u * 9) +
      0.12 * Math.sin(a * 3 + v * 40) +
      between(random, -0.03, 0.03);
    return onVessel(vessel, u + du * Math.cos(a) * wobble, v + dv * Math.sin(a) * wobble);
  });

function dullAndBright(): Drawing {
  const random = seeded(161);
  const cup = (cx: number): Vessel => ({
    cx,
    top: 440,
    height: 430,
    radius: 255,
    profile: [0.98, 0.98, 1, 0.99, 0.96, 0.88, 0.7, 0.48, 0.46],
    tilt: 0.21,
  });
  const [left, right] = [cup(480), cup(1120)];
  return sheet({
    key: 'dull-and-bright',
    seed: 161,
    ground: tableGround(1600, 1200, ['#cbc9c3', '#e3e0da', '#b9b5ad'], 0.64),
    defs: noisePaint('dry', ['#8d9a92', '#9aa69d', '#a7b0a6', '#93a098'], {
      fx: 0.02,
      fy: 0.02,
      seed: 4,
    }),
    body:
      drawVessel({
        vessel: left,
        id: 'a',
        fill: '#9aa69d',
        paint: 'dry',
        surface: `<rect x="200" y="380" width="560" height="560" fill="#4b514c" filter="url(#speck)" opacity="0.55"/>`,
        inside: '#87938b',
        rimColour: '#a2ada4',
        gloss: 0.04,
        bareColour: '#8d8176',
      }) +
      drawVessel({
        vessel: right,
        id: 'b',
        fill: '#4f8f86',
        surface: crackleOn(random, right, { cells: 70, fine: 4, line: 4.6, ink: '#0f1c1a' }),
        inside: '#427b73',
        rimColour: '#6aa79d',
        gloss: 0.85,
      }) +
      label(480, 1050, 'drawn at 900', { anchor: 'middle', size: 32 }) +
      label(1120, 1050, 'drawn at 985', { anchor: 'middle', size: 32 }),
  });
}

function crawled(): Drawing {
  const random = seeded(167);
  const bowl: Vessel = {
    cx: 800,
    top: 450,
    height: 450,
    radius: 420,
    tilt: 0.25,
    profile: [1, 0.99, 0.96, 0.89, 0.77, 0.6, 0.43, 0.41],
  };
  let bare = '';
  for (let i = 0; i < 19; i += 1) {
    const u = between(random, -1.35, 1.35);
    const v = i < 12 ? Math.abs(normal(random)) * 0.07 : between(random, 0.15, 0.6);
    const d = smooth(
      blob(random, bowl, u, v, between(random, 0.05, 0.17), between(random, 0.03, 0.09)),
      true,
    );
    bare += `<path d="${d}" fill="#2d2825"/><path d="${d}" fill="none" stroke="#fffdf6" stroke-width="9" opacity="0.9"/><path d="${d}" fill="none" stroke="#a79d8d" stroke-width="2.5" transform="translate(2 5)" opacity="0.8"/>`;
  }
  return sheet({
    key: 'crawled-bowl',
    seed: 167,
    ground: tableGround(1600, 1200, ['#cac7c1', '#e2dfd9', '#b9b5ad']),
    body: drawVessel({
      vessel: bowl,
      id: 'p',
      fill: '#efe9dc',
      surface: crackleOn(random, bowl, { cells: 60, fine: 3, line: 4.2 }) + bare,
      inside: '#cfc8ba',
      gloss: 0.6,
    }),
  });
}

/** Blisters close up: craters with raised lips in a clear glaze over a warm body. */
function blisters(): Drawing {
  const random = seeded(173);
  const craters: { x: number; y: number; r: number }[] = [];
  for (let tries = 0; tries < 2600 && craters.length < 150; tries += 1) {
    const r = 5 + random() ** 3.2 * 82;
    const x = between(random, -20, 1620);
    const y = between(random, -20, 1220);
    if (craters.every((c) => Math.hypot(c.x - x, c.y - y) > c.r + r + 6)) craters.push({ x, y, r });
  }
  const drawn = craters
    .map(({ x, y, r }) => {
      const rim = Array.from({ length: 14 }, (_, i): Point => {
        const a = (i / 14) * Math.PI * 2;
        const q = r * between(random, 0.93, 1.07);
        return [x + Math.cos(a) * q, y + Math.sin(a) * q];
      });
      const d = smooth(rim, true);
      const burstOpen = r > 14;
      return `<path d="${d}" transform="translate(${r * 0.12} ${r * 0.16})" fill="#1c1511" opacity="0.45" filter="url(#soft6)"/><path d="${d}" fill="#cdbb9f" stroke="#f7efdf" stroke-width="${Math.max(2, r * 0.12)}" stroke-opacity="0.9"/>${burstOpen ? `<path d="${d}" transform="translate(${x * 0.26} ${y * 0.26}) scale(0.74)" fill="#3a2b21"/><path d="${d}" transform="translate(${x * 0.4 + r * 0.06} ${y * 0.4 + r * 0.09}) scale(0.6)" fill="#6f5642"/>` : `<ellipse cx="${x - r * 0.3}" cy="${y - r * 0.35}" rx="${r * 0.3}" ry="${r * 0.2}" fill="#fff" opacity="0.9"/>`}`;
    })
    .join('');
  const lines = crackleLines(random, { width: 1600, height: 1200, cells: 40, fine: 3, line: 4 });
  return sheet({
    key: 'blisters-close',
    seed: 173,
    ground: `<rect width="1600" height="1200" fill="#bfa98a" filter="url(#body)"/>`,
    defs: `${noisePaint('body', ['#8f7659', '#b29a7b', '#c9b495', '#bda585', '#a28868'], { fx: 0.003, fy: 0.004, seed: 14 })}<radialGradient id="lamp" cx="0.3" cy="0.25" r="0.95"><stop offset="0" stop-color="#fff" stop-opacity="0.26"/><stop offset="1" stop-color="#17110d" stop-opacity="0.5"/></radialGradient>`,
    body: `${inkCrackle(random, lines, (at) => at, { colour: '#2a1f18', halo: 0.2, strength: 0.75 })}${drawn}<rect width="1600" height="1200" fill="url(#lamp)"/>`,
    wordColour: '#efe7da',
  });
}

function stuckJar(): Drawing {
  const random = seeded(179);
  const jar: Vessel = {
    cx: 800,
    top: 480,
    height: 480,
    radius: 330,
    tilt: 0.16,
    profile: [0.66, 0.8, 0.95, 1, 0.98, 0.9, 0.77, 0.6, 0.52],
  };
  const lid: Vessel = {
    cx: 800,
    top: 330,
    height: 158,
    radius: 238,
    tilt: 0.16,
    profile: [0.09, 0.2, 0.19, 0.5, 0.8, 0.95, 1],
  };
  const seamAt = (u: number): Point => onVessel(lid, u, 1.02);
  const seam = Array.from({ length: 40 }, (_, i) => seamAt(-1.5 + (3 * i) / 39));
  const beads = [-1.1, -0.62, -0.3, 0.18, 0.44, 0.9, 1.2]
    .map((u) => {
      const [x, y] = seamAt(u);
      const r = between(random, 9, 17);
      return `<ellipse cx="${x.toFixed(0)}" cy="${(y + r * 0.6).toFixed(0)}" rx="${r.toFixed(0)}" ry="${(r * 1.25).toFixed(0)}" fill="#e3ddd0"/><circle cx="${(x - r * 0.3).toFixed(0)}" cy="${(y + r * 0.2).toFixed(0)}" r="${(r * 0.25).toFixed(0)}" fill="#fff"/>`;
    })
    .join('');
  const runs = `<path d="${smooth(seam)}" fill="none" stroke="#8f887c" stroke-width="20" opacity="0.6" transform="translate(0 7)" filter="url(#soft6)"/><path d="${smooth(seam)}" fill="none" stroke="#ddd7ca" stroke-width="15"/>${beads}<path d="${smooth(seam.slice(6, 24))}" transform="translate(0 -3)" fill="none" stroke="#fff" stroke-width="4" opacity="0.9"/>`;
  const body = drawVessel({
    vessel: jar,
    id: 'j',
    fill: '#e9e4d8',
    surface: crackleOn(random, jar, { cells: 80, fine: 4, line: 4.6 }),
    inside: '#2b2725',
    gloss: 0.6,
    bareFrom: 0.9,
  });
  const top = drawVessel({
    vessel: lid,
    id: 'l',
    fill: '#e9e4d8',
    surface: crackleOn(random, lid, { cells: 60, fine: 2, line: 4 }),
    inside: '#e0dacc',
    bareFrom: 1.4,
    gloss: 0.5,
  })
    .replace(/<ellipse[^>]*filter="url\(#soft30\)"\/>\n/, '')
    .replace(/<ellipse[^>]*filter="url\(#soft14\)"\/>\n/, '');
  return sheet({
    key: 'lid-stuck-jar',
    seed: 179,
    ground: tableGround(1600, 1200, ['#c9c6c0', '#e1ded8', '#b8b4ac']),
    body: `${body}<ellipse cx="800" cy="490" rx="236" ry="42" fill="#191614" opacity="0.7" filter="url(#soft6)"/>${top}${runs}`,
  });
}

function splitBottle(): Drawing {
  const random = seeded(181);
  const bottle: Vessel = {
    cx: 600,
    top: 250,
    height: 1100,
    radius: 280,
    tilt: 0.13,
    profile: [0.24, 0.17, 0.17, 0.19, 0.36, 0.74, 0.96, 1, 0.97, 0.87, 0.7, 0.54],
  };
  const track = wander(random, onVessel(bottle, 0.25, 0.2), onVessel(bottle, -0.12, 0.93), 44, 7);
  const branch = wander(random, track[24] ?? [0, 0], onVessel(bottle, 0.8, 0.66), 20, 6);
  const cracks = [track, branch]
    .map(
      (path, i) =>
        `<path d="${penStroke(random, path, i ? 7 : 15)}" transform="translate(5 2)" fill="#fff" opacity="0.5" filter="url(#soft2)"/><path d="${penStroke(random, path, i ? 6 : 13)}" fill="#0d0a08"/>`,
    )
    .join('');
  return sheet({
    key: 'bottle-split',
    seed: 181,
    width: 1200,
    height: 1600,
    ground: tableGround(1200, 1600, ['#c7c5c0', '#dfdcd7', '#b5b2aa']),
    defs: noisePaint('copper', ['#4b5a5f', '#6d8580', '#8e7f7d', '#a07a68', '#857066', '#5f6a6c'], {
      fx: 0.005,
      fy: 0.003,
      seed: 77,
    }),
    body: drawVessel({
      vessel: bottle,
      id: 'p',
      fill: '#7d7671',
      paint: 'copper',
      surface: cracks,
      inside: '#1d1917',
      rimColour: '#6d635d',
      gloss: 0.3,
      bareFrom: 0.95,
    }),
  });
}

function brokenHandle(): Drawing {
  const random = seeded(191);
  const cup: Vessel = {
    cx: 720,
    top: 440,
    height: 440,
    radius: 270,
    tilt: 0.2,
    profile: [1, 0.98, 0.96, 0.96, 0.97, 0.98, 0.95, 0.82, 0.66],
  };
  const curve: Point[] = [
    [1130, 975],
    [1210, 900],
    [1330, 890],
    [1390, 960],
    [1360, 1040],
    [1270, 1065],
  ];
  const handle = `<path d="${smooth(curve)}" transform="translate(16 30)" stroke="#1b1714" stroke-width="50" stroke-linecap="butt" fill="none" opacity="0.42" filter="url(#soft14)"/><path d="${smooth(curve)}" stroke="#3a7f80" stroke-width="54" fill="none"/><path d="${smooth(curve)}" stroke="#5ba6a2" stroke-width="40" fill="none"/><path d="${smooth(curve)}" transform="translate(-6 -9)" stroke="#cfe6e0" stroke-width="8" fill="none" opacity="0.8" filter="url(#soft2)"/><ellipse cx="1130" cy="975" rx="33" ry="18" transform="rotate(48 1130 975)" fill="#a5907b"/><ellipse cx="1268" cy="1065" rx="31" ry="17" transform="rotate(96 1268 1065)" fill="#a5907b"/>`;
  const stubs = [0.14, 0.66]
    .map((v) => {
      const d = smooth(blob(random, cup, 0.98, v, 0.15, 0.07), true);
      return `<path d="${d}" fill="#2c5f60"/><path d="${d}" fill="#a8937e" transform="translate(1 2)"/><path d="${d}" fill="#3c2f26" filter="url(#speck)" opacity="0.6"/>`;
    })
    .join('');
  return sheet({
    key: 'broken-handle',
    seed: 191,
    ground: tableGround(1600, 1200, ['#cac8c3', '#e2e0db', '#b8b5ae'], 0.62),
    body:
      drawVessel({
        vessel: cup,
        id: 'p',
        fill: '#559f9c',
        surface: crackleOn(random, cup, { cells: 75, fine: 4, line: 4.4, ink: '#10201f' }) + stubs,
        inside: '#3f7f7d',
        rimColour: '#76b8b2',
        gloss: 0.7,
        bareFrom: 0.9,
      }) + handle,
  });
}

/** A cup welded to a piece of shelf by its own glaze. */
function stuckFoot(): Drawing {
  const random = seeded(193);
  const cup: Vessel = {
    cx: 790,
    top: 300,
    height: 510,
    radius: 280,
    tilt: 0.2,
    profile: [0.98, 0.97, 0.98, 1, 1, 0.97, 0.88, 0.7, 0.56],
  };
  const pool = (grow: number): Point[] =>
    Array.from({ length: 30 }, (_, i) => {
      const a = (i / 30) * Math.PI * 2;
      const q = 196 + grow + 26 * Math.sin(a * 3 + 0.6) + 14 * Math.sin(a * 5);
      return [790 + Math.cos(a) * q, 850 + Math.sin(a) * q * 0.27];
    });
  const tears = [-0.95, -0.5, -0.1, 0.36, 0.82]
    .map((u, i) => {
      const top = 0.55 + 0.07 * (i % 3);
      const half = 0.05 + 0.015 * ((i * 2) % 3);
      const side = (sign: number): Point[] =>
        [0, 0.25, 0.5, 0.8, 1].map((t) =>
          onVessel(cup, u + sign * half * (0.25 + 0.75 * t), top + (1.02 - top) * t),
        );
      const d = `${smooth([...side(-1), ...side(1).reverse()])}Z`;
      const line = [0.3, 0.6, 0.9].map((t) => onVessel(cup, u - half * 0.4, top + (1 - top) * t));
      return `<path d="${d}" fill="#6fb0a6"/><path d="${smooth(line)}" fill="none" stroke="#fff" stroke-width="7" stroke-linecap="round" opacity="0.65" filter="url(#soft2)"/>`;
    })
    .join('');
  const slab: Point[] = [
    [330, 760],
    [1270, 760],
    [1420, 1010],
    [200, 1010],
  ];
  const slabPath = `M${slab.map(([x, y]) => `${x} ${y}`).join('L')}Z`;
  return sheet({
    key: 'stuck-foot',
    seed: 193,
    ground: tableGround(1600, 1200, ['#c8c5bf', '#e0ddd7', '#b7b3ab'], 0.56),
    defs: `<clipPath id="slab"><path d="${slabPath}"/></clipPath>${noisePaint('shelf', ['#8f8271', '#a69886', '#b8aa97', '#9c8e7d'], { fx: 0.03, fy: 0.05, seed: 9, contrast: 1.6 })}`,
    body: `<path d="M180 1060L1450 1060L1300 800L320 800Z" transform="translate(40 40)" fill="#1b1714" opacity="0.4" filter="url(#soft30)"/><path d="M200 1010L1420 1010L1420 1072L200 1072Z" fill="#85786a"/><g clip-path="url(#slab)"><rect x="180" y="750" width="1260" height="270" fill="#a69886" filter="url(#shelf)"/></g>${drawVessel({ vessel: cup, id: 'p', fill: '#5c9f96', surface: crackleOn(random, cup, { cells: 75, fine: 4, line: 4.4, ink: '#10201f' }), inside: '#457f77', rimColour: '#7dbab1', gloss: 0.7, bareFrom: 0.93 })}<path d="${smooth(pool(18), true)}" fill="#1f3b38" opacity="0.5" transform="translate(6 10)" filter="url(#soft6)"/><clipPath id="front"><path d="M0 838L594 838C640 900 940 900 986 838L1600 838L1600 1200L0 1200Z"/></clipPath><g clip-path="url(#front)"><path d="${smooth(pool(0), true)}" fill="#66a69c"/><path d="${smooth(pool(-20), true)}" fill="none" stroke="#fff" stroke-width="8" opacity="0.5" filter="url(#soft2)"/></g>${tears}<ellipse cx="690" cy="893" rx="60" ry="9" fill="#fff" opacity="0.6" filter="url(#soft2)"/>`,
  });
}

export const faultDrawings: readonly (() => Drawing)[] = [
  dullAndBright,
  crawled,
  blisters,
  stuckJar,
  splitBottle,
  brokenHandle,
  stuckFoot,
];
