import { FARTHEST } from './best-path.ts';
import type { JsonObject } from './json.ts';
import type { QueryGraph } from './query-graph.ts';
import type { RankingStep, Standing } from './ranking-rules.ts';
import type { SortKey } from './sort.ts';

type Grade = { rank: number; of: number };

/** Average position of a query's words up to which each of eight steps reaches. */
const POSITION_STEPS = [0, 1, 2, 4, 8, 16, 64];

/** How good one rule's outcome is: `rank` of `of`, larger is better. Null for rules without say. */
function gradeOf(
  rule: RankingStep['rule'],
  { match, costs, wholeMatch }: Standing,
  graph: QueryGraph,
  attributeCount: number,
): Grade | null {
  const units = graph.units.length;
  const kept = Math.max(1, units - match.dropped);
  switch (rule) {
    case 'words':
      return { rank: units - match.dropped, of: units };
    case 'typo': {
      const most = graph.budgets.reduce((sum, budget) => sum + budget, 0);
      const typos = Math.min(costs.typo, most);
      return { rank: most + 1 - typos, of: most + 1 };
    }
    case 'proximity': {
      const pairs = kept - 1;
      const most = pairs * (FARTHEST - 1);
      return {
        rank: most + 1 - Math.min(most, Math.max(0, costs.proximity - pairs)),
        of: most + 1,
      };
    }
    case 'attributeRank':
      return {
        rank: attributeCount - Math.min(attributeCount - 1, Math.floor(costs.attributeRank / kept)),
        of: attributeCount,
      };
    case 'wordPosition': {
      const average = costs.wordPosition / kept;
      const step = POSITION_STEPS.findIndex((bound) => average <= bound);
      const steps = POSITION_STEPS.length + 1;
      return { rank: step < 0 ? 1 : steps - step, of: steps };
    }
    case 'exactness': {
      const exactWords = Math.max(0, kept - costs.inexact);
      return { rank: (2 - wholeMatch) * (units + 1) + exactWords + 1, of: 3 * (units + 1) };
    }
    case 'attribute':
    case 'sort':
    case 'field':
      return null;
  }
}

const WHOLE_MATCH_NAMES = ['exactMatch', 'matchesStart', 'noExactMatch'] as const;

export type Score = { score: number; details: JsonObject };

function asJson(key: SortKey): string | number | null {
  return key ?? null;
}

/**
 * The ranking score of one document, 0 to 1, and what each rule made of it. Grades are nested: a
 * later rule moves the score only within the step that the earlier rules left, so scores order
 * documents as the rules do. Sorting and custom rules show in the details and leave the score alone.
 */
export function scoreOf(
  standing: Standing,
  steps: readonly RankingStep[],
  graph: QueryGraph,
  attributeCount: number,
): Score {
  let rank = 1;
  let of = 1;
  const details: JsonObject = {};
  const { match, costs, wholeMatch } = standing;
  let order = 0;
  const seen = new Set<string>();
  const take = (grade: Grade): number => {
    rank = (rank - 1) * grade.of + grade.rank;
    of *= grade.of;
    return grade.rank / grade.of;
  };
  for (const step of steps) {
    if (step.sortBy !== null) {
      const { attribute, descending } = step.sortBy;
      details[`${attribute}:${descending ? 'desc' : 'asc'}`] = {
        order: order++,
        value: asJson(step.keyOf(match)),
      };
      continue;
    }
    if (graph.units.length === 0 || seen.has(step.rule)) continue;
    seen.add(step.rule);
    if (step.rule === 'attribute') {
      const first = gradeOf('attributeRank', standing, graph, attributeCount);
      const second = gradeOf('wordPosition', standing, graph, attributeCount);
      if (first === null || second === null) continue;
      const attributeRankingOrderScore = first.rank / first.of;
      const queryWordDistanceScore = second.rank / second.of;
      take(first);
      take(second);
      details['attribute'] = {
        order: order++,
        attributeRankingOrderScore,
        queryWordDistanceScore,
        score: ((first.rank - 1) * second.of + second.rank) / (first.of * second.of),
      };
      continue;
    }
    const grade = gradeOf(step.rule, standing, graph, attributeCount);
    if (grade === null) continue;
    const score = take(grade);
    details[step.rule] = { order: order++, ...extras(step.rule), score };
  }
  return { score: rank / of, details };

  function extras(rule: RankingStep['rule']): JsonObject {
    const units = graph.units.length;
    if (rule === 'words') return { matchingWords: units - match.dropped, maxMatchingWords: units };
    if (rule === 'typo') {
      return {
        typoCount: costs.typo,
        maxTypoCount: graph.budgets.reduce((sum, budget) => sum + budget, 0),
      };
    }
    if (rule === 'exactness') {
      return {
        matchType: WHOLE_MATCH_NAMES[wholeMatch],
        matchingWords: Math.max(0, units - match.dropped - costs.inexact),
        maxMatchingWords: units,
      };
    }
    return {};
  }
}
