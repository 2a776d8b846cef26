/**
 * The sheet every drawing lies on: ground, light, shared filters, and the small word
 * that says what it is.
 */
export interface Drawing {
  readonly key: string;
  readonly width: number;
  readonly height: number;
  readonly svg: string;
}

/** Where a drawing may lay something over everything but the corner word. */
export const OVER = '<g/>';

export const SOOT = '#2a2826';
export const SOOT_2 = '#5d5954';
export const ASH = '#e4e1da';
export const CLAY = '#b9a68f';

/** A palette laid over noise: `stops` are hex colours from the darkest to the lightest noise. */
export function noisePaint(
  id: string,
  stops: readonly string[],
  options: {
    readonly fx: number;
    readonly fy: number;
    readonly octaves?: number;
    readonly seed: number;
    readonly contrast?: number;
  },
): string {
  const channel = (offset: number): string =>
    stops.map((hex) => (parseInt(hex.slice(offset, offset + 2), 16) / 255).toFixed(3)).join(' ');
  const k = options.contrast ?? 2.4;
  const b = ((1 - k) / 2).toFixed(3);
  return `<filter id="${id}" x="0" y="0" width="100%" height="100%" color-interpolation-filters="sRGB">
<feTurbulence type="fractalNoise" baseFrequency="${options.fx} ${options.fy}" numOctaves="${options.octaves ?? 4}" seed="${options.seed}" result="t"/>
<feColorMatrix in="t" type="matrix" values="${k} 0 0 0 ${b} ${k} 0 0 0 ${b} ${k} 0 0 0 ${b} 0 0 0 0 1"/>
<feComponentTransfer result="c"><feFuncR type="table" tableValues="${channel(1)}"/><feFuncG type="table" tableValues="${channel(3)}"/><feFuncB type="table" tableValues="${channel(5)}"/></feComponentTransfer>
<feComposite in="c" in2="SourceGraphic" operator="in"/></filter>`;
}

const blur = (size: number): string =>
  `<filter id="soft${size}" x="${size < 14 ? -12 : -40}%" y="${size < 14 ? -12 : -40}%" width="${size < 14 ? 124 : 180}%" height="${size < 14 ? 124 : 180}%"><feGaussianBlur stdDeviation="${size}"/></filter>`;

const sharedDefs = (seed: number): string => `
${[2, 6, 14, 30, 60].map(blur).join('')}
<filter id="smoke" x="-20%" y="-20%" width="140%" height="140%"><feTurbulence type="fractalNoise" baseFrequency="0.006 0.009" numOctaves="2" seed="${seed}" result="t"/><feDisplacementMap in="SourceGraphic" in2="t" scale="120" xChannelSelector="R" yChannelSelector="G"/><feGaussianBlur stdDeviation="13"/></filter>
<filter id="ragged" x="-20%" y="-20%" width="140%" height="140%"><feTurbulence type="fractalNoise" baseFrequency="0.018" numOctaves="3" seed="${seed + 1}" result="t"/><feDisplacementMap in="SourceGraphic" in2="t" scale="26" xChannelSelector="R" yChannelSelector="G"/></filter>
<filter id="rough" x="-5%" y="-5%" width="110%" height="110%"><feTurbulence type="fractalNoise" baseFrequency="0.035" numOctaves="2" seed="${seed + 2}" result="t"/><feDisplacementMap in="SourceGraphic" in2="t" scale="5" xChannelSelector="R" yChannelSelector="G"/></filter>
<filter id="speck" x="0" y="0" width="100%" height="100%" color-interpolation-filters="sRGB"><feTurbulence type="fractalNoise" baseFrequency="0.32" numOctaves="2" seed="${seed + 4}"/><feColorMatrix type="matrix" values="0 0 0 0 0.13 0 0 0 0 0.11 0 0 0 0 0.1 5 0 0 0 -3.35"/></filter>`;

export interface SheetOptions {
  readonly key: string;
  readonly seed: number;
  readonly width?: number;
  readonly height?: number;
  /** What lies behind everything; drawn first. */
  readonly ground: string;
  readonly defs?: string;
  readonly body: string;
  /** Colour of the corner word, to stay legible on dark sheets. */
  readonly wordColour?: string;
}

export function sheet(options: SheetOptions): Drawing {
  const { key, seed, width = 1600, height = 1200, ground, defs = '', body } = options;
  const svg = `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}" viewBox="0 0 ${width} ${height}">
<defs>${sharedDefs(seed)}${defs}</defs>${ground}${body}
${OVER}
<text x="${width - 34}" y="${height - 30}" text-anchor="end" font-family="DejaVu Serif, Georgia, serif" font-style="italic" font-size="25" fill="${options.wordColour ?? SOOT_2}" fill-opacity="0.85">drawing</text></svg>`;
  return { key, width, height, svg };
}

/** A table by a north window: pale wall, paler cloth, light from the left. */
export function tableGround(
  width: number,
  height: number,
  tones: readonly [string, string, string] = ['#d3cfc6', '#e6e2da', '#c4bfb4'],
  horizon = 0.66,
): string {
  const [wall, lit, cloth] = tones;
  return `<defs><linearGradient id="wall" x1="0" y1="0" x2="1" y2="0.55"><stop offset="0" stop-color="${lit}"/><stop offset="1" stop-color="${wall}"/></linearGradient>
<linearGradient id="cloth" x1="0" y1="0" x2="0" y2="1"><stop offset="0" stop-color="${cloth}"/><stop offset="1" stop-color="${lit}"/></linearGradient></defs>
<rect width="${width}" height="${height}" fill="url(#wall)"/>
<rect y="${height * horizon}" width="${width}" height="${height * (1 - horizon)}" fill="url(#cloth)"/>
<rect y="${height * horizon - 40}" width="${width}" height="80" fill="url(#wall)" opacity="0.55" filter="url(#soft30)"/>`;
}

/** Squared or plain paper for sections and plans. */
export function paperGround(width: number, height: number, squares = 0): string {
  let grid = '';
  if (squares > 0) {
    for (let x = squares; x < width; x += squares) grid += `M${x} 0V${height}`;
    for (let y = squares; y < height; y += squares) grid += `M0 ${y}H${width}`;
  }
  return `<rect width="${width}" height="${height}" fill="#eae7e0"/><path d="${grid}" stroke="#b7c3c4" stroke-width="1.2" opacity="0.55" fill="none"/>
<rect width="${width}" height="${height}" fill="none" stroke="#cfcac0" stroke-width="70" opacity="0.35" filter="url(#soft30)"/>`;
}

export const label = (
  x: number,
  y: number,
  words: string,
  options: {
    readonly size?: number;
    readonly anchor?: 'start' | 'middle' | 'end';
    readonly colour?: string;
  } = {},
): string =>
  `<text x="${x}" y="${y}" font-family="DejaVu Serif, Georgia, serif" font-style="italic" font-size="${options.size ?? 30}" text-anchor="${options.anchor ?? 'start'}" fill="${options.colour ?? SOOT}">${words}</text>`;
