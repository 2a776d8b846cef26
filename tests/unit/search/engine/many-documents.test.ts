import { describe, expect, it } from 'vitest';
import { createSelector } from '../../../../search/engine/attribute-selection.ts';
import { updateSearchIndex } from '../../../../search/engine/index-builder.ts';
import type { Json, JsonObject } from '../../../../search/engine/json.ts';
import { createSearchIndex, type SearchIndex } from '../../../../search/engine/search-index.ts';
import { readSearchRequest } from '../../../../search/engine/search-request.ts';
import { search } from '../../../../search/engine/search.ts';
import { patchSettings } from '../../../../search/engine/settings-patch.ts';
import { defaultSettings } from '../../../../search/engine/settings.ts';

const SETTINGS = {
  searchableAttributes: ['title', 'body'],
  filterableAttributes: ['kind', 'peak'],
};

function emptyIndex(settings: JsonObject = SETTINGS): SearchIndex {
  return createSearchIndex(patchSettings(defaultSettings(), settings));
}

const store = (index: SearchIndex, documents: JsonObject[], removed: string[] = []) =>
  updateSearchIndex(
    index,
    documents.map((document) => [JSON.stringify(document['id']), document]),
    removed,
  );

const ask = (index: SearchIndex, request: JsonObject): JsonObject =>
  search(index, 'test', readSearchRequest(request));
const ids = (index: SearchIndex, request: JsonObject): Json[] =>
  (ask(index, request)['hits'] as JsonObject[]).map((hit) => hit['id'] ?? null);

describe('what is kept between searches', () => {
  it('is forgotten with every write: filters, counts, words and synonyms are those of now', async () => {
    const index = emptyIndex();
    const all = { facets: ['kind'], filter: '' };
    await store(index, [{ id: 1, title: 'bowl', kind: 'x', peak: 700 }]);
    expect(ids(index, { q: 'bowls' })).toEqual([1]);
    expect(ids(index, { filter: 'peak > 600' })).toEqual([1]);
    expect(ask(index, all)['facetDistribution']).toEqual({ kind: { x: 1 } });

    await store(index, [{ id: 2, title: 'bowls', kind: 'y', peak: 800 }]);
    expect(ids(index, { q: 'bowls' })).toEqual([2, 1]);
    expect(ids(index, { filter: 'peak > 600' })).toEqual([1, 2]);
    expect(ask(index, all)['facetDistribution']).toEqual({ kind: { x: 1, y: 1 } });

    await store(index, [{ id: 1, title: 'tile', kind: 'z', peak: 500 }], ['2']);
    expect(ids(index, { q: 'bowls' })).toEqual([]);
    expect(ids(index, { filter: 'peak > 600' })).toEqual([]);
    expect(ask(index, all)['facetDistribution']).toEqual({ kind: { z: 1 } });
  });

  it('does not let one search change what the next one finds', async () => {
    const index = emptyIndex();
    await store(index, [
      { id: 1, title: 'bowl', kind: 'x', peak: 700 },
      { id: 2, title: 'bowl', kind: 'y', peak: 800 },
      { id: 3, title: 'tile', kind: 'x', peak: 900 },
    ]);
    for (let round = 0; round < 2; round += 1) {
      expect(ids(index, { filter: 'NOT kind = x' })).toEqual([2]);
      expect(ids(index, { filter: 'kind = x AND peak > 800' })).toEqual([3]);
      expect(ids(index, { filter: 'kind = x OR kind = y' })).toEqual([1, 2, 3]);
      expect(ids(index, { q: 'bowl -tile', filter: 'kind = x' })).toEqual([1]);
      expect(ids(index, { filter: 'kind = x' })).toEqual([1, 3]);
    }
  });
});

describe('more matches than are read word by word', () => {
  const many = Array.from({ length: 3000 }, (_, at): JsonObject => {
    const inTitle = at % 500 === 499;
    return { id: at, title: inTitle ? 'a kiln' : 'a shed', body: inTitle ? 'x' : 'the kiln here' };
  });

  it('puts those with the word in an earlier attribute first, and loses none', async () => {
    const index = emptyIndex();
    await store(index, many);
    const expected = [499, 999, 1499, 1999, 2499, 2999];
    expect(ids(index, { q: 'kiln', limit: 6 })).toEqual(expected);
    const answer = ask(index, { q: 'kiln', limit: 1000 });
    expect(answer['estimatedTotalHits']).toBe(1000);
    const found = (answer['hits'] as JsonObject[]).map((hit) => hit['id']);
    expect(new Set(found).size).toBe(1000);
    expect(found.slice(0, 8)).toEqual([...expected, 0, 1]);
  });

  it('keeps a replaced document where it first came among equals', async () => {
    const index = emptyIndex();
    await store(index, many.slice(0, 5));
    await store(index, [{ id: 1, title: 'a shed', body: 'the kiln here' }]);
    expect(ids(index, { q: 'kiln' })).toEqual([0, 1, 2, 3, 4]);
  });
});

describe('attributes named by a request', () => {
  it('are told from their parts, whichever way they are searched', async () => {
    const index = emptyIndex({ searchableAttributes: ['title', 'place', 'place.name'] });
    await store(index, [
      { id: 1, title: 'yard', place: { name: 'x', road: 'yard' } },
      { id: 2, title: 'x', place: { name: 'yard', road: 'x' } },
    ]);
    expect(ids(index, { q: 'yard', attributesToSearchOn: ['title'] })).toEqual([1]);
    expect(ids(index, { q: 'yard', attributesToSearchOn: ['place.name'] })).toEqual([2]);
    expect(ids(index, { q: 'yard', attributesToSearchOn: ['place'] }).sort()).toEqual([1, 2]);
  });

  it('are cut out of a document by any name, without its prototype', () => {
    const document = JSON.parse(
      '{"a":{"b":1,"c":2},"d":[{"b":3,"e":4}],"__proto__":5}',
    ) as JsonObject;
    expect(createSelector(['*'])(document)).toBe(document);
    expect(createSelector(['a.b', 'd.e'])(document)).toEqual({ a: { b: 1 }, d: [{ e: 4 }] });
    const odd = createSelector(['__proto__'])(document);
    expect([Object.keys(odd), JSON.stringify(odd)]).toEqual([['__proto__'], '{"__proto__":5}']);
    expect(createSelector(['a', 'd'], ['a.c'])(document)).toEqual({ a: { c: 2 } });
  });
});
