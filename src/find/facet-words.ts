import type { FindFacet } from '#shared/api/search.ts';
import { GLAZES_ASKED } from '#shared/question/reading-types.ts';
import { formatChamber } from '#shared/units/volume.ts';
import type { Units } from '#shared/units/units.ts';
import { FUELS, WEATHERS } from '#shared/vocabulary/kiln.ts';
import { CAUSES, TROUBLE_SHORT } from '#shared/vocabulary/troubles.ts';
import { FORM_FAMILIES } from '#shared/vocabulary/ware.ts';

/** The headings of the filters. */
export const FACET_LABELS: Readonly<Record<FindFacet, string>> = {
  troubles: 'Trouble',
  forms: 'Form',
  glazes: 'Glaze or route',
  fuel: 'Fuel',
  kilnSize: 'Inside of the kiln',
  causes: 'Suspected cause',
  weather: 'Weather',
};

/** Inside volume where one class of kilns ends and the next begins, litres (our own division). */
const MEDIUM_FROM_LITRES = 40;
const LARGE_FROM_LITRES = 100;

function kilnSizeWords(value: string, units: Units): string {
  const medium = formatChamber(MEDIUM_FROM_LITRES, units);
  const large = formatChamber(LARGE_FROM_LITRES, units);
  if (value === 'small') return `under ${medium}`;
  return value === 'medium' ? `${medium} to ${large}` : `${large} and more`;
}

const wordsIn = (terms: Readonly<Record<string, string>>, value: string): string =>
  (terms[value] ?? value).toLowerCase();

/** A value of a filter as people say it; one we do not know stays as it is. */
export function facetWords(facet: FindFacet, value: string, units: Units): string {
  switch (facet) {
    case 'troubles':
      return wordsIn(TROUBLE_SHORT, value);
    case 'forms':
      return wordsIn(FORM_FAMILIES, value);
    case 'glazes':
      return wordsIn(GLAZES_ASKED, value);
    case 'fuel':
      return value === 'mixed-lpg' ? FUELS['mixed-lpg'] : wordsIn(FUELS, value);
    case 'kilnSize':
      return kilnSizeWords(value, units);
    case 'causes':
      return wordsIn(CAUSES, value);
    case 'weather':
      return wordsIn(WEATHERS, value);
  }
}
