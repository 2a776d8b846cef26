import { contrastRatio, hexOfLinear, linearInGamut } from './oklch.ts';
import type { Oklch } from './oklch.ts';

/** First visible red in daylight, °C (A Book of Steam for Engineers, 1905, p. 50: "red, just visible"). */
export const FIRST_VISIBLE_RED_CELSIUS = 525;

/** Inversion of quartz, °C, ticked on every strip and chart. */
export const QUARTZ_INVERSION_CELSIUS = 573;

interface Anchor extends Oklch {
  readonly celsius: number;
  /** The table's word for it; null where the anchor is ours. */
  readonly name: string | null;
}

/**
 * The scale. Temperatures from 525 °C up are those of the heat-colour table in A Book of Steam for
 * Engineers (Stirling Consolidated Boiler Company, 1905, p. 50). The colours are ours: a screen has
 * no deep orange as bright as a kiln's, and authors' tables differ by 50 to 100 °C, so the scale is
 * modelled on incandescence and chosen for telling temperatures apart. Lightness alone orders it
 * (it rises all the way, fastest from 600 to 1100 °C where raku happens), for readers who see no
 * difference between red and green, for grey printers and for both themes.
 */
const ANCHORS: readonly Anchor[] = [
  { celsius: 0, lightness: 0.145, chroma: 0.003, hueDegrees: 40, name: null },
  { celsius: 480, lightness: 0.19, chroma: 0.016, hueDegrees: 28, name: null },
  { celsius: 525, lightness: 0.222, chroma: 0.06, hueDegrees: 25, name: 'red, just visible' },
  { celsius: 700, lightness: 0.435, chroma: 0.172, hueDegrees: 27, name: 'dull red' },
  { celsius: 800, lightness: 0.55, chroma: 0.21, hueDegrees: 31, name: 'dull cherry red' },
  { celsius: 900, lightness: 0.64, chroma: 0.207, hueDegrees: 42, name: 'full cherry red' },
  { celsius: 1000, lightness: 0.77, chroma: 0.17, hueDegrees: 64, name: 'clear cherry red' },
  { celsius: 1100, lightness: 0.875, chroma: 0.145, hueDegrees: 86, name: 'deep orange' },
  { celsius: 1200, lightness: 0.945, chroma: 0.085, hueDegrees: 96, name: 'clear orange' },
  { celsius: 1300, lightness: 0.985, chroma: 0.025, hueDegrees: 100, name: 'white heat' },
];

/** Lowest and highest temperature with a colour of its own, °C; beyond them the end colours hold. */
export const HEAT_SCALE_CELSIUS = { low: 0, high: 1300 } as const;

const mix = (from: number, to: number, share: number) => from + (to - from) * share;

/** The colour before it is fitted to a screen. A temperature that is no number counts as cold. */
export function heatOklch(celsius: number): Oklch {
  const first = ANCHORS[0] as Anchor;
  const last = ANCHORS[ANCHORS.length - 1] as Anchor;
  if (!(celsius > first.celsius)) return first;
  if (celsius >= last.celsius) return last;
  const upperIndex = ANCHORS.findIndex((anchor) => anchor.celsius > celsius);
  const lower = ANCHORS[upperIndex - 1] ?? first;
  const upper = ANCHORS[upperIndex] ?? last;
  const share = (celsius - lower.celsius) / (upper.celsius - lower.celsius);
  return {
    lightness: mix(lower.lightness, upper.lightness, share),
    chroma: mix(lower.chroma, upper.chroma, share),
    hueDegrees: mix(lower.hueDegrees, upper.hueDegrees, share),
  };
}

/**
 * The colour that stands for a temperature everywhere in Spyhole, as `#rrggbb`.
 * Interpolated in OKLCH between the published temperatures, fitted to sRGB by lowering chroma.
 */
export function heatColour(celsius: number): string {
  return hexOfLinear(linearInGamut(heatOklch(celsius)));
}

/** Black or white, whichever reads better on that heat. One of the two always reaches 4.5 : 1. */
export function textOnHeat(celsius: number): '#000000' | '#ffffff' {
  const heat = heatColour(celsius);
  return contrastRatio(heat, '#000000') >= contrastRatio(heat, '#ffffff') ? '#000000' : '#ffffff';
}

/** The table's words for a heat, nearest named temperature at or below; null below first red. */
export function heatName(celsius: number): string | null {
  return ANCHORS.findLast((anchor) => anchor.celsius <= celsius)?.name ?? null;
}
