import { isJsonObject, type Json, type JsonObject } from './json.ts';

export type Scalar = string | number | boolean;

/** What a document holds under one dotted name. */
export type FieldContent = {
  values: Scalar[];
  isNull: boolean;
  /** `""`, `[]` or `{}`; never null. */
  isEmpty: boolean;
};

/** Deeper nesting is ignored, so that no document can exhaust the stack. */
const MAX_DEPTH = 60;

function contentOf(fields: Map<string, FieldContent>, name: string): FieldContent {
  let content = fields.get(name);
  if (content === undefined) {
    content = { values: [], isNull: false, isEmpty: false };
    fields.set(name, content);
  }
  return content;
}

function collect(
  fields: Map<string, FieldContent>,
  name: string,
  value: Json,
  depth: number,
  inList: boolean,
): void {
  if (depth > MAX_DEPTH) return;
  const content = contentOf(fields, name);
  if (Array.isArray(value)) {
    if (value.length === 0 && !inList) content.isEmpty = true;
    for (const item of value) collect(fields, name, item, depth + 1, true);
  } else if (isJsonObject(value)) {
    const keys = Object.keys(value);
    if (keys.length === 0 && !inList) content.isEmpty = true;
    for (const key of keys) {
      collect(fields, `${name}.${key}`, value[key] ?? null, depth + 1, false);
    }
  } else if (value === null) {
    if (!inList) content.isNull = true;
  } else {
    if (value === '' && !inList) content.isEmpty = true;
    content.values.push(value);
  }
}

/** All dotted names of a document with their values, objects inside lists merged per key. */
export function flattenDocument(document: JsonObject): Map<string, FieldContent> {
  const fields = new Map<string, FieldContent>();
  for (const [key, value] of Object.entries(document)) collect(fields, key, value, 0, false);
  return fields;
}

/** Whether a dotted name is an attribute itself or lies inside it: `a.b` belongs to `a`. */
export function isWithin(name: string, attribute: string): boolean {
  return name === attribute || name.startsWith(`${attribute}.`);
}

/** The same with patterns: `*`, `note_*` or a plain attribute name. */
export function matchesPattern(name: string, pattern: string): boolean {
  if (pattern === '*') return true;
  if (pattern.endsWith('*') && name.startsWith(pattern.slice(0, -1))) return true;
  return isWithin(name, pattern);
}
