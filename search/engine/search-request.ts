import { EngineError } from './errors.ts';
import { describeJson, isStringArray, type Json, type JsonObject } from './json.ts';
import type { MatchingStrategy } from './matching.ts';

/** A search as asked for, with defaults filled in. `page` is null for offset and limit. */
export type SearchRequest = {
  q: string | null;
  offset: number;
  limit: number;
  page: number | null;
  hitsPerPage: number | null;
  filter: Json;
  facets: string[] | null;
  sort: string[];
  distinct: string | null;
  attributesToRetrieve: string[];
  attributesToHighlight: string[];
  attributesToCrop: string[];
  attributesToSearchOn: string[] | null;
  cropLength: number;
  cropMarker: string;
  highlightPreTag: string;
  highlightPostTag: string;
  showMatchesPosition: boolean;
  showRankingScore: boolean;
  showRankingScoreDetails: boolean;
  rankingScoreThreshold: number | null;
  matchingStrategy: MatchingStrategy;
};

/** Accepted so that clients may send them; they change nothing here. */
const WITHOUT_EFFECT = [
  'locales',
  'retrieveVectors',
  'showPerformanceDetails',
  'exhaustiveFacetCount',
];
const UNSUPPORTED = ['hybrid', 'vector', 'media', 'personalize'];

function snake(name: string): string {
  return name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);
}

export function invalidParameter(name: string, expected: string, found: Json): EngineError {
  return new EngineError(
    `invalid_search_${snake(name)}`,
    `Invalid value type at \`.${name}\`: expected ${expected}, but found ${describeJson(found)}: \`${(JSON.stringify(found) ?? '').slice(0, 200)}\``,
  );
}

/** Reads one search out of a JSON body. Unknown and badly typed fields are refused by name. */
export function readSearchRequest(
  body: JsonObject,
  alsoKnown: readonly string[] = [],
): SearchRequest {
  const known = new Set<string>([...alsoKnown, ...WITHOUT_EFFECT]);
  const value = (name: string): Json => {
    known.add(name);
    return body[name] ?? null;
  };
  const text = (name: string, fallback: string): string => {
    const found = value(name);
    if (found === null) return fallback;
    if (typeof found !== 'string') throw invalidParameter(name, 'a string', found);
    return found;
  };
  const optionalText = (name: string): string | null => {
    const found = value(name);
    if (found !== null && typeof found !== 'string')
      throw invalidParameter(name, 'a string', found);
    return found;
  };
  const count = (name: string): number | null => {
    const found = value(name);
    if (found === null) return null;
    if (typeof found !== 'number' || !Number.isSafeInteger(found) || found < 0) {
      throw invalidParameter(name, 'a positive integer', found);
    }
    return found;
  };
  const flag = (name: string): boolean => {
    const found = value(name);
    if (found === null) return false;
    if (typeof found !== 'boolean') throw invalidParameter(name, 'a boolean', found);
    return found;
  };
  const list = (name: string): string[] | null => {
    const found = value(name);
    if (found === null) return null;
    if (!isStringArray(found)) throw invalidParameter(name, 'an array of strings', found);
    return found;
  };

  const request: SearchRequest = {
    q: optionalText('q'),
    offset: count('offset') ?? 0,
    limit: count('limit') ?? 20,
    page: count('page'),
    hitsPerPage: count('hitsPerPage'),
    filter: value('filter'),
    facets: list('facets'),
    sort: list('sort') ?? [],
    distinct: optionalText('distinct'),
    attributesToRetrieve: list('attributesToRetrieve') ?? ['*'],
    attributesToHighlight: list('attributesToHighlight') ?? [],
    attributesToCrop: list('attributesToCrop') ?? [],
    attributesToSearchOn: list('attributesToSearchOn'),
    cropLength: count('cropLength') ?? 10,
    cropMarker: text('cropMarker', '…'),
    highlightPreTag: text('highlightPreTag', '<em>'),
    highlightPostTag: text('highlightPostTag', '</em>'),
    showMatchesPosition: flag('showMatchesPosition'),
    showRankingScore: flag('showRankingScore'),
    showRankingScoreDetails: flag('showRankingScoreDetails'),
    rankingScoreThreshold: readThreshold(value('rankingScoreThreshold')),
    matchingStrategy: readStrategy(value('matchingStrategy')),
  };
  for (const name of Object.keys(body)) {
    if (UNSUPPORTED.includes(name) && body[name] !== null) {
      throw new EngineError(
        `invalid_search_${snake(name)}`,
        `\`.${name}\` is not supported by this engine.`,
      );
    }
    if (!known.has(name) && !UNSUPPORTED.includes(name)) {
      throw new EngineError(
        'bad_request',
        `Unknown field \`${name}\`: expected one of ${[...known].map((each) => `\`${each}\``).join(', ')}`,
      );
    }
  }
  return request;
}

function readThreshold(found: Json): number | null {
  if (found === null) return null;
  if (typeof found !== 'number' || found < 0 || found > 1) {
    throw invalidParameter('rankingScoreThreshold', 'a number between `0.0` and `1.0`', found);
  }
  return found;
}

function readStrategy(found: Json): MatchingStrategy {
  if (found === null) return 'last';
  if (found === 'last' || found === 'all' || found === 'frequency') return found;
  throw invalidParameter('matchingStrategy', 'one of `last`, `all`, `frequency`', found);
}

const LISTS = [
  'facets',
  'sort',
  'attributesToRetrieve',
  'attributesToHighlight',
  'attributesToCrop',
  'attributesToSearchOn',
  'locales',
];
const NUMBERS = ['offset', 'limit', 'page', 'hitsPerPage', 'cropLength', 'rankingScoreThreshold'];
const FLAGS = [
  'showMatchesPosition',
  'showRankingScore',
  'showRankingScoreDetails',
  'showPerformanceDetails',
  'retrieveVectors',
];

/** The same search written as a query string: lists by comma, numbers and flags as text. */
export function searchBodyFromQuery(query: URLSearchParams): JsonObject {
  const entries = [...query].map(([name, text]): [string, Json] => {
    if (LISTS.includes(name)) return [name, text === '' ? [] : text.split(',')];
    if (NUMBERS.includes(name)) {
      return [name, /^-?\d+(\.\d+)?$/.test(text) ? Number(text) : text];
    }
    if (FLAGS.includes(name))
      return [name, text === 'true' ? true : text === 'false' ? false : text];
    if (name === 'filter') return [name, filterFromText(text)];
    return [name, text];
  });
  return Object.fromEntries(entries);
}

/** In a query string a filter may be an expression or a JSON list of them. */
function filterFromText(text: string): Json {
  if (!text.trimStart().startsWith('[')) return text;
  try {
    return JSON.parse(text) as Json;
  } catch {
    return text;
  }
}
