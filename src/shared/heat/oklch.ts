/**
 * Colour arithmetic: OKLCH (Ottosson's OKLab in polar form) to sRGB and back, and the relative
 * luminance and contrast of WCAG 2.2. Matrices from Björn Ottosson, "A perceptual color space for
 * image processing" (2020), written from memory and held by round-trip tests.
 */

/** Lightness 0–1, chroma 0–0.4, hue in degrees. */
export interface Oklch {
  readonly lightness: number;
  readonly chroma: number;
  readonly hueDegrees: number;
}

/** Three channels. Linear light or gamma-encoded as the function says; 0–1 inside the gamut. */
export type Rgb = readonly [red: number, green: number, blue: number];

function linearOf({ lightness, chroma, hueDegrees }: Oklch): Rgb {
  const hue = (hueDegrees * Math.PI) / 180;
  const a = chroma * Math.cos(hue);
  const b = chroma * Math.sin(hue);
  const long = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const medium = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const short = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3;
  return [
    4.0767416621 * long - 3.3077115913 * medium + 0.2309699292 * short,
    -1.2684380046 * long + 2.6097574011 * medium - 0.3413193965 * short,
    -0.0041960863 * long - 0.7034186147 * medium + 1.707614701 * short,
  ];
}

/** Linear sRGB (0–1) to OKLab: [lightness, a, b]. */
export function oklabOfLinear([red, green, blue]: Rgb): Rgb {
  const long = Math.cbrt(0.4122214708 * red + 0.5363325363 * green + 0.0514459929 * blue);
  const medium = Math.cbrt(0.2119034982 * red + 0.6806995451 * green + 0.1073969566 * blue);
  const short = Math.cbrt(0.0883024619 * red + 0.2817188376 * green + 0.6299787005 * blue);
  return [
    0.2104542553 * long + 0.793617785 * medium - 0.0040720468 * short,
    1.9779984951 * long - 2.428592205 * medium + 0.4505937099 * short,
    0.0259040371 * long + 0.7827717662 * medium - 0.808675766 * short,
  ];
}

const inGamut = (rgb: Rgb) => rgb.every((channel) => channel >= -1e-6 && channel <= 1 + 1e-6);

/** IEC 61966-2-1: linear light to the encoded channel, both 0–1. */
function encode(linear: number): number {
  const clamped = Math.min(1, Math.max(0, linear));
  return clamped <= 0.0031308 ? 12.92 * clamped : 1.055 * clamped ** (1 / 2.4) - 0.055;
}

function decode(encoded: number): number {
  return encoded <= 0.04045 ? encoded / 12.92 : ((encoded + 0.055) / 1.055) ** 2.4;
}

/**
 * The nearest colour a screen can show: lightness and hue are kept, chroma is lowered until all
 * three channels fit sRGB. Returns linear light, each channel 0–1.
 */
export function linearInGamut(colour: Oklch): Rgb {
  const direct = linearOf(colour);
  if (inGamut(direct)) return direct;
  let low = 0;
  let high = colour.chroma;
  for (let step = 0; step < 24; step += 1) {
    const middle = (low + high) / 2;
    if (inGamut(linearOf({ ...colour, chroma: middle }))) low = middle;
    else high = middle;
  }
  return linearOf({ ...colour, chroma: low });
}

/** Linear light (0–1) to `#rrggbb`. */
export function hexOfLinear(linear: Rgb): string {
  const byte = (channel: number) =>
    Math.round(encode(channel) * 255)
      .toString(16)
      .padStart(2, '0');
  return `#${linear.map(byte).join('')}`;
}

/** `#rrggbb` to linear light (0–1). Throws on anything else: colours here are our own constants. */
export function linearOfHex(hex: string): Rgb {
  const digits = /^#([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})$/i.exec(hex);
  if (!digits) throw new Error(`Not a colour of the form #rrggbb: ${hex}`);
  const channel = (position: number) => decode(parseInt(digits[position] ?? '0', 16) / 255);
  return [channel(1), channel(2), channel(3)];
}

/** Relative luminance as WCAG 2.2 defines it, 0 (black) to 1 (white). */
export function relativeLuminance(hex: string): number {
  const [red, green, blue] = linearOfHex(hex);
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

/** Contrast ratio of WCAG 2.2, 1 to 21; the order of the two colours does not matter. */
export function contrastRatio(oneHex: string, otherHex: string): number {
  const one = relativeLuminance(oneHex);
  const other = relativeLuminance(otherHex);
  return (Math.max(one, other) + 0.05) / (Math.min(one, other) + 0.05);
}
