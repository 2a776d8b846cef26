import { EngineError } from './errors.ts';

export const BUILT_IN_RULES = [
  'words',
  'typo',
  'proximity',
  'attribute',
  'attributeRank',
  'sort',
  'wordPosition',
  'exactness',
] as const;

export type BuiltInRule = (typeof BUILT_IN_RULES)[number];

export type RankingRule =
  { kind: BuiltInRule } | { kind: 'field'; attribute: string; descending: boolean };

const CUSTOM_RULE = /^(.+):(asc|desc)$/;

export function parseRankingRule(text: string): RankingRule | undefined {
  const builtIn = BUILT_IN_RULES.find((rule) => rule === text);
  if (builtIn !== undefined) return { kind: builtIn };
  const custom = CUSTOM_RULE.exec(text);
  if (custom === null) return undefined;
  return { kind: 'field', attribute: custom[1] ?? '', descending: custom[2] === 'desc' };
}

/** Refuses unknown rules, repeats, and `attribute` beside the two rules that replaced it. */
export function checkRankingRules(rules: string[]): string[] {
  const code = 'invalid_settings_ranking_rules';
  for (const rule of rules) {
    if (parseRankingRule(rule) === undefined) {
      throw new EngineError(
        code,
        `Invalid value at \`.rankingRules\`: \`${rule}\` ranking rule is invalid. Valid ranking rules are words, typo, sort, proximity, attribute, attributeRank, wordPosition, exactness and custom ranking rules.`,
      );
    }
  }
  if (new Set(rules).size !== rules.length) {
    throw new EngineError(code, 'Invalid value at `.rankingRules`: a ranking rule is repeated.');
  }
  if (rules.includes('attribute')) {
    const clash = rules.find((rule) => rule === 'attributeRank' || rule === 'wordPosition');
    if (clash !== undefined) {
      throw new EngineError(
        code,
        `Invalid value at \`.rankingRules\`: \`attribute\` cannot be used together with \`${clash}\`.`,
      );
    }
  }
  return rules;
}
