import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { contrastRatio, linearOfHex, oklabOfLinear } from '#shared/heat/oklch.ts';

const css = readFileSync(new URL('../../../src/styles.css', import.meta.url), 'utf8');
const tokens = new Map(
  [...css.matchAll(/--([a-z0-9-]+): light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\)/g)].map(
    ([, name = '', day = '', dusk = '']) => [name, { day, dusk }],
  ),
);
const hexOf = (name: string, theme: 'day' | 'dusk') => {
  const token = tokens.get(name);
  if (!token) throw new Error(`No token --${name}`);
  return token[theme];
};

/** Text on ground, as the components pair them. WCAG 2.2, 1.4.3: 4.5 : 1. */
const TEXT_ON_GROUND = [
  ['soot', 'ash'],
  ['soot', 'ash-2'],
  ['soot-2', 'ash'],
  ['soot-2', 'ash-2'],
  ['ash', 'soot-2'],
  ['verdigris', 'ash'],
  ['verdigris', 'ash-2'],
  ['verdigris-ink', 'verdigris-tint'],
  ['soot', 'verdigris-tint'],
  ['on-verdigris', 'verdigris'],
  ['ash', 'verdigris-ink'],
  ['caution', 'ash'],
  ['caution', 'ash-2'],
  ['caution', 'caution-tint'],
  ['soot', 'caution-tint'],
] as const;

/** Outlines, focus rings and bars on what they stand on. WCAG 2.2, 1.4.11: 3 : 1. */
const DRAWING_ON_GROUND = [
  ['soot-2', 'ash'],
  ['soot-2', 'ash-2'],
  ['soot-2', 'line'],
  ['verdigris', 'ash'],
  ['verdigris', 'ash-2'],
  ['verdigris', 'verdigris-tint'],
  ['caution', 'ash'],
] as const;

describe.each(['day', 'dusk'] as const)('colours at %s', (theme) => {
  it.each(TEXT_ON_GROUND)('text in %s on %s reads at 4.5 : 1', (ink, ground) => {
    expect(contrastRatio(hexOf(ink, theme), hexOf(ground, theme))).toBeGreaterThanOrEqual(4.5);
  });

  it.each(DRAWING_ON_GROUND)('a line in %s on %s is seen at 3 : 1', (ink, ground) => {
    expect(contrastRatio(hexOf(ink, theme), hexOf(ground, theme))).toBeGreaterThanOrEqual(3);
  });

  it('has nothing warm: red, orange and yellow belong to temperature', () => {
    for (const [name, { [theme]: hex }] of tokens) {
      const [, a, b] = oklabOfLinear(linearOfHex(hex));
      const hue = ((Math.atan2(b, a) * 180) / Math.PI + 360) % 360;
      const warm = Math.hypot(a, b) > 0.02 && (hue < 110 || hue > 345);
      expect(warm, `--${name} ${hex} has hue ${Math.round(hue)}`).toBe(false);
    }
  });
});

describe('the style sheet', () => {
  it('defines every token for both themes', () => {
    expect(tokens.size).toBeGreaterThanOrEqual(11);
  });
});
