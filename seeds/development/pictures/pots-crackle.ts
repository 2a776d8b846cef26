import { crackleLines, inkCrackle } from './crackle.ts';
import { sheet, tableGround, type Drawing } from './sheet.ts';
import { seeded } from './random.ts';
import { drawVessel, radiusAt, wrap, type Vessel } from './vessel.ts';

/** Crackle glazes on thrown forms. */
function crackled(
  key: string,
  seed: number,
  vessel: Vessel,
  look: {
    readonly width?: number;
    readonly height?: number;
    readonly glaze: string;
    readonly cells: number;
    readonly fine: number;
    readonly line: number;
    readonly ink?: string;
    readonly strength?: number;
    readonly halo?: number;
    readonly bareFrom?: number;
    readonly bareColour?: string;
    readonly inside?: string;
    readonly tones?: readonly [string, string, string];
  },
): Drawing {
  const random = seeded(seed);
  const { width, height, place, scale } = wrap(vessel);
  const lines = crackleLines(random, {
    width,
    height,
    cells: look.cells,
    fine: look.fine,
    line: look.line,
  });
  const surface = inkCrackle(random, lines, place, {
    colour: look.ink ?? '#1f1c1a',
    halo: look.halo ?? 0.26,
    strength: look.strength ?? 1,
    scale,
  });
  const rim = radiusAt(vessel, 0);
  const insideLines = crackleLines(random, {
    width: rim * 2,
    height: rim * 2,
    cells: Math.max(8, Math.round(look.cells * 0.5)),
    fine: look.fine * 0.6,
    line: look.line * 0.8,
  });
  const insideSurface = inkCrackle(
    random,
    insideLines,
    ([x, y]) => [vessel.cx + x - rim, vessel.top + (y - rim) * vessel.tilt],
    { colour: look.ink ?? '#1f1c1a', halo: 0, strength: 0.8 * (look.strength ?? 1) },
  );
  const w = look.width ?? 1600;
  const h = look.height ?? 1200;
  return sheet({
    key,
    seed,
    width: w,
    height: h,
    ground: tableGround(w, h, look.tones),
    body: drawVessel({
      vessel,
      id: 'p',
      fill: look.glaze,
      surface,
      inside: look.inside ?? look.glaze,
      insideSurface,
      bareFrom: look.bareFrom ?? 0.88,
      bareColour: look.bareColour ?? '#262220',
      gloss: 0.62,
    }),
  });
}

const bowl: Vessel = {
  cx: 800,
  top: 470,
  height: 440,
  radius: 430,
  profile: [1, 0.985, 0.95, 0.88, 0.77, 0.6, 0.42, 0.4],
  tilt: 0.24,
};
const bottle: Vessel = {
  cx: 600,
  top: 260,
  height: 1090,
  radius: 300,
  profile: [0.2, 0.15, 0.15, 0.17, 0.3, 0.66, 0.93, 1, 0.97, 0.85, 0.66, 0.5],
  tilt: 0.13,
};
const teabowl: Vessel = {
  cx: 790,
  top: 390,
  height: 500,
  radius: 330,
  profile: [0.96, 0.97, 1, 1, 0.98, 0.93, 0.78, 0.5, 0.46],
  tilt: 0.2,
};
const jar: Vessel = {
  cx: 800,
  top: 340,
  height: 610,
  radius: 360,
  profile: [0.5, 0.5, 0.72, 0.93, 1, 0.99, 0.92, 0.8, 0.66, 0.56],
  tilt: 0.17,
};

export const cracklePots: readonly (() => Drawing)[] = [
  () => crackled('crackle-bowl', 11, bowl, { glaze: '#f1ede3', cells: 85, fine: 5, line: 6.5 }),
  () =>
    crackled('crackle-bottle', 23, bottle, {
      width: 1200,
      height: 1600,
      glaze: '#efece4',
      cells: 120,
      fine: 4,
      line: 5,
      bareFrom: 0.93,
    }),
  () =>
    crackled('pale-crackle', 37, teabowl, {
      glaze: '#efe9dc',
      cells: 70,
      fine: 2,
      line: 3.2,
      ink: '#9a8f80',
      strength: 0.55,
      halo: 0,
      bareColour: '#b7a897',
      tones: ['#cbc8c1', '#e2dfd8', '#bdb9b0'],
    }),
  () =>
    crackled('turquoise-crackle-jar', 41, jar, {
      glaze: '#5fa9a6',
      cells: 95,
      fine: 4,
      line: 5.5,
      ink: '#14201f',
      inside: '#559693',
    }),
  () =>
    crackled('ash-crackle-teabowl', 53, teabowl, {
      glaze: '#d9d6cb',
      cells: 40,
      fine: 8,
      line: 8,
      bareFrom: 0.8,
    }),
];
