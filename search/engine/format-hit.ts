import { selectByNames, selects } from './attribute-selection.ts';
import { formatText, type FormatOptions } from './highlight.ts';
import { isJsonObject, type Json, type JsonObject } from './json.ts';
import type { SearchRequest } from './search-request.ts';
import type { TextMatcher } from './text-matcher.ts';

/** The document as asked for, with `_formatted` and `_matchesPosition` where wanted. */
export function formatHit(
  source: JsonObject,
  request: SearchRequest,
  displayed: readonly string[],
  matcher: TextMatcher,
): JsonObject {
  const hit: JsonObject = { ...selectByNames(source, displayed, request.attributesToRetrieve) };
  const crops = parseCrops(request);
  if (request.attributesToHighlight.length > 0 || crops.length > 0) {
    const shown = [
      ...request.attributesToRetrieve,
      ...request.attributesToHighlight,
      ...crops.map((crop) => crop.attribute),
    ];
    const part = selectByNames(source, displayed, shown);
    hit['_formatted'] = formatObject(part, '', request, crops, matcher);
  }
  if (request.showMatchesPosition) {
    const positions = new Map<string, Json[]>();
    collectPositions(selectByNames(source, displayed), '', [], matcher, positions);
    hit['_matchesPosition'] = Object.fromEntries(positions);
  }
  return hit;
}

type Crop = { attribute: string; length: number };

function parseCrops(request: SearchRequest): Crop[] {
  return request.attributesToCrop.map((entry) => {
    const parts = /^(.+):(\d{1,6})$/.exec(entry);
    return {
      attribute: parts?.[1] ?? entry,
      length: parts?.[2] === undefined ? request.cropLength : Number(parts[2]),
    };
  });
}

function optionsFor(name: string, request: SearchRequest, crops: readonly Crop[]): FormatOptions {
  const crop =
    crops.find((each) => each.attribute !== '*' && selects([each.attribute], name)) ??
    crops.find((each) => each.attribute === '*');
  return {
    highlight: selects(request.attributesToHighlight, name)
      ? { preTag: request.highlightPreTag, postTag: request.highlightPostTag }
      : null,
    crop: crop === undefined ? null : { length: crop.length, marker: request.cropMarker },
  };
}

function formatObject(
  object: JsonObject,
  prefix: string,
  request: SearchRequest,
  crops: readonly Crop[],
  matcher: TextMatcher,
): JsonObject {
  const format = (name: string, value: Json): Json => {
    if (typeof value === 'string' || typeof value === 'number') {
      return formatText(String(value), matcher, optionsFor(name, request, crops));
    }
    if (Array.isArray(value)) return value.map((item) => format(name, item));
    if (isJsonObject(value)) return formatObject(value, `${name}.`, request, crops, matcher);
    return value;
  };
  return Object.fromEntries(
    Object.entries(object).map(([key, value]) => [key, format(prefix + key, value)]),
  );
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
