import type { Knex } from 'knex';
import type { TopicFigures, TopicQuery } from '#shared/api/figure-topics.ts';
import type { FigureTopic } from '#shared/vocabulary/figures.ts';
import { figuresVersion } from './figure-repository.ts';
import type { FigureFiring } from './topic-cases.ts';
import { topicCsv } from './topic-csv.ts';
import { topicFigures } from './topic-figures.ts';
import { figureFirings, figureRowsVersion, firedKilns } from './topic-repository.ts';

/** The rows of all plots, kept until anything they read changes. */
let kept: { readonly version: string; readonly firings: readonly FigureFiring[] } | null = null;

async function firingsNow(db: Knex): Promise<readonly FigureFiring[]> {
  // In a test's open transaction versions may repeat with other contents.
  if (db.isTransaction === true) return figureFirings(db);
  const version = (await Promise.all([figuresVersion(db), figureRowsVersion(db)])).join('|');
  if (kept?.version === version) return kept.firings;
  const firings = await figureFirings(db);
  kept = { version, firings };
  return firings;
}

/** A plot of published, undisputed firings. */
export async function readTopic(
  db: Knex,
  topic: FigureTopic,
  query: TopicQuery,
): Promise<TopicFigures> {
  const [firings, kilns] = await Promise.all([firingsNow(db), firedKilns(db, query.kiln)]);
  return { ...topicFigures(topic, query, firings), kilns };
}

/** The rows behind it. */
export async function readTopicCsv(
  db: Knex,
  topic: FigureTopic,
  query: TopicQuery,
): Promise<string> {
  return topicCsv(topic, query, await firingsNow(db));
}
