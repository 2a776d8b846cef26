import type { Knex } from 'knex';
import type { FindAnswer, FindQuery, Hit } from '#shared/api/search.ts';
import { nearnessCentre, orderByNearness, orderHits } from '#shared/question/order-hits.ts';
import { labelOf } from '#shared/question/part-labels.ts';
import { readQuestion } from '#shared/question/read-question.ts';
import type { QuestionReading } from '#shared/question/reading-types.ts';
import type { Tier } from '#shared/question/search-request.ts';
import { whyFound } from '#shared/question/why.ts';
import { withoutParts } from '#shared/question/without-parts.ts';
import type { Units } from '#shared/units/units.ts';
import type { Deps } from '../deps.ts';
import { readWhatHelped } from '../figures/figure-service.ts';
import { publishedRows } from '../notes/published-repository.ts';
import { chosenFacets, countClose, searchEngine, type EngineHit } from './engine-search.ts';
import { improvementsOf } from './improvements.ts';
import { chosenRanges } from './measured-ranges.ts';
import { hitWords, passageOf } from './passage.ts';
import { plainSearch } from './plain-search.ts';
import { readShownHits, type ShownHit } from './shown-hits.ts';

const A_PAGE = 20;
const TIERS: readonly Tier[] = ['close', 'same-trouble', 'by-words'];
const POOLED_ROWS = 3;

interface Question {
  /** As typed, with all its parts. */
  readonly whole: QuestionReading;
  /** Without the parts switched off. */
  readonly asked: QuestionReading;
  readonly off: ReadonlySet<string>;
}

function questionOf(query: FindQuery, units: Units): Question {
  const whole = readQuestion(query.q, { preferredUnit: units.temperature });
  const off = (query.off ?? '').split(',').filter((key) => key !== '');
  return { whole, asked: withoutParts(whole, off), off: new Set(off) };
}

/** Tiers one after the other, each in its own order, every note once. */
function inOrder(hits: readonly EngineHit[], asked: QuestionReading, sort: FindQuery['sort']) {
  const centre = nearnessCentre(asked);
  const seen = new Set<number>();
  const joined = TIERS.flatMap((tier) =>
    orderHits(
      hits.filter((hit) => hit.tier === tier),
      centre,
    ),
  ).filter((hit) => !seen.has(hit.document.noteId) && seen.add(hit.document.noteId));
  if (sort === 'newest') {
    return joined.sort((a, b) => b.document.publishedAt - a.document.publishedAt);
  }
  return sort === 'nearest' && centre !== null ? orderByNearness(joined, centre) : joined;
}

/** What the next firing brought, best first; notes without one keep their order at the end. */
async function mostImproved(db: Knex, hits: readonly EngineHit[]): Promise<EngineHit[]> {
  const gains = await improvementsOf(
    db,
    hits.map(({ document }) => document.noteId),
  );
  const rank = ({ document, outcome }: EngineHit): readonly [number, number] => [
    outcome,
    gains.get(document.noteId) ?? -Infinity,
  ];
  return [...hits].sort((a, b) => {
    const [outcomeA, gainA] = rank(a);
    const [outcomeB, gainB] = rank(b);
    return outcomeB - outcomeA || (gainA === gainB ? 0 : gainB - gainA);
  });
}

/** Answers a question: from the engine, or, when it is away, from MariaDB's full text. */
export async function find(
  db: Knex,
  deps: Deps,
  query: FindQuery,
  units: Units,
): Promise<FindAnswer> {
  const question = questionOf(query, units);
  const { whole, asked, off } = question;
  const parts = whole.parts.map((part) => ({
    key: part.key,
    kind: part.kind,
    label: labelOf(part, units),
    off: off.has(part.key),
  }));
  const chosen = chosenFacets(query);
  const [pooled, answer] = await Promise.all([
    pooledAnswer(db, asked),
    searchEngine(deps.config, asked, chosen, chosenRanges(query)).catch((error: unknown) => {
      deps.log.warn({ err: error }, 'the engine is away: plain search');
      return null;
    }),
  ]);
  if (answer === null) {
    return { ...(await findPlainly(db, query, asked)), parts, pooled };
  }
  const joined = inOrder(answer.hits, asked, query.sort);
  const ordered = query.sort === 'improvement' ? await mostImproved(db, joined) : joined;
  const shown = ordered.slice((query.page - 1) * A_PAGE, query.page * A_PAGE);
  // Only what is published now is shown, whatever the index still holds.
  const [published, details] = await Promise.all([
    publishedRows(
      db,
      shown.map((hit) => hit.document.noteId),
    ),
    readShownHits(deps.config, shown).catch((error: unknown) => {
      deps.log.warn({ err: error }, 'the engine is away: hits without passages');
      return new Map<number, ShownHit>();
    }),
  ]);
  const rows = new Map(published.map((row) => [row.id, row]));
  const hits = shown.flatMap((hit): Hit[] => {
    const note = rows.get(hit.document.noteId);
    if (!note) return [];
    // A note changed this very moment may be missing here: it is shown without the reason.
    const told = details.get(note.id);
    const passage = passageOf(told?.marked);
    const why =
      told === undefined || query.q.trim() === ''
        ? ''
        : whyFound(asked, told.found, hit.tier, units, hitWords(passage));
    return [{ note, tier: hit.tier, why, passage }];
  });
  return {
    parts,
    hits,
    total: ordered.length,
    page: query.page,
    pages: Math.max(1, Math.ceil(ordered.length / A_PAGE)),
    facets: answer.facets,
    histograms: answer.histograms,
    pooled,
    loosen: ordered.length === 0 ? await looser(deps, question, units).catch(() => []) : [],
    plain: false,
  };
}

async function findPlainly(
  db: Knex,
  query: FindQuery,
  asked: QuestionReading,
): Promise<Omit<FindAnswer, 'parts' | 'pooled'>> {
  const ids = await plainSearch(db, asked);
  const rows = await publishedRows(db, ids.slice((query.page - 1) * A_PAGE, query.page * A_PAGE));
  return {
    hits: rows.map((note) => ({ note, tier: 'by-words', why: '', passage: null })),
    total: ids.length,
    page: query.page,
    pages: Math.max(1, Math.ceil(ids.length / A_PAGE)),
    facets: {},
    histograms: [],
    loosen: [],
    plain: true,
  };
}

/** Which part to leave out, and how many notes that would find; most first. */
async function looser(
  deps: Deps,
  { asked }: Question,
  units: Units,
): Promise<FindAnswer['loosen']> {
  const counts = await countClose(
    deps.config,
    asked.parts.map((part) => withoutParts(asked, [part.key])),
  );
  return asked.parts
    .map((part, index) => ({
      key: part.key,
      label: labelOf(part, units),
      count: counts[index] ?? 0,
    }))
    .filter((part) => part.count > 0)
    .sort((a, b) => b.count - a.count);
}

/** What was tried next for the trouble asked about: the fullest table's first rows. */
async function pooledAnswer(db: Knex, asked: QuestionReading): Promise<FindAnswer['pooled']> {
  const [trouble] = asked.trouble;
  if (trouble === undefined) return null;
  const helped = await readWhatHelped(db, trouble);
  const [table] = [...helped.tables].sort((a, b) => b.pairs - a.pairs);
  if (!table || table.pairs === 0) return null;
  return {
    trouble,
    startClass: table.startClass,
    source: table.source,
    pairs: table.pairs,
    rows: table.ranked.slice(0, POOLED_ROWS + 1).map((row) => ({
      change: row.change,
      gone: row.gone,
      firings: row.firings,
      members: row.members,
      verdict: row.verdict,
      caution: row.caution,
    })),
  };
}
