import type { TopicQuery } from '#shared/api/figure-topics.ts';
import type { FigureDimension, FigureTopic } from '#shared/vocabulary/figures.ts';
import { SHARE_TOPICS } from '#shared/vocabulary/figures.ts';
import type { StartClass } from '#shared/vocabulary/kiln.ts';
import { dimensionNumber, groupOf } from './figure-groups.ts';
import type { FigureNumbers, FigurePiece } from './figure-numbers.ts';

/** A published firing with what the plots read of it. */
export interface FigureFiring extends FigureNumbers {
  readonly noteId: number;
  readonly kilnId: number;
  readonly memberId: number;
  readonly firedOn: string;
}

/** One mark of a plot: a row of pieces, a firing or a stall. */
export interface FigureCase {
  readonly firing: FigureFiring;
  readonly startClass: StartClass;
  readonly group: string;
  /** Pieces of the row; 1 for a firing or a stall. */
  readonly count: number;
  /** For shares: whether it is as the topic says. */
  readonly yes: boolean | null;
  /** For numbers: the number. */
  readonly value: number | null;
  /** The number it is grouped by, where it is one. */
  readonly along: number | null;
}

export interface CasesOfTopic {
  readonly cases: readonly FigureCase[];
  /** What was left out and why, in pieces or firings. */
  readonly leftOut: readonly { readonly reason: string; readonly count: number }[];
}

export const NO_START = 'not told whether the kiln was cold or hot';
export const NO_GROUP = 'what it is told apart by is not told, or disputed';
export const NO_VALUE = 'the number is not told, or disputed';
export const NO_OUTCOME = 'how it came out is not told';
export const STALL_DISPUTED = 'the stall is disputed';

/** Whether a piece came out as the topic says; null where that is not told or does not apply. */
function outcomeOf(topic: FigureTopic, piece: FigurePiece): boolean | null {
  switch (topic) {
    case 'cracks':
      return piece.cracked;
    case 'colour':
      return piece.colour === null ? null : piece.colour === 'as-hoped';
    case 'bare-clay':
      return piece.bareClay === null || piece.bareClay === 'not-applicable'
        ? null
        : piece.bareClay === 'black';
    default:
      return null;
  }
}

function valuesOf(topic: FigureTopic, firing: FigureFiring): readonly number[] {
  const one = (value: number | null): readonly number[] => (value === null ? [] : [value]);
  switch (topic) {
    case 'time':
      return one(firing.timeToTemperatureMinutes);
    case 'hold':
      return one(firing.holdMinutes);
    case 'peak':
      return one(firing.peakCelsius);
    case 'gas':
      return one(firing.gasUsedKg);
    case 'stalls':
      return firing.stallCelsius;
    default:
      return [];
  }
}

/** The cases of a topic among the firings of a kiln and with a ware, and what had to be left out. */
export function casesOf(
  topic: FigureTopic,
  by: FigureDimension,
  firings: readonly FigureFiring[],
  { kiln, ware }: Pick<TopicQuery, 'kiln' | 'ware'>,
): CasesOfTopic {
  const cases: FigureCase[] = [];
  const leftOut = new Map<string, number>();
  const leave = (reason: string, count: number): void => {
    leftOut.set(reason, (leftOut.get(reason) ?? 0) + count);
  };
  const take = (
    firing: FigureFiring,
    piece: FigurePiece | null,
    of: Pick<FigureCase, 'count' | 'yes' | 'value'>,
  ): void => {
    const group = groupOf(by, firing, piece);
    if (firing.startClass === null) leave(NO_START, of.count);
    else if (group === null) leave(NO_GROUP, of.count);
    else {
      const along = dimensionNumber(by, firing, piece);
      cases.push({ firing, startClass: firing.startClass, group, along, ...of });
    }
  };
  const isShare = SHARE_TOPICS.includes(topic);
  for (const firing of firings) {
    if (kiln !== undefined && firing.kilnId !== kiln) continue;
    const pieces = firing.pieces.filter(({ family }) => ware === undefined || family === ware);
    if (ware !== undefined && pieces.length === 0) continue;
    if (isShare) {
      for (const piece of pieces) {
        const yes = outcomeOf(topic, piece);
        if (yes === null) leave(NO_OUTCOME, piece.count);
        else take(firing, piece, { count: piece.count, yes, value: null });
      }
      continue;
    }
    const values = valuesOf(topic, firing);
    if (topic === 'stalls' && firing.stallDisputed) leave(STALL_DISPUTED, 1);
    else if (values.length === 0 && topic !== 'stalls') leave(NO_VALUE, 1);
    for (const value of values) take(firing, null, { count: 1, yes: null, value });
  }
  return {
    cases,
    leftOut: [...leftOut].map(([reason, count]) => ({ reason, count })),
  };
}
