import { execFile } from 'node:child_process';
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { cToF } from '#shared/units/temperature.ts';
import { recordReport } from '../../../../server/records/record-report.ts';
import { straightLines } from '../../shared/firing/made-up-firing.ts';

/** Climbs to 712 °C in 31 min, stays there 16 min, climbs on to 1010 °C and is held 4 min. */
const STALLED = straightLines([
  [0, 15],
  [31, 712],
  [47, 712],
  [62, 1010],
  [66, 1010],
]);
const csv = (write: (celsius: number) => number, unit: string): string =>
  [
    `Time (min),Temperature (${unit})`,
    ...STALLED.map(({ minute, celsius }) => `${minute},${write(celsius).toFixed(1)}`),
  ].join('\n');
const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);

describe('a report of a logger’s file', () => {
  it('tells the firing in °C and minutes, and the unit as the file has it', () => {
    for (const [unit, write] of [
      ['C', (celsius: number) => celsius],
      ['F', cToF],
      ['K', (celsius: number) => celsius + 273.15],
    ] as const) {
      const report = recordReport(bytes(csv(write, unit === 'K' ? 'K' : `°${unit}`)), {
        targetCelsius: 1010,
        fuel: 'propane',
      });
      if ('error' in report) throw new Error(report.error.message);
      expect(report.unit).toBe(unit);
      expect(report.readings).toBe(STALLED.length);
      expect(report.stalls).toHaveLength(1);
      expect(report.stalls[0]?.level_c).toBeCloseTo(712, 0);
      expect(report.stalls[0]?.minutes).toBeCloseTo(16, 0);
      expect(report.time_to_temperature_min).toBeCloseTo(61.75, 1);
      expect(report.hold?.minutes).toBeCloseTo(4, 0);
      expect(report.shut_off).toEqual({ min: 66, inferred: true });
      expect(report.assumed.join(' ')).toContain('No mark says when the burner was lit');
    }
  });
  it('asks about a target that was typed in °F', () => {
    const report = recordReport(bytes(csv((celsius) => celsius, '°C')), { targetCelsius: 1850 });
    if ('error' in report) throw new Error(report.error.message);
    expect(report.checks).toContainEqual(
      expect.objectContaining({
        kind: 'must-mend',
        text: expect.stringContaining('1010') as string,
      }),
    );
  });
  it('says what is wrong with a file, and where', () => {
    expect(recordReport(bytes('minute,°C\n0,15\n1,30\n2,45\nlater,60\n4,90\n5,120\n'), {})).toEqual(
      {
        error: { message: expect.any(String) as string, line: 5 },
      },
    );
    expect(recordReport(bytes('only words'), {})).toHaveProperty('error.message');
    expect(recordReport(bytes('minute,°C\n0,15\n1,30\n'), {})).toHaveProperty('error.message');
  });
});

describe('the command read-record', () => {
  let folder = '';
  beforeAll(async () => {
    folder = await mkdtemp(path.join(tmpdir(), 'read-record-'));
    await writeFile(
      path.join(folder, 'one.csv'),
      csv((celsius) => celsius, '°C'),
    );
    await writeFile(path.join(folder, 'none.csv'), 'only words');
  });
  afterAll(() => rm(folder, { recursive: true, force: true }));

  const run = (...args: string[]) =>
    promisify(execFile)(
      process.execPath,
      ['--import', 'tsx', 'server/commands/read-record.ts', ...args],
      {
        env: { ...process.env, INIT_CWD: folder },
      },
    ).then(
      ({ stdout }) => ({ code: 0, stdout }),
      (error: { code: number; stdout: string }) => ({ code: error.code, stdout: error.stdout }),
    );

  it('reads a list in order, says of a file what is wrong and goes on, and ends with 1 for it', async () => {
    const list = path.join(folder, 'list.jsonl');
    const lines = [
      { file: 'one.csv', target: 1010, fuel: 'propane', lit: 0, shutOff: 66 },
      { file: 'none.csv', target: 1010 },
      { file: path.join(folder, 'one.csv'), target: 990, drawnBecause: 'melt' },
      { file: 'away.csv', target: 1010 },
    ];
    await writeFile(list, lines.map((line) => JSON.stringify(line)).join('\n'));
    const { code, stdout } = await run('--batch', 'list.jsonl');
    const said = stdout
      .trim()
      .split('\n')
      .map((line) => JSON.parse(line) as Record<string, unknown>);
    expect(said).toHaveLength(4);
    expect(said[0]).toMatchObject({ start: { min: 0, inferred: false }, shut_off: { min: 66 } });
    expect(said[1]).toHaveProperty('error.message');
    expect(said[2]).toMatchObject({ readings: STALLED.length });
    expect(said[3]).toHaveProperty('error.message');
    expect(code).toBe(1);
  }, 60_000);
  it('reads one file, and refuses options it does not know', async () => {
    const { code, stdout } = await run(
      'one.csv',
      '--target',
      '1010',
      '--drawn-because',
      'temperature',
    );
    expect(code).toBe(0);
    expect(JSON.parse(stdout)).toHaveProperty('unit', 'C');
    expect((await run('one.csv', '--fuel', 'steam')).code).toBe(2);
    expect((await run('one.csv', '--colour', 'red')).code).toBe(2);
  }, 60_000);
});
