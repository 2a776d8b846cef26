import type { LoggerShape } from './logger-shape.ts';
import { elapsed, moment } from '../../../../support/logger-files.ts';

const at =
  (shape: (parts: ReturnType<typeof moment>) => string, start?: number) =>
  ({ minute, T }: { minute: number; T: string }) => [shape(moment(minute, start)), T];
const silent = { silent: true } as const;

/** Times since the beginning, and times of day. */
export const CLOCK_SHAPES: readonly LoggerShape[] = [
  {
    name: 'elapsed h:mm:ss',
    shape: { head: ['Elapsed,Temp °C'], row: ({ minute, T }) => [elapsed(minute), T] },
    expected: silent,
  },
  {
    name: 'elapsed hh:mm:ss with thousandths',
    shape: { head: ['Elapsed,Temp °C'], row: ({ minute, T }) => [`0${elapsed(minute)}.000`, T] },
    expected: silent,
  },
  {
    name: 'seconds with a decimal comma in a clock',
    shape: {
      head: ['Zeit;Temp °C'],
      delimiter: ';',
      decimal: ',',
      row: ({ minute, T }) => [`${moment(minute).clock},500`, T],
    },
  },
  {
    name: 'minutes and seconds beyond an hour',
    shape: {
      head: ['Time,Temp °C'],
      row: ({ minute, T }) => [`${Math.floor(minute)}:${minute % 1 ? '30' : '00'}`, T],
    },
    expected: { says: ['minutes and seconds'] },
  },
  {
    name: 'hours and minutes, a minute a step',
    shape: {
      head: ['Time,Temp °C'],
      stepMinutes: 1,
      row: ({ minute, T }) => [elapsed(minute).slice(0, -3), T],
    },
    expected: { says: ['hours and minutes'] },
  },
  {
    name: '“90 min 30 s”',
    shape: {
      head: ['Time,Temp °C'],
      row: ({ minute, T }) => [`${Math.floor(minute)} min ${(minute % 1) * 60} s`, T],
    },
  },
  {
    name: 'days and a clock',
    shape: { head: ['Elapsed,Temp °C'], row: ({ minute, T }) => [`0 days 0${elapsed(minute)}`, T] },
  },
  {
    name: 'units stuck to times and temperatures',
    shape: { row: ({ minute, T }) => [`${minute * 60} s`, `${T}°C`] },
  },
  {
    name: 'units behind a blank, in °F',
    shape: { head: ['when,what'], unit: 'F', row: ({ minute, T }) => [`${minute} min`, `${T} °F`] },
  },
  {
    name: 'a C stuck to whole numbers',
    shape: {
      head: ['min,Temp'],
      row: ({ minute, celsius }) => [minute, `${Math.round(celsius)}C`],
    },
    expected: { within: 0.6 },
  },
  {
    name: 'seconds since 1970',
    shape: { head: ['timestamp,value'], row: ({ minute, T }) => [moment(minute).unix, T] },
    expected: { says: ['seconds since 1970'] },
  },
  {
    name: 'milliseconds since 1970',
    shape: { row: ({ minute, T }) => [moment(minute).unix * 1000, T] },
    expected: { says: ['milliseconds since 1970'] },
  },
  {
    name: 'a spreadsheet’s days',
    shape: { head: ['Date,Temp'], row: ({ minute, T }) => [moment(minute).serial.toFixed(6), T] },
    expected: { says: ['as a spreadsheet counts'] },
  },
  {
    name: 'a clock past midnight',
    shape: { head: ['Time,°C'], row: at(({ clock }) => clock, Date.UTC(2026, 11, 1, 23, 31)) },
    expected: { says: ['past midnight'] },
  },
  {
    name: 'twelve hours with AM and PM past noon',
    shape: {
      head: ['Time,°C'],
      row: at(({ h12, mi, s, half }) => `${h12}:${mi}:${s} ${half}`, Date.UTC(2026, 11, 1, 11, 31)),
    },
    expected: silent,
  },
  {
    name: 'twelve hours with a.m. and p.m. past midnight',
    shape: {
      head: ['Time,°C'],
      row: at(
        ({ h12, mi, s, half }) => `${h12}:${mi}:${s} ${half === 'AM' ? 'a.m.' : 'p.m.'}`,
        Date.UTC(2026, 11, 1, 23, 31),
      ),
    },
    expected: { says: ['past midnight'] },
  },
  {
    name: 'twelve hours without am or pm',
    shape: {
      head: ['Time,°C'],
      row: at(({ h12, mi, s }) => `${h12}:${mi}:${s}`, Date.UTC(2026, 11, 1, 12, 31)),
    },
    expected: { says: ['twelve hours without am or pm'] },
  },
  {
    name: 'AM and PM in a column of their own',
    shape: {
      head: ['Date,Time,AM/PM,°C'],
      row: ({ minute, T }) => {
        const p = moment(minute, Date.UTC(2026, 11, 1, 11, 31));
        return [`${p.mo}/${p.d}/${p.y}`, `${p.h12}:${p.mi}:${p.s}`, p.half, T];
      },
    },
  },
  {
    name: 'date and time in two columns, past midnight',
    shape: {
      head: ['Date,Time,Temp C'],
      row: ({ minute, T }) => {
        const p = moment(minute, Date.UTC(2026, 11, 31, 23, 31));
        return [`${p.y}-${p.mo}-${p.d}`, p.clock, T];
      },
    },
    expected: silent,
  },
  {
    name: 'date and time in two columns, days first',
    shape: {
      head: ['Datum;Uhrzeit;Ofen'],
      delimiter: ';',
      decimal: ',',
      row: ({ minute, T }) => {
        const p = moment(minute, Date.UTC(2026, 11, 31, 23, 31));
        return [`${p.d}.${p.mo}.${p.y}`, p.clock, T];
      },
    },
  },
  {
    name: 'date, time and more parted by blanks',
    shape: {
      delimiter: ' ',
      row: ({ minute, T }) => {
        const p = moment(minute);
        return [`${p.y}-${p.mo}-${p.d}`, p.clock, T];
      },
    },
  },
];
