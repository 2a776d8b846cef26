import type { Cell, Column } from './columns.ts';
import type { Comparison, FilterCondition, FilterNode } from './filter-parser.ts';
import { foldFacet } from './normalise.ts';

/** One byte per document number: 1 where the document is in. */
export type DocumentSet = Uint8Array;

type CellTest = (cell: Cell) => boolean;

/** Answers to conditions, by their text; the oldest goes when there are too many. */
export type KnownConditions = Map<string, DocumentSet>;
const MOST_KNOWN_CONDITIONS = 200;

/**
 * Documents that satisfy a filter. `columnOf` finds an attribute's column (absent when no document
 * has the attribute); `everyone` marks the documents that exist. The answer may be one that is kept
 * in `known`: it must not be written to.
 */
export function evaluateFilter(
  node: FilterNode,
  columnOf: (attribute: string) => Column | undefined,
  everyone: DocumentSet,
  known?: KnownConditions,
): DocumentSet {
  if (node.kind === 'not') {
    const inner = evaluateFilter(node.part, columnOf, everyone, known);
    const result = new Uint8Array(everyone.length);
    for (let at = 0; at < result.length; at += 1) result[at] = inner[at] ? 0 : (everyone[at] ?? 0);
    return result;
  }
  if (node.kind === 'condition') {
    const key = JSON.stringify([node.attribute, node.condition]);
    let found = known?.get(key);
    if (found === undefined) {
      found = evaluateCondition(node.condition, columnOf(node.attribute), everyone);
      keep(known, key, found);
    }
    return found;
  }
  const [first, ...rest] = node.parts;
  if (first === undefined) return everyone;
  const result = evaluateFilter(first, columnOf, everyone, known).slice();
  for (const part of rest) {
    const other = evaluateFilter(part, columnOf, everyone, known);
    if (node.kind === 'and') {
      for (let at = 0; at < result.length; at += 1)
        result[at] = (result[at] ?? 0) & (other[at] ?? 0);
    } else {
      for (let at = 0; at < result.length; at += 1)
        result[at] = (result[at] ?? 0) | (other[at] ?? 0);
    }
  }
  return result;
}

function keep(known: KnownConditions | undefined, key: string, found: DocumentSet): void {
  if (known === undefined) return;
  const oldest = known.keys().next().value;
  if (known.size >= MOST_KNOWN_CONDITIONS && oldest !== undefined) known.delete(oldest);
  known.set(key, found);
}

function evaluateCondition(
  condition: FilterCondition,
  column: Column | undefined,
  everyone: DocumentSet,
): DocumentSet {
  const result = new Uint8Array(everyone.length);
  const negated = condition.kind === 'compare' && condition.operator === '!=';
  if (column !== undefined) {
    const test = cellTest(condition, column);
    for (let at = 0; at < result.length; at += 1) {
      const cell = column.cells[at];
      if (cell !== undefined && everyone[at] && test(cell)) result[at] = 1;
    }
  }
  // `!=` also holds for documents that lack the attribute.
  if (negated) {
    for (let at = 0; at < result.length; at += 1) result[at] = result[at] ? 0 : (everyone[at] ?? 0);
  }
  return result;
}

function cellTest(condition: FilterCondition, column: Column): CellTest {
  switch (condition.kind) {
    case 'exists':
      return () => true;
    case 'null':
      return (cell) => cell.isNull;
    case 'empty':
      return (cell) => cell.isEmpty;
    case 'in':
      return equalsAny(condition.values, column);
    case 'startsWith': {
      const prefix = foldFacet(condition.value);
      return textTest(column, (text) => text.startsWith(prefix));
    }
    case 'between': {
      const low = orderTest('>=', condition.from, column);
      const high = orderTest('<=', condition.to, column);
      const from = toNumber(condition.from);
      const to = toNumber(condition.to);
      if (from !== undefined && to !== undefined) {
        return (cell) => cell.numbers.some((number) => number >= from && number <= to);
      }
      return (cell) => low(cell) && high(cell);
    }
    case 'compare':
      return condition.operator === '=' || condition.operator === '!='
        ? equalsAny([condition.value], column)
        : orderTest(condition.operator, condition.value, column);
  }
}

function equalsAny(values: readonly string[], column: Column): CellTest {
  const codes = new Set<number>();
  const numbers = new Set<number>();
  for (const value of values) {
    const code = column.codeOf.get(foldFacet(value));
    if (code !== undefined) codes.add(code);
    const number = toNumber(value);
    if (number !== undefined) numbers.add(number);
  }
  return (cell) =>
    cell.codes.some((code) => codes.has(code)) ||
    cell.numbers.some((number) => numbers.has(number));
}

function orderTest(operator: Comparison, value: string, column: Column): CellTest {
  const bound = toNumber(value);
  if (bound !== undefined) {
    const holds = holdsFor<number>(operator, bound);
    return (cell) => cell.numbers.some(holds);
  }
  return textTest(column, holdsFor<string>(operator, foldFacet(value)));
}

function holdsFor<T extends number | string>(
  operator: Comparison,
  bound: T,
): (value: T) => boolean {
  switch (operator) {
    case '>':
      return (value) => value > bound;
    case '>=':
      return (value) => value >= bound;
    case '<':
      return (value) => value < bound;
    case '<=':
      return (value) => value <= bound;
    case '=':
      return (value) => value === bound;
    case '!=':
      return (value) => value !== bound;
  }
}

/** Tests each dictionary entry once, then only looks codes up. */
function textTest(column: Column, holds: (folded: string) => boolean): CellTest {
  const passes = column.folded.map(holds);
  return (cell) => cell.codes.some((code) => passes[code] === true);
}

function toNumber(value: string): number | undefined {
  if (!/^[+-]?(\d+(\.\d*)?|\.\d+)(e[+-]?\d+)?$/i.test(value)) return undefined;
  const number = Number(value);
  return Number.isFinite(number) ? number : undefined;
}
