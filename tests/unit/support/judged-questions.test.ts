import { describe, expect, test } from 'vitest';
import { judgedQuestions } from '../../support/judged-questions/judged-questions.ts';
import {
  discountedGain,
  meanMeasures,
  measureRanking,
} from '../../support/judged-questions/ranking-measures.ts';

describe('measureRanking', () => {
  test('a gain is 2^grade - 1 over log2 of the place and one (worked out by hand)', () => {
    // 7/1 + 3/1.58496 + 0 + 1/2.32193
    expect(discountedGain([3, 2, 0, 1])).toBeCloseTo(7 + 1.892789 + 0.430677, 5);
    expect(discountedGain([0, 3], 1)).toBe(0);
  });

  test('the best order there could be counts as one, whatever else was found after it', () => {
    expect(measureRanking([3, 2, 1, 0, 0], [1, 3, 2]).ndcg).toBeCloseTo(1, 10);
    expect(measureRanking([2, 3], [3, 2]).ndcg).toBeCloseTo(
      (3 + 7 / 1.58496) / (7 + 3 / 1.58496),
      4,
    );
  });

  test('what was not found is missed, and places after the tenth count nothing', () => {
    expect(measureRanking([], [3]).ndcg).toBe(0);
    expect(measureRanking([0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 3], [3]).ndcg).toBe(0);
  });

  test('the reciprocal rank is of the first note of grade two; success asks for the best grade first', () => {
    expect(measureRanking([1, 0, 2], [3, 2, 1])).toMatchObject({
      reciprocalRank: 1 / 3,
      success: false,
    });
    expect(measureRanking([2, 3], [3, 2])).toMatchObject({ reciprocalRank: 1, success: false });
    expect(measureRanking([2, 1], [1, 2])).toMatchObject({ reciprocalRank: 1, success: true });
    expect(measureRanking([], [])).toEqual({ ndcg: 0, reciprocalRank: 0, success: false });
  });

  test('means are over questions', () => {
    const means = meanMeasures([measureRanking([3], [3]), measureRanking([0], [3])]);
    expect(means).toEqual({ questions: 2, ndcg: 0.5, reciprocalRank: 0.5, successAt1: 0.5 });
    expect(meanMeasures([]).ndcg).toBe(0);
  });
});

describe('the judged questions', () => {
  test('are at least 120, each asked once, each with a note that helps', () => {
    const judged = judgedQuestions();
    expect(judged.length).toBeGreaterThanOrEqual(120);
    expect(new Set(judged.map(({ question }) => question)).size).toBe(judged.length);
    for (const { question, grades } of judged) {
      expect([question, Math.max(0, ...grades.values()) >= 2]).toEqual([question, true]);
    }
  });
});
