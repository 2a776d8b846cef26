import type { Grade, RankingMeasures } from './ranking-measures.ts';
import { judgedQuestions, titleByKey } from './judged-questions.ts';
import { measureRanking } from './ranking-measures.ts';

export interface JudgedRanking extends RankingMeasures {
  readonly question: string;
  /** Titles and grades of the first ten. */
  readonly first: readonly (readonly [title: string, grade: Grade])[];
}

/** Asks every judged question and measures what comes back, told by the notes' titles. */
export async function judgeSearch(
  ask: (question: string) => Promise<readonly string[]>,
): Promise<JudgedRanking[]> {
  const rankings: JudgedRanking[] = [];
  for (const { question, grades } of judgedQuestions()) {
    const byTitle = new Map<string, Grade>();
    for (const [key, grade] of grades) byTitle.set(titleByKey.get(key) ?? key, grade);
    const titles = await ask(question);
    const ranked = titles.map((title): readonly [string, Grade] => [
      title,
      byTitle.get(title) ?? 0,
    ]);
    const measures = measureRanking(
      ranked.map(([, grade]) => grade),
      [...grades.values()],
    );
    rankings.push({ question, ...measures, first: ranked.slice(0, 10) });
  }
  return rankings;
}
