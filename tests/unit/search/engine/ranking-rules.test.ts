import { describe, expect, it } from 'vitest';
import { updateSearchIndex } from '../../../../search/engine/index-builder.ts';
import type { JsonObject } from '../../../../search/engine/json.ts';
import { parseQuery } from '../../../../search/engine/query-parse.ts';
import { effectiveRules } from '../../../../search/engine/ranking-rules.ts';
import { createSearchIndex } from '../../../../search/engine/search-index.ts';
import { readSearchRequest } from '../../../../search/engine/search-request.ts';
import { search } from '../../../../search/engine/search.ts';
import { patchSettings } from '../../../../search/engine/settings-patch.ts';
import { defaultSettings } from '../../../../search/engine/settings.ts';
import { createTokeniser } from '../../../../search/engine/tokenise.ts';

async function order(
  documents: JsonObject[],
  q: string,
  settings: JsonObject = {},
  request: JsonObject = {},
): Promise<unknown[]> {
  const index = createSearchIndex(patchSettings(defaultSettings(), settings));
  await updateSearchIndex(
    index,
    documents.map((document, at) => [String(at), document]),
    [],
  );
  const { hits } = search(index, 'test', readSearchRequest({ q, ...request }));
  return (hits as JsonObject[]).map((hit) => hit['id']);
}

const FIELDS = { searchableAttributes: ['title', 'body'] };

describe('ranking rules in order', () => {
  it('ranks more matched words before fewer typos', async () => {
    const documents = [
      { id: 'one exact', title: 'burner' },
      { id: 'two with a typo', title: 'burnor lowering' },
    ];
    expect(await order(documents, 'burner lowering', FIELDS)).toEqual([
      'two with a typo',
      'one exact',
    ]);
  });

  it('ranks fewer typos before nearness', async () => {
    const documents = [
      { id: 'near, typo', title: 'blanket burnor' },
      { id: 'far, exact', title: 'blanket of the old and wet sort on a burner' },
    ];
    expect(await order(documents, 'blanket burner', FIELDS)).toEqual(['far, exact', 'near, typo']);
  });

  it('ranks nearness before the attribute, and the right order of words before the reverse', async () => {
    const documents = [
      { id: 'scattered title', title: 'wet weather and a cold old blanket', body: 'x' },
      { id: 'reversed', title: 'x', body: 'blanket wet' },
      { id: 'near body', title: 'x', body: 'a wet blanket' },
    ];
    expect(await order(documents, 'wet blanket', FIELDS)).toEqual([
      'near body',
      'reversed',
      'scattered title',
    ]);
  });

  it('ranks earlier attributes before positions, and positions before exactness', async () => {
    const documents = [
      { id: 'body', title: 'x', body: 'kiln' },
      { id: 'late title', title: 'x y z kiln' },
      { id: 'early title', title: 'x kiln' },
      { id: 'prefix first', title: 'kilns' },
    ];
    expect(await order(documents, 'kiln', FIELDS)).toEqual([
      'prefix first',
      'early title',
      'late title',
      'body',
    ]);
  });

  it('ranks a whole attribute before one that begins with the query, and words before prefixes', async () => {
    const documents = [
      { id: 'prefix', title: 'wet kilns' },
      { id: 'begins', title: 'wet kiln here' },
      { id: 'whole', title: 'wet kiln' },
    ];
    expect(await order(documents, 'wet kiln', FIELDS)).toEqual(['whole', 'begins', 'prefix']);
  });

  it('ranks the word itself before its synonym', async () => {
    const documents = [
      { id: 'synonym', title: 'propane' },
      { id: 'itself', title: 'fuel' },
    ];
    const settings = { ...FIELDS, synonyms: { fuel: ['propane'] } };
    expect(await order(documents, 'fuel', settings)).toEqual(['itself', 'synonym']);
  });

  it('lets a request’s sort break ties only, unless it comes first in the rules', async () => {
    const documents = [
      { id: 'better', title: 'wet blanket', date: 1 },
      { id: 'newer', title: 'wet old blanket', date: 2 },
    ];
    const settings = { ...FIELDS, sortableAttributes: ['date'] };
    const newest = { sort: ['date:desc'] };
    expect(await order(documents, 'wet blanket', settings, newest)).toEqual(['better', 'newer']);
    const first = { ...settings, rankingRules: ['sort', 'words', 'typo', 'proximity'] };
    expect(await order(documents, 'wet blanket', first, newest)).toEqual(['newer', 'better']);
  });

  it('sorts by a custom rule with lacking values last', async () => {
    const documents = [
      { id: 'none', title: 'kiln' },
      { id: 'few', title: 'kiln', votes: 1 },
      { id: 'many', title: 'kiln', votes: 10 },
    ];
    const settings = { ...FIELDS, rankingRules: ['votes:desc'] };
    expect(await order(documents, 'kiln', settings)).toEqual(['many', 'few', 'none']);
    expect(await order(documents, '', settings)).toEqual(['many', 'few', 'none']);
  });

  it('finds the nearest pair among many occurrences', async () => {
    const filler = 'kiln x x x x x x x x x '.repeat(30);
    const documents = [
      { id: 'never near', title: `${filler} sag`, body: '' },
      { id: 'near once', title: `${filler} kiln sag ${filler}`, body: '' },
    ];
    expect(await order(documents, 'kiln sag', FIELDS)).toEqual(['near once', 'never near']);
  });
});

describe('effectiveRules', () => {
  it('puts words before the first rule that looks at words', () => {
    const kinds = (rules: Parameters<typeof effectiveRules>[0]): string[] =>
      effectiveRules(rules).map((rule) => rule.kind);
    expect(kinds([{ kind: 'sort' }, { kind: 'typo' }])).toEqual(['sort', 'words', 'typo']);
    expect(kinds([{ kind: 'exactness' }, { kind: 'words' }])).toEqual(['words', 'exactness']);
    expect(kinds([{ kind: 'words' }, { kind: 'sort' }, { kind: 'typo' }])).toEqual([
      'words',
      'sort',
      'typo',
    ]);
  });
});

describe('attributes', () => {
  const documents = [
    { id: 'title', title: 'glaze', body: 'x' },
    { id: 'body', title: 'x', body: 'glaze' },
    { id: 'typo', title: 'x', body: 'glase' },
  ];

  it('searches only where the request says', async () => {
    expect(await order(documents, 'glaze', FIELDS, { attributesToSearchOn: ['body'] })).toEqual([
      'body',
      'typo',
    ]);
  });

  it('tolerates no typos in attributes where that is switched off', async () => {
    const settings = { ...FIELDS, typoTolerance: { disableOnAttributes: ['body'] } };
    expect(await order(documents, 'glaze', settings)).toEqual(['title', 'body']);
  });
});

describe('parseQuery', () => {
  const tokenise = createTokeniser({ separatorTokens: [], nonSeparatorTokens: [], dictionary: [] });
  const parse = (text: string): ReturnType<typeof parseQuery> =>
    parseQuery(text, tokenise, new Set(['the', 'of']));

  it('takes the last word as a beginning unless something follows it', () => {
    expect(parse('wet bla').units.at(-1)).toEqual({ kind: 'word', word: 'bla', isPrefix: true });
    expect(parse('wet bla ').units.at(-1)).toMatchObject({ isPrefix: false });
    expect(parse('bla "x"').units[0]).toMatchObject({ isPrefix: false });
  });

  it('reads phrases, open ones to the end, with a gap for a stop word', () => {
    expect(parse('"top of the kiln').units).toEqual([
      { kind: 'phrase', words: ['top', null, null, 'kiln'] },
    ]);
  });

  it('reads a minus only before a word', () => {
    expect(parse('re-fire -sag -"wet clay" - x')).toMatchObject({
      excluded: [['sag'], ['wet', 'clay']],
      units: [{ word: 're' }, { word: 'fire' }, { word: 'x' }],
    });
  });

  it('answers no units for stop words alone, and ten at the most', () => {
    expect(parse('the of').units).toEqual([]);
    expect(parse('a b c d e f g h i j k l').units).toHaveLength(10);
  });
});
