import { EngineError } from './errors.ts';
import { describeJson, type Json, type JsonObject } from './json.ts';

export type Page = { offset: number; limit: number };

/** Reads a count out of a query string or a body; `code` names the error for anything else. */
export function readCount(value: Json | undefined, name: string, code: string): number | null {
  if (value === undefined || value === null) return null;
  const number = typeof value === 'string' && /^\d+$/.test(value) ? Number(value) : value;
  if (typeof number !== 'number' || !Number.isSafeInteger(number) || number < 0) {
    throw new EngineError(
      code,
      `Invalid value in parameter \`${name}\`: expected a positive integer, but found ${describeJson(value)}`,
    );
  }
  return number;
}

/** `offset` and `limit` of a list route; errors are named after what is listed. */
export function readPage(query: URLSearchParams, listed: 'index' | 'api_key' | 'document'): Page {
  return {
    offset: readCount(query.get('offset'), 'offset', `invalid_${listed}_offset`) ?? 0,
    limit: readCount(query.get('limit'), 'limit', `invalid_${listed}_limit`) ?? 20,
  };
}

export function pageOf<T>(
  items: readonly T[],
  { offset, limit }: Page,
  present: (item: T) => Json,
): JsonObject {
  return {
    results: items.slice(offset, offset + limit).map(present),
    offset,
    limit,
    total: items.length,
  };
}
