import { penStroke, wander } from './lines.ts';
import { between, seeded } from './random.ts';
import { noisePaint, sheet, tableGround, type Drawing } from './sheet.ts';
import { drawVessel, onVessel, type Vessel } from './vessel.ts';

/** Copper matt and lustre: colour by noise laid through a palette, in bands where the smoke ran. */

const vase: Vessel = {
  cx: 600,
  top: 300,
  height: 1040,
  radius: 310,
  profile: [0.36, 0.3, 0.34, 0.56, 0.84, 0.98, 1, 0.96, 0.86, 0.73, 0.6, 0.52],
  tilt: 0.14,
};
const sphere: Vessel = {
  cx: 800,
  top: 320,
  height: 640,
  radius: 345,
  profile: [0.26, 0.62, 0.84, 0.96, 1, 1, 0.95, 0.85, 0.68, 0.44],
  tilt: 0.15,
};
const bowl: Vessel = {
  cx: 800,
  top: 490,
  height: 410,
  radius: 425,
  profile: [1, 0.98, 0.93, 0.85, 0.73, 0.57, 0.42, 0.4],
  tilt: 0.27,
};

interface CopperLook {
  readonly key: string;
  readonly seed: number;
  readonly vessel: Vessel;
  readonly upright: boolean;
  readonly stops: readonly string[];
  readonly fx: number;
  readonly fy: number;
  readonly gloss: number;
  readonly inside: string;
  readonly rim: string;
  readonly bareFrom?: number;
  readonly tones: readonly [string, string, string];
  readonly fleck?: string;
}

function copper(look: CopperLook): Drawing {
  const random = seeded(look.seed);
  const [width, height] = look.upright ? [1200, 1600] : [1600, 1200];
  const { vessel } = look;
  let flecks = '';
  if (look.fleck) {
    for (let i = 0; i < 130; i += 1) {
      const u = between(random, -1.5, 1.5);
      const v = random();
      const from = onVessel(vessel, u, v);
      const to = onVessel(
        vessel,
        u + between(random, -0.05, 0.05),
        v + between(random, 0.005, 0.03),
      );
      flecks += `<path d="${penStroke(random, wander(random, from, to, 3, 2), between(random, 1, 4))}" fill="${look.fleck}" opacity="${between(random, 0.15, 0.6).toFixed(2)}"/>`;
    }
  }
  return sheet({
    key: look.key,
    seed: look.seed,
    width,
    height,
    ground: tableGround(width, height, look.tones),
    defs: noisePaint('copper', look.stops, {
      fx: look.fx,
      fy: look.fy,
      seed: look.seed,
      octaves: 5,
      contrast: 2.1,
    }),
    body: drawVessel({
      vessel,
      id: 'p',
      fill: '#7d5a63',
      paint: 'copper',
      surface: flecks,
      inside: look.inside,
      rimColour: look.rim,
      bareFrom: look.bareFrom ?? 0.955,
      gloss: look.gloss,
    }),
  });
}

const cool: readonly [string, string, string] = ['#c5c6c6', '#dfe0df', '#b3b4b3'];

export const copperPots: readonly (() => Drawing)[] = [
  () =>
    copper({
      key: 'copper-matt-vase',
      seed: 12,
      vessel: vase,
      upright: true,
      stops: [
        '#2b3150',
        '#4a6283',
        '#8299a0',
        '#80617c',
        '#9d5865',
        '#b57757',
        '#c39f73',
        '#66506a',
      ],
      fx: 0.0042,
      fy: 0.0026,
      gloss: 0.16,
      inside: '#2d2026',
      rim: '#6b4a58',
      tones: cool,
    }),
  () =>
    copper({
      key: 'copper-matt-brown',
      seed: 19,
      vessel: sphere,
      upright: false,
      stops: ['#3a302a', '#5b4a3e', '#6f5a4a', '#7d6a58', '#6a5b50', '#8a7a6a'],
      fx: 0.006,
      fy: 0.006,
      gloss: 0.1,
      inside: '#2c2521',
      rim: '#5c4b40',
      tones: ['#cbc8c2', '#e1ded8', '#bbb7af'],
    }),
  () =>
    copper({
      key: 'copper-matt-sphere',
      seed: 27,
      vessel: sphere,
      upright: false,
      stops: ['#283f4e', '#43757c', '#7f9f94', '#b79b68', '#ad6a4c', '#834253', '#4c3955'],
      fx: 0.0036,
      fy: 0.0052,
      gloss: 0.18,
      inside: '#241a20',
      rim: '#6d4347',
      tones: cool,
    }),
  () =>
    copper({
      key: 'lustre-bowl',
      seed: 33,
      vessel: bowl,
      upright: false,
      stops: ['#5b2a1f', '#a4542e', '#d6944b', '#e9cf8e', '#b9b37a', '#6f9a86', '#8a5b4d'],
      fx: 0.004,
      fy: 0.008,
      gloss: 0.85,
      inside: '#9a5a38',
      rim: '#c98a50',
      bareFrom: 0.88,
      tones: ['#cfccc5', '#e5e2db', '#bfbab1'],
      fleck: '#f3e3b4',
    }),
  () =>
    copper({
      key: 'lustre-green',
      seed: 45,
      vessel: bowl,
      upright: false,
      stops: ['#2f5a4b', '#4d7f67', '#6f9c7f', '#8fb295', '#5f8d76', '#7f8a63'],
      fx: 0.004,
      fy: 0.007,
      gloss: 0.75,
      inside: '#4d7561',
      rim: '#7aa48a',
      bareFrom: 0.88,
      tones: ['#cdccc6', '#e3e1db', '#bdbab2'],
      fleck: '#2d4a3f',
    }),
];
