import { describe, expect, it } from 'vitest';
import { formatText, type FormatOptions } from '../../../../search/engine/highlight.ts';
import { updateSearchIndex } from '../../../../search/engine/index-builder.ts';
import { buildQueryGraph } from '../../../../search/engine/query-graph.ts';
import { parseQuery } from '../../../../search/engine/query-parse.ts';
import { createSearchIndex } from '../../../../search/engine/search-index.ts';
import { defaultSettings } from '../../../../search/engine/settings.ts';
import { createTextMatcher } from '../../../../search/engine/text-matcher.ts';

const TEXT =
  'We fired slowly all day. The Éclair kiln stalled at last, so we packed the lid with a wet blanket and waited.';

async function format(text: string, query: string, options: FormatOptions): Promise<string> {
  const index = createSearchIndex(defaultSettings());
  await updateSearchIndex(index, [['1', { text: TEXT }]], []);
  const { units } = parseQuery(query, index.tokenise, index.stopWords);
  const matcher = createTextMatcher(buildQueryGraph(index, units), index.tokenise, (word) =>
    index.vocabulary.numberOf.has(word),
  );
  return formatText(text, matcher, options);
}

const tags = { highlight: { preTag: '<', postTag: '>' }, crop: null };

describe('formatText', () => {
  it('marks words with their accents, typos as a whole and beginnings as far as typed', async () => {
    expect(await format(TEXT, 'eclair staled wai', tags)).toContain('<Éclair> kiln <stalled>');
    expect(await format(TEXT, 'eclair staled wai', tags)).toContain('<wai>ted');
  });

  it('marks misspellings also in texts that are not indexed', async () => {
    expect(await format('Stallled again', 'stalled ', tags)).toBe('<Stallled> again');
  });

  it('marks a phrase only where it stands as a whole', async () => {
    expect(await format('wet kiln, wet blanket', '"wet blanket"', tags)).toBe(
      'wet kiln, <wet blanket>',
    );
  });

  it('cuts around the stretch with most of the query, with markers only where it cut', async () => {
    const crop = { length: 4, marker: '…' };
    expect(await format(TEXT, 'wet blanket', { highlight: null, crop })).toBe(
      '…a wet blanket and…',
    );
    expect(await format(TEXT, 'fired', { highlight: null, crop })).toBe('We fired slowly all…');
    expect(await format('short text', 'fired', { highlight: null, crop })).toBe('short text');
    expect(await format(TEXT, 'waited', { ...tags, crop })).toBe('…wet blanket and <waited>.');
  });
});
