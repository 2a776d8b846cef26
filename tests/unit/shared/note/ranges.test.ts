import { describe, expect, it } from 'vitest';
import { emptyNoteFields } from '#shared/note/note-fields.ts';
import { KILN_RANGES, NOTE_RANGES, outOfRange, rangeAt } from '#shared/note/ranges.ts';
import { aPiece } from './a-note.ts';

describe('ranges', () => {
  it('reads each range off the schema, with its unit, under its pointer pattern', () => {
    expect(NOTE_RANGES.get('/plan/targetCelsius')).toEqual({ range: [400, 1150], unit: '°C' });
    expect(NOTE_RANGES.get('/pieces/*/spanMm')).toEqual({ range: [5, 1000], unit: 'mm' });
    expect(NOTE_RANGES.get('/pieces/*/recipe/combustibles/*/litres')).toEqual({
      range: [0, 500],
      unit: 'l',
    });
    expect(NOTE_RANGES.get('/reduction/secondsInAir')).toEqual({ range: [0, 1800], unit: 's' });
    expect(KILN_RANGES.get('/fibreDensityKgM3')).toEqual({ range: [64, 240], unit: 'kg/m³' });
  });

  it('finds the range of a row by the row’s own pointer', () => {
    expect(rangeAt('/pieces/12/wallMm')?.range).toEqual([1, 80]);
    expect(rangeAt('/title')).toBeNull();
  });

  it('names every number outside its range and no blank', () => {
    const fields = emptyNoteFields();
    fields.setUp.airCelsius = -31;
    fields.setUp.regulatorBar = 4;
    fields.pieces = [aPiece({ spanMm: 1001 })];
    expect(outOfRange(fields).map((found) => found.pointer)).toEqual([
      '/setUp/airCelsius',
      '/pieces/0/spanMm',
    ]);
  });
});
