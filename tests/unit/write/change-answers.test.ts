import { describe, expect, it } from 'vitest';
import { emptyNoteFields } from '#shared/note/note-fields.ts';
import { answerChange, answerToChange, sayPurpose } from '../../../src/write/change-answers.ts';

const blank = emptyNoteFields();

describe('answering a proposed change', () => {
  it('is open until the author says whether it was meant', () => {
    expect(answerToChange(blank, 'flue-more-open')).toBeNull();
  });

  it('names a change that was meant, and keeps its purpose when said twice', () => {
    const meant = answerChange(blank, 'flue-more-open', 'meant');
    const purposed = sayPurpose(meant, 'flue-more-open', 'more draught');
    expect(answerChange(purposed, 'flue-more-open', 'meant').changes).toEqual([
      { change: 'flue-more-open', purpose: 'more draught' },
    ]);
  });

  it('never holds a change as meant and not meant at once', () => {
    const turned = answerChange(
      answerChange(blank, 'load-less', 'meant'),
      'load-less',
      'not-meant',
    );
    expect(turned.changes).toEqual([]);
    expect(turned.changesNotMeant).toEqual(['load-less']);
    const back = answerChange(turned, 'load-less', 'meant');
    expect(back.changesNotMeant).toEqual([]);
    expect(answerToChange(back, 'load-less')).toBe('meant');
  });

  it('leaves the other changes alone', () => {
    const two = answerChange(answerChange(blank, 'form', 'meant'), 'clay', 'meant');
    expect(answerChange(two, 'form', null).changes.map(({ change }) => change)).toEqual(['clay']);
  });
});
