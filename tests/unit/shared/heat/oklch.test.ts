import { describe, expect, it } from 'vitest';
import {
  contrastRatio,
  hexOfLinear,
  linearInGamut,
  linearOfHex,
  oklabOfLinear,
} from '#shared/heat/oklch.ts';

describe('OKLCH arithmetic', () => {
  it('brings sRGB red to the values Ottosson gives for it', () => {
    // oklch(0.62796 0.25768 29.23): the CSS Color 4 value of red, from memory.
    const [lightness, a, b] = oklabOfLinear(linearOfHex('#ff0000'));
    expect(lightness).toBeCloseTo(0.62796, 4);
    expect(Math.hypot(a, b)).toBeCloseTo(0.25768, 4);
    expect((Math.atan2(b, a) * 180) / Math.PI).toBeCloseTo(29.23, 1);
  });

  it('returns the colour it started from', () => {
    for (const hex of ['#0b6a63', '#e9ecec', '#5b2350', '#ffcc00', '#010203']) {
      const [lightness, a, b] = oklabOfLinear(linearOfHex(hex));
      const hueDegrees = (Math.atan2(b, a) * 180) / Math.PI;
      const chroma = Math.hypot(a, b);
      expect(hexOfLinear(linearInGamut({ lightness, chroma, hueDegrees }))).toBe(hex);
    }
  });

  it('lowers chroma, not lightness, for a colour no screen has', () => {
    const fitted = linearInGamut({ lightness: 0.76, chroma: 0.3, hueDegrees: 60 });
    expect(Math.max(...fitted)).toBeLessThanOrEqual(1.00001);
    expect(Math.min(...fitted)).toBeGreaterThanOrEqual(-0.00001);
    expect(oklabOfLinear(fitted)[0]).toBeCloseTo(0.76, 3);
  });

  it('refuses what is not a six-digit colour', () => {
    expect(() => linearOfHex('red')).toThrow('#rrggbb');
  });
});

describe('contrastRatio', () => {
  // WCAG 2.2: black on white is 21, a colour on itself 1; #767676 on white is the usual 4.54.
  it('agrees with known pairs', () => {
    expect(contrastRatio('#000000', '#ffffff')).toBeCloseTo(21, 5);
    expect(contrastRatio('#767676', '#ffffff')).toBeCloseTo(4.54, 2);
    expect(contrastRatio('#ffffff', '#ffffff')).toBe(1);
  });
});
