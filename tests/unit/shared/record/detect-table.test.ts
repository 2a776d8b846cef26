import { describe, expect, it } from 'vitest';
import { detectTable } from '#shared/record/detect-table.ts';
import { recordChoiceSchema } from '#shared/record/record-choice.ts';
import { readTable } from '#shared/record/read-table.ts';

/** Detects and reads, as the person does who confirms everything. */
const taken = (text: string) => {
  const table = detectTable(text);
  expect(recordChoiceSchema.parse(table.choice)).toEqual(table.choice);
  return {
    table,
    pairs: readTable(text, table.choice).readings.map((one) => [one.minute, one.celsius]),
  };
};

describe('detectTable', () => {
  it.each([
    [',', '.', 'Minutes,Temperature (°C)\n0,20.5\n1,45.3\n2,99.1\n'],
    [';', ',', 'Minutes;Temperature (°C)\n0;20,5\n1;45,3\n2;99,1\n'],
    [';', '.', 'Minutes;Temperature (°C)\r\n0;20.5\r\n1;45.3\r\n2;99.1\r\n'],
    ['\t', ',', 'Minutes\tTemperature (°C)\n0\t20,5\n1\t45,3\n2\t99,1'],
    [' ', ',', '0 20,5\n1   45,3\n2 99,1\n'],
    [',', '.', '\uFEFF"Minutes","Temperature (°C)"\r"0","20.5"\r"1","45.3"\r"2","99.1"\r'],
  ])('finds the delimiter %j and the decimal sign %j', (delimiter, decimal, text) => {
    const { table, pairs } = taken(text);
    expect(table.delimiter).toBe(delimiter);
    expect(table.decimal).toBe(decimal);
    expect(pairs).toEqual([
      [0, 20.5],
      [1, 45.3],
      [2, 99.1],
    ]);
  });

  it('takes the first of two like probes, though its plug was loose now and then', () => {
    const rows = Array.from(
      { length: 100 },
      (_, i) => `${i},${i === 40 ? 'OPEN' : 20 + 9 * i},${15 + 9 * i}`,
    );
    const loose = detectTable(['Minutes,Probe 1 (°C),Probe 2 (°C)', ...rows].join('\n'));
    expect([loose.choice.temperatureColumn, loose.choice.secondColumn]).toEqual([1, 2]);
    const dead = rows.map((row, i) => (i % 2 === 0 ? row : `${i},OPEN,${15 + 9 * i}`));
    const off = detectTable(['Minutes,Probe 1 (°C),Probe 2 (°C)', ...dead].join('\n'));
    expect(off.choice.temperatureColumn).toBe(2);
  });

  it('finds the header below a preamble and comments, and a line of units', () => {
    const { table, pairs } = taken(
      '# kiln logger\nSerial: 12\nNote, with comma\n\nTime,Load,Kiln\n[s],[kg],[K]\n0,5,293.15\n30,5,303.15\n60,5,313.15\n',
    );
    expect(table.headerLine).toBe(5);
    expect(table.columns.map((column) => column.role)).toEqual(['time', 'other', 'temperature']);
    expect(table.choice.unit).toBe('K');
    expect(table.choice.timeFormat).toBe('seconds');
    expect(pairs).toEqual([
      [0, 20],
      [0.5, 30],
      [1, 40],
    ]);
  });

  it.each([
    ['Temp F', '68', 20],
    ['Temperature (K)', '293.15', 20],
    ['Temp [°C]', '20', 20],
    ['Kiln degF', '1850', 1010],
    ['Celsius', '20', 20],
  ])('takes the unit from the name %j', (name, cell, celsius) => {
    expect(taken(`min,${name}\n0,${cell}\n1,${cell}\n2,${cell}\n`).pairs[0]).toEqual([0, celsius]);
  });

  it('takes °F where no unit is named and the numbers are above any kiln in °C, and says so', () => {
    const { table, pairs } = taken('Min,Temp\n0,70\n10,500\n20,1000\n30,1500\n40,1850');
    expect(table.choice.unit).toBe('F');
    expect(table.assumed.join(' ')).toContain('taken as °F, because its numbers, 70 to 1850');
    expect(pairs[4]).toEqual([40, 1010]);
  });

  it('says so when it takes °C and minutes without being told', () => {
    const { assumed } = detectTable('0,20\n10,300\n20,600\n');
    expect(assumed).toEqual([
      'Column 1 names no unit of time; it is taken as minutes, by how fast the temperature climbs.',
      'Column 2 names no unit; it is taken as °C, because its numbers, 20 to 600, are those of a kiln in °C.',
      'Column 2 is taken as the temperature.',
    ]);
  });

  it('takes bare numbers as seconds where minutes would climb too slowly', () => {
    const rows = Array.from({ length: 180 }, (_, i) => `${i},${20 + i * 0.4}`).join('\n');
    expect(detectTable(`time,temp\n${rows}`).choice.timeFormat).toBe('seconds');
  });

  it.each([
    ['2026-05-01T10:00:00Z', '2026-05-01T10:01:30Z', 'timestamp'],
    ['2026-05-01 10:00', '2026-05-01 10:01:30', 'timestamp'],
    ['2026/05/01 10:00:00', '2026/05/01 10:01:30', 'timestamp'],
    ['31.12.2026 23:59:00', '01.01.2027 00:00:30', 'timestamp-dmy'],
    ['12/31/2026 11:59:00 PM', '01/01/2027 12:00:30 AM', 'timestamp-mdy'],
    ['0:10:00', '0:11:30', 'h:mm:ss'],
    ['23:59:00', '00:00:30', 'h:mm:ss'],
  ])('reads %j to %j as 1.5 minutes (%s)', (first, second, format) => {
    const { table, pairs } = taken(`when;TC1 °C\n${first};20\n${second};50\n`);
    expect(table.time).toEqual({ column: 0, format });
    expect(pairs).toEqual([
      [0, 20],
      [1.5, 50],
    ]);
  });

  it('takes a clock beside a date, and passes midnight', () => {
    const text =
      'Date,Time,Kiln (F),Setpoint\n2026-05-01,23:59:00,68,100\n2026-05-01,23:59:30,77,100\n2026-05-02,00:00:00,86,100\n';
    const { table, pairs } = taken(text);
    expect(table.columns.map((column) => column.role)).toEqual([
      'date',
      'time',
      'temperature',
      'other',
    ]);
    expect(pairs).toEqual([
      [0, 20],
      [0.5, 25],
      [1, 30],
    ]);
  });

  it('finds two probes, and leaves what is no temperature', () => {
    const { choice, columns } = detectTable(
      'time (s),Mass (g),Top (°C),Bottom (°C),Power %\n0,10,20,21,50\n1,10,22,23,50\n2,9,25,26,50\n',
    );
    expect(choice.temperatureColumn).toBe(2);
    expect(choice.secondColumn).toBe(3);
    expect(columns.map((column) => column.role)).toEqual([
      'time',
      'other',
      'temperature',
      'temperature',
      'other',
    ]);
  });

  it('prefers a probe that is connected', () => {
    const rows = Array.from({ length: 20 }, (_, i) => `${i},0,${300 + i}`).join('\n');
    const { choice, assumed } = detectTable(`Time (s),T1 (K),T2 (K)\n${rows}\n`);
    expect(choice.temperatureColumn).toBe(2);
    expect(choice.secondColumn).toBeNull();
    expect(assumed.join(' ')).toContain('T1 (K)) reads 0 almost all the time');
  });

  it.each(['', '\n\n\n', 'just text', '5\n6\n7', 'a,b\nc,d\n'])(
    '%j is refused with a plain message',
    (text) => {
      expect(() => detectTable(text)).toThrow(/No table was found/);
    },
  );

  it('looks at the first lines only: a mistake far below does not disturb it', () => {
    const rows = Array.from({ length: 5000 }, (_, i) => `${i},${20 + i / 10}`).join('\n');
    expect(detectTable(`s,°C\n${rows}\n"never closed`).choice.unit).toBe('C');
  });
});
