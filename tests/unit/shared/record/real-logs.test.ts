import { readFileSync } from 'node:fs';
import { describe, expect, it, vi } from 'vitest';
import { readFiring } from '#shared/firing/read-firing.ts';
import { decodeRecordBytes } from '#shared/record/decode-record-bytes.ts';
import { detectTable } from '#shared/record/detect-table.ts';
import { readTable } from '#shared/record/read-table.ts';
import { kToC } from '#shared/units/temperature.ts';
import facts from '../../../reference/logs-facts.json';

vi.setConfig({ testTimeout: 60_000 });

const textOf = (file: string) =>
  decodeRecordBytes(
    new Uint8Array(readFileSync(new URL(`../../../reference/logs/${file}`, import.meta.url))),
  );

/** Reads a log; a column of the same table may be asked for by name. */
function importLog(file: string, columnName?: string) {
  const text = textOf(file);
  const table = detectTable(text);
  const column =
    columnName === undefined ? undefined : table.columns.find((one) => one.name === columnName);
  const choice =
    column === undefined ? table.choice : { ...table.choice, temperatureColumn: column.index };
  return { table, ...readTable(text, choice) };
}

// Source: measured logs of the MaCFP working group, MIT licence (tests/reference/logs, logs-facts.json).
describe('real logs', () => {
  it.each(facts.rows)(
    '$file, $column: rows, units, times and extremes are those of the file',
    (row) => {
      const { table, readings, rowCount } = importLog(row.file, row.column);
      expect(table.choice.unit).toBe('K');
      expect(table.choice.timeFormat).toBe('seconds');
      expect(table.headerLine).toBe(1);
      expect(rowCount).toBe(row.rows);
      expect(readings).toHaveLength(row.rows - row.zero_readings);
      const celsius = readings.map((one) => one.celsius);
      expect(Math.max(...celsius)).toBeCloseTo(row.max_C, 1);
      if (row.zero_readings === 0) {
        expect(Math.min(...celsius)).toBeCloseTo(kToC(row.min_K), 1);
        expect(celsius[celsius.length - 1]).toBeCloseTo(kToC(row.last_K), 1);
        expect(readings[readings.length - 1]!.minute * 60).toBeCloseTo(
          row.t_last_s - row.t_first_s,
          3,
        );
        const peak = Math.max(...celsius);
        const hottest = readings.find((one) => one.celsius === peak)!;
        expect(hottest.minute * 60).toBeCloseTo(row.t_max_s, 0);
      }
    },
  );

  it('the columns of a burning block are told apart: mass and heat are no temperatures', () => {
    const { table } = importLog('FPL_Wood_Cone_50kW_hor_R5.csv');
    expect(table.columns.map((column) => column.role)).toEqual([
      'time',
      'other',
      'other',
      'temperature',
      'temperature',
      'temperature',
    ]);
  });

  it('the broken channel is recognised as stuck at 0 K and its zeros are left out', () => {
    const { table, assumed, readings } = importLog('UClan_Cone_65kW.csv');
    expect(table.assumed.join(' ')).toContain('not connected');
    expect(assumed.join(' ')).toContain('473 of 490 rows');
    expect(readings.every((one) => one.celsius > -40)).toBe(true);
  });

  it('the holds of the furnaces are found where they were measured', () => {
    let compared = 0;
    for (const row of facts.rows) {
      for (const hold of row.holds ?? []) {
        if (hold.within_1K_length_s < 600) continue;
        const { readings } = importLog(row.file);
        const reading = readFiring({ readings, targetCelsius: 1100 })!;
        const level = kToC(hold.median_K);
        const from = hold.within_1K_from_s / 60;
        const to = hold.within_1K_to_s / 60;
        const found = reading.levels.find(
          (one) =>
            Math.abs(one.levelCelsius - level) < 3 && one.fromMinute < to && one.toMinute > from,
        );
        // A firing starts at its first climb; a stretch before that is no part of it.
        const begin = Math.max(from, reading.start.minute);
        if (to - begin < 8) continue;
        compared += 1;
        expect(found, `${row.file} ${hold.programmed_K} K`).toBeDefined();
        expect(found!.minutes).toBeGreaterThan(0.85 * (to - begin));
      }
    }
    expect(compared).toBeGreaterThanOrEqual(3);
  });
});
