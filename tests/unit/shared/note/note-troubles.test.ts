import { describe, expect, it } from 'vitest';
import type { Piece } from '#shared/note/pieces.ts';
import { countPieces, namedTroubles } from '#shared/note/note-troubles.ts';
import { aNote, aPiece } from './a-note.ts';

const namedOf = (piece: Partial<Piece>): string[] =>
  namedTroubles(aNote((fields) => (fields.pieces = [aPiece(piece)])));

describe('the troubles an author names', () => {
  it.each<[string, Partial<Piece>]>([
    ['crack-in-firing', { cracked: true, cracks: [{ place: 'base', noticed: 'in-the-firing' }] }],
    [
      'crack-in-firing',
      { cracked: true, cracks: [{ place: 'rim', noticed: 'put-into-hot-kiln' }] },
    ],
    ['crack-after-draw', { cracked: true, cracks: [{ place: 'wall', noticed: 'days-later' }] }],
    ['dull-glaze', { melt: 'under-fired' }],
    ['dull-glaze', { faults: ['dull'] }],
    ['weak-reduction', { bareClay: 'pale' }],
    ['weak-reduction', { bareClay: 'patchy', route: 'crackle-then-smoked' }],
    ['weak-reduction', { colour: 'not' }],
    ['crawling', { faults: ['crawling'] }],
    ['blistering', { faults: ['pinholes'] }],
  ])('are read off the pieces: %s', (trouble, piece) => {
    expect(namedOf(piece)).toEqual([trouble]);
  });

  it.each<[string, Partial<Piece>]>([
    ['a crack that nobody saw come', { cracked: true, cracks: [{ place: 'base', noticed: null }] }],
    ['pale clay left in the air on purpose', { bareClay: 'pale', route: 'air-only' }],
    ['a colour missed on under-fired ware of another route', { colour: 'not', route: 'horsehair' }],
    ['runs, which need not have stuck', { faults: ['runs'] }],
  ])('are not guessed from %s', (_what, piece) => {
    expect(namedOf(piece)).toEqual([]);
  });

  it('are those ticked too, each once, in the order of the list', () => {
    const fields = aNote((note) => {
      note.result.troubles = ['dull-glaze', 'stall'];
      note.pieces = [aPiece({ melt: 'under-fired' })];
    });
    expect(namedTroubles(fields)).toEqual(['stall', 'dull-glaze']);
  });
});

describe('counting pieces', () => {
  it('counts pieces and not rows', () => {
    const fields = aNote((note) => {
      note.pieces = [
        aPiece({ count: 2 }),
        aPiece({
          count: 3,
          whole: false,
          cracked: true,
          cracks: [{ place: 'base', noticed: 'in-the-firing' }],
        }),
      ];
    });
    expect(countPieces(fields)).toEqual({
      pieces: 5,
      whole: 2,
      cracked: 3,
      crackedInFiring: 3,
      crackedAfterDraw: 0,
    });
  });
});
