import { ALIKE, SPELLINGS } from '#shared/question/spellings.ts';
import { EMPTY_WORDS } from '#shared/question/word-classes.ts';
import type { NoteDocument } from './note-document.ts';

type Field = keyof NoteDocument;

/** In this order a hit in the earlier field is the better hit. */
const searchableAttributes: Field[] = [
  'title',
  'inShort',
  'troubleWords',
  'causeWords',
  'glazeNames',
  'clays',
  'pieceRemarks',
  'story',
  'kilnName',
  'authorName',
];

const filterableAttributes: Field[] = [
  'troubles',
  'measuredTroubles',
  'namedTroubles',
  'changes',
  'nextChanges',
  'outcome',
  'forms',
  'clays',
  'glazes',
  'causes',
  'fuel',
  'kilnSize',
  'stallC',
  'sagC',
  'eventC',
  'peakC',
  'aimC',
  'minutesToPeak',
  'holdMinutes',
  'crossingRatePerMin',
  'cracks',
  'widestCm',
  'wind',
  'weather',
  'firedOn',
  'publishedAt',
  'noteId',
];

const sortableAttributes: Field[] = ['outcome', 'firedOn', 'publishedAt', 'peakC', 'noteId'];

/** Every word of a group stands for every other: the engine's synonyms are neither mutual nor transitive. */
export function mutualSynonyms(groups: readonly (readonly string[])[]): Record<string, string[]> {
  const synonyms = new Map<string, Set<string>>();
  for (const group of groups) {
    for (const word of group) {
      const others = synonyms.get(word) ?? new Set<string>();
      group.filter((other) => other !== word).forEach((other) => others.add(other));
      synonyms.set(word, others);
    }
  }
  return Object.fromEntries([...synonyms].map(([word, others]) => [word, [...others]]));
}

const stopWords: ReadonlySet<string> = new Set(EMPTY_WORDS);
/** Spellings made only of stop words or negations help no search ("will not"). */
const groups = [
  ...Object.entries(SPELLINGS).map(([main, others]) => [main, ...others]),
  ...ALIKE,
].filter((group) => group.every((word) => !stopWords.has(word) && !word.includes(' not')));

/**
 * Settings of the index of notes. Ranking rules are written out, in the one form both the older and
 * the newer engine generation accept ("attribute" stands for attribute rank and word position).
 */
export const NOTE_INDEX_SETTINGS = {
  searchableAttributes,
  filterableAttributes,
  sortableAttributes,
  displayedAttributes: ['*'],
  rankingRules: [
    'words',
    'typo',
    'proximity',
    'attribute',
    'sort',
    'exactness',
    'outcome:desc',
    'firedOn:desc',
  ],
  // "no", "not", "up", "down", "over", "under", "off" and "out" carry the meaning in this trade.
  stopWords: [...EMPTY_WORDS].sort(),
  synonyms: mutualSynonyms(groups),
  typoTolerance: {
    enabled: true,
    minWordSizeForTypos: { oneTypo: 5, twoTypos: 9 },
    disableOnWords: [],
    disableOnAttributes: [],
    // 700 is not 750.
    disableOnNumbers: true,
  },
  faceting: { maxValuesPerFacet: 100, sortFacetValuesBy: { '*': 'count' as const } },
  pagination: { maxTotalHits: 1000 },
};
