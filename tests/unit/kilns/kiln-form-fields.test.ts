import { describe, expect, it } from 'vitest';
import { IMPERIAL_UNITS, METRIC_UNITS } from '#shared/units/units.ts';
import {
  blankKiln,
  differingLabels,
  kilnIssues,
  refusedFields,
  tidiedKiln,
} from '../../../src/kilns/kiln-form-fields.ts';

const kiln = { ...blankKiln('Europe/London'), name: 'Drum' };

describe('the form of a kiln', () => {
  it('drops what does not belong to its shape and wall before it is saved', () => {
    const typed = {
      ...kiln,
      shape: 'round' as const,
      insideDiameterMm: 400,
      insideWidthMm: 380,
      wall: 'brick' as const,
      fibreThicknessMm: 25,
      brickThicknessMm: 115,
    };
    expect(tidiedKiln(typed)).toMatchObject({
      insideDiameterMm: 400,
      insideWidthMm: null,
      fibreThicknessMm: null,
      brickThicknessMm: 115,
    });
  });

  it('asks for a name, and for measures within their ranges in the member’s units', () => {
    expect(kilnIssues(blankKiln(''), METRIC_UNITS).name?.[0]?.text).toBe('Give the kiln a name.');
    const wide = { ...kiln, insideDiameterMm: 2001 };
    expect(kilnIssues(wide, METRIC_UNITS).insideDiameterMm?.[0]?.text).toBe(
      'Outside 100 to 2000\u00a0mm.',
    );
    // 100 mm are 3.9 in, 2000 mm are 78.7 in (25.4 mm each, exact).
    expect(kilnIssues(wide, IMPERIAL_UNITS).insideDiameterMm?.[0]?.text).toBe(
      'Outside 3.9 to 78.7\u00a0in.',
    );
    expect(kilnIssues({ ...kiln, insideDiameterMm: 2000 }, METRIC_UNITS)).toEqual({});
  });

  it('puts a refusal of the server beside the field it names, and no other', () => {
    const issues = refusedFields([
      { pointer: '/fields/jet', detail: 'Too long.' },
      { pointer: '/fields/constructor', detail: 'No such field.' },
    ]);
    expect(issues).toEqual({ jet: [{ kind: 'must-mend', text: 'Too long.' }] });
  });

  it('names the fields in which two descriptions differ', () => {
    expect(differingLabels(kiln, { ...kiln, jet: '0.9', fuel: 'butane' })).toEqual(['Jet', 'Fuel']);
  });
});
