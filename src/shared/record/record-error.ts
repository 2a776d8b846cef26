/**
 * What cannot be read in a record, where: the line as an editor counts them (1 is the first), the
 * column from 1, null where the whole line or file is meant.
 */
export class RecordError extends Error {
  readonly line: number | null;
  readonly column: number | null;

  constructor(message: string, line: number | null = null, column: number | null = null) {
    super(message);
    this.name = 'RecordError';
    this.line = line;
    this.column = column;
  }
}
