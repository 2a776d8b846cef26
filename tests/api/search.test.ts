import { describe, expect, vi } from 'vitest';
import { suggestAnswerSchema, type FindAnswer } from '#shared/api/search.ts';
import { NOTES_INDEX } from '../../search/note-document.ts';
import { searchingClient } from '../../server/search/search-client.ts';
import { aSmallNotebook, test } from '../support/search.ts';

vi.setConfig({ testTimeout: 90_000 });

const titles = (answer: FindAnswer): string[] => answer.hits.map(({ note }) => note.title);
const titlesOf = (answer: FindAnswer, tier: string): string[] =>
  answer.hits.filter((hit) => hit.tier === tier).map(({ note }) => note.title);

describe('a question', () => {
  test('finds what is near it: stalls by their level in either unit, cracks by the form', async ({
    searchApi: api,
  }) => {
    await aSmallNotebook(api);
    // Before there is an index, MariaDB answers.
    const early = await api.find('');
    expect([early.plain, early.total]).toEqual([true, 6]);
    await api.catchUp();
    const seven = await api.find('stalled at 700 °C');
    expect(seven.plain).toBe(false);
    expect(titlesOf(seven, 'close')).toEqual(['Stuck near seven hundred']);
    expect(titles(seven)[0]).toBe('Stuck near seven hundred');
    expect(titlesOf(seven, 'same-trouble').sort()).toEqual([
      'Stuck far higher',
      'Stuck in the fog',
    ]);
    // 1300 °F is 704 °C.
    const fahrenheit = await api.find('stuck at 1300F');
    expect(titles(fahrenheit)).toEqual(titles(seven));
    const plate = await api.find('cracked flat plate');
    expect(titles(plate)[0]).toBe('The great plate broke');
    expect(titlesOf(plate, 'close')).toEqual(['The great plate broke']);
    const words = await api.find('heron');
    expect(titles(words)).toEqual(['All went well']);
    expect(words.hits[0]?.passage).toContainEqual({ text: 'heron', hit: true });
  });

  test('can be taken apart, narrowed and sorted', async ({ searchApi: api }) => {
    await aSmallNotebook(api);
    await api.catchUp();
    const off = await api.find('stalled at 700 °C', { off: 'temperature' });
    expect(off.parts.map(({ key, off: isOff }) => [key, isOff])).toEqual([
      ['trouble:stall', false],
      ['temperature', true],
    ]);
    expect(titlesOf(off, 'close')).toHaveLength(3);
    const nearest = await api.find('stalled at 900 °C', { sort: 'nearest' });
    expect(titles(nearest)[0]).toBe('Stuck far higher');
    const all = await api.find('');
    expect(all.total).toBe(6);
    expect(all.facets['troubles']).toContainEqual({ value: 'stall', count: 3 });
    const ticked = await api.find('', { troubles: 'stall' });
    expect(ticked.total).toBe(3);
    // A facet's other values stay to be seen beside its own ticks.
    expect(ticked.facets['troubles']?.map(({ value }) => value)).toContain('crack-after-draw');
    expect((await api.find('', { troubles: 'stall,crack-after-draw' })).total).toBe(5);
    expect((await api.find('', { troubles: 'stall', forms: 'plate' })).total).toBe(0);
    const nothing = await api.find('plates that exploded in the firing');
    expect(nothing.total).toBe(0);
    expect(nothing.loosen[0]).toMatchObject({ count: 1 });
    const pages = await api.find('', { page: '2' });
    expect([pages.hits.length, pages.page, pages.pages]).toEqual([0, 2, 1]);
  });

  test('with pieces of the engine’s own language in it is only words', async ({
    searchApi: api,
  }) => {
    await aSmallNotebook(api);
    await api.catchUp();
    const filters = [
      'stall" OR noteId > 0 OR "x',
      "stall' OR 1=1",
      'stall) OR (noteId EXISTS',
      'stall] OR troubles IN [stall',
      '\\" OR noteId > 0',
      'NOT stall',
      '_geoRadius(1,1,1)',
      '*',
    ];
    for (const filter of filters) {
      const answer = await api.find('', { troubles: filter });
      expect([filter, answer.plain, answer.total]).toEqual([filter, false, 0]);
    }
    for (const q of [
      '"',
      '-heron',
      'noteId > 0',
      '*',
      '\ue000x\ue001',
      "'; DROP TABLE notes; --",
    ]) {
      expect([q, (await api.find(q)).plain]).toEqual([q, false]);
    }
    const suggested = await api.client().get('/api/suggestions?q=stu');
    const { suggestions } = suggested.as(suggestAnswerSchema);
    expect(suggestions.map(({ text }) => text)).toContain('Stuck in the fog');
    const troubles = (await api.client().get('/api/suggestions?q=stal')).as(suggestAnswerSchema);
    expect(troubles.suggestions).toContainEqual({ kind: 'trouble', text: 'stall', noteId: null });
    // The readers' key can search the one index and nothing else.
    const client = await searchingClient(api.deps.config);
    const index = client.index(NOTES_INDEX);
    for (const forbidden of [
      () => index.addDocuments([{ id: '1' }]),
      () => index.getDocuments(),
      () => client.getIndexes(),
      () => client.getKeys(),
      () => client.index('notes_new').search('x'),
    ]) {
      await expect(Promise.resolve(forbidden())).rejects.toThrow(/API key/i);
    }
  });
});
