import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { readAnyRecord } from '#shared/record/read-any-record.ts';
import { RecordError } from '#shared/record/record-error.ts';
import { encoded, loggerFile } from '../../../support/logger-files.ts';
import { ALL_SHAPES } from './shapes/all-shapes.ts';

// Much is tried here, on machines that may be busy.
vi.setConfig({ testTimeout: 120_000 });

/** Reads, or is refused in words; what is read is numbers a kiln may have, and not one more than rows. */
function expectSafe(bytes: Uint8Array): void {
  try {
    const { readings, secondProbe, assumed, rowCount } = readAnyRecord(bytes);
    expect(readings.length).toBeLessThanOrEqual(rowCount);
    for (const { minute, celsius } of [...readings, ...(secondProbe ?? [])]) {
      if (!Number.isFinite(minute) || !(celsius >= -100 && celsius <= 2000)) {
        throw new Error(`read as ${minute} min, ${celsius} °C`);
      }
    }
    for (const words of assumed) expect(words).not.toMatch(/undefined|numbers, \S*(NaN|Infinity)/);
  } catch (error) {
    if (!(error instanceof RecordError)) throw error;
    expect(error.message.length).toBeGreaterThan(15);
    expect(error.message).not.toContain('undefined');
  }
}

function cpuMilliseconds(work: () => void): number {
  const from = process.cpuUsage();
  work();
  const used = process.cpuUsage(from);
  return (used.user + used.system) / 1000;
}

const FILES = ALL_SHAPES.map(({ shape, encoding }) =>
  encoded(loggerFile({ ...shape, count: 24 }).text, encoding ?? 'utf-8'),
);

describe('a hostile file', () => {
  it('of any bytes is read as numbers or refused in words', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 400 }), (bytes) => expectSafe(bytes)),
      { numRuns: 500, seed: 5 },
    );
  });

  it('that was a logger’s until it was cut, doubled and scribbled in, likewise', () => {
    const scribbles = fc.constantFrom(
      '"',
      ',',
      ';',
      '\t',
      '\n',
      '\r',
      '\0',
      'NaN',
      '1e309',
      '-1e309',
      '=cmd()',
      '<b>',
      '9'.repeat(40),
      ':',
      '::',
      '2026-02-30',
      '25:61:61',
      '°',
      '\ufeff',
      'OPEN',
      '-',
      'T',
      'Infinity',
      '0x1F',
      '1,2,3',
    );
    fc.assert(
      fc.property(
        fc.constantFrom(...FILES),
        fc.array(fc.tuple(fc.nat(4000), scribbles), { maxLength: 6 }),
        fc.nat(4000),
        (file, marks, cut) => {
          let bytes = [...file.slice(0, Math.max(20, file.length - (cut % file.length)))];
          for (const [at, words] of marks) {
            bytes = [
              ...bytes.slice(0, at % bytes.length),
              ...new TextEncoder().encode(words),
              ...bytes.slice(at % bytes.length),
            ];
          }
          expectSafe(Uint8Array.from(bytes));
        },
      ),
      { numRuns: 600, seed: 11 },
    );
  });

  const big = 9_900_000;
  const rows = (row: (i: number) => string, count: number) =>
    Array.from({ length: count }, (_, i) => row(i)).join('\n');
  it.each([
    ['a million rows', () => rows((i) => `${i},2`, 1_000_000)],
    ['twenty thousand columns', () => rows(() => '1,'.repeat(20_000), 20)],
    ['one line of ten million characters', () => '9'.repeat(big)],
    ['five million line ends', () => '\n'.repeat(5_000_000)],
    ['two million quotation marks', () => '"'.repeat(2_000_000)],
    ['nothing but commas', () => ','.repeat(big)],
    ['nothing but blanks', () => ' '.repeat(big)],
    ['nothing but colons', () => '1:1 '.repeat(big / 4)],
    ['nothing but letters and points', () => 'a.'.repeat(big / 2)],
    ['long cells of a date that never ends', () => rows(() => `${'1 '.repeat(500)},20`, 9000)],
    ['cells of signs', () => rows(() => `${'-/.'.repeat(300)},${'°'.repeat(300)}`, 5000)],
    ['two hundred thousand faults', () => rows((i) => `${i},OPEN`, 200_000)],
    ['two hundred thousand zeros', () => rows((i) => `${i},0`, 200_000)],
    [
      'times that leap to and fro',
      () => rows((i) => `${(i * 7919) % 86_400},${20 + (i % 900)}`, 200_000),
    ],
  ])('is answered in a moment: %s', (_, text) => {
    const bytes = new TextEncoder().encode(text());
    expect(cpuMilliseconds(() => expectSafe(bytes))).toBeLessThan(2000);
  });

  it.each([
    ['seconds', 's,°C', (i: number) => String(i)],
    ['timestamps', 'time,°C', (i: number) => new Date(1.79e12 + i * 1000).toISOString()],
    [
      'days first',
      'time,°C',
      (i: number) => {
        const iso = new Date(1.79e12 + i * 1000).toISOString();
        return `${iso.slice(8, 10)}/${iso.slice(5, 7)}/${iso.slice(0, 4)} ${iso.slice(11, 19)}`;
      },
    ],
  ])(
    'or a long honest one: 200,000 rows by %s are read whole, and in a moment',
    (_, head, time) => {
      const text = `${head}\n${rows((i) => `${time(i)},${(20 + (i % 50_000) / 50).toFixed(1)}`, 200_000)}\n`;
      const bytes = new TextEncoder().encode(text);
      let count = 0;
      const spent = cpuMilliseconds(() => {
        count = readAnyRecord(bytes).readings.length;
      });
      expect(count).toBe(200_000);
      expect(spent).toBeLessThan(3000);
    },
  );
});
