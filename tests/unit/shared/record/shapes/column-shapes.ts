import type { LoggerShape } from './logger-shape.ts';
import { elapsed, moment } from '../../../../support/logger-files.ts';

/** Several columns, and channels that are no probe. */
export const COLUMN_SHAPES: readonly LoggerShape[] = [
  {
    name: 'no names, two columns, seconds',
    shape: { row: ({ minute, T }) => [minute * 60, T] },
    expected: { says: ['seconds', '°C'] },
  },
  {
    name: 'no names, an index first',
    shape: { row: ({ index, minute, T }) => [index + 1, minute * 60, T] },
    expected: { says: ['seconds'] },
  },
  {
    name: 'no names, an index, a clock',
    shape: { row: ({ index, minute, T }) => [index + 1, moment(minute).clock, T] },
  },
  {
    name: 'no names, two probes',
    shape: { row: ({ minute, T, celsius, n }) => [minute, T, n(celsius * 0.9)] },
    expected: { second: 2 },
  },
  {
    name: 'named index, time, temperature',
    shape: {
      head: ['No.,Time,Temp'],
      row: ({ index, minute, T }) => [index + 1, elapsed(minute), T],
    },
  },
  {
    name: 'index, date, time, two probes',
    shape: {
      head: ['#,Date,Time,TC1 (°C),TC2 (°C)'],
      row: ({ index, minute, T, celsius, n }) => {
        const p = moment(minute);
        return [index, `${p.d}/${p.mo}/${p.y}`, p.clock, T, n(celsius - 12)];
      },
    },
    expected: { second: 4 },
  },
  {
    name: 'four probes of which the third is in the kiln',
    shape: {
      head: ['s,CH1 (°C),CH2 (°C),CH3 (°C),CH4 (°C)'],
      row: ({ index, minute, T, n }) => [minute * 60, n(18 + (index % 5) / 10), n(17.2), T, n(19)],
    },
    expected: { says: ['CH3'], second: null },
  },
  {
    name: 'a channel stuck at zero',
    shape: { head: ['s,T1 (°C),T2 (°C)'], row: ({ minute, T }) => [minute * 60, 0, T] },
    expected: { says: ['T1 (°C)) reads 0 almost all'], second: null },
  },
  {
    name: 'channels open in words',
    shape: { head: ['s,T1,T2,T3'], row: ({ minute, T }) => [minute * 60, 'OPEN', T, '----'] },
    expected: { says: ['reads OPEN'] },
  },
  {
    name: 'channels open in numbers',
    shape: { head: ['s,T1,T2,T3,T4'], row: ({ minute, T }) => [minute * 60, 1372, -200, T, 32767] },
    expected: { says: ['reads 1372', 'reads 32767'], second: null },
  },
  {
    name: 'a set-point before the probe',
    shape: {
      head: ['min,Setpoint (°C),Temp (°C)'],
      row: ({ minute, T, celsius, n }) => [minute, n(celsius + 15), T],
    },
    expected: { second: null },
  },
  {
    name: 'SV and PV',
    shape: {
      head: ['Time,SV,PV,OUT%'],
      row: ({ minute, T, celsius, n }) => [elapsed(minute), n(celsius + 8, 0), T, 66],
    },
    expected: { second: null },
  },
  {
    name: 'Soll and Ist',
    shape: {
      head: ['Zeit (min);Sollwert °C;Istwert °C'],
      delimiter: ';',
      decimal: ',',
      row: ({ minute, T, celsius, n }) => [n(minute), n(celsius + 15), T],
    },
  },
  {
    name: 'compound German names',
    shape: {
      head: ['Zeit (min);Raumtemperatur;Ofentemperatur;Solltemperatur'],
      delimiter: ';',
      decimal: ',',
      row: ({ minute, T, celsius, n }) => [n(minute), n(17.5), T, n(celsius + 9)],
    },
  },
  {
    name: 'a cold junction and a battery',
    shape: {
      head: ['Time (s),Cold junction (°C),Battery (V),Thermocouple (°C)'],
      row: ({ minute, T, n }) => [minute * 60, n(21 + minute / 20), n(3.6), T],
    },
    expected: { second: null },
  },
  {
    name: 'ambient, humidity, kiln',
    shape: {
      head: ['timestamp,Ambient,RH,Kiln'],
      row: ({ minute, T }) => [moment(minute).unix, 19.4, 55, T],
    },
  },
  {
    name: 'mass and heat beside a temperature',
    shape: {
      head: ['Time (s),Mass (g),HRR (kW/m2),TC Top (K)'],
      unit: 'K',
      row: ({ index, minute, T, n }) => [minute * 60, n(96 - index / 10), n(index * 2.5), T],
    },
  },
  {
    name: 'a power that rises higher than the kiln',
    shape: {
      head: ['min,Power,Temperature'],
      row: ({ index, minute, T }) => [minute, index * 30, T],
    },
  },
  {
    name: 'highest, lowest and mean of every minute',
    shape: {
      head: ['min,Max temp (°C),Min temp (°C),Avg temp (°C)'],
      row: ({ minute, T, celsius, n }) => [minute, n(celsius + 2), n(celsius - 2), T],
    },
  },
  {
    name: 'a rate beside the temperature',
    shape: {
      head: ['min,Rate (°C/h),Temp (°C)'],
      row: ({ index, minute, T }) => [minute, index * 20, T],
    },
  },
  {
    name: 'elapsed beside a timestamp',
    shape: {
      head: ['Timestamp,Elapsed (s),Temp (°C)'],
      row: ({ minute, T }) => [moment(minute).date.toISOString(), minute * 60, T],
    },
  },
  {
    name: 'a timestamp to the minute, elapsed to the second',
    shape: {
      head: ['Timestamp,Elapsed (s),Temp (°C)'],
      stepMinutes: 0.1,
      row: ({ minute, T }) => {
        const p = moment(minute);
        return [`${p.y}-${p.mo}-${p.d} ${p.h}:${p.mi}`, Math.round(minute * 60), T];
      },
    },
  },
  {
    name: 'a channel, a note and a state behind',
    shape: {
      head: ['min,Temp °C,State,Note'],
      row: ({ index, minute, T }) => [minute, T, 'OK', index === 40 ? '"gas up, a little"' : ''],
    },
  },
  {
    name: 'probes A to C, which are no °C',
    shape: {
      head: ['min,Probe A,Probe B,Probe C'],
      unit: 'F',
      row: ({ minute, T, celsius, n }) => [minute, T, n(celsius * 1.8), n(celsius * 1.7)],
    },
  },
];
