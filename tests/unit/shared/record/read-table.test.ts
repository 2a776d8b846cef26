import { describe, expect, it, vi } from 'vitest';
import { detectTable } from '#shared/record/detect-table.ts';
import type { RecordChoice } from '#shared/record/record-choice.ts';
import { recordChoiceSchema } from '#shared/record/record-choice.ts';
import { RecordError } from '#shared/record/record-error.ts';
import { readTable } from '#shared/record/read-table.ts';

// Big files are read here, on machines that may be busy.
vi.setConfig({ testTimeout: 60_000 });

const CHOICE: RecordChoice = {
  delimiter: ',',
  decimal: '.',
  headerLine: 1,
  timeColumn: 0,
  timeFormat: 'minutes',
  temperatureColumn: 1,
  secondColumn: null,
  unit: 'C',
};
const errorOf = (work: () => unknown): RecordError => {
  try {
    work();
  } catch (error) {
    if (error instanceof RecordError) return error;
    throw error;
  }
  throw new Error('nothing was refused');
};

describe('readTable', () => {
  it('counts minutes from the first reading and keeps the order of the file', () => {
    const { readings, rowCount } = readTable('t,T\n5,20\n7.5,30\n6,25\n', CHOICE);
    expect(readings).toEqual([
      { minute: 0, celsius: 20 },
      { minute: 2.5, celsius: 30 },
      { minute: 1, celsius: 25 },
    ]);
    expect(rowCount).toBe(3);
  });

  it('says at which line the time runs backwards', () => {
    expect(readTable('t,T\n5,20\n7.5,30\n6,25\n', CHOICE).assumed).toEqual([
      'The time runs backwards at line 4.',
    ]);
  });

  it('lists what it skips, with line and reason', () => {
    const { readings, skipped } = readTable(
      't,T\n[min],[°C]\n0,20\n\n# pause\n1,\n2,OPEN\n3,50\n',
      CHOICE,
    );
    expect(readings.map((one) => one.celsius)).toEqual([20, 50]);
    expect(skipped).toEqual([
      { line: 2, reason: 'no reading on this line' },
      { line: 5, reason: 'a comment' },
      { line: 6, reason: 'no temperature' },
      { line: 7, reason: '“OPEN” is no temperature' },
    ]);
  });

  it('reads a second probe beside the first', () => {
    const { secondProbe } = readTable('t,a,b\n0,20,22\n1,30,\n2,40,44\n', {
      ...CHOICE,
      secondColumn: 2,
    });
    expect(secondProbe).toEqual([
      { minute: 0, celsius: 22 },
      { minute: 2, celsius: 44 },
    ]);
  });

  it('refuses a time it cannot read beside a temperature, with line and column', () => {
    const error = errorOf(() => readTable('t,T\n0,20\nabc,30\n2,40\n', CHOICE));
    expect([error.line, error.column]).toEqual([3, 1]);
    expect(error.message).toBe('Line 3: “abc” cannot be read as a time (minutes).');
  });

  it('refuses a table without a reading', () => {
    expect(errorOf(() => readTable('t,T\n', CHOICE)).message).toContain('No reading was found');
    const stuck = errorOf(() => readTable('t,T\n0,0\n1,0\n', { ...CHOICE, unit: 'K' }));
    expect(stuck.message).toContain('not connected');
  });

  it('refuses more than 200,000 rows, 50 columns, 1 kB in a cell, 10 MiB, and says the limit', () => {
    const many = `t,T\n${'1,2\n'.repeat(200_001)}`;
    expect(errorOf(() => readTable(many, CHOICE)).message).toContain('200,000 rows');
    expect(readTable(`t,T\n${'1,2\n'.repeat(200_000)}`, CHOICE).rowCount).toBe(200_000);
    const wide = errorOf(() => readTable(`t,T\n0,1${',9'.repeat(49)}\n`, CHOICE));
    expect([wide.message.includes('50 columns'), wide.line]).toEqual([true, 2]);
    expect(readTable(`t,T\n0,1${',9'.repeat(48)}\n`, CHOICE).readings).toHaveLength(1);
    const long = errorOf(() => readTable(`t,T\n0,20\n1,${'9'.repeat(1100)}\n`, CHOICE));
    expect([long.message.includes('1 kB'), long.line, long.column]).toEqual([true, 3, 2]);
    const open = errorOf(() => readTable('t,T\n0,20\n1,"30\n', CHOICE));
    expect([open.message.includes('never closed'), open.line]).toEqual([true, 3]);
    expect(errorOf(() => readTable('1,2\n'.repeat(2_700_000), CHOICE)).message).toContain('10 MiB');
  });

  it('reads quoted cells with delimiters, quotes and line breaks in them, and counts the lines', () => {
    const { readings, skipped } = readTable(
      't,T,note\n0,20,"a, ""b""\nc"\n1,x,\n2,"1,010",\n',
      CHOICE,
    );
    expect(readings.map((one) => one.celsius)).toEqual([20, 1010]);
    expect(skipped).toEqual([{ line: 4, reason: '“x” is no temperature' }]);
  });

  it('a cell’s own unit goes before the column’s', () => {
    const { readings } = readTable('t,T\n0,68 °F\n1,20\n2,293.15K\n', CHOICE);
    expect(readings.map((one) => one.celsius)).toEqual([20, 20, 20]);
  });

  it('the choice is checked: columns from 0 to 49, known formats only', () => {
    expect(recordChoiceSchema.safeParse(CHOICE).success).toBe(true);
    for (const wrong of [
      { timeColumn: 50 },
      { timeColumn: -1 },
      { timeFormat: 'weeks' },
      { delimiter: '/' },
      { dateColumn: 50 },
      { unit: 'R' },
    ]) {
      expect(recordChoiceSchema.safeParse({ ...CHOICE, ...wrong }).success).toBe(false);
    }
  });

  it('reads 200,000 rows of a big file in a moment: time grows with size only', () => {
    const rows = (count: number) =>
      `s,C\n${Array.from({ length: count }, (_, i) => `${i},${20 + (i % 900)}.5`).join('\n')}`;
    const small = rows(20_000);
    const big = rows(200_000);
    const time = (text: string) => {
      const from = process.cpuUsage();
      readTable(text, detectTable(text).choice);
      const used = process.cpuUsage(from);
      return (used.user + used.system) / 1000;
    };
    time(small);
    const least = Math.min(time(small), time(small), time(small));
    expect(Math.min(time(big), time(big))).toBeLessThan(Math.max(40 * least, 500));
  });
});
