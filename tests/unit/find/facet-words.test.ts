import { describe, expect, it } from 'vitest';
import { IMPERIAL_UNITS, METRIC_UNITS } from '#shared/units/units.ts';
import { kilnSizeOf } from '../../../search/note-document.ts';
import { facetWords } from '../../../src/find/facet-words.ts';

describe('facetWords', () => {
  it('says the classes of kilns in litres or cubic feet, at the bounds the server divides by', () => {
    expect(facetWords('kilnSize', 'small', METRIC_UNITS)).toBe('under 40\u00a0l');
    expect(facetWords('kilnSize', 'large', METRIC_UNITS)).toBe('100\u00a0l and more');
    expect([39.9, 40, 99.9, 100].map(kilnSizeOf)).toEqual(['small', 'medium', 'medium', 'large']);
    // 40 l are 1.41 cubic feet (28.316846592 l each, exact).
    expect(facetWords('kilnSize', 'small', IMPERIAL_UNITS)).toBe('under 1.4\u00a0cu\u00a0ft');
  });

  it('leaves a value nobody knows as it is', () => {
    expect(facetWords('causes', 'moonlight', METRIC_UNITS)).toBe('moonlight');
    expect(facetWords('fuel', 'mixed-lpg', METRIC_UNITS)).toBe('Mixed LPG');
  });
});
