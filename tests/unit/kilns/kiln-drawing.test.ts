import { describe, expect, it } from 'vitest';
import { blankKiln } from '../../../src/kilns/kiln-form-fields.ts';
import { kilnDrawing } from '../../../src/kilns/kiln-drawing.ts';

const round = {
  ...blankKiln(''),
  name: 'Drum',
  shape: 'round' as const,
  insideDiameterMm: 400,
  insideHeightMm: 450,
};

describe('a kiln as it is drawn', () => {
  it('is not drawn before shape, width and height are there', () => {
    expect(kilnDrawing({ ...round, shape: null })).toBeNull();
    expect(kilnDrawing({ ...round, insideHeightMm: null })).toBeNull();
    expect(kilnDrawing({ ...round, shape: 'square' })).toBeNull();
  });

  it('says what was drawn without being given', () => {
    expect(kilnDrawing(round)?.assumed).toEqual(['a fibre wall of 25\u00a0mm']);
    const given = { ...round, wall: 'fibre' as const, fibreThicknessMm: 50 };
    expect(kilnDrawing(given)).toMatchObject({ dimensions: { wallMm: 50 }, assumed: [] });
  });

  it('leaves out a measure that cannot be, and an opening wider than the kiln', () => {
    expect(kilnDrawing({ ...round, flue: 'lid', flueOpeningMm: 9000 })?.dimensions.flue).toBeNull();
    const small = { ...round, insideDiameterMm: 150 };
    expect(kilnDrawing({ ...small, flue: 'lid', flueOpeningMm: 200 })?.dimensions.flue).toBeNull();
    expect(kilnDrawing({ ...round, insideDiameterMm: 5 })).toBeNull();
    expect(kilnDrawing({ ...round, burnerPortMm: 60 })?.dimensions.port).toEqual({ openingMm: 60 });
  });
});
