import { cToF, cToK } from '#shared/units/temperature.ts';

/** A reading as it truly was: minutes from the first, °C. */
export interface TruePoint {
  readonly minute: number;
  readonly celsius: number;
}

/** What a logger's file is made of; everything left out is as in the plainest file. */
export interface FileShape {
  readonly stepMinutes?: number;
  readonly count?: number;
  readonly startCelsius?: number;
  readonly peakCelsius?: number;
  readonly unit?: 'C' | 'F' | 'K';
  readonly delimiter?: string;
  readonly decimal?: '.' | ',';
  readonly lineEnd?: string;
  /** Lines above the readings, as they stand. */
  readonly head?: readonly string[];
  /** Lines below the readings. */
  readonly foot?: readonly string[];
  /** The cells of a row; `t` and `T` are usual ones. */
  readonly row?: (point: RowParts) => readonly (string | number)[];
  /** Changes the finished lines. */
  readonly mend?: (lines: string[]) => string[];
}
export interface RowParts {
  readonly index: number;
  readonly minute: number;
  readonly celsius: number;
  /** The temperature in the file's unit, one decimal, with its decimal sign. */
  readonly T: string;
  /** A number with the file's decimal sign. */
  readonly n: (value: number, decimals?: number) => string;
}

/** A kiln on paper: up to the peak in seven tenths of the time, a hold, and down; a little unsteady. */
export function trueCourse(shape: FileShape): TruePoint[] {
  const { stepMinutes = 0.5, count = 120, startCelsius = 18, peakCelsius = 985 } = shape;
  return Array.from({ length: count }, (_, i) => {
    const share = count < 2 ? 0 : i / (count - 1);
    const rise = Math.min(1, share / 0.7);
    const fall = Math.max(0, (share - 0.8) / 0.2);
    const course = startCelsius + (peakCelsius - startCelsius) * (rise ** 0.8 - 0.75 * fall);
    const waver = i % 3 === 1 ? 0.4 : i % 7 === 3 ? -0.3 : 0;
    return { minute: i * stepMinutes, celsius: Math.round((course + waver) * 10) / 10 };
  });
}

export function writtenIn(celsius: number, unit: 'C' | 'F' | 'K'): number {
  return unit === 'F' ? cToF(celsius) : unit === 'K' ? cToK(celsius) : celsius;
}

/** The text of a logger's file of a shape, and what it truly holds. */
export function loggerFile(shape: FileShape): { text: string; points: TruePoint[] } {
  const {
    unit = 'C',
    delimiter = ',',
    decimal = '.',
    lineEnd = '\n',
    head = [],
    foot = [],
  } = shape;
  const points = trueCourse(shape);
  const n = (value: number, decimals = 1): string => value.toFixed(decimals).replace('.', decimal);
  const row = shape.row ?? (({ minute, T }: RowParts) => [n(minute, 2), T]);
  const lines = [
    ...head,
    ...points.map(({ minute, celsius }, index) =>
      row({ index, minute, celsius, T: n(writtenIn(celsius, unit)), n }).join(delimiter),
    ),
    ...foot,
  ];
  return { text: `${(shape.mend ? shape.mend(lines) : lines).join(lineEnd)}${lineEnd}`, points };
}

const two = (value: number): string => String(Math.floor(value)).padStart(2, '0');

/** A moment so many minutes after 1 December 2026, 14:03:22 (or another start), as parts. */
export function moment(minute: number, start = Date.UTC(2026, 11, 1, 14, 3, 22)) {
  const at = new Date(start + Math.round(minute * 60_000));
  const hour = at.getUTCHours();
  return {
    date: at,
    y: String(at.getUTCFullYear()),
    yy: two(at.getUTCFullYear() % 100),
    mo: two(at.getUTCMonth() + 1),
    mon: ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'][
      at.getUTCMonth()
    ] as string,
    d: two(at.getUTCDate()),
    h: two(hour),
    h12: String(hour % 12 === 0 ? 12 : hour % 12),
    half: hour < 12 ? 'AM' : 'PM',
    mi: two(at.getUTCMinutes()),
    s: two(at.getUTCSeconds()),
    ms: String(at.getUTCMilliseconds()).padStart(3, '0'),
    unix: at.getTime() / 1000,
    serial: at.getTime() / 86_400_000 + 25_569,
    clock: `${two(hour)}:${two(at.getUTCMinutes())}:${two(at.getUTCSeconds())}`,
  };
}

/** Elapsed minutes as "h:mm:ss". */
export function elapsed(minute: number): string {
  const seconds = Math.round(minute * 60);
  return `${Math.floor(seconds / 3600)}:${two((seconds / 60) % 60)}:${two(seconds % 60)}`;
}

/** Bytes of a text in an encoding, with or without its mark. */
export function encoded(
  text: string,
  as: 'utf-8' | 'utf-8-bom' | 'utf-16le' | 'utf-16be' | 'utf-16le-bare' | 'latin-1',
): Uint8Array {
  if (as === 'utf-8') return new TextEncoder().encode(text);
  if (as === 'utf-8-bom') return new TextEncoder().encode(`\uFEFF${text}`);
  if (as === 'latin-1') return Uint8Array.from(text, (char) => char.charCodeAt(0));
  const marked = as === 'utf-16le-bare' ? text : `\uFEFF${text}`;
  const bytes = new Uint8Array(marked.length * 2);
  for (let i = 0; i < marked.length; i += 1) {
    const code = marked.charCodeAt(i);
    const [low, high] = [code & 255, code >> 8];
    bytes.set(as === 'utf-16be' ? [high, low] : [low, high], 2 * i);
  }
  return bytes;
}
