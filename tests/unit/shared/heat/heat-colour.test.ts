import { describe, expect, it } from 'vitest';
import { heatColour, heatName, heatOklch, textOnHeat } from '#shared/heat/heat-colour.ts';
import { contrastRatio, linearOfHex, oklabOfLinear } from '#shared/heat/oklch.ts';
import type { Rgb } from '#shared/heat/oklch.ts';

const lightnessOf = (celsius: number) => oklabOfLinear(linearOfHex(heatColour(celsius)))[0];

type Matrix = readonly [Rgb, Rgb, Rgb];
// Machado, Oliveira and Fernandes (2009), severity 1.0, applied to linear RGB. From memory; each row
// sums to 1, which the first test of the block checks.
const DEUTERANOPIA: Matrix = [
  [0.367322, 0.860646, -0.227968],
  [0.280085, 0.672501, 0.047413],
  [-0.01182, 0.04294, 0.968881],
];
const PROTANOPIA: Matrix = [
  [0.152286, 1.052583, -0.204868],
  [0.114503, 0.786281, 0.099216],
  [-0.003882, -0.048116, 1.051998],
];
function seenBy(matrix: Matrix, hex: string): Rgb {
  const [red, green, blue] = linearOfHex(hex);
  const row = ([r, g, b]: Rgb) => Math.min(1, Math.max(0, r * red + g * green + b * blue));
  return oklabOfLinear([row(matrix[0]), row(matrix[1]), row(matrix[2])]);
}
const distance = (one: Rgb, other: Rgb) =>
  Math.hypot(one[0] - other[0], one[1] - other[1], one[2] - other[2]);

describe('heatColour', () => {
  it('grows lighter with every degree, before and after fitting to the screen', () => {
    for (let celsius = 1; celsius <= 1300; celsius += 1) {
      expect(heatOklch(celsius).lightness).toBeGreaterThan(heatOklch(celsius - 1).lightness);
    }
    // In eight bits per channel the near-black below the first red moves in plateaus.
    for (let celsius = 10; celsius <= 480; celsius += 10) {
      expect(lightnessOf(celsius)).toBeGreaterThanOrEqual(lightnessOf(celsius - 10));
    }
    for (let celsius = 490; celsius <= 1300; celsius += 10) {
      expect(lightnessOf(celsius)).toBeGreaterThan(lightnessOf(celsius - 10));
    }
  });

  it.each([
    [600, 720, 0.13],
    [650, 750, 0.11],
    [700, 750, 0.05],
    [850, 900, 0.04],
    [950, 1020, 0.08],
    [1000, 1050, 0.05],
  ])('tells %i °C from %i °C by lightness alone', (one, other, floor) => {
    expect(lightnessOf(other) - lightnessOf(one)).toBeGreaterThan(floor);
  });

  it('is black below the first visible red and visibly red above it', () => {
    for (const celsius of [-40, 0, 20, 300, 480]) {
      expect(contrastRatio(heatColour(celsius), '#000000')).toBeLessThan(1.25);
    }
    const [red, green, blue] = linearOfHex(heatColour(700));
    expect(red).toBeGreaterThan(5 * Math.max(green, blue));
  });

  it('keeps its end colours outside the scale and treats a missing number as cold', () => {
    expect(heatColour(-40)).toBe(heatColour(0));
    expect(heatColour(2000)).toBe(heatColour(1300));
    expect(heatColour(Number.NaN)).toBe(heatColour(0));
  });

  it('changes by small steps: nowhere does one degree jump', () => {
    for (let celsius = 1; celsius <= 1300; celsius += 1) {
      const one = oklabOfLinear(linearOfHex(heatColour(celsius - 1)));
      const other = oklabOfLinear(linearOfHex(heatColour(celsius)));
      expect(distance(one, other)).toBeLessThan(0.012);
    }
  });
});

describe('heatColour for colour-blind readers', () => {
  it('is tested with matrices that leave grey grey', () => {
    for (const matrix of [DEUTERANOPIA, PROTANOPIA]) {
      for (const [r, g, b] of matrix) expect(r + g + b).toBeCloseTo(1, 4);
    }
  });

  it.each([
    ['deuteranopia', DEUTERANOPIA],
    ['protanopia', PROTANOPIA],
  ])('keeps its order and its steps under %s', (_, matrix) => {
    for (let celsius = 500; celsius <= 1200; celsius += 20) {
      const one = seenBy(matrix, heatColour(celsius - 20));
      expect(seenBy(matrix, heatColour(celsius))[0]).toBeGreaterThan(one[0]);
    }
    for (const [one, other, floor] of [
      [600, 720, 0.09],
      [650, 750, 0.08],
      [950, 1020, 0.07],
    ] as const) {
      const apart = distance(seenBy(matrix, heatColour(one)), seenBy(matrix, heatColour(other)));
      expect(apart).toBeGreaterThan(floor);
    }
  });
});

describe('textOnHeat', () => {
  it('reads at 4.5 : 1 or better on every heat', () => {
    for (let celsius = 0; celsius <= 1300; celsius += 5) {
      expect(contrastRatio(heatColour(celsius), textOnHeat(celsius))).toBeGreaterThanOrEqual(4.5);
    }
  });

  it('is white on a dull red and black on a straw heat', () => {
    expect(textOnHeat(700)).toBe('#ffffff');
    expect(textOnHeat(1050)).toBe('#000000');
  });
});

describe('heatName', () => {
  // A Book of Steam for Engineers, 1905, p. 50.
  it('says the table’s word at its temperatures and nothing below the first red', () => {
    expect(heatName(500)).toBeNull();
    expect(heatName(525)).toBe('red, just visible');
    expect(heatName(712)).toBe('dull red');
    expect(heatName(1010)).toBe('clear cherry red');
  });
});
