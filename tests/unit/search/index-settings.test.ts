import { describe, expect, test } from 'vitest';
import { mutualSynonyms, NOTE_INDEX_SETTINGS } from '../../../search/index-settings.ts';
import { kilnSizeOf, noteDocumentSchema } from '../../../search/note-document.ts';

describe('NOTE_INDEX_SETTINGS', () => {
  test('never stops the small words that carry the meaning in this trade', () => {
    for (const word of ['no', 'not', 'up', 'down', 'over', 'under', 'off', 'out']) {
      expect(NOTE_INDEX_SETTINGS.stopWords).not.toContain(word);
    }
  });

  test('names only fields a note document has', () => {
    const fields = Object.keys(noteDocumentSchema.shape);
    const { searchableAttributes, filterableAttributes, sortableAttributes } = NOTE_INDEX_SETTINGS;
    for (const field of [...searchableAttributes, ...filterableAttributes, ...sortableAttributes]) {
      expect(fields).toContain(field);
    }
  });

  test('allows no typo in a number', () => {
    expect(NOTE_INDEX_SETTINGS.typoTolerance.disableOnNumbers).toBe(true);
  });

  test('lists every synonym in both directions', () => {
    const { synonyms } = NOTE_INDEX_SETTINGS;
    for (const [word, others] of Object.entries(synonyms)) {
      expect(others).not.toContain(word);
      for (const other of others) expect(synonyms[other]).toContain(word);
    }
    expect(synonyms['luster']).toContain('lustre');
    expect(synonyms['pull']).toContain('draw');
  });
});

test('mutualSynonyms joins the groups a word stands in', () => {
  expect(
    mutualSynonyms([
      ['a', 'b'],
      ['a', 'c'],
    ]),
  ).toEqual({ a: ['b', 'c'], b: ['a'], c: ['a'] });
});

test('kilnSizeOf parts kilns at 40 and 100 litres', () => {
  expect([null, 39.9, 40, 99.9, 100].map(kilnSizeOf)).toEqual([
    null,
    'small',
    'medium',
    'medium',
    'large',
  ]);
});
