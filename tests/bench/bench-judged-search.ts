import { METRIC_UNITS } from '#shared/units/units.ts';
import { findQuerySchema } from '#shared/api/search.ts';
import { NOTES_INDEX, type NoteDocument } from '../../search/note-document.ts';
import type { Deps } from '../../server/deps.ts';
import { find } from '../../server/search/find-service.ts';
import { searchingClient } from '../../server/search/search-client.ts';
import { judgeSearch } from '../support/judged-questions/judge-search.ts';
import {
  meanMeasures,
  type RankingMeasures,
} from '../support/judged-questions/ranking-measures.ts';
import { print } from './measure.ts';

/** Titles in the order in which a reader is shown them. */
export async function askWhole(deps: Deps, question: string): Promise<string[]> {
  const query = findQuerySchema.parse({ q: question });
  const { hits } = await find(deps.db, deps, query, METRIC_UNITS);
  return hits.map(({ note }) => note.title);
}

/** The same engine, synonyms and typing mistakes and all, asked with the question as it was typed. */
export async function askAsText(deps: Deps, question: string): Promise<string[]> {
  const client = await searchingClient(deps.config);
  const { hits } = await client
    .index<NoteDocument>(NOTES_INDEX)
    .search(question, { limit: 20, attributesToRetrieve: ['title'] });
  return hits.map(({ title }) => title);
}

function said(measures: readonly RankingMeasures[]): string {
  const { ndcg, reciprocalRank, successAt1 } = meanMeasures(measures);
  const three = (value: number): string => value.toFixed(3);
  return `nDCG@10 ${three(ndcg)}, RR ${three(reciprocalRank)}, success@1 ${three(successAt1)}`;
}

/** How well the right notes come first, over the judged questions of the demo. */
export async function benchJudgedSearch(deps: Deps): Promise<void> {
  const whole = await judgeSearch((question) => askWhole(deps, question));
  const text = await judgeSearch((question) => askAsText(deps, question));
  print(`judged search (${String(whole.length)} questions)`, said(whole), 'aim 0.92, success 0.9');
  print('the same questions as plain text', said(text));
  const gain = meanMeasures(whole).ndcg / meanMeasures(text).ndcg - 1;
  print('judged search above plain text', `${(gain * 100).toFixed(0)} % in nDCG@10`, 'aim ≥ 25 %');
}
