import { crackleLines, inkCrackle } from './crackle.ts';
import { penStroke, polygon, wander, type Point } from './lines.ts';
import { between, normal, seeded, type Random } from './random.ts';
import { ASH, noisePaint, sheet, type Drawing } from './sheet.ts';

/** Plates, platters and tiles seen from above, whole and otherwise. */

const clothFromAbove = (tone: string, lit: string): string =>
  `<defs><linearGradient id="above" x1="0" y1="0" x2="1" y2="1"><stop offset="0" stop-color="${lit}"/><stop offset="1" stop-color="${tone}"/></linearGradient></defs><rect width="1600" height="1200" fill="url(#above)"/>`;

interface PlateLook {
  readonly key: string;
  readonly seed: number;
  readonly glaze: string;
  readonly paint?: string;
  readonly defs?: string;
  readonly cells: number;
  readonly fine: number;
  readonly line: number;
  readonly ink?: string;
  readonly strength?: number;
  readonly radius?: number;
  readonly extra?: (random: Random, at: PlateAt) => string;
  /** Splits the plate in two pieces a little apart along a line through it. */
  readonly splitDegrees?: number;
}
interface PlateAt {
  readonly cx: number;
  readonly cy: number;
  readonly r: number;
}

function plateBody(random: Random, look: PlateLook, at: PlateAt): string {
  const { cx, cy, r } = at;
  const lines = crackleLines(random, {
    width: r * 2,
    height: r * 2,
    cells: look.cells,
    fine: look.fine,
    line: look.line,
  });
  const net = inkCrackle(random, lines, ([x, y]) => [cx - r + x, cy - r + y], {
    colour: look.ink ?? '#1f1c1a',
    halo: 0.26,
    strength: look.strength ?? 1,
  });
  return `<g clip-path="url(#plate)"><rect x="${cx - r}" y="${cy - r}" width="${2 * r}" height="${2 * r}" fill="${look.glaze}"${look.paint ? ` filter="url(#${look.paint})"` : ''}/>${net}${look.extra?.(random, at) ?? ''}
<circle cx="${cx}" cy="${cy}" r="${r * 0.74}" fill="none" stroke="#1d1a18" stroke-width="${r * 0.05}" opacity="0.32" filter="url(#soft14)"/>
<circle cx="${cx + 6}" cy="${cy + 8}" r="${r * 0.72}" fill="none" stroke="#fff" stroke-width="${r * 0.03}" opacity="0.4" filter="url(#soft6)"/>
<circle cx="${cx}" cy="${cy}" r="${r}" fill="url(#dish)"/>
<ellipse cx="${cx - r * 0.42}" cy="${cy - r * 0.5}" rx="${r * 0.34}" ry="${r * 0.1}" fill="#fff" opacity="0.42" transform="rotate(-38 ${cx - r * 0.42} ${cy - r * 0.5})" filter="url(#soft14)"/></g>
<circle cx="${cx}" cy="${cy}" r="${r}" fill="none" stroke="#2b2623" stroke-width="7" opacity="0.8" filter="url(#rough)"/>`;
}

function plate(look: PlateLook): Drawing {
  const random = seeded(look.seed);
  const at: PlateAt = { cx: 800, cy: 590, r: look.radius ?? 480 };
  const { cx, cy, r } = at;
  const body = plateBody(random, look, at);
  const shadow = `<ellipse cx="${cx + 34}" cy="${cy + 46}" rx="${r * 1.02}" ry="${r}" fill="#1d1a17" opacity="0.42" filter="url(#soft30)"/>`;
  let pieces = body;
  let halves = '';
  if (look.splitDegrees !== undefined) {
    const a = (look.splitDegrees * Math.PI) / 180;
    const along = wander(
      random,
      [cx - Math.cos(a) * r * 1.1, cy - Math.sin(a) * r * 1.1],
      [cx + Math.cos(a) * r * 1.1, cy + Math.sin(a) * r * 1.1],
      46,
      12,
    );
    const side = (sign: number): string => {
      const far = (t: Point): Point => [
        t[0] - Math.sin(a) * r * 3 * sign,
        t[1] + Math.cos(a) * r * 3 * sign,
      ];
      const first = along[0] ?? [0, 0];
      const last = along[along.length - 1] ?? [0, 0];
      return polygon([...along, far(last), far(first)]);
    };
    halves = `<clipPath id="half1"><path d="${side(1)}"/></clipPath><clipPath id="half2"><path d="${side(-1)}"/></clipPath>`;
    const shift = (sign: number, turn: number): string =>
      `translate(${(-Math.sin(a) * 15 * sign).toFixed(1)} ${(Math.cos(a) * 15 * sign).toFixed(1)}) rotate(${turn} ${cx} ${cy})`;
    const edge = `<path d="${penStroke(random, along, 9)}" fill="#6d5847"/>`;
    pieces = `<g transform="${shift(1, 0.9)}"><g clip-path="url(#half1)"><g clip-path="url(#plateOut)">${body}${edge}</g></g></g><g transform="${shift(-1, -0.6)}"><g clip-path="url(#half2)"><g clip-path="url(#plateOut)">${body.replaceAll('url(#plate)', 'url(#plate)')}${edge}</g></g></g>`;
  }
  return sheet({
    key: look.key,
    seed: look.seed,
    ground: clothFromAbove('#b9b4aa', ASH),
    defs: `${look.defs ?? ''}<clipPath id="plate"><circle cx="${cx}" cy="${cy}" r="${r}"/></clipPath><clipPath id="plateOut"><circle cx="${cx}" cy="${cy}" r="${r + 6}"/></clipPath>${halves}
<radialGradient id="dish" cx="0.36" cy="0.3" r="0.85"><stop offset="0" stop-color="#fff" stop-opacity="0.14"/><stop offset="0.5" stop-color="#1d1a18" stop-opacity="0.02"/><stop offset="1" stop-color="#1d1a18" stop-opacity="0.5"/></radialGradient>`,
    body: shadow + pieces,
  });
}

/** Fine dunting: long hair-fine cracks that start at the rim and run in arcs. */
function dunts(random: Random, { cx, cy, r }: PlateAt): string {
  let out = '';
  const starts = [0.4, 1.7, 2.5, 4.1, 5.3];
  for (const start of starts) {
    const a = start + between(random, -0.2, 0.2);
    const sweep = between(random, 0.8, 1.6);
    const depth = between(random, 0.35, 0.75);
    const path = Array.from({ length: 34 }, (_, k): Point => {
      const t = k / 33;
      const angle = a + sweep * t ** 1.4;
      const reach = r * (1 - depth * Math.sin((Math.PI / 2) * t)) + normal(random) * 2.4;
      return [cx + Math.cos(angle) * reach, cy + Math.sin(angle) * reach];
    });
    out += `<path d="${penStroke(random, path, 11)}" fill="#fff" opacity="0.35" filter="url(#soft2)" transform="translate(3 3)"/><path d="${penStroke(random, path, 5)}" fill="#0d0b0a"/>`;
  }
  return out;
}

function tile(): Drawing {
  const random = seeded(139);
  const [x, y, s] = [330, 130, 900];
  const lines = crackleLines(random, { width: s, height: s, cells: 60, fine: 3, line: 5 });
  const net = inkCrackle(random, lines, ([px, py]) => [x + px, y + py], {
    colour: '#17211f',
    halo: 0.25,
    strength: 0.9,
  });
  const main = wander(random, [x + 90, y - 10], [x + s * 0.62, y + s + 10], 40, 9);
  const branch = wander(random, main[19] ?? [0, 0], [x + s + 10, y + s * 0.36], 26, 8);
  const cracks = [main, branch]
    .map(
      (path) =>
        `<path d="${penStroke(random, path, 15)}" fill="#fff" opacity="0.4" transform="translate(4 3)" filter="url(#soft2)"/><path d="${penStroke(random, path, 11)}" fill="#120f0d"/>`,
    )
    .join('');
  const wave = Array.from({ length: 41 }, (_, i): Point => [
    x + (s * i) / 40,
    y + s - 8 + 26 * Math.sin((Math.PI * i) / 40),
  ]);
  const outline = polygon([[x, y], [x + s, y + 8], ...wave.reverse()]);
  return sheet({
    key: 'cracked-tile',
    seed: 139,
    ground: clothFromAbove('#b5b2ab', '#dedcd6'),
    defs: `<clipPath id="tile"><path d="${outline}"/></clipPath><linearGradient id="glint" x1="0" y1="0" x2="1" y2="1"><stop offset="0" stop-color="#fff" stop-opacity="0.32"/><stop offset="0.45" stop-color="#fff" stop-opacity="0"/><stop offset="1" stop-color="#101514" stop-opacity="0.42"/></linearGradient>${noisePaint('sea', ['#2f6d6d', '#4d8f8a', '#77b0a6', '#5b9c95', '#3d7d7b'], { fx: 0.003, fy: 0.003, seed: 8 })}`,
    body: `<path d="${outline}" transform="translate(30 40)" fill="#1b1916" opacity="0.45" filter="url(#soft30)"/><path d="${outline}" transform="translate(7 13)" fill="#3b2f28"/><g clip-path="url(#tile)"><rect x="${x - 20}" y="${y - 20}" width="${s + 60}" height="${s + 80}" fill="#5b9c95" filter="url(#sea)"/>${net}${cracks}<path d="${outline}" fill="url(#glint)"/></g><path d="${outline}" fill="none" stroke="#222a28" stroke-width="6" opacity="0.7" filter="url(#rough)"/>`,
  });
}

/** A pot burst by steam: shards about a foot that stayed where it stood. */
function burst(): Drawing {
  const random = seeded(149);
  let shards = '';
  for (let i = 0; i < 46; i += 1) {
    const a = random() * Math.PI * 2;
    const d = 90 + Math.abs(normal(random)) * 260;
    const [x, y] = [800 + Math.cos(a) * d * 1.25, 610 + Math.sin(a) * d * 0.95];
    const r = between(random, 16, 88) * (1 - Math.min(0.6, d / 900));
    const corners = Array.from({ length: 6 }, (_, k): Point => {
      const t = (k / 6) * Math.PI * 2 + a;
      const q = r * between(random, 0.55, 1.2);
      return [x + Math.cos(t) * q, y + Math.sin(t) * q * 0.85];
    });
    const d_ = polygon(corners);
    const tone =
      ['#c7a98c', '#b8977a', '#d2b89d', '#a98a70'][Math.floor(random() * 4)] ?? '#c7a98c';
    shards += `<path d="${d_}" transform="translate(9 13)" fill="#1b1714" opacity="0.45" filter="url(#soft6)"/><path d="${d_}" transform="translate(2 5)" fill="#7d6350"/><path d="${d_}" fill="${tone}"/><path d="${d_}" fill="#3a2a20" filter="url(#speck)" opacity="0.5"/>`;
  }
  const foot = `<ellipse cx="810" cy="628" rx="175" ry="150" fill="#1b1714" opacity="0.5" filter="url(#soft14)"/><circle cx="800" cy="610" r="150" fill="#b6967b"/><circle cx="800" cy="610" r="126" fill="#8d7160"/><circle cx="806" cy="618" r="118" fill="#a88a72"/>${[0, 1, 2].map((i) => `<circle cx="803" cy="614" r="${40 + i * 30}" fill="none" stroke="#8a6d59" stroke-width="3" opacity="0.7"/>`).join('')}`;
  return sheet({
    key: 'burst-shards',
    seed: 149,
    ground: `<rect width="1600" height="1200" fill="#cfcabf"/><rect x="-20" y="90" width="1640" height="1020" fill="#bdb5a6" filter="url(#ragged)"/><rect width="1600" height="1200" fill="#5b5348" filter="url(#speck)" opacity="0.35"/>`,
    body: `<g filter="url(#rough)">${shards}${foot}</g>`,
  });
}

const turquoise = noisePaint('sea', ['#2c7476', '#4c9997', '#7dbdb4', '#5aa6a1', '#35807f'], {
  fx: 0.003,
  fy: 0.004,
  seed: 3,
});

export const plateDrawings: readonly (() => Drawing)[] = [
  () =>
    plate({
      key: 'plate-cracked-across',
      seed: 131,
      glaze: '#ece7db',
      cells: 110,
      fine: 4,
      line: 4.6,
      splitDegrees: 64,
    }),
  () =>
    plate({
      key: 'plate-whole',
      seed: 132,
      glaze: '#5aa6a1',
      paint: 'sea',
      defs: turquoise,
      cells: 120,
      fine: 4,
      line: 4.8,
      ink: '#0f1f1e',
    }),
  () =>
    plate({
      key: 'platter-dunting',
      seed: 133,
      glaze: '#e6e0d2',
      cells: 130,
      fine: 2,
      line: 2.6,
      ink: '#5b5249',
      strength: 0.7,
      radius: 510,
      extra: dunts,
    }),
  tile,
  burst,
];
