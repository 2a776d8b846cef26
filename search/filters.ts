import type { Filter } from '#shared/question/search-request.ts';

/**
 * A value in quotes. Inside them only the quote and the backslash mean anything to the engine, so
 * with both escaped no value can end the string and become filter syntax.
 */
export function quoted(value: string): string {
  return `"${value.replaceAll('\\', '\\\\').replaceAll('"', '\\"')}"`;
}

function number(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError('a filter takes finite numbers only');
  return String(value);
}

function list(values: readonly string[]): string {
  return `[${values.map(quoted).join(', ')}]`;
}

/** A filter in the engine's language; the empty string filters nothing. */
export function filterText(filter: Filter | null): string {
  if (filter === null) return '';
  switch (filter.kind) {
    case 'all':
    case 'any': {
      const parts = filter.of.map(filterText).filter((part) => part !== '');
      const joined = parts.join(filter.kind === 'all' ? ' AND ' : ' OR ');
      return parts.length > 1 ? `(${joined})` : joined;
    }
    case 'in':
      return `${filter.field} IN ${list(filter.values)}`;
    case 'not-in':
      return filter.values.length === 0 ? '' : `${filter.field} NOT IN ${list(filter.values)}`;
    case 'between': {
      const { field, min, max } = filter;
      if (min !== null && max !== null) return `${field} ${number(min)} TO ${number(max)}`;
      if (min !== null) return `${field} >= ${number(min)}`;
      return max === null ? '' : `${field} <= ${number(max)}`;
    }
    case 'empty':
      return `${filter.field} IS EMPTY`;
  }
}

/** Two filters that must both hold. */
export function bothFilters(first: Filter | null, second: Filter | null): Filter | null {
  if (first === null) return second;
  return second === null ? first : { kind: 'all', of: [first, second] };
}
