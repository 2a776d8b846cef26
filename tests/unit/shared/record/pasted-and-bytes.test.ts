import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { decodeRecordBytes } from '#shared/record/decode-record-bytes.ts';
import { detectTable } from '#shared/record/detect-table.ts';
import { parseNumber } from '#shared/record/parse-number.ts';
import { parsePastedRows } from '#shared/record/parse-pasted-rows.ts';
import { TIME_FORMATS } from '#shared/record/parse-time.ts';
import { RecordError } from '#shared/record/record-error.ts';
import { readTable } from '#shared/record/read-table.ts';

// Much is tried here, on machines that may be busy.
vi.setConfig({ testTimeout: 60_000 });

describe('parsePastedRows', () => {
  it.each([
    '12 310',
    '0:12, 310',
    '12\t310',
    '12;310',
    '12,310',
    '12 min 310 °C',
    '12 590F',
    '0:12:00  310C',
    ' 12   310,0 ',
  ])('%j is 310 °C at 12 min', (row) => {
    expect(parsePastedRows(row)).toEqual({ readings: [{ minute: 12, celsius: 310 }], skipped: [] });
  });
  it('keeps the minutes as typed, decimal commas included, and takes the unit it is told', () => {
    expect(parsePastedRows('12,5 310,4\r\n1:05 68', 'F').readings).toEqual([
      { minute: 12.5, celsius: 154.67 },
      { minute: 65, celsius: 20 },
    ]);
  });
  it('skips, with the reason, what is not clear', () => {
    const { readings, skipped } = parsePastedRows(
      '# kiln\n\n12\nabc 300\n12 hot\n12 300 400\n13 310\n',
    );
    expect(readings).toEqual([{ minute: 13, celsius: 310 }]);
    expect(skipped.map((one) => one.line)).toEqual([3, 4, 5, 6]);
  });
});

describe('decodeRecordBytes', () => {
  const text = 'Zeit;Temp °C\n0;20,5 – 𝄞\n';
  const utf16 = (little: boolean) => {
    const bytes = little ? [0xff, 0xfe] : [0xfe, 0xff];
    for (let i = 0; i < text.length; i += 1) {
      const unit = text.charCodeAt(i);
      bytes.push(...(little ? [unit & 255, unit >> 8] : [unit >> 8, unit & 255]));
    }
    return new Uint8Array(bytes);
  };
  it('reads UTF-8 with and without its mark, and UTF-16 of both orders', () => {
    const utf8 = new TextEncoder().encode(text);
    expect(decodeRecordBytes(utf8)).toBe(text);
    expect(decodeRecordBytes(new Uint8Array([0xef, 0xbb, 0xbf, ...utf8]))).toBe(text);
    expect(decodeRecordBytes(utf16(true))).toBe(text);
    expect(decodeRecordBytes(utf16(false))).toBe(text);
  });
  it('reads other bytes as Latin-1', () => {
    expect(decodeRecordBytes(new Uint8Array([0x54, 0x20, 0xb0, 0x43]))).toBe('T °C');
  });
  it('agrees with the platform’s own decoder on any text', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 200 }), (any) => {
        const bytes = new TextEncoder().encode(any);
        if (bytes[0] === 0xef && bytes[1] === 0xbb) return;
        expect(decodeRecordBytes(bytes)).toBe(
          new TextDecoder('utf-8', { ignoreBOM: true }).decode(bytes),
        );
      }),
      { seed: 3 },
    );
  });
  it('refuses more than 10 MiB', () => {
    expect(() => decodeRecordBytes(new Uint8Array(10 * 1024 * 1024 + 1))).toThrow(RecordError);
  });
});

describe('parseNumber', () => {
  it.each([
    ['1,010.5', '.', 1010.5],
    ['1.010,5', ',', 1010.5],
    ["1'010.5", '.', 1010.5],
    ['1,234,567', '.', 1234567],
    ['-12.5e-1', '.', -1.25],
    ['−3', '.', -3],
    ['.5', '.', 0.5],
    ['5.', '.', 5],
    ['1,01', '.', null],
    ['12,3456', '.', null],
    ['1.2.3', '.', null],
    ['', '.', null],
    ['-', '.', null],
    ['1e999', '.', null],
    ['0x10', '.', null],
    ['Infinity', '.', null],
  ] as const)('%j with decimal %j is %s', (cell, decimal, value) => {
    expect(parseNumber(cell, decimal)).toBe(value);
  });
});

describe('hostile tables', () => {
  const cell = fc.oneof(
    fc.constantFrom(
      '',
      '0',
      '20.5',
      '1,5',
      '12:30',
      '2026-01-01 10:00',
      '"',
      '""',
      '"a',
      'NaN',
      'Infinity',
      '-',
      '1e400',
      '°C',
      '#',
      '\u0000',
      '９',
      '=1+1',
      ' ',
      '-:',
      '::',
      '1:2:3:4',
      '99999999999999999999',
    ),
    fc.string({ maxLength: 12 }),
    fc.double().map(String),
  );
  const table = fc
    .tuple(
      fc.constantFrom(',', ';', '\t', ' ', '|'),
      fc.constantFrom('\n', '\r\n', '\r'),
      fc.array(fc.array(cell, { maxLength: 6 }), { maxLength: 30 }),
    )
    .map(([delimiter, end, rows]) => rows.map((row) => row.join(delimiter)).join(end));
  const choice = fc.record({
    delimiter: fc.constantFrom(',' as const, ';' as const, '\t' as const, ' ' as const),
    decimal: fc.constantFrom('.' as const, ',' as const),
    headerLine: fc.option(fc.integer({ min: 1, max: 5 })),
    timeColumn: fc.integer({ min: 0, max: 5 }),
    timeFormat: fc.constantFrom(...TIME_FORMATS),
    temperatureColumn: fc.integer({ min: 0, max: 5 }),
    secondColumn: fc.option(fc.integer({ min: 0, max: 5 })),
    unit: fc.constantFrom('C' as const, 'F' as const, 'K' as const),
  });
  /** Works, or is refused in words; what works holds numbers only. */
  const expectSafe = (work: () => readonly { minute: number; celsius: number }[]) => {
    try {
      for (const one of work()) {
        expect(Number.isFinite(one.minute)).toBe(true);
        expect(Number.isFinite(one.celsius)).toBe(true);
      }
    } catch (error) {
      if (!(error instanceof RecordError)) throw error;
      expect(error.message.length).toBeGreaterThan(20);
    }
  };
  it('are refused as records or read as numbers, never anything else', () => {
    fc.assert(
      fc.property(table, choice, (text, chosen) => {
        expectSafe(() => readTable(text, detectTable(text).choice).readings);
        expectSafe(() => readTable(text, chosen).readings);
        expectSafe(() => parsePastedRows(text).readings);
      }),
      { numRuns: 600, seed: 17 },
    );
  });
  it('of one endless line, or of nothing but quotes, are refused at once', () => {
    for (const text of [
      '9'.repeat(5_000_000),
      '"'.repeat(5_000_000),
      ','.repeat(5_000_000),
      ' '.repeat(5_000_000),
      '1,'.repeat(2_000_000),
      ': '.repeat(2_000_000),
    ]) {
      const from = process.cpuUsage();
      expectSafe(() => readTable(text, detectTable(text).choice).readings);
      expectSafe(() => parsePastedRows(text).readings);
      const used = process.cpuUsage(from);
      expect((used.user + used.system) / 1000).toBeLessThan(1500);
    }
  });
});
