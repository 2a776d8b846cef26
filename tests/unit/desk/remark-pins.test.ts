import { describe, expect, it } from 'vitest';
import { emptyNoteFields } from '#shared/note/note-fields.ts';
import { pieceSchema } from '#shared/note/pieces.ts';
import { pinWords, remarkPins } from '../../../src/desk/remark-pins.ts';

describe('what a remark can be pinned to', () => {
  it('begins with the note as a whole, and names every field in words once', () => {
    const bowl = pieceSchema.parse({ key: 'a', form: 'bowl' });
    const pins = remarkPins({ ...emptyNoteFields(), pieces: [bowl] });
    expect(pins[0]).toEqual({ value: '', label: 'The note as a whole' });
    expect(pins).toContainEqual({ value: '/pieces/0', label: 'Piece row 1 (bowl)' });
    expect(pins).toContainEqual({ value: '/plan/peakCelsius', label: 'Peak' });
    expect(new Set(pins.map(({ value }) => value)).size).toBe(pins.length);
    expect(pins.filter(({ label }) => label === 'This field')).toEqual([]);
  });

  it('names a pin in words that the list does not offer', () => {
    expect(pinWords('/pieces/1/wallMm')).toBe('Piece row 2, wall');
  });
});
