import type { LoggerShape } from './logger-shape.ts';
import { elapsed } from '../../../../support/logger-files.ts';

const silent = { silent: true } as const;

/** Delimiters, decimal signs, encodings, names, units and remarks. */
export const LAYOUT_SHAPES: readonly LoggerShape[] = [
  { name: 'comma and point', shape: { head: ['Minutes,Temp (°C)'] }, expected: silent },
  {
    name: 'semicolon and comma',
    shape: { head: ['Zeit [min];Temperatur [°C]'], delimiter: ';', decimal: ',' },
    expected: silent,
  },
  { name: 'semicolon and point', shape: { head: ['min;°C'], delimiter: ';' }, expected: silent },
  {
    name: 'tab and comma',
    shape: { head: ['Temps (min)\tTempérature (°C)'], delimiter: '\t', decimal: ',' },
  },
  {
    name: 'bars, as in a printed table',
    shape: {
      head: ['| Time (min) | Temp (°C) |', '|---|---|'],
      delimiter: ' | ',
      mend: (lines) => lines.map((line, i) => (i < 2 ? line : `| ${line} |`)),
    },
  },
  { name: 'blanks of any number', shape: { head: ['minutes   tempC'], delimiter: '     ' } },
  {
    name: 'columns set by blanks under names of two words',
    shape: { head: ['Elapsed min   Kiln temp C'], delimiter: '         ' },
  },
  {
    name: 'single blanks without names',
    shape: { delimiter: ' ' },
    expected: { says: ['minutes', '°C'] },
  },
  {
    name: 'comma and quoted decimal commas',
    shape: {
      head: ['"Minuten","Temperatur °C"'],
      delimiter: '","',
      decimal: ',',
      mend: (lines) => lines.map((line, i) => (i === 0 ? line : `"${line}"`)),
    },
    expected: { says: ['comma is read as the decimal sign'] },
  },
  {
    name: 'thousands by comma, quoted',
    shape: {
      head: ['min,Temp °F'],
      unit: 'F',
      row: ({ minute, celsius }) => [
        minute,
        `"${(celsius * 1.8 + 32).toLocaleString('en-US', { minimumFractionDigits: 1, maximumFractionDigits: 1 })}"`,
      ],
    },
  },
  {
    name: 'thousands by a blank',
    shape: {
      head: ['min;Temp °F'],
      unit: 'F',
      delimiter: ';',
      decimal: ',',
      row: ({ n, minute, celsius }) => [
        n(minute),
        n(celsius * 1.8 + 32).replace(/^(\d)(\d{3})/, '$1 $2'),
      ],
    },
  },
  {
    name: 'thousands by a point',
    shape: {
      head: ['min;Temp °F'],
      unit: 'F',
      delimiter: ';',
      decimal: ',',
      row: ({ n, minute, celsius }) => [
        n(minute),
        n(celsius * 1.8 + 32).replace(/^(\d)(\d{3})/, '$1.$2'),
      ],
    },
  },
  {
    name: 'UTF-8 with its mark',
    shape: { head: ['min,°C'] },
    encoding: 'utf-8-bom',
    expected: silent,
  },
  {
    name: 'UTF-16 little end first',
    shape: { head: ['min,°C'] },
    encoding: 'utf-16le',
    expected: silent,
  },
  {
    name: 'UTF-16 big end first',
    shape: { head: ['min,°C'] },
    encoding: 'utf-16be',
    expected: silent,
  },
  {
    name: 'UTF-16 without its mark',
    shape: { head: ['min,°C'] },
    encoding: 'utf-16le-bare',
    expected: { says: ['UTF-16'] },
  },
  {
    name: 'Latin-1 degree signs',
    shape: { head: ['Zeit (min);Temp (°C)'], delimiter: ';' },
    encoding: 'latin-1',
    expected: { says: ['Latin-1'] },
  },
  { name: 'lines ended by CR alone', shape: { head: ['min,°C'], lineEnd: '\r' }, expected: silent },
  {
    name: 'lines ended by CR and LF',
    shape: { head: ['min,°C'], lineEnd: '\r\n' },
    expected: silent,
  },
  {
    name: 'line ends mixed',
    shape: {
      head: ['min,°C'],
      mend: (lines) => [
        lines
          .map((line, i) => line + (['\r\n', '\n', '\r'][i % 3] as string))
          .join('')
          .trimEnd(),
      ],
    },
  },
  {
    name: 'names in capitals',
    shape: { head: ['ELAPSED MINUTES,KILN TEMP F'], unit: 'F' },
    expected: silent,
  },
  { name: 'names run together', shape: { head: ['ElapsedMinutes,KilnTempC'] } },
  { name: 'names with a bar below', shape: { head: ['elapsed_min,kiln_temp_f'], unit: 'F' } },
  {
    name: '“t [s]” and “T [K]”',
    shape: { head: ['t [s],T [K]'], unit: 'K', row: ({ minute, T }) => [minute * 60, T] },
    expected: silent,
  },
  {
    name: 'quantities over units: “t/s”, “ϑ/°C”',
    shape: { head: ['t/s;ϑ/°C'], delimiter: ';', row: ({ minute, T }) => [minute * 60, T] },
    expected: silent,
  },
  {
    name: '“TC1/K” in kelvin',
    shape: { head: ['t/s,TC1/K'], unit: 'K', row: ({ minute, T }) => [minute * 60, T] },
  },
  {
    name: '“TC1/K” where K is the type',
    shape: { head: ['t/s,TC1/K'], row: ({ minute, T }) => [minute * 60, T] },
    expected: { says: ['type of thermocouple'] },
  },
  {
    name: 'type K in a name with its own unit',
    shape: {
      head: ['Time (s),Thermocouple Type K (°F)'],
      unit: 'F',
      row: ({ minute, T }) => [minute * 60, T],
    },
  },
  {
    name: '“CH1 degF”',
    shape: { head: ['Time (s),CH1 degF'], unit: 'F', row: ({ minute, T }) => [minute * 60, T] },
    expected: silent,
  },
  {
    name: 'a line of units below the names',
    shape: { head: ['Time,Temp', 's,°C'], row: ({ minute, T }) => [minute * 60, T] },
    expected: silent,
  },
  {
    name: 'a line of units in brackets, time’s left blank',
    shape: {
      head: ['Time;Kiln', ';[°F]'],
      delimiter: ';',
      unit: 'F',
      row: ({ minute, T }) => [elapsed(minute), T],
    },
  },
  {
    name: 'a line of patterns and units',
    shape: {
      head: ['Elapsed,Temp', 'hh:mm:ss,deg C'],
      row: ({ minute, T }) => [elapsed(minute), T],
    },
  },
  { name: 'two lines of names', shape: { head: [',Channel 1', 'Time,Temperature', '[min],[°C]'] } },
  {
    name: 'names in a remark',
    shape: {
      head: ['# logger 3', '# Time(s), Temp(F)'],
      unit: 'F',
      row: ({ minute, T }) => [minute * 60, T],
    },
  },
  {
    name: 'a long preamble',
    shape: {
      head: [
        'Device: logger',
        'Serial;12345',
        'Interval: 30 s',
        'sep=,',
        '',
        'Time (min),Probe 1 (°C)',
      ],
    },
    expected: silent,
  },
  {
    name: 'the unit in the preamble only',
    shape: {
      head: ['Logger 7', 'Temperature unit: F', 'Minutes,Reading'],
      unit: 'F',
      peakCelsius: 500,
    },
    expected: { says: ['as line 2 says'] },
  },
  {
    name: 'remarks by #, ; and //',
    shape: {
      head: ['# one', '; two', '// three', 'min,°C'],
      mend: (lines) => [
        ...lines.slice(0, 20),
        '# cone down',
        '; pause',
        '// on',
        ...lines.slice(20),
      ],
    },
  },
  {
    name: 'blank lines between, a footer below',
    shape: { head: ['min,°C', ''], foot: ['', 'End of log', 'Maximum,985.0', 'Total rows,120'] },
  },
];
