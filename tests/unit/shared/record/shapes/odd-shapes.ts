import type { LoggerShape } from './logger-shape.ts';
import { moment } from '../../../../support/logger-files.ts';

/** Open circuits, odd order, units and steps told by range. */
export const ODD_SHAPES: readonly LoggerShape[] = [
  {
    name: 'open for a while: words',
    shape: {
      head: ['min,°C'],
      row: ({ index, minute, T }) => [
        minute,
        index >= 50 && index < 55 ? ['OPEN', 'OL', '----', 'NaN', 'Err'][index - 50]! : T,
      ],
    },
    expected: { kept: (i) => i < 50 || i >= 55, says: ['5 of 120 rows hold no temperature'] },
  },
  {
    name: 'open for a while: numbers',
    shape: {
      head: ['min,°C'],
      row: ({ index, minute, T }) => [
        minute,
        index >= 50 && index < 56 ? [0, 9999, -200, 1372, 32767, 0][index - 50]! : T,
      ],
    },
    expected: { kept: (i) => i < 50 || i >= 56, says: ['6 of 120 rows'] },
  },
  {
    name: 'open from a moment on, to the end',
    shape: { head: ['min,°C'], row: ({ index, minute, T }) => [minute, index >= 90 ? 1372 : T] },
    expected: { kept: (i) => i < 90 },
  },
  {
    name: 'zero until the probe is heard',
    shape: { head: ['min,°C'], row: ({ index, minute, T }) => [minute, index < 4 ? 0 : T] },
    expected: { kept: (i) => i >= 4 },
  },
  {
    name: 'zero on a channel in °F now and then',
    shape: {
      head: ['min,Temp F'],
      unit: 'F',
      row: ({ index, minute, T }) => [minute, index % 20 === 9 ? 0 : T],
    },
    expected: { kept: (i) => i % 20 !== 9 },
  },
  {
    name: 'empty cells for some minutes',
    shape: { head: ['min,°C'], row: ({ index, minute, T }) => [minute, index % 10 === 4 ? '' : T] },
    expected: { kept: (i) => i % 10 !== 4 },
  },
  {
    name: 'latest first',
    shape: {
      head: ['time,°C'],
      row: ({ minute, T }) => [moment(minute).date.toISOString(), T],
      mend: (lines) => [lines[0] as string, ...lines.slice(1).reverse()],
    },
    expected: { says: ['turned round'] },
  },
  {
    name: 'the logger started anew, its counter at zero',
    shape: {
      head: ['s,°C'],
      row: ({ index, minute, T }) => [(index < 60 ? minute : minute - 30) * 60, T],
    },
    expected: { says: ['begins again at line 62'] },
  },
  {
    name: 'names repeated in the middle',
    shape: {
      head: ['min,°C'],
      mend: (lines) => [...lines.slice(0, 40), lines[0] as string, ...lines.slice(40)],
    },
  },
  {
    name: 'kelvin, not named',
    shape: { head: ['Time (s),Temp'], unit: 'K', row: ({ minute, T }) => [minute * 60, T] },
    expected: { says: ['taken as kelvin'] },
  },
  {
    name: 'kelvin, not named, no names at all',
    shape: { unit: 'K', row: ({ minute, T }) => [minute * 60, T] },
    expected: { says: ['taken as kelvin'] },
  },
  {
    name: 'Fahrenheit, not named',
    shape: { head: ['Time (min),Temp'], unit: 'F' },
    expected: { says: ['taken as °F'] },
  },
  {
    name: 'Fahrenheit, not named, only to 400 °C',
    shape: { head: ['Time (min),Temp'], unit: 'F', peakCelsius: 400 },
    expected: { says: ['taken as °F'] },
  },
  {
    name: 'Fahrenheit, told by the shed’s temperature',
    shape: {
      head: ['Time (min),Ambient,Kiln'],
      unit: 'F',
      startCelsius: 120,
      peakCelsius: 520,
      row: ({ minute, T }) => [minute, 68.4, T],
    },
    expected: { says: ["the air's temperature"] },
  },
  {
    name: 'Fahrenheit, told by the set-point’s name',
    shape: {
      head: ['Time (min),Setpoint (°F),Kiln'],
      unit: 'F',
      startCelsius: 120,
      peakCelsius: 520,
      row: ({ minute, T }) => [minute, 1000, T],
    },
    expected: { says: ['as Column 2'] },
  },
  {
    name: 'Celsius from a hot start',
    shape: { head: ['Time (min),Temp'], startCelsius: 200 },
    expected: { says: ['taken as °C'] },
  },
  {
    name: 'seconds told by the climb, one a row',
    shape: {
      head: ['Time,Temp (°C)'],
      stepMinutes: 1 / 60,
      count: 2400,
      row: ({ index, T }) => [index, T],
    },
    expected: { says: ['as seconds'] },
  },
  {
    name: 'minutes told by the climb',
    shape: {
      head: ['Time,Temp (°C)'],
      stepMinutes: 5,
      count: 20,
      row: ({ minute, T }) => [minute, T],
    },
    expected: { says: ['as minutes'] },
  },
  {
    name: 'hours told by the climb',
    shape: {
      head: ['Time,Temp (°C)'],
      stepMinutes: 5,
      count: 100,
      row: ({ minute, T }) => [(minute / 60).toFixed(4), T],
    },
    expected: { says: ['as hours'] },
  },
  {
    name: 'milliseconds told by the climb',
    shape: { head: ['Time,Temp (°C)'], row: ({ minute, T }) => [minute * 60_000, T] },
    expected: { says: ['as milliseconds'] },
  },
  {
    name: 'a microcontroller’s “millis”',
    shape: {
      head: ['millis,tempF'],
      unit: 'F',
      row: ({ minute, T }) => [4321 + minute * 60_000, T],
    },
  },
  {
    name: 'a column that holds nothing but the unit',
    shape: {
      head: ['Time,Value,Unit'],
      unit: 'F',
      startCelsius: 100,
      peakCelsius: 450,
      row: ({ minute, T }) => [moment(minute).clock, T, 'F'],
    },
    expected: { says: ['as Column 3 (Unit) says'] },
  },
  {
    name: 'cells as a spreadsheet’s formulas of texts',
    shape: { head: ['Time (min),Temp (C)'], row: ({ minute, T }) => [`="${minute}"`, `="${T}"`] },
  },
  {
    name: 'cells in single quotes',
    shape: { head: ["'Time (min)','Temp (C)'"], row: ({ minute, T }) => [`'${minute}'`, `'${T}'`] },
  },
  {
    name: 'a date as a browser prints it, the zone spelled out',
    shape: {
      head: ['time;C'],
      delimiter: ';',
      row: ({ minute, T }) => {
        const p = moment(minute);
        return [
          `Tue ${p.mon} ${p.d} ${p.y} ${p.clock} GMT+0100 (Central European Standard Time)`,
          T,
        ];
      },
    },
  },
];
