import { describe, expect, it } from 'vitest';
import type { DeskQueue } from '#shared/api/desk.ts';
import { waitingWords } from '../../../src/desk/desk-words.ts';
import { nextNoteId } from '../../../src/desk/next-note.ts';

type Row = DeskQueue['waiting'][number];
const waiting = (noteId: number, over: Partial<Row> = {}): Row => ({
  noteId,
  revisionId: noteId,
  title: '',
  author: null,
  kilnName: '',
  handedInAt: '2026-05-01T10:00:00.000Z',
  firstRevision: true,
  strip: null,
  stripWords: '',
  answeredChecks: 0,
  unsafeWords: 0,
  claim: null,
  own: false,
  ...over,
});
const claim = (mine: boolean) => ({
  by: { id: 3, name: 'Bertil Onn' },
  until: '2026-05-01T11:00:00.000Z',
  mine,
});

describe('the next note at the desk', () => {
  it('is the longest waiting that is free: no own note, none that another reads, not this one', () => {
    const pile = [
      waiting(1),
      waiting(2, { own: true }),
      waiting(3, { claim: claim(false) }),
      waiting(4),
      waiting(5),
    ];
    expect(nextNoteId(pile, 1)).toBe(4);
  });

  it('may be one that is on one’s own desk already', () => {
    expect(nextNoteId([waiting(1), waiting(2, { claim: claim(true) })], 1)).toBe(2);
  });

  it('is none when nothing else is free', () => {
    expect(nextNoteId([waiting(1), waiting(2, { own: true })], 1)).toBeNull();
  });
});

describe('waitingWords', () => {
  it.each([
    ['2026-05-01T10:00:20.000Z', 'waiting less than a minute'],
    ['2026-05-01T10:59:59.000Z', 'waiting 59\u00a0min'],
    ['2026-05-01T11:00:00.000Z', 'waiting 1\u00a0h'],
    ['2026-05-03T09:59:00.000Z', 'waiting 47\u00a0h'],
    ['2026-05-04T10:00:00.000Z', 'waiting 3 days'],
    // A reader's clock that is slow.
    ['2026-05-01T09:00:00.000Z', 'waiting less than a minute'],
  ])('at %s says "%s"', (now, words) => {
    expect(waitingWords('2026-05-01T10:00:00.000Z', new Date(now))).toBe(words);
  });
});
