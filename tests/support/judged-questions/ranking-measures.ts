/** How much a note helps whoever asked: 3 answers the question, 0 says nothing to it. */
export type Grade = 0 | 1 | 2 | 3;

export interface RankingMeasures {
  /** Discounted gain of the first ten, as a share of the best that there could be. */
  readonly ndcg: number;
  /** One over the place of the first note of grade 2 or more; 0 where there is none. */
  readonly reciprocalRank: number;
  /** Whether the first note has the best grade that any note has for the question. */
  readonly success: boolean;
}

const PLACES = 10;
/** From this grade on a note is of the thing asked about, and not only near it. */
const OF_THE_SAME = 2;

/** Gain 2^grade - 1, divided by log2(place + 1): the usual form of discounted cumulative gain. */
export function discountedGain(grades: readonly Grade[], places = PLACES): number {
  return grades
    .slice(0, places)
    .reduce<number>((sum, grade, index) => sum + (2 ** grade - 1) / Math.log2(index + 2), 0);
}

/**
 * Measures one ranking.
 * @param ranked grades of the notes found, best place first
 * @param judged grades of all notes there are, in any order
 */
export function measureRanking(
  ranked: readonly Grade[],
  judged: readonly Grade[],
): RankingMeasures {
  const ideal = [...judged].sort((a, b) => b - a);
  const most = discountedGain(ideal);
  const best = ideal[0] ?? 0;
  const first = ranked.findIndex((grade) => grade >= Math.min(OF_THE_SAME, best || OF_THE_SAME));
  return {
    ndcg: most === 0 ? 0 : discountedGain(ranked) / most,
    reciprocalRank: first < 0 ? 0 : 1 / (first + 1),
    success: best > 0 && ranked[0] === best,
  };
}

export interface MeanMeasures {
  readonly questions: number;
  readonly ndcg: number;
  readonly reciprocalRank: number;
  readonly successAt1: number;
}

export function meanMeasures(measures: readonly RankingMeasures[]): MeanMeasures {
  const mean = (of: (measure: RankingMeasures) => number): number =>
    measures.length === 0 ? 0 : measures.reduce((sum, each) => sum + of(each), 0) / measures.length;
  return {
    questions: measures.length,
    ndcg: mean(({ ndcg }) => ndcg),
    reciprocalRank: mean(({ reciprocalRank }) => reciprocalRank),
    successAt1: mean(({ success }) => (success ? 1 : 0)),
  };
}
