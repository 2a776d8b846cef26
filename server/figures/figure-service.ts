import type { Knex } from 'knex';
import type { FrontData, TroubleShares, WhatHelped } from '#shared/api/figures.ts';
import { CHANGES } from '#shared/vocabulary/changes.ts';
import { MARKS } from '#shared/vocabulary/marks.ts';
import { TROUBLE_SHORT, TROUBLES, type Trouble } from '#shared/vocabulary/troubles.ts';
import { countPublished, newestRows, publishedRows } from '../notes/published-repository.ts';
import { duringTheFiring } from './during-the-firing.ts';
import { figuresVersion, firingsAround, troubleCounts } from './figure-repository.ts';
import { whatHelped } from './what-helped.ts';

const START_CLASSES = ['cold', 'hot'] as const;
const SOURCES = ['measured', 'named'] as const;

/** Figures asked for often, kept until anything they read changes. */
const kept = new Map<string, { version: string; value: WhatHelped }>();

/** What was tried next for a trouble, cold and hot starts apart, measured and named apart. */
export async function readWhatHelped(db: Knex, trouble: Trouble): Promise<WhatHelped> {
  const version = await figuresVersion(db);
  const before = kept.get(trouble);
  // In a test's open transaction versions may repeat with other contents.
  if (before?.version === version && db.isTransaction !== true) return before.value;
  const firings = await firingsAround(db, trouble);
  const tables = START_CLASSES.flatMap((startClass) =>
    SOURCES.map((source) => whatHelped(trouble, startClass, firings, source)),
  ).filter((table) => table.pairs > 0 || table.leftOut.length > 0);
  const during =
    trouble === 'stall'
      ? START_CLASSES.flatMap((startClass) =>
          duringTheFiring(startClass, firings).map((row) => ({ ...row, startClass })),
        ).filter((row) => row.firings > 0)
      : [];
  const ids = new Set([
    ...tables.flatMap((table) => [...table.ranked, ...table.tooFew].flatMap((row) => row.noteIds)),
    ...during.flatMap((row) => row.noteIds),
  ]);
  const rows = await publishedRows(db, [...ids]);
  const value: WhatHelped = {
    trouble,
    tables,
    duringTheFiring: during.map((row) => ({
      change: row.mark === null ? 'Nothing done' : MARKS[row.mark],
      startClass: row.startClass,
      firings: row.firings,
      members: row.members,
      wentOn: row.wentOn,
      share: row.share,
      interval: row.interval,
      caution: row.caution,
      noteIds: [...row.noteIds],
    })),
    disputed: firings.filter(({ disputed }) => disputed?.includes(trouble)).length,
    notes: Object.fromEntries(
      rows.map((row) => [row.id, { id: row.id, slug: row.slug, title: row.title }]),
    ),
  };
  if (db.isTransaction !== true) kept.set(trouble, { version, value });
  return value;
}

/** How many of the published notes had each trouble. */
export async function readTroubleShares(db: Knex): Promise<TroubleShares> {
  const [published, troubles] = await Promise.all([countPublished(db), troubleCounts(db)]);
  return { ...published, troubles };
}

const SENTENCES = 4;

/** Front page: shares, newest notes, and the pooled figures that are strong enough to be said. */
export async function readFront(db: Knex): Promise<FrontData> {
  const [shares, newest] = await Promise.all([readTroubleShares(db), newestRows(db, 8)]);
  const sentences: FrontData['sentences'] = [];
  for (const { trouble } of shares.troubles.slice(0, 6)) {
    if (sentences.length >= SENTENCES) break;
    const said = strongestSentence(await readWhatHelped(db, trouble));
    if (said !== null) sentences.push({ text: said, trouble });
  }
  return { shares, newest, sentences };
}

/** One sentence with its counts, from the fullest table of a trouble; null when all are too thin. */
function strongestSentence(helped: WhatHelped): string | null {
  const [table] = helped.tables
    .filter((each) => each.ranked.length > 1)
    .sort((a, b) => b.pairs - a.pairs);
  const best = table?.ranked.find((row) => row.change !== null && row.caution === null);
  if (!table || !best || best.change === null) return null;
  const unchanged = table.ranked[0];
  const compared =
    unchanged && unchanged.firings > 0
      ? ` With no change named it was gone in ${String(unchanged.gone)} of ${String(unchanged.firings)}.`
      : '';
  return `${TROUBLES[helped.trouble]}, ${table.startClass} start: after “${CHANGES[best.change].toLowerCase()}” the ${TROUBLE_SHORT[helped.trouble]} was gone in ${String(best.gone)} of ${String(best.firings)} firings by ${String(best.members)} members.${compared}`;
}
