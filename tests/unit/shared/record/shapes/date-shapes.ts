import type { LoggerShape } from './logger-shape.ts';
import { moment } from '../../../../support/logger-files.ts';

const at =
  (shape: (parts: ReturnType<typeof moment>) => string, start?: number) =>
  ({ minute, T }: { minute: number; T: string }) => [shape(moment(minute, start)), T];
const silent = { silent: true } as const;

/** Dates with their times, in every usual order. */
export const DATE_SHAPES: readonly LoggerShape[] = [
  {
    name: 'ISO with Z',
    shape: { head: ['time,°C'], row: at(({ date }) => date.toISOString()) },
    expected: silent,
  },
  {
    name: 'ISO with an offset',
    shape: {
      head: ['time,°C'],
      row: at(({ y, mo, d, clock }) => `${y}-${mo}-${d}T${clock}+01:00`),
    },
    expected: silent,
  },
  {
    name: 'ISO over the end of summer time, with offsets',
    shape: {
      head: ['time,°C'],
      row: ({ minute, T }) => {
        const isSummer = minute < 20;
        const p = moment(minute + (isSummer ? 120 : 60), Date.UTC(2026, 9, 25, 0, 40));
        return [`${p.y}-${p.mo}-${p.d}T${p.clock}${isSummer ? '+02:00' : '+01:00'}`, T];
      },
    },
    expected: silent,
  },
  {
    name: 'the end of summer time without offsets',
    shape: {
      head: ['time,°C'],
      row: ({ minute, T }) => {
        const p = moment(minute + (minute < 20 ? 120 : 60), Date.UTC(2026, 9, 25, 0, 40));
        return [`${p.y}-${p.mo}-${p.d} ${p.clock}`, T];
      },
    },
    expected: { says: ['set back by an hour at line 42'] },
  },
  {
    name: 'the beginning of summer time without offsets',
    shape: {
      head: ['time,°C'],
      row: ({ minute, T }) => {
        const p = moment(minute + (minute < 20 ? 60 : 120), Date.UTC(2026, 2, 29, 0, 40));
        return [`${p.y}-${p.mo}-${p.d} ${p.clock}`, T];
      },
    },
    expected: { says: ['set ahead by an hour'] },
  },
  {
    name: 'named zones',
    shape: { head: ['time,°C'], row: at(({ y, mo, d, clock }) => `${y}-${mo}-${d} ${clock} CET`) },
  },
  {
    name: 'year/month/day',
    shape: { head: ['time,°C'], row: at(({ y, mo, d, clock }) => `${y}/${mo}/${d} ${clock}`) },
    expected: silent,
  },
  {
    name: 'day.month.year',
    shape: {
      head: ['Datum;°C'],
      delimiter: ';',
      row: at(({ y, mo, d, clock }) => `${d}.${mo}.${y} ${clock}`),
    },
  },
  {
    name: 'day/month/year, told by the 31st',
    shape: {
      head: ['time,°C'],
      row: at(({ y, mo, d, clock }) => `${d}/${mo}/${y} ${clock}`, Date.UTC(2026, 11, 31, 14)),
    },
    expected: { saysNot: ['another order'] },
  },
  {
    name: 'month/day/year, told by the 31st',
    shape: {
      head: ['time,°C'],
      row: at(
        ({ y, mo, d, h12, mi, s, half }) => `${mo}/${d}/${y} ${h12}:${mi}:${s} ${half}`,
        Date.UTC(2026, 11, 31, 14),
      ),
    },
  },
  {
    name: 'month/day/year past midnight, told by the jump',
    shape: {
      head: ['time,°C'],
      row: at(({ y, mo, d, clock }) => `${mo}/${d}/${y} ${clock}`, Date.UTC(2026, 2, 4, 23, 30)),
    },
    expected: { says: ['month, day, year'] },
  },
  {
    name: 'a date that may be either, which changes nothing',
    shape: {
      head: ['time,°C'],
      row: at(({ y, mo, d, clock }) => `${d}/${mo}/${y} ${clock}`, Date.UTC(2026, 2, 4, 14)),
    },
    expected: { says: ['changes nothing'] },
  },
  {
    name: 'two-figure years',
    shape: {
      head: ['time;°C'],
      delimiter: ';',
      row: at(({ yy, mo, d, clock }) => `${d}.${mo}.${yy} ${clock}`),
    },
  },
  {
    name: 'two-figure years first, past midnight',
    shape: {
      head: ['time;°C'],
      delimiter: ';',
      row: at(({ yy, mo, d, clock }) => `${yy}-${mo}-${d} ${clock}`, Date.UTC(2026, 11, 1, 23, 30)),
    },
  },
  {
    name: '“01-Dec-2026 14:03:22”',
    shape: { head: ['time,°C'], row: at(({ y, mon, d, clock }) => `${d}-${mon}-${y} ${clock}`) },
    expected: silent,
  },
  {
    name: '“Dec 1 2026 2:03 PM”, to the minute',
    shape: {
      head: ['time,°C'],
      stepMinutes: 1,
      row: at(({ y, mon, d, h12, mi, half }) => `${mon} ${Number(d)} ${y} ${h12}:${mi} ${half}`),
    },
    expected: silent,
  },
  {
    name: '“Tue, 01 Dec 2026 14:03:22 GMT”, quoted',
    shape: { head: ['time,°C'], row: at(({ date }) => `"${date.toUTCString()}"`) },
    expected: silent,
  },
  {
    name: '“Tue Dec 01 14:03:22 2026”-like, without a year',
    shape: { head: ['time,°C'], row: at(({ mon, d, clock }) => `${mon} ${d} ${clock}`) },
    expected: { says: ['no year'] },
  },
  {
    name: 'a German month’s name',
    shape: {
      head: ['Zeit;°C'],
      delimiter: ';',
      decimal: ',',
      row: at(({ y, d, clock }) => `${Number(d)}. Dezember ${y} ${clock}`),
    },
  },
  {
    name: 'figures without signs between',
    shape: {
      head: ['time,°C'],
      row: at(({ y, mo, d, h, mi, s }) => `${y}${mo}${d}T${h}${mi}${s}`),
    },
    expected: silent,
  },
  {
    name: 'points in the time too',
    shape: {
      head: ['tid;°C'],
      delimiter: ';',
      row: at(({ y, mo, d, h, mi, s }) => `${d}.${mo}.${y} ${h}.${mi}.${s}`),
    },
  },
];
