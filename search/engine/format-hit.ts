import { createSelector, selects } from './attribute-selection.ts';
import { formatText, type FormatOptions } from './highlight.ts';
import { isJsonObject, setMember, type Json, type JsonObject } from './json.ts';
import type { SearchRequest } from './search-request.ts';
import type { TextMatcher } from './text-matcher.ts';

export type HitFormatter = (source: JsonObject) => JsonObject;

/**
 * Makes the function that shows a document as the request asks for it, with `_formatted` and
 * `_matchesPosition` where wanted. `matcher` is made only if something has to be marked.
 */
export function createHitFormatter(
  request: SearchRequest,
  displayed: readonly string[],
  matcher: () => TextMatcher,
): HitFormatter {
  const retrieved = createSelector(displayed, request.attributesToRetrieve);
  const crops = parseCrops(request);
  const isFormatted = request.attributesToHighlight.length > 0 || crops.length > 0;
  if (!isFormatted && !request.showMatchesPosition) {
    return (source) => ({ ...retrieved(source) });
  }
  const shown = createSelector(displayed, [
    ...request.attributesToRetrieve,
    ...request.attributesToHighlight,
    ...crops.map((crop) => crop.attribute),
  ]);
  const visible = createSelector(displayed);
  const format: Formatting = { matcher: matcher(), request, crops, optionsOf: new Map() };
  return (source) => {
    const hit: JsonObject = { ...retrieved(source) };
    if (isFormatted) hit['_formatted'] = formatObject(shown(source), '', format);
    if (request.showMatchesPosition) {
      const positions = new Map<string, Json[]>();
      collectPositions(visible(source), '', [], format.matcher, positions);
      hit['_matchesPosition'] = Object.fromEntries(positions);
    }
    return hit;
  };
}

type Crop = { attribute: string; length: number };

type Formatting = {
  matcher: TextMatcher;
  request: SearchRequest;
  crops: readonly Crop[];
  /** By attribute, found out once for all hits. */
  optionsOf: Map<string, FormatOptions>;
};

function parseCrops(request: SearchRequest): Crop[] {
  return request.attributesToCrop.map((entry) => {
    const parts = /^(.+):(\d{1,6})$/.exec(entry);
    return {
      attribute: parts?.[1] ?? entry,
      length: parts?.[2] === undefined ? request.cropLength : Number(parts[2]),
    };
  });
}

function optionsFor(name: string, { request, crops, optionsOf }: Formatting): FormatOptions {
  const known = optionsOf.get(name);
  if (known !== undefined) return known;
  const crop =
    crops.find((each) => each.attribute !== '*' && selects([each.attribute], name)) ??
    crops.find((each) => each.attribute === '*');
  const options: FormatOptions = {
    highlight: selects(request.attributesToHighlight, name)
      ? { preTag: request.highlightPreTag, postTag: request.highlightPostTag }
      : null,
    crop: crop === undefined ? null : { length: crop.length, marker: request.cropMarker },
  };
  optionsOf.set(name, options);
  return options;
}

function formatObject(object: JsonObject, prefix: string, formatting: Formatting): JsonObject {
  const formatted: JsonObject = {};
  for (const key of Object.keys(object)) {
    setMember(formatted, key, formatValue(prefix + key, object[key] ?? null, formatting));
  }
  return formatted;
}

/** Numbers become text; null and booleans stay as they are. */
function formatValue(name: string, value: Json, formatting: Formatting): Json {
  if (typeof value === 'string' || typeof value === 'number') {
    return formatText(String(value), formatting.matcher, optionsFor(name, formatting));
  }
  if (Array.isArray(value)) return value.map((item) => formatValue(name, item, formatting));
  if (isJsonObject(value)) return formatObject(value, `${name}.`, formatting);
  return value;
}

/** Where the query matches, in bytes of UTF-8; `indices` say which element of a list. */
function collectPositions(
  value: Json,
  name: string,
  indices: readonly number[],
  matcher: TextMatcher,
  positions: Map<string, Json[]>,
): void {
  if (typeof value === 'string' || typeof value === 'number') {
    const text = String(value);
    for (const { start, end } of matcher.matchesIn(text, matcher.tokenise(text))) {
      const list = positions.get(name) ?? [];
      list.push({
        start: Buffer.byteLength(text.slice(0, start)),
        length: Buffer.byteLength(text.slice(start, end)),
        ...(indices.length > 0 ? { indices: [...indices] } : {}),
      });
      positions.set(name, list);
    }
  } else if (Array.isArray(value)) {
    for (const [at, item] of value.entries()) {
      collectPositions(item, name, [...indices, at], matcher, positions);
    }
  } else if (isJsonObject(value)) {
    for (const [key, item] of Object.entries(value)) {
      const inner = name === '' ? key : `${name}.${key}`;
      collectPositions(item, inner, indices, matcher, positions);
    }
  }
}
