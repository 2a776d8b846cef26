import type { WhatHelped, WhatHelpedRow } from '#shared/api/figures.ts';
import { formatNumber } from '#shared/units/number.ts';
import { NO_BREAK_SPACE } from '#shared/units/units.ts';
import { CHANGES } from '#shared/vocabulary/changes.ts';

export type HelpedTable = WhatHelped['tables'][number];

/** Where the trouble is known from. */
export const SOURCE_WORDS = {
  measured: 'found in the record',
  named: 'named by the author',
} as const;
export const START_WORDS = { cold: 'Cold starts', hot: 'Hot starts' } as const;

const points = (share: number): string => formatNumber(share * 100);

const moreOrFewer = (share: number): string =>
  `${points(Math.abs(share))} ${share < 0 ? 'fewer' : 'more'}`;

const firingsBy = ({ gone, firings, members }: WhatHelpedRow): string =>
  `${String(gone)} of ${String(firings)} ${firings === 1 ? 'firing' : 'firings'} by ${String(members)} ${members === 1 ? 'member' : 'members'}`;

/** The name of a row: a change, or that none is named. */
export function rowWords(row: WhatHelpedRow): string {
  return row.change === null ? 'No change named' : CHANGES[row.change];
}

/** One sentence that says what a row says, without a symbol. */
export function rowSentence(row: WhatHelpedRow, trouble: string): string {
  if (row.change === null) {
    return row.firings === 0
      ? 'No firing without a named change can be compared, so there is nothing to hold the changes against.'
      : `With no change named, “${trouble}” was gone in ${firingsBy(row)}.`;
  }
  const counted = `After “${CHANGES[row.change].toLowerCase()}”, “${trouble}” was gone in ${firingsBy(row)}`;
  const { difference } = row;
  if (difference === null) {
    return `${counted}; there are too few firings with no change named to hold this against.`;
  }
  const size = `${moreOrFewer(difference.share)} in a hundred than with no change named`;
  const between = `anything from ${moreOrFewer(difference.low)} to ${moreOrFewer(difference.high)} fits the counts`;
  switch (row.verdict) {
    case 'better':
      return `${counted}, ${size} (${between}): better than changing nothing.`;
    case 'worse':
      return `${counted}, ${size} (${between}): worse than changing nothing.`;
    case 'cannot-be-told':
    case 'too-few':
    case 'reference':
      return `${counted}, ${size} (${between}): this cannot be told from changing nothing.`;
  }
}

/** The small figures under a row: tried alone, and if every missing follow-on had failed. */
export function rowAsides(row: WhatHelpedRow): string[] {
  const alone =
    row.change === null
      ? null
      : row.alone.firings === 0
        ? 'never tried alone'
        : `tried alone: ${String(row.alone.gone)} of ${String(row.alone.firings)}`;
  const missing =
    row.shareIfMissingFailed === null || row.shareIfMissingFailed === row.share
      ? null
      : `if every missing follow-on had failed: ${points(row.shareIfMissingFailed)}${NO_BREAK_SPACE}%`;
  return [alone, missing].filter((aside) => aside !== null);
}

/** The level of the intervals of differences, so many changes being shown: "99.2 %". */
export function levelWords(changesShown: number): string {
  return `${formatNumber(100 * (1 - 0.05 / Math.max(1, changesShown)), 1)}${NO_BREAK_SPACE}%`;
}

/** Cold before hot, measured before named: the order of the tables on the page. */
export function inReadingOrder(tables: readonly HelpedTable[]): HelpedTable[] {
  const place = ({ startClass, source }: HelpedTable): number =>
    (startClass === 'cold' ? 0 : 2) + (source === 'measured' ? 0 : 1);
  return [...tables].sort((a, b) => place(a) - place(b));
}
