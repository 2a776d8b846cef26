import { isWithin } from './flatten.ts';
import { isJsonObject, setMember, type Json, type JsonObject } from './json.ts';

/** Whether a list of attribute names (`*` for all) covers a dotted name. */
export function selects(names: readonly string[], name: string): boolean {
  for (const each of names) if (each === '*' || isWithin(name, each)) return true;
  return false;
}

/** What becomes of a name: the value is kept whole, only what is named inside it, or nothing. */
type Verdict = 'whole' | 'inside' | 'none';

function verdictOn(name: string, lists: readonly (readonly string[])[]): Verdict {
  let verdict: Verdict = 'whole';
  for (const names of lists) {
    if (selects(names, name)) continue;
    if (!names.some((each) => each.startsWith(`${name}.`))) return 'none';
    verdict = 'inside';
  }
  return verdict;
}

export type AttributeSelector = (document: JsonObject) => JsonObject;

/**
 * Makes the function that keeps the part of a document which every list covers; parents of kept
 * names stay. What becomes of a name is found out once and remembered for the next document.
 */
export function createSelector(...lists: readonly (readonly string[])[]): AttributeSelector {
  if (lists.every((names) => names.includes('*'))) return (document) => document;
  const verdicts = new Map<string, Verdict>();
  return (document) => selectFrom(document, '', lists, verdicts);
}

function selectFrom(
  object: JsonObject,
  prefix: string,
  lists: readonly (readonly string[])[],
  verdicts: Map<string, Verdict>,
): JsonObject {
  const kept: JsonObject = {};
  for (const key of Object.keys(object)) {
    const name = prefix === '' ? key : prefix + key;
    let verdict = verdicts.get(name);
    if (verdict === undefined) {
      verdict = verdictOn(name, lists);
      verdicts.set(name, verdict);
    }
    if (verdict === 'none') continue;
    const value = object[key] ?? null;
    if (verdict === 'whole') setMember(kept, key, value);
    else if (isJsonObject(value)) {
      setMember(kept, key, selectFrom(value, `${name}.`, lists, verdicts));
    } else if (Array.isArray(value)) {
      const inside = value
        .filter(isJsonObject)
        .map((item: JsonObject): Json => selectFrom(item, `${name}.`, lists, verdicts));
      setMember(kept, key, inside);
    }
  }
  return kept;
}
