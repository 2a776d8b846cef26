import { isWithin } from './flatten.ts';
import { isJsonObject, type Json, type JsonObject } from './json.ts';

/** Whether a list of attribute names (`*` for all) covers a dotted name. */
export function selects(names: readonly string[], name: string): boolean {
  return names.some((each) => each === '*' || isWithin(name, each));
}

/** The part of a document that `isKept` accepts by dotted name; parents of kept names stay. */
export function selectAttributes(
  document: JsonObject,
  isKept: (name: string) => boolean,
  keptInside: (name: string) => boolean,
): JsonObject {
  return Object.fromEntries(selectEntries(document, '', isKept, keptInside));
}

function selectEntries(
  object: JsonObject,
  prefix: string,
  isKept: (name: string) => boolean,
  keptInside: (name: string) => boolean,
): [string, Json][] {
  return Object.entries(object).flatMap(([key, value]): [string, Json][] => {
    const name = prefix + key;
    if (isKept(name)) return [[key, value]];
    if (!keptInside(name)) return [];
    const part = (item: Json): Json =>
      isJsonObject(item)
        ? Object.fromEntries(selectEntries(item, `${name}.`, isKept, keptInside))
        : item;
    if (isJsonObject(value)) return [[key, part(value)]];
    if (Array.isArray(value)) return [[key, value.filter(isJsonObject).map(part)]];
    return [];
  });
}

/** Selection by lists of names: every list must cover a name for it to be kept. */
export function selectByNames(
  document: JsonObject,
  ...lists: readonly (readonly string[])[]
): JsonObject {
  if (lists.every((names) => names.includes('*'))) return document;
  const reachesInside = (names: readonly string[], name: string): boolean =>
    selects(names, name) || names.some((each) => each.startsWith(`${name}.`));
  return selectAttributes(
    document,
    (name) => lists.every((names) => selects(names, name)),
    (name) => lists.every((names) => reachesInside(names, name)),
  );
}
