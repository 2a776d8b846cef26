import { describe, expect, it } from 'vitest';
import { answerAt, withAnswer } from '../../../../src/write/record/level-answers.ts';
import { areMarksInOrder, marksInOrder } from '../../../../src/write/record/marks-order.ts';

const mark = (minute: number, detail = '') => ({
  minute,
  kind: 'gas-up' as const,
  percent: null,
  detail,
});

describe('marks', () => {
  it('stand by minute, those of one minute in the order they were written in', () => {
    const marks = [mark(9), mark(2, 'first'), mark(2, 'second')];
    expect(areMarksInOrder(marks)).toBe(false);
    expect(marksInOrder(marks)).toEqual([mark(2, 'first'), mark(2, 'second'), mark(9)]);
    expect(areMarksInOrder(marksInOrder(marks))).toBe(true);
  });
});

describe('an answer to a level stretch', () => {
  it('is found again when the stretch begins a little earlier or later', () => {
    const answers = withAnswer([], 28, 'meant');
    expect(answerAt(answers, 30.5)).toBe('meant');
    expect(answerAt(answers, 32)).toBeNull();
  });

  it('is changed, not doubled, and can be taken back', () => {
    const changed = withAnswer(withAnswer([], 28, 'meant'), 29, 'stuck');
    expect(changed).toEqual([{ fromMinute: 29, answer: 'stuck' }]);
    expect(withAnswer(changed, 29, null)).toEqual([]);
  });
});
