import { firingFacts } from '#shared/note/facts.ts';
import type { PieceFacts } from '#shared/note/facts.ts';
import type { PublishedFiring } from '../../../../server/figures/pairs.ts';
import { aKiln, aNote, aReading } from '../../shared/note/a-note.ts';

let lastNoteId = 0;

/** An uneventful published firing with a record; each has its own note, kiln and member. */
export function aFiring(over: Partial<PublishedFiring> = {}): PublishedFiring {
  lastNoteId += 1;
  const facts = firingFacts({ fields: aNote(), kiln: aKiln(), reading: aReading() });
  return {
    ...facts,
    noteId: lastNoteId,
    kilnId: lastNoteId,
    memberId: lastNoteId,
    season: '2024',
    ...over,
  };
}

/** A firing that levelled off at 708 °C and was shut off there. */
export function aStalled(over: Partial<PublishedFiring> = {}): PublishedFiring {
  return aFiring({
    measuredTroubles: ['stall'],
    stalls: [{ levelCelsius: 708, fromMinute: 29, toMinute: 46, minutes: 17, wentOn: false }],
    peakCelsius: 712,
    timeToTemperatureMinutes: null,
    ...over,
  });
}

/** The first row of pieces of an uneventful firing, altered. */
export function pieceOf(over: Partial<PieceFacts>): PieceFacts {
  const [piece] = aFiring().pieces;
  if (!piece) throw new Error('The builder’s note has a piece.');
  return { ...piece, ...over };
}
