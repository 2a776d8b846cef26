import { foldFacet } from './normalise.ts';
import type { FieldContent } from './flatten.ts';

/** What one document holds in one column. */
export type Cell = {
  /** Numbers of the text values in the column's dictionary; booleans count as text. */
  codes: readonly number[];
  numbers: readonly number[];
  isNull: boolean;
  isEmpty: boolean;
};

/** One attribute of all documents, by document number; text values are coded by a dictionary. */
export type Column = {
  cells: (Cell | undefined)[];
  /** Values as first written, for display. */
  labels: string[];
  /** Values in lower case, for comparison. */
  folded: string[];
  codeOf: Map<string, number>;
};

const NO_CODES: readonly number[] = [];

export function createColumn(): Column {
  return { cells: [], labels: [], folded: [], codeOf: new Map() };
}

function codeFor(column: Column, label: string): number {
  const folded = foldFacet(label);
  let code = column.codeOf.get(folded);
  if (code === undefined) {
    code = column.labels.length;
    column.codeOf.set(folded, code);
    column.labels.push(label);
    column.folded.push(folded);
  }
  return code;
}

export function setCell(column: Column, document: number, content: FieldContent): void {
  const codes: number[] = [];
  const numbers: number[] = [];
  for (const value of content.values) {
    if (typeof value === 'number') {
      if (!numbers.includes(value)) numbers.push(value);
    } else {
      const code = codeFor(column, String(value));
      if (!codes.includes(code)) codes.push(code);
    }
  }
  column.cells[document] = {
    codes: codes.length === 0 ? NO_CODES : codes,
    numbers: numbers.length === 0 ? NO_CODES : numbers,
    isNull: content.isNull,
    isEmpty: content.isEmpty,
  };
}

export function clearCell(column: Column, document: number): void {
  column.cells[document] = undefined;
}
