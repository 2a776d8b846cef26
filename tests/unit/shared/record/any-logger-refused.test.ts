import { describe, expect, it } from 'vitest';
import { readAnyRecord } from '#shared/record/read-any-record.ts';
import { RecordError } from '#shared/record/record-error.ts';
import { loggerFile, type FileShape } from '../../../support/logger-files.ts';

function refusal(text: string | Uint8Array): RecordError {
  try {
    readAnyRecord(typeof text === 'string' ? new TextEncoder().encode(text) : text);
  } catch (error) {
    if (error instanceof RecordError) return error;
    throw error;
  }
  throw new Error('nothing was refused');
}

const REFUSED: readonly { name: string; shape: FileShape; line: number | null; words: string }[] = [
  {
    name: 'a time that is a word, in the middle',
    shape: { head: ['min,°C'], row: ({ index, minute, T }) => [index === 60 ? 'abc' : minute, T] },
    line: 62,
    words: '“abc” cannot be read as a time',
  },
  {
    name: 'a temperature without a time, in the middle',
    shape: { head: ['min,°C'], row: ({ index, minute, T }) => [index === 60 ? '' : minute, T] },
    line: 62,
    words: 'has a temperature, but no time',
  },
  {
    name: 'a day that does not exist',
    shape: {
      head: ['time,°C'],
      row: ({ index, T }) => [
        `2026-02-${index === 50 ? '30' : '27'} 10:${String(Math.floor(index / 2)).padStart(2, '0')}:00`,
        T,
      ],
      count: 118,
    },
    line: 52,
    words: 'cannot be read as a time',
  },
  {
    name: 'decimal commas between commas',
    shape: { head: ['min,Temp'], row: ({ minute, T }) => [minute, T.replace('.', ',')] },
    line: 2,
    words: 'commas part the columns and seem to be decimal signs too',
  },
  {
    name: 'temperatures without a time',
    shape: { head: ['Top °C,Bottom °C'], row: ({ T, celsius, n }) => [T, n(celsius - 5)] },
    line: 2,
    words: 'No column of this table can be read as a time',
  },
  {
    name: 'a count of rows and no time',
    shape: { head: ['Sample,Temp °C'], row: ({ index, T }) => [index + 1, T] },
    line: 2,
    words: 'only counts the rows',
  },
  {
    name: 'a set-point without a probe',
    shape: { head: ['min,Setpoint °C'] },
    line: 2,
    words: 'be read as a temperature',
  },
  {
    name: 'a mass without a temperature',
    shape: { head: ['Time (s),Mass (g)'] },
    line: 2,
    words: 'be read as a temperature',
  },
  {
    name: 'a probe that was never connected, at zero',
    shape: { head: ['min,°C'], row: ({ minute }) => [minute, 0] },
    line: null,
    words: 'not connected',
  },
  {
    name: 'a probe that was never connected, open',
    shape: { head: ['min,°C'], row: ({ minute }) => [minute, 1372] },
    line: null,
    words: 'not connected',
  },
  {
    name: 'a quotation mark never closed',
    shape: { head: ['min,°C'], mend: (lines) => [...lines, '60,"70'], count: 400 },
    line: 402,
    words: 'never closed',
  },
  {
    name: 'more than fifty columns',
    shape: { head: ['min,°C'], mend: (lines) => [...lines, Array(60).fill('1').join(',')] },
    line: 122,
    words: '50 columns',
  },
];

describe('a file that cannot be read', () => {
  it.each(REFUSED)('is refused with its line: $name', ({ shape, line, words }) => {
    const error = refusal(loggerFile(shape).text);
    expect(error.message).toContain(words);
    expect(error.line).toBe(line);
  });

  it.each([
    ['nothing', '', 'empty'],
    ['blank lines', '\n\n  \n', 'empty'],
    ['prose', 'The kiln was slow.\nWe waited.\n', 'No table was found'],
    ['one column', '20\n30\n40\n', 'No table was found'],
    ['a page', '<html><body><p>Not found</p></body></html>', 'No table was found'],
    ['data in braces', '{"t": 0, "c": 20}\n{"t": 1, "c": 30}\n', 'No table was found'],
  ])('is refused in words: %s', (_, text, words) => {
    expect(refusal(text).message).toContain(words);
  });

  it.each([
    ['a spreadsheet', [0x50, 0x4b, 3, 4, 20, 0], 'spreadsheet'],
    ['an old spreadsheet', [0xd0, 0xcf, 0x11, 0xe0, 0xa1], 'spreadsheet'],
    ['a PDF', [0x25, 0x50, 0x44, 0x46, 0x2d], 'PDF'],
    ['a packed file', [0x1f, 0x8b, 8, 0], 'packed'],
    ['a picture', [0xff, 0xd8, 0xff, 0xe0], 'picture'],
  ])('is refused for what it is: %s', (_, bytes, words) => {
    expect(refusal(Uint8Array.from(bytes)).message).toContain(words);
  });
});
