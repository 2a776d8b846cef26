/** Messages quote the filter; a huge one is quoted in part. */
const MAX_QUOTED = 1_000;

function shortened(text: string): string {
  return text.length > MAX_QUOTED ? `${text.slice(0, MAX_QUOTED)}…` : text;
}

/** A fault in a filter, with the stretch of the expression it is about (offsets from 0). */
export class FilterSyntaxError extends Error {
  readonly at: number;
  readonly end: number;

  constructor(message: string, at: number, end: number) {
    super(shortened(message));
    this.name = 'FilterSyntaxError';
    this.at = at;
    this.end = end;
  }
}

/** The message with the position line below it: columns from 1, then the whole expression. */
export function positionedMessage(error: FilterSyntaxError, expression: string): string {
  return `${error.message}\n${error.at + 1}:${error.end + 1} ${shortened(expression)}`;
}
