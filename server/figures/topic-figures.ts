import type {
  FigureComparison,
  FigureGroup,
  TopicFigures,
  TopicQuery,
} from '#shared/api/figure-topics.ts';
import { quantile } from '#shared/statistics/quantile.ts';
import {
  DIMENSIONS_OF_TOPIC,
  FIGURE_CUTS,
  QUANTITY_OF_TOPIC,
  SHARE_TOPICS,
  type FigureDimension,
  type FigureTopic,
} from '#shared/vocabulary/figures.ts';
import { bootstrapMedian } from './bootstrap-median.ts';
import { groupNames, groupQuantity, type GroupName } from './figure-groups.ts';
import { effectiveProportion, newcombe, wilson, type Proportion } from './intervals.ts';
import { domainOf, spreadOf, type Domain } from './spread.ts';
import { casesOf, type FigureCase, type FigureFiring } from './topic-cases.ts';
import { FEWEST_FIRINGS, FEWEST_MEMBERS } from './what-helped.ts';

/** Groups that people wrote themselves (clays): more would be a list and no plot. */
export const MOST_WRITTEN_GROUPS = 12;
const TOO_MANY = 'written too seldom to be among the twelve shown';
const START_CLASSES = ['cold', 'hot'] as const;

const sumOf = (cases: readonly FigureCase[]): number =>
  cases.reduce((sum, { count }) => sum + count, 0);
const membersOf = (cases: readonly FigureCase[]): number =>
  new Set(cases.map(({ firing }) => firing.memberId)).size;
const firingsOf = (cases: readonly FigureCase[]): number =>
  new Set(cases.map(({ firing }) => firing.noteId)).size;
const isEnough = (cases: readonly FigureCase[]): boolean =>
  firingsOf(cases) >= FEWEST_FIRINGS && membersOf(cases) >= FEWEST_MEMBERS;

/** Each piece once: pieces of one member are alike, so their number is reduced to its effect. */
function effectiveOf(cases: readonly FigureCase[]): Proportion {
  const memberIds = cases.flatMap(({ count, firing }) =>
    Array.from({ length: count }, () => firing.memberId),
  );
  return effectiveProportion(sumOf(cases.filter(({ yes }) => yes === true)), memberIds);
}

function shareOf(cases: readonly FigureCase[]): NonNullable<FigureGroup['share']> {
  const members = new Map<number, { count: number; of: number }>();
  for (const { firing, count, yes } of cases) {
    const own = members.get(firing.memberId) ?? { count: 0, of: 0 };
    own.of += count;
    if (yes === true) own.count += count;
    members.set(firing.memberId, own);
  }
  const of = sumOf(cases);
  const count = sumOf(cases.filter(({ yes }) => yes === true));
  const effective = effectiveOf(cases);
  const enough = isEnough(cases);
  const interval = enough ? wilson(effective.successes, effective.n) : null;
  return {
    count,
    of,
    effective: effective.n,
    share: enough ? count / of : null,
    interval: interval && { low: interval.lower, high: interval.upper },
    // Sorted by what they got: the order tells nothing of whose they are.
    byMember: [...members.values()].sort(
      (one, other) => one.count / one.of - other.count / other.of || one.of - other.of,
    ),
  };
}

function numbersOf(
  cases: readonly FigureCase[],
  domain: Domain,
): NonNullable<FigureGroup['numbers']> {
  const values = cases.map(({ value }) => value ?? 0);
  const enough = isEnough(cases);
  const interval = enough
    ? bootstrapMedian(
        cases.map(({ value, firing }) => ({ value: value ?? 0, memberId: firing.memberId })),
      )
    : null;
  return {
    q1: enough ? quantile(values, 0.25) : null,
    median: enough ? quantile(values, 0.5) : null,
    q3: enough ? quantile(values, 0.75) : null,
    interval: interval && { low: interval.lower, high: interval.upper },
    spread: spreadOf(values, domain),
  };
}

function compared(a: string, b: string, cases: readonly FigureCase[]): FigureComparison {
  const [first, second] = [a, b].map((id) => cases.filter(({ group }) => group === id));
  if (!first || !second || a === b || !isEnough(first) || !isEnough(second)) {
    return { a, b, difference: null };
  }
  const found = newcombe(effectiveOf(first), effectiveOf(second));
  return {
    a,
    b,
    difference: found && { share: found.difference, low: found.lower, high: found.upper },
  };
}

/** Clays and the like: those of most pieces first, the rest left out and counted. */
function writtenGroups(cases: readonly FigureCase[]): readonly GroupName[] {
  const counts = new Map<string, number>();
  for (const { group, count } of cases) counts.set(group, (counts.get(group) ?? 0) + count);
  return [...counts]
    .sort(([one, n], [other, m]) => m - n || (one < other ? -1 : 1))
    .slice(0, MOST_WRITTEN_GROUPS)
    .map(([id]) => ({ id, label: id, range: null }));
}

/**
 * Which two groups are compared: those asked for, else the ends of a scale, as far as they have
 * enough firings to say something.
 */
function pairOf(
  { a, b }: TopicQuery,
  by: FigureDimension,
  groups: readonly GroupName[],
  cases: readonly FigureCase[],
): readonly [string, string] | null {
  const isScale = FIGURE_CUTS[by] !== undefined;
  const known = (id: string | undefined): string | undefined =>
    groups.find((group) => group.id === id)?.id;
  const cold = cases.filter(({ startClass }) => startClass === 'cold');
  const told = groups.filter(({ id }) => isEnough(cold.filter(({ group }) => group === id)));
  const ends = told.length > 1 ? told : groups;
  const first = known(a) ?? (isScale ? ends[0]?.id : undefined);
  const second = known(b) ?? (isScale ? ends.at(-1)?.id : undefined);
  return first === undefined || second === undefined ? null : [first, second];
}

const isIn = (cases: readonly FigureCase[], id: string): boolean =>
  cases.some(({ group }) => group === id);

/** The plot of a topic: groups of cold and of hot starts, which are never pooled. */
export function topicFigures(
  topic: FigureTopic,
  query: TopicQuery,
  firings: readonly FigureFiring[],
): Omit<TopicFigures, 'kilns'> {
  const possible = DIMENSIONS_OF_TOPIC[topic];
  const by = possible.find((each) => each === query.by) ?? possible[0];
  if (by === undefined) throw new Error(`Nothing to tell ${topic} apart by.`);
  const isShare = SHARE_TOPICS.includes(topic);
  const { cases: found, leftOut } = casesOf(topic, by, firings, query);
  const named = groupNames(by);
  const groups = (named ?? writtenGroups(found)).filter(
    // A scale keeps its empty parts, a list does not.
    ({ id, range }) => range !== null || isIn(found, id),
  );
  const shown = new Set(groups.map(({ id }) => id));
  const cases = found.filter(({ group }) => shown.has(group));
  const seldom = sumOf(found) - sumOf(cases);
  const alongs = (some: readonly FigureCase[]): number[] =>
    some.flatMap(({ along, count }) =>
      along === null ? [] : Array.from({ length: count }, () => along),
    );
  const isAlong = isShare && FIGURE_CUTS[by] !== undefined;
  const domain = domainOf(
    isShare ? (isAlong ? alongs(cases) : []) : cases.map(({ value }) => value ?? 0),
  );
  const pair = isShare ? pairOf(query, by, groups, cases) : null;
  return {
    topic,
    by,
    kiln: query.kiln ?? null,
    ware: query.ware ?? null,
    groups: groups.map((group) => ({ ...group })),
    groupQuantity: groupQuantity(by),
    quantity: QUANTITY_OF_TOPIC[topic],
    tables: START_CLASSES.flatMap((startClass) => {
      const own = cases.filter((each) => each.startClass === startClass);
      if (own.length === 0) return [];
      const along = (wanted: boolean) =>
        spreadOf(alongs(own.filter(({ yes }) => yes === wanted)), domain ?? { low: 0, high: 1 });
      return {
        startClass,
        cases: sumOf(own),
        firings: firingsOf(own),
        members: membersOf(own),
        groups: groups.flatMap(({ id, range }) => {
          const ofGroup = own.filter(({ group }) => group === id);
          if (range === null && ofGroup.length === 0) return [];
          return {
            id,
            cases: sumOf(ofGroup),
            firings: firingsOf(ofGroup),
            members: membersOf(ofGroup),
            enough: isEnough(ofGroup),
            share: isShare ? shareOf(ofGroup) : null,
            numbers: isShare ? null : numbersOf(ofGroup, domain ?? { low: 0, high: 1 }),
          };
        }),
        along: isAlong ? { yes: along(true), no: along(false) } : null,
        comparison: pair && compared(pair[0], pair[1], own),
      };
    }),
    domain,
    leftOut: [...leftOut, ...(seldom > 0 ? [{ reason: TOO_MANY, count: seldom }] : [])],
  };
}
