import type { Asked } from '#shared/api/saved-searches.ts';
import { FIND_FACETS, FIND_RANGES } from '#shared/api/search.ts';
import { labelOf } from '#shared/question/part-labels.ts';
import { readQuestion } from '#shared/question/read-question.ts';
import type { Units } from '#shared/units/units.ts';
import { FACET_LABELS, facetWords } from '../find/facet-words.ts';
import { RANGE_LABELS, rangeWords } from '../find/range-words.ts';
import { addressOf } from './asked-address.ts';

/** The filters of a search, each in words: "fuel: propane or wood", "peak 900 to 950 °C". */
export function filterWords(asked: Asked, units: Units): string[] {
  const { facets, ranges } = addressOf(asked);
  return [
    ...FIND_FACETS.flatMap((facet) => {
      const values = (facets[facet] ?? []).map((value) => facetWords(facet, value, units));
      return values.length > 0
        ? [`${FACET_LABELS[facet].toLowerCase()}: ${values.join(' or ')}`]
        : [];
    }),
    ...FIND_RANGES.flatMap((range) => {
      const ends = ranges[range];
      return ends ? [`${RANGE_LABELS[range].toLowerCase()} ${rangeWords(range, ends, units)}`] : [];
    }),
  ];
}

/** Parts of the question that were left out. */
export function leftOutWords({ q, off }: Asked, units: Units): string[] {
  const keys = (off ?? '').split(',');
  return readQuestion(q, { preferredUnit: units.temperature })
    .parts.filter(({ key }) => keys.includes(key))
    .map((part) => `without “${labelOf(part, units)}”`);
}

/** A search in one line: what a new one is called until its member says otherwise. */
export function askedWords(asked: Asked, units: Units): string {
  return [asked.q, ...leftOutWords(asked, units), ...filterWords(asked, units)]
    .filter((words) => words !== '')
    .join('; ');
}
