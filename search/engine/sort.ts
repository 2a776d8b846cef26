import type { Column } from './columns.ts';
import { EngineError } from './errors.ts';
import { isWithin } from './flatten.ts';
import type { SearchIndex } from './search-index.ts';

export type SortBy = { attribute: string; descending: boolean };

/** Reads `attribute:asc` or `attribute:desc`. `code` names the error for anything else. */
export function parseSort(entries: readonly string[], index: SearchIndex, code: string): SortBy[] {
  const { sortableAttributes } = index.settings;
  return entries.map((entry) => {
    const parts = /^(.+):(asc|desc)$/.exec(entry);
    const attribute = parts?.[1];
    if (attribute === undefined) {
      throw new EngineError(
        code,
        `Invalid syntax for the sort parameter: expected expression ending by \`:asc\` or \`:desc\`, found \`${entry}\`.`,
      );
    }
    if (!sortableAttributes.some((each) => each === '*' || isWithin(attribute, each))) {
      const known =
        sortableAttributes.length === 0
          ? 'This index does not have configured sortable attributes.'
          : `Available sortable attributes are: \`${sortableAttributes.join(', ')}\`.`;
      throw new EngineError(code, `Attribute \`${attribute}\` is not sortable. ${known}`);
    }
    return { attribute, descending: parts?.[2] === 'desc' };
  });
}

/** What a document is sorted by: a number, else a text, else nothing. */
export type SortKey = number | string | undefined;

/** The value that comes first in the wanted direction, if a document has several. */
export function sortKey(
  column: Column | undefined,
  document: number,
  descending: boolean,
): SortKey {
  const cell = column?.cells[document];
  if (column === undefined || cell === undefined) return undefined;
  if (cell.numbers.length === 1) return cell.numbers[0];
  if (cell.numbers.length > 0) {
    return descending ? Math.max(...cell.numbers) : Math.min(...cell.numbers);
  }
  let best: string | undefined;
  for (const code of cell.codes) {
    const text = column.folded[code] ?? '';
    if (best === undefined || (descending ? text > best : text < best)) best = text;
  }
  return best;
}

/** Numbers before texts and nothing last, in both directions. */
export function compareSortKeys(a: SortKey, b: SortKey, descending: boolean): number {
  if (a === b) return 0;
  if (a === undefined) return 1;
  if (b === undefined) return -1;
  if (typeof a !== typeof b) return typeof a === 'number' ? -1 : 1;
  return (a < b ? -1 : 1) * (descending ? -1 : 1);
}
