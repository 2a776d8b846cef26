import { EngineError } from './errors.ts';
import { describeJson, isJsonObject, isStringArray, type Json, type JsonObject } from './json.ts';
import { checkRankingRules } from './ranking-rule-names.ts';
import { defaultSettings, type SettingName, type Settings } from './settings.ts';

function codeOf(name: SettingName): string {
  return `invalid_settings_${name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`)}`;
}

function invalid(name: SettingName, expected: string, value: Json, path = ''): EngineError {
  return new EngineError(
    codeOf(name),
    `Invalid value type at \`.${name}${path}\`: expected ${expected}, but found ${describeJson(value)}: \`${JSON.stringify(value).slice(0, 200)}\``,
  );
}

function strings(name: SettingName, value: Json): string[] {
  if (!isStringArray(value)) throw invalid(name, 'an array of strings', value);
  return value;
}

const unique = (values: readonly string[]): string[] => [...new Set(values)];
const sortedSet = (values: readonly string[]): string[] => unique(values).sort();

function nonNegativeInteger(name: SettingName, value: Json, path: string): number {
  if (typeof value !== 'number' || !Number.isSafeInteger(value) || value < 0) {
    throw invalid(name, 'a positive integer', value, path);
  }
  return value;
}

function boolean(name: SettingName, value: Json, path = ''): boolean {
  if (typeof value !== 'boolean') throw invalid(name, 'a boolean', value, path);
  return value;
}

function object(name: SettingName, value: Json, keys: readonly string[], path = ''): JsonObject {
  if (!isJsonObject(value)) throw invalid(name, 'an object', value, path);
  for (const key of Object.keys(value)) {
    if (!keys.includes(key)) {
      throw new EngineError(
        codeOf(name),
        `Unknown field \`${key}\` inside \`.${name}${path}\`: expected one of ${keys.map((known) => `\`${known}\``).join(', ')}`,
      );
    }
  }
  return value;
}

function filterableAttributes(value: Json): Settings['filterableAttributes'] {
  if (!Array.isArray(value)) throw invalid('filterableAttributes', 'an array', value);
  const name = 'filterableAttributes';
  const plain: string[] = [];
  const rules: Settings['filterableAttributes'] = [];
  for (const item of value) {
    if (typeof item === 'string') {
      plain.push(item);
      continue;
    }
    const rule = object(name, item, ['attributePatterns', 'features']);
    const features = object(name, rule['features'] ?? {}, ['facetSearch', 'filter'], '.features');
    const filter = object(name, features['filter'] ?? {}, ['equality', 'comparison'], '.filter');
    rules.push({
      attributePatterns: strings(name, rule['attributePatterns'] ?? null),
      features: {
        facetSearch: boolean(name, features['facetSearch'] ?? false, '.facetSearch'),
        filter: {
          equality: boolean(name, filter['equality'] ?? true, '.equality'),
          comparison: boolean(name, filter['comparison'] ?? false, '.comparison'),
        },
      },
    });
  }
  return [...sortedSet(plain), ...rules];
}

function synonyms(value: Json): Record<string, string[]> {
  if (!isJsonObject(value)) throw invalid('synonyms', 'an object', value);
  const entries = Object.entries(value).map(([key, list]): [string, string[]] => [
    key,
    unique(strings('synonyms', list)),
  ]);
  return Object.fromEntries(entries.sort(([a], [b]) => (a < b ? -1 : 1)));
}

function typoTolerance(value: Json, before: Settings['typoTolerance']): Settings['typoTolerance'] {
  const name = 'typoTolerance';
  const defaults = defaultSettings().typoTolerance;
  const patch = object(name, value, Object.keys(defaults));
  const sizes = object(
    name,
    patch['minWordSizeForTypos'] ?? {},
    ['oneTypo', 'twoTypos'],
    '.minWordSizeForTypos',
  );
  const pick = <T>(key: string, current: T, fallback: T, read: (found: Json) => T): T => {
    const found = patch[key];
    return found === undefined ? current : found === null ? fallback : read(found);
  };
  const size = (key: 'oneTypo' | 'twoTypos'): number => {
    const found = sizes[key];
    if (patch['minWordSizeForTypos'] === null || found === null) {
      return defaults.minWordSizeForTypos[key];
    }
    if (found === undefined) return before.minWordSizeForTypos[key];
    const length = nonNegativeInteger(name, found, `.minWordSizeForTypos.${key}`);
    if (length > 255) throw invalid(name, 'an integer up to 255', found, `.${key}`);
    return length;
  };
  const minWordSizeForTypos = { oneTypo: size('oneTypo'), twoTypos: size('twoTypos') };
  if (minWordSizeForTypos.oneTypo > minWordSizeForTypos.twoTypos) {
    throw new EngineError(
      'invalid_settings_typo_tolerance',
      '`minWordSizeForTypos` setting is invalid. `oneTypo` and `twoTypos` fields should be between `0` and `255`, and `twoTypos` should be greater or equals to `oneTypo`.',
    );
  }
  return {
    enabled: pick('enabled', before.enabled, defaults.enabled, (found) => boolean(name, found)),
    minWordSizeForTypos,
    disableOnWords: pick('disableOnWords', before.disableOnWords, [], (found) =>
      sortedSet(strings(name, found)),
    ),
    disableOnAttributes: pick('disableOnAttributes', before.disableOnAttributes, [], (found) =>
      sortedSet(strings(name, found)),
    ),
    disableOnNumbers: pick('disableOnNumbers', before.disableOnNumbers, false, (found) =>
      boolean(name, found),
    ),
  };
}

function faceting(value: Json, before: Settings['faceting']): Settings['faceting'] {
  const name = 'faceting';
  const patch = object(name, value, ['maxValuesPerFacet', 'sortFacetValuesBy']);
  const defaults = defaultSettings().faceting;
  const result = { ...before };
  const most = patch['maxValuesPerFacet'];
  if (most === null) result.maxValuesPerFacet = defaults.maxValuesPerFacet;
  else if (most !== undefined) {
    result.maxValuesPerFacet = nonNegativeInteger(name, most, '.maxValuesPerFacet');
  }
  const order = patch['sortFacetValuesBy'];
  if (order === null) result.sortFacetValuesBy = defaults.sortFacetValuesBy;
  else if (order !== undefined) {
    if (!isJsonObject(order)) throw invalid(name, 'an object', order, '.sortFacetValuesBy');
    const merged = { ...before.sortFacetValuesBy };
    for (const [key, kind] of Object.entries(order)) {
      if (kind !== 'alpha' && kind !== 'count') {
        throw invalid(name, '`alpha` or `count`', kind, `.sortFacetValuesBy.${key}`);
      }
      merged[key] = kind;
    }
    result.sortFacetValuesBy = merged;
  }
  return result;
}

function oneOf<T extends string>(name: SettingName, value: Json, allowed: readonly T[]): T {
  const found = allowed.find((candidate) => candidate === value);
  if (found === undefined) {
    throw invalid(name, `one of ${allowed.map((each) => `\`${each}\``).join(', ')}`, value);
  }
  return found;
}

type Reader<K extends SettingName> = (value: Json, before: Settings) => Settings[K];

const READERS: { [K in SettingName]: Reader<K> } = {
  displayedAttributes: (value) => unique(strings('displayedAttributes', value)),
  searchableAttributes: (value) => unique(strings('searchableAttributes', value)),
  filterableAttributes,
  sortableAttributes: (value) => sortedSet(strings('sortableAttributes', value)),
  rankingRules: (value) => checkRankingRules(strings('rankingRules', value)),
  stopWords: (value) => sortedSet(strings('stopWords', value)),
  nonSeparatorTokens: (value) => sortedSet(strings('nonSeparatorTokens', value)),
  separatorTokens: (value) => sortedSet(strings('separatorTokens', value)),
  dictionary: (value) => sortedSet(strings('dictionary', value)),
  synonyms,
  distinctAttribute: (value) => {
    if (typeof value !== 'string') throw invalid('distinctAttribute', 'a string', value);
    return value;
  },
  proximityPrecision: (value) => oneOf('proximityPrecision', value, ['byWord', 'byAttribute']),
  typoTolerance: (value, before) => typoTolerance(value, before.typoTolerance),
  faceting: (value, before) => faceting(value, before.faceting),
  pagination: (value, before) => {
    const most = object('pagination', value, ['maxTotalHits'])['maxTotalHits'];
    if (most === undefined) return before.pagination;
    if (most === null) return defaultSettings().pagination;
    return { maxTotalHits: nonNegativeInteger('pagination', most, '.maxTotalHits') };
  },
  embedders: (value) => object('embedders', value, []),
  searchCutoffMs: (value) => nonNegativeInteger('searchCutoffMs', value, ''),
  localizedAttributes: (value) => {
    if (!Array.isArray(value)) throw invalid('localizedAttributes', 'an array', value);
    return value;
  },
  facetSearch: (value) => boolean('facetSearch', value),
  prefixSearch: (value) => oneOf('prefixSearch', value, ['indexingTime', 'disabled']),
};

export function isSettingName(name: string): name is SettingName {
  return Object.hasOwn(READERS, name);
}

function applyOne<K extends SettingName>(target: Settings, name: K, value: Json): void {
  target[name] = value === null ? defaultSettings()[name] : READERS[name](value, target);
}

/**
 * Settings after a patch: absent keys stay, `null` restores a default. Throws an EngineError naming
 * the setting when a value has the wrong shape.
 */
export function patchSettings(before: Settings, patch: Json): Settings {
  if (!isJsonObject(patch)) {
    throw new EngineError(
      'bad_request',
      `Invalid value type: expected an object, but found ${describeJson(patch)}`,
    );
  }
  const after = { ...before };
  for (const [name, value] of Object.entries(patch)) {
    if (!isSettingName(name)) {
      throw new EngineError(
        'bad_request',
        `Unknown field \`${name}\`: expected one of ${Object.keys(READERS)
          .map((known) => `\`${known}\``)
          .join(', ')}`,
      );
    }
    applyOne(after, name, value);
  }
  return after;
}
