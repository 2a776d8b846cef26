import { describe, expect, it } from 'vitest';
import { readTable } from '#shared/record/read-table.ts';
import {
  leaveOut,
  lineAt,
  readPasted,
  sourceOf,
  sourceOfFile,
  sourceOfReadings,
} from '../../../../src/write/record/record-source.ts';

const table = 'Zeit (min);Temp (°C)\r\n0;20,5\r\nPause;300\r\n10;310,5\r\n20;480\r\n';

describe('a table before it is sent', () => {
  it('carries what was found out about its layout', () => {
    const source = sourceOf(table, 'firing.csv', 'file');
    expect(source.undetected).toBeNull();
    expect(source.choice).toMatchObject({
      delimiter: ';',
      decimal: ',',
      headerLine: 1,
      timeColumn: 0,
      temperatureColumn: 1,
      unit: 'C',
    });
  });

  it('keeps the reason where nothing was found out, with a choice to be made by hand', () => {
    const source = sourceOf('nothing\nat all', 'x.csv', 'file');
    expect(source.undetected).toMatch(/table/);
    expect(source.choice.timeColumn).toBe(0);
  });

  it('is read in the unit that fits the target, where the file names none', async () => {
    // From a warm kiln at 59: to 905 in °C, or, from a cool day, to 485 °C in °F.
    const rows = Array.from({ length: 48 }, (_, i) => `${String(i)},${String(59 + 18 * i)}`);
    const file = new File([['minute,probe', ...rows].join('\n')], 'warm.csv');
    expect((await sourceOfFile(file, 900)).choice.unit).toBe('C');
    expect((await sourceOfFile(file, 485)).choice.unit).toBe('F');
  });

  it('can be read once the line that cannot be read is left out', () => {
    const source = sourceOf(table, 'firing.csv', 'file', new Blob([table]));
    expect(() => readTable(source.text, source.choice)).toThrow(/Line 3/);
    expect(lineAt(source.text, 3)).toBe('Pause;300');
    const mended = leaveOut(source, 3);
    const read = readTable(mended.text, mended.choice);
    expect(read.readings.map(({ celsius }) => celsius)).toEqual([20.5, 310.5, 480]);
    expect(read.skipped).toEqual([{ line: 3, reason: 'a comment' }]);
    // Changed here, it is no longer the file that was chosen.
    expect(source.file).not.toBeNull();
    expect(mended.file).toBeNull();
    expect(mended.leftOut).toEqual([3]);
  });

  it('leaves nothing out for a line that is not there', () => {
    const source = sourceOf('0,20\n1,30', 'x.csv', 'file');
    expect(leaveOut(source, 7)).toBe(source);
    expect(lineAt(source.text, 7)).toBe('');
    expect(lineAt(source.text, 2)).toBe('1,30');
  });

  it('is refused with a sentence where it is no text: empty, or a spreadsheet’s own file', async () => {
    await expect(sourceOfFile(new File([], 'a.csv'))).rejects.toThrow('empty');
    const zip = new File([new Uint8Array([0x50, 0x4b, 3, 4, 0, 0])], 'a.xlsx');
    await expect(sourceOfFile(zip)).rejects.toThrow('Save the table as CSV');
  });

  it('of readings gives the same readings back', () => {
    const readings = [
      { minute: 0, celsius: 20 },
      { minute: 1.5, celsius: 712.25 },
    ];
    const source = sourceOfReadings(readings);
    expect(readTable(source.text, source.choice).readings).toEqual(readings);
  });
});

describe('pasted text', () => {
  it('of a minute and a temperature a line is rows', () => {
    const read = readPasted('0 20\n0:12 310\n25; 640,5', 'C');
    expect(read).toMatchObject({ kind: 'rows', skipped: [] });
    expect(read.kind === 'rows' && read.readings).toEqual([
      { minute: 0, celsius: 20 },
      { minute: 12, celsius: 310 },
      { minute: 25, celsius: 640.5 },
    ]);
  });

  it('with column names is a table, because the names tell the units', () => {
    const read = readPasted('Time (s)\tTemp (°F)\n0\t68\n60\t590\n120\t900\n', 'C');
    expect(read.kind).toBe('table');
    expect(read.kind === 'table' && read.source.choice).toMatchObject({
      timeFormat: 'seconds',
      unit: 'F',
    });
  });

  it('takes temperatures without a unit in the member’s', () => {
    const read = readPasted('0 1850', 'F');
    expect(read.kind === 'rows' && read.readings[0]?.celsius).toBe(1010);
  });

  it('that says nothing is refused with its line', () => {
    expect(readPasted('the kiln was slow', 'C')).toMatchObject({
      kind: 'unreadable',
      because: expect.stringContaining('Line 1') as unknown,
    });
  });
});
