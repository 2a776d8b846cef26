import type { RecordChoice } from '#shared/record/record-choice.ts';
import { RecordError } from '#shared/record/record-error.ts';
import { isComment, scanRows, type Delimiter } from '#shared/record/scan-rows.ts';
import type { TimeFormat } from '#shared/record/parse-time.ts';

export const DELIMITER_WORDS: Readonly<Record<Delimiter, string>> = {
  ',': 'Comma',
  ';': 'Semicolon',
  '\t': 'Tab',
  '|': 'Bar',
  ' ': 'Spaces',
  '  ': 'Two spaces or more',
};

export const TIME_FORMAT_WORDS: Readonly<Record<TimeFormat, string>> = {
  minutes: 'Minutes',
  seconds: 'Seconds',
  milliseconds: 'Milliseconds',
  hours: 'Hours',
  days: 'Days',
  'h:mm:ss': 'Hours:minutes:seconds',
  'h:mm': 'Hours:minutes',
  'm:ss': 'Minutes:seconds',
  timestamp: 'Date and time, year first',
  'timestamp-dmy': 'Date and time, day first',
  'timestamp-mdy': 'Date and time, month first',
  'timestamp-ymd': 'Date and time, two figures of the year first',
};

export interface TableColumn {
  readonly index: number;
  readonly name: string;
  readonly samples: readonly string[];
}

const SAMPLE_LINES = 5;
const LINES_LOOKED_AT = 200;

/** The columns as they fall by a choice, with their first cells. */
export function columnsUnder(
  text: string,
  choice: Pick<RecordChoice, 'delimiter' | 'headerLine'>,
): TableColumn[] {
  let names: readonly string[] = [];
  const rows: (readonly string[])[] = [];
  try {
    scanRows(text, choice.delimiter, (cells, line) => {
      if (choice.headerLine !== null && line <= choice.headerLine) {
        if (line === choice.headerLine) names = cells;
        return true;
      }
      if (cells.some((cell) => cell !== '') && !isComment(cells)) rows.push(cells);
      return rows.length < SAMPLE_LINES && line < LINES_LOOKED_AT;
    });
  } catch (error) {
    if (!(error instanceof RecordError)) throw error;
  }
  const width = Math.max(names.length, ...rows.map((row) => row.length), 1);
  return Array.from({ length: width }, (_, index) => ({
    index,
    name: names[index] ?? '',
    samples: rows.map((row) => row[index] ?? ''),
  }));
}

/** The choice with another way of parting columns: those that are there no more fall back. */
export function withinColumns(choice: RecordChoice, width: number): RecordChoice {
  const fits = (column: number): boolean => column < width;
  return {
    ...choice,
    ...(choice.dateColumn == null || fits(choice.dateColumn) ? {} : { dateColumn: null }),
    timeColumn: fits(choice.timeColumn) ? choice.timeColumn : 0,
    temperatureColumn: fits(choice.temperatureColumn)
      ? choice.temperatureColumn
      : Math.min(1, width - 1),
    secondColumn:
      choice.secondColumn !== null && fits(choice.secondColumn) ? choice.secondColumn : null,
  };
}
