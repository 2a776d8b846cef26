import { ink, inkCurve, inkOutline, smooth, type Point } from './lines.ts';
import { between, seeded, type Random } from './random.ts';
import { label, noisePaint, paperGround, sheet, SOOT, type Drawing } from './sheet.ts';

/** Kilns and burners in section and plan, drawn as a potter draws on squared paper. */

const FIBRE = '#d9d3c5';
const BLUE = '#3d6f74';

/** Wavy lines that say "ceramic fibre" in a section. */
function fibre(random: Random, x: number, y: number, w: number, h: number): string {
  let waves = '';
  const across = w > h;
  const lanes = Math.max(2, Math.round((across ? h : w) / 14));
  for (let i = 1; i < lanes; i += 1) {
    const points: Point[] = [];
    const length = across ? w : h;
    for (let t = 6; t < length - 4; t += 16) {
      const sway = Math.sin(t * 0.09 + i * 1.3) * 3.4 + between(random, -1.2, 1.2);
      const off = ((across ? h : w) * i) / lanes + sway;
      points.push(across ? [x + t, y + off] : [x + off, y + t]);
    }
    if (points.length > 2) waves += inkCurve(points, 1.6, '#8c8577');
  }
  return `<rect x="${x}" y="${y}" width="${w}" height="${h}" fill="${FIBRE}"/>${waves}${inkOutline(
    random,
    [
      [x, y],
      [x + w, y],
      [x + w, y + h],
      [x, y + h],
    ],
    3.4,
  )}`;
}

function block(
  random: Random,
  x: number,
  y: number,
  w: number,
  h: number,
  tone = '#b9b2a6',
  hollow = false,
): string {
  const holes = hollow
    ? [0.12, 0.56]
        .map(
          (t) =>
            `<rect x="${x + w * t}" y="${y + h * 0.2}" width="${w * 0.32}" height="${h * 0.6}" fill="#e7e3da" stroke="${SOOT}" stroke-width="3"/>`,
        )
        .join('')
    : '';
  return `<rect x="${x}" y="${y}" width="${w}" height="${h}" fill="${tone}"/>${holes}${inkOutline(
    random,
    [
      [x, y],
      [x + w, y],
      [x + w, y + h],
      [x, y + h],
    ],
    3.6,
  )}`;
}

/** A swirl of cold blue-green: hot gas, drawn as a path and never as a temperature. */
const gasPath = (points: readonly Point[], width = 5): string => {
  const end = points[points.length - 1] ?? [0, 0];
  const before = points[points.length - 2] ?? end;
  const a = Math.atan2(end[1] - before[1], end[0] - before[0]);
  const head: Point[] = [-2.6, 2.6].map((turn) => [
    end[0] + Math.cos(a + turn) * 22,
    end[1] + Math.sin(a + turn) * 22,
  ]);
  return (
    inkCurve(points, width, BLUE) + inkCurve([head[0] ?? end, end, head[1] ?? end], width, BLUE)
  );
};

const leader = (random: Random, from: Point, to: Point): string =>
  ink(random, from, to, 2.4, '#6a655e');

function topHatSection(): Drawing {
  const r = seeded(201);
  const [x, y, w, h, t] = [470, 250, 660, 700, 60];
  const pots = [
    [640, 690, 120, 150],
    [800, 650, 150, 190],
    [965, 700, 110, 140],
  ]
    .map(
      ([px = 0, py = 0, pw = 0, ph = 0]) =>
        `<path d="${smooth([
          [px - pw / 2, py],
          [px - pw * 0.42, py + ph * 0.6],
          [px - pw * 0.2, py + ph],
          [px + pw * 0.2, py + ph],
          [px + pw * 0.42, py + ph * 0.6],
          [px + pw / 2, py],
        ])}Z" fill="#efebe2" stroke="${SOOT}" stroke-width="4"/>`,
    )
    .join('');
  const body = `${fibre(r, x, y, t, h)}${fibre(r, x + w - t, y, t, h)}${fibre(r, x, y - t, 260, t)}${fibre(r, x + 400, y - t, 260, t)}
${block(r, x - 40, y + h, w + 80, 54, '#cdc5b6')}${fibre(r, x - 40, y + h + 54, w + 80, 40)}${block(r, x - 30, y + h + 94, 210, 90, '#b3aca0', true)}${block(r, x + 230, y + h + 94, 210, 90, '#b3aca0', true)}${block(r, x + 490, y + h + 94, 200, 90, '#b3aca0', true)}
${block(r, 560, 840, 480, 24, '#a79a88')}${[590, 795, 990].map((px) => block(r, px, 864, 26, 86, '#c7bba8')).join('')}${pots}
<rect x="${x + w - t - 6}" y="855" width="${t + 12}" height="72" fill="#eae7e0"/>${ink(r, [x + w - t, 855], [x + w, 855], 4)}${ink(r, [x + w - t, 927], [x + w, 927], 4)}
${block(r, 1190, 868, 190, 46, '#8e9a9b')}${block(r, 1380, 858, 40, 66, '#7b8788')}${inkCurve(
    [
      [1420, 890],
      [1480, 892],
      [1510, 950],
      [1500, 1060],
    ],
    8,
    '#4a4e50',
  )}
${gasPath(
  [
    [1180, 891],
    [1090, 893],
    [960, 905],
    [700, 915],
    [560, 900],
    [535, 780],
    [545, 560],
    [600, 400],
    [720, 330],
    [790, 260],
    [800, 150],
  ],
  5,
)}${gasPath(
    [
      [1100, 880],
      [1040, 800],
      [1050, 620],
      [1000, 430],
      [880, 340],
      [815, 250],
      [806, 160],
    ],
    4,
  )}
<rect x="560" y="520" width="180" height="9" fill="#9a938a"/>${ink(r, [430, 524], [742, 524], 5, '#5b5650')}
${label(210, 215, 'flue, 120 mm')}${leader(r, [400, 208], [735, 185])}${label(130, 520, 'probe, 40 mm')}${label(130, 556, 'from the ware')}${leader(r, [350, 518], [428, 523])}${label(1180, 470, '50 mm fibre')}${leader(r, [1170, 462], [1105, 480])}${label(1180, 1010, 'burner, 50 mm back')}${leader(r, [1210, 980], [1170, 920])}${label(130, 860, 'shelf on 90 mm posts')}${leader(r, [452, 853], [556, 851])}${label(130, 1030, 'fibre under the base')}${leader(r, [425, 1022], [446, 1024])}`;
  return sheet({ key: 'kiln-section', seed: 201, ground: paperGround(1600, 1200, 40), body });
}

function burnerPlan(): Drawing {
  const r = seeded(211);
  const plan = (cx: number, sweep: boolean): string => {
    const [cy, outer, inner] = [560, 330, 275];
    const ringFill = `<circle cx="${cx}" cy="${cy}" r="${outer}" fill="${FIBRE}" stroke="${SOOT}" stroke-width="4"/><circle cx="${cx}" cy="${cy}" r="${inner}" fill="#f3f0e9" stroke="${SOOT}" stroke-width="4"/>`;
    const waves = Array.from({ length: 3 }, (_, i) => {
      const rr = inner + 14 + i * 14;
      return inkCurve(
        Array.from({ length: 61 }, (_v, k): Point => {
          const a = (k / 60) * Math.PI * 2;
          const q = rr + 3 * Math.sin(k * 2.1 + i);
          return [cx + Math.cos(a) * q, cy + Math.sin(a) * q];
        }),
        1.5,
        '#8c8577',
        true,
      );
    }).join('');
    const pots = [
      [0, 0, 70],
      [-120, -80, 46],
      [95, -110, 50],
      [-70, 125, 52],
      [120, 90, 44],
    ]
      .map(
        ([dx = 0, dy = 0, q = 0]) =>
          `<circle cx="${cx + dx}" cy="${cy + dy}" r="${q}" fill="#e2dccf" stroke="${SOOT}" stroke-width="3.5"/><circle cx="${cx + dx}" cy="${cy + dy}" r="${q * 0.72}" fill="none" stroke="#8c8577" stroke-width="2"/>`,
      )
      .join('');
    const [px, angle] = sweep ? [cx + 205, -52] : [cx, -90];
    const py = sweep ? cy + 225 : cy + 305;
    const burner = `<g transform="rotate(${sweep ? 38 : 0} ${px} ${py})"><rect x="${px - 38}" y="${py - 62}" width="76" height="96" fill="#f3f0e9"/><rect x="${px - 24}" y="${py + 78}" width="48" height="160" fill="#8e9a9b" stroke="${SOOT}" stroke-width="4"/><rect x="${px - 36}" y="${py + 220}" width="72" height="44" fill="#7b8788" stroke="${SOOT}" stroke-width="4"/></g>`;
    const arc = Array.from({ length: 30 }, (_, k): Point => {
      const a = 0.75 - (k / 29) * 5.4;
      const q = 232 - k * 1.6;
      return [cx + Math.cos(a) * q, cy + Math.sin(a) * q];
    });
    const flow = sweep
      ? gasPath([[px + 62, py + 74], [px + 22, py + 18], ...arc], 6)
      : gasPath(
          [
            [cx, cy + 370],
            [cx, cy + 250],
            [cx + 4, cy + 95],
          ],
          6,
        ) +
        gasPath(
          [
            [cx - 12, cy + 110],
            [cx - 50, cy + 60],
            [cx - 150, cy + 60],
            [cx - 215, cy - 20],
          ],
          4,
        ) +
        gasPath(
          [
            [cx + 12, cy + 110],
            [cx + 50, cy + 50],
            [cx + 150, cy + 10],
            [cx + 215, cy - 60],
          ],
          4,
        );
    return ringFill + waves + burner + pots + flow + (angle ? '' : '');
  };
  return sheet({
    key: 'burner-plan',
    seed: 211,
    ground: paperGround(1600, 1200, 40),
    body: `${plan(430, false)}${plan(1170, true)}${label(430, 150, 'straight in', { anchor: 'middle', size: 40 })}${label(1170, 150, 'swept round the wall', { anchor: 'middle', size: 40 })}${ink(r, [800, 120], [800, 1060], 2.4, '#9a958c')}`,
  });
}

function floorLayers(): Drawing {
  const r = seeded(223);
  const hot = block(r, 240, 160, 1000, 44, '#a79a88');
  const posts = [330, 720, 1110].map((x) => block(r, x, 204, 60, 130, '#c7bba8')).join('');
  const ground = `<path d="M0 960C200 940 380 965 620 955S1100 945 1600 962V1200H0Z" fill="#a8a294"/><path d="M0 960C200 940 380 965 620 955S1100 945 1600 962V1200H0Z" fill="#4b463e" filter="url(#speck)" opacity="0.6"/>${inkCurve(
    [
      [0, 960],
      [300, 948],
      [620, 955],
      [1100, 946],
      [1600, 962],
    ],
    4,
  )}`;
  const names: [number, string][] = [
    [182, 'shelf, 15 mm'],
    [278, 'posts, 60 mm'],
    [375, 'soft brick, flat'],
    [470, 'fibre, 25 mm'],
    [540, 'fibre board'],
    [660, 'hollow blocks,'],
    [700, 'holes open'],
    [1050, 'shingle'],
  ];
  return sheet({
    key: 'floor-layers',
    seed: 223,
    ground: paperGround(1600, 1200, 40),
    body: `${ground}${hot}${posts}${[0, 1, 2, 3].map((i) => block(r, 200 + i * 270, 334, 262, 82, '#d9cdb8')).join('')}${fibre(r, 180, 420, 1120, 90)}${fibre(r, 180, 514, 1120, 44)}${[0, 1, 2].map((i) => block(r, 190 + i * 375, 562, 350, 385, '#b3aca0', true)).join('')}${names.map(([y, name]) => label(1340, y + 10, name, { size: 27 })).join('')}${[182, 375, 470, 540, 660].map((y) => leader(r, [1256, y], [1330, y])).join('')}`,
  });
}

function twoProbes(): Drawing {
  const r = seeded(227);
  const probe = (y: number): string =>
    `<rect x="180" y="${y - 9}" width="560" height="18" rx="8" fill="#9aa0a0" stroke="${SOOT}" stroke-width="3"/><rect x="120" y="${y - 34}" width="86" height="68" fill="#6d7576" stroke="${SOOT}" stroke-width="4"/>${inkCurve(
      [
        [120, y],
        [70, y + 10],
        [60, y + 120],
      ],
      5,
      '#4a4e50',
    )}`;
  const pots = [
    [640, 590, 170, 120],
    [960, 590, 200, 120],
    [700, 900, 190, 130],
    [1010, 905, 160, 125],
  ]
    .map(
      ([x = 0, y = 0, w = 0, h = 0]) =>
        `<path d="${smooth([
          [x - w / 2, y],
          [x - w * 0.4, y + h * 0.7],
          [x - w * 0.2, y + h],
          [x + w * 0.2, y + h],
          [x + w * 0.4, y + h * 0.7],
          [x + w / 2, y],
        ])}Z" fill="#efebe2" stroke="${SOOT}" stroke-width="4"/>`,
    )
    .join('');
  return sheet({
    key: 'two-probes',
    seed: 227,
    ground: paperGround(1600, 1200, 40),
    body: `${block(r, 360, 150, 90, 950, '#d9cdb8')}${block(r, 1180, 150, 90, 950, '#d9cdb8')}${block(r, 360, 70, 910, 80, '#d9cdb8')}${block(r, 300, 1100, 1030, 60, '#b3aca0')}${Array.from({ length: 9 }, (_, i) => ink(r, [360, 240 + i * 95], [450, 240 + i * 95], 2.4) + ink(r, [1180, 240 + i * 95], [1270, 240 + i * 95], 2.4)).join('')}
${block(r, 500, 712, 630, 22, '#a79a88')}${block(r, 500, 1034, 630, 22, '#a79a88')}${[520, 1080].map((x) => block(r, x, 734, 28, 300, '#c7bba8')).join('')}${[520, 1080].map((x) => block(r, x, 1056, 28, 44, '#c7bba8')).join('')}${pots}${probe(420)}${probe(830)}
${label(1300, 395, 'top: 998 °C', { size: 34 })}${label(1300, 825, 'bottom: 896 °C', { size: 34 })}${ink(r, [1300, 410], [760, 420], 2.2, '#8a857c')}${ink(r, [1300, 840], [760, 830], 2.2, '#8a857c')}`,
  });
}

function flameLift(): Drawing {
  const r = seeded(229);
  const burner = (y: number): string =>
    `${block(r, 180, y - 46, 330, 92, '#8e9a9b')}${block(r, 120, y - 62, 60, 124, '#7b8788')}${[230, 300].map((x) => `<rect x="${x}" y="${y - 28}" width="42" height="56" rx="20" fill="#e9e5dc" stroke="${SOOT}" stroke-width="4"/>`).join('')}${inkCurve(
      [
        [120, y],
        [70, y + 4],
        [20, y + 60],
      ],
      8,
      '#4a4e50',
    )}${block(r, 510, y - 56, 40, 112, '#7b8788')}`;
  const flame = (x: number, y: number, long: number, opacity: number): string =>
    [1, 0.72, 0.44]
      .map(
        (k, i) =>
          `<path d="${smooth(
            [
              [x, y],
              [x + long * 0.12 * k, y - 52 * k],
              [x + long * 0.4 * k, y - 60 * k],
              [x + long * 0.75 * k, y - 30 * k],
              [x + long * k, y],
              [x + long * 0.75 * k, y + 30 * k],
              [x + long * 0.4 * k, y + 60 * k],
              [x + long * 0.12 * k, y + 52 * k],
            ],
            true,
          )}" fill="${['#9dbcc4', '#6d9aa8', '#d8e6e6'][i] ?? '#9dbcc4'}" opacity="${opacity}"/>`,
      )
      .join('');
  return sheet({
    key: 'flame-lifting-off',
    seed: 229,
    ground: paperGround(1600, 1200, 40),
    body: `${burner(340)}<g filter="url(#soft2)">${flame(556, 340, 620, 0.75)}</g>${label(860, 470, 'seated: the flame begins at the lip', { anchor: 'middle', size: 36 })}${burner(820)}<g filter="url(#ragged)">${flame(800, 820, 520, 0.55)}</g>${gasPath(
      [
        [570, 820],
        [680, 815],
        [760, 822],
      ],
      4,
    )}${label(900, 960, 'lifting: a gap, a hiss, and then nothing', { anchor: 'middle', size: 36 })}`,
  });
}

function binSection(): Drawing {
  const r = seeded(233);
  const bin: Point[] = [
    [500, 330],
    [545, 1010],
    [1055, 1010],
    [1100, 330],
  ];
  const bed = Array.from({ length: 260 }, () => {
    const y = between(r, 800, 1000);
    const x = between(r, 555, 1045);
    const a = between(r, 0, 180);
    return `<rect x="${x.toFixed(0)}" y="${y.toFixed(0)}" width="${between(r, 12, 46).toFixed(0)}" height="4" fill="${r() < 0.5 ? '#b59f7c' : '#cbb694'}" stroke="#6e5c42" stroke-width="0.8" transform="rotate(${a.toFixed(0)} ${x.toFixed(0)} ${y.toFixed(0)})"/>`;
  }).join('');
  const paper = Array.from({ length: 9 }, (_, i) => {
    const x = 600 + (i % 5) * 95 + between(r, -12, 12);
    const y = 470 + Math.floor(i / 5) * 70 + between(r, -14, 14);
    const points = Array.from({ length: 9 }, (_v, k): Point => {
      const a = (k / 9) * Math.PI * 2;
      const q = between(r, 36, 66);
      return [x + Math.cos(a) * q, y + Math.sin(a) * q * 0.7];
    });
    return `<path d="M${points.map(([px, py]) => `${px.toFixed(0)} ${py.toFixed(0)}`).join('L')}Z" fill="#e9e5da" stroke="${SOOT}" stroke-width="2.6"/>${[0, 1, 2].map((k) => ink(r, [x - 26, y - 14 + k * 12], [x + between(r, 6, 28), y - 14 + k * 12], 1.6, '#8d887e')).join('')}`;
  }).join('');
  const bowl = smooth([
    [640, 610],
    [670, 720],
    [740, 800],
    [860, 800],
    [930, 720],
    [960, 610],
  ]);
  return sheet({
    key: 'reduction-bin-section',
    seed: 233,
    ground: paperGround(1600, 1200, 40),
    defs: `<clipPath id="bin"><path d="M${bin.map((q) => q.join(' ')).join('L')}Z"/></clipPath>`,
    body: `<path d="M${bin.map((q) => q.join(' ')).join('L')}Z" fill="#f0ede6"/><g clip-path="url(#bin)">${bed}</g><path d="${bowl}Z" fill="#efebe2" stroke="${SOOT}" stroke-width="5"/><ellipse cx="800" cy="610" rx="160" ry="26" fill="#d9d3c6" stroke="${SOOT}" stroke-width="4"/>${paper}${inkOutline(r, bin, 7, false)}${ink(r, [545, 1010], [1055, 1010], 7)}${block(r, 470, 290, 660, 34, '#8e9a9b')}<path d="${smooth(
      [
        [440, 300],
        [480, 262],
        [640, 250],
        [800, 256],
        [980, 248],
        [1120, 262],
        [1160, 302],
        [1150, 380],
        [1118, 372],
        [1120, 316],
        [480, 316],
        [482, 370],
        [448, 382],
      ],
    )}Z" fill="#9fb2b4" opacity="0.85" stroke="${SOOT}" stroke-width="3"/>
${label(1200, 300, 'lid, wet towel over')}${label(1200, 500, 'paper, crumpled: over')}${label(1200, 640, 'the bowl, on the bed')}${label(1200, 900, 'shavings, 6 litres: under')}${leader(r, [1190, 292], [1150, 292])}${leader(r, [1190, 492], [1020, 500])}${leader(r, [1190, 632], [966, 640])}${leader(r, [1190, 892], [1040, 900])}`,
  });
}

/** A page of a firing book: a climb that would not go on, and the pencil's opinion of it. */
function notebookPage(): Drawing {
  const r = seeded(239);
  const at = (minute: number, celsius: number): Point => [250 + minute * 17, 1000 - celsius * 0.78];
  const read: Point[] = [
    [0, 12],
    [5, 190],
    [10, 330],
    [15, 445],
    [20, 540],
    [25, 612],
    [30, 660],
    [35, 689],
    [40, 700],
    [45, 704],
    [50, 703],
    [55, 705],
    [60, 704],
  ].map(([m = 0, c = 0]) => at(m, c + between(r, -4, 4)));
  const crosses = read
    .map(
      ([x, y]) =>
        ink(r, [x - 9, y - 9], [x + 9, y + 9], 4) + ink(r, [x - 9, y + 9], [x + 9, y - 9], 4),
    )
    .join('');
  const ticks =
    [200, 400, 600, 800, 1000]
      .map(
        (c) =>
          ink(r, [240, at(0, c)[1]], [262, at(0, c)[1]], 3) +
          label(225, at(0, c)[1] + 10, String(c), { anchor: 'end', size: 28 }),
      )
      .join('') +
    [15, 30, 45, 60]
      .map(
        (m) =>
          ink(r, [at(m, 0)[0], 990], [at(m, 0)[0], 1012], 3) +
          label(at(m, 0)[0], 1056, String(m), { anchor: 'middle', size: 28 }),
      )
      .join('');
  return sheet({
    key: 'notebook-stall',
    seed: 239,
    ground: paperGround(1600, 1200, 34),
    defs: noisePaint('stain', ['#eae7e0', '#ddd2bd', '#eae7e0'], { fx: 0.002, fy: 0.003, seed: 6 }),
    body: `<circle cx="1330" cy="1010" r="118" fill="none" stroke="#a58f6d" stroke-width="12" opacity="0.32" filter="url(#rough)"/>${ink(r, [250, 150], [250, 1000], 4)}${ink(r, [250, 1000], [1420, 1000], 4)}${ticks}${inkCurve(read, 4, '#4a4f57')}${crosses}${inkCurve([at(36, 735), at(46, 748), at(61, 742)], 3, BLUE)}${label(at(47, 0)[0], at(0, 782)[1], 'and there it sat', { anchor: 'middle', size: 40, colour: BLUE })}${ink(r, at(0, 1000), [1420, at(0, 1000)[1]], 2, '#8a857c')}${label(1410, at(0, 1018)[1], 'wanted', { anchor: 'end', size: 30 })}${label(270, 128, '°C', { size: 30 })}${label(1440, 1010, 'min', { size: 30 })}`,
  });
}

export const sectionDrawings: readonly (() => Drawing)[] = [
  topHatSection,
  burnerPlan,
  floorLayers,
  twoProbes,
  flameLift,
  binSection,
  notebookPage,
];
