import { EngineError } from './errors.ts';
import { describeJson, type Json, type JsonObject } from './json.ts';

const DOCUMENT_ID = /^[a-zA-Z0-9_-]+$/;
const MAX_ID_BYTES = 511;

/** Field whose value is a document's id when nobody named one: the only one that ends in `id`. */
export function inferPrimaryKey(indexUid: string, first: JsonObject): string {
  const candidates = Object.keys(first).filter((name) => name.toLowerCase().endsWith('id'));
  const [only, other] = candidates;
  if (only === undefined) {
    throw new EngineError(
      'index_primary_key_no_candidate_found',
      `Index \`${indexUid}\`: The primary key inference failed as the engine did not find any field ending with \`id\` in its name. Please specify the primary key manually using the \`primaryKey\` query parameter.`,
    );
  }
  if (other !== undefined) {
    throw new EngineError(
      'index_primary_key_multiple_candidates_found',
      `Index \`${indexUid}\`: The primary key inference failed as the engine found ${candidates.length} fields ending with \`id\` in their names: '${only}' and '${other}'. Please specify the primary key manually using the \`primaryKey\` query parameter.`,
    );
  }
  return only;
}

/** An id as it is stored: integers and text of `a-zA-Z0-9_-`; `1` and `"1"` are the same. */
export function normaliseId(value: Json): string | undefined {
  if (typeof value === 'number') return Number.isSafeInteger(value) ? String(value) : undefined;
  if (typeof value !== 'string') return undefined;
  return DOCUMENT_ID.test(value) && value.length <= MAX_ID_BYTES ? value : undefined;
}

export function idOfDocument(indexUid: string, primaryKey: string, document: JsonObject): string {
  const value = valueAt(document, primaryKey);
  if (value === undefined) {
    throw new EngineError(
      'missing_document_id',
      `Index \`${indexUid}\`: Document doesn't have a \`${primaryKey}\` attribute: \`${JSON.stringify(document).slice(0, 200)}\`.`,
    );
  }
  const id = normaliseId(value);
  if (id === undefined) {
    throw new EngineError(
      'invalid_document_id',
      `Index \`${indexUid}\`: Document identifier \`${JSON.stringify(value).slice(0, 200)}\` (${describeJson(value)}) is invalid. A document identifier can be of type integer or string, only composed of alphanumeric characters (a-z A-Z 0-9), hyphens (-) and underscores (_), and can not be more than 511 bytes.`,
    );
  }
  return id;
}

/** A primary key may be a dotted name. */
function valueAt(document: JsonObject, name: string): Json | undefined {
  if (Object.hasOwn(document, name)) return document[name];
  let current: Json = document;
  for (const part of name.split('.')) {
    if (typeof current !== 'object' || current === null || Array.isArray(current)) return undefined;
    if (!Object.hasOwn(current, part)) return undefined;
    current = current[part] ?? null;
  }
  return current;
}
