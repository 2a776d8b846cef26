import type { Knex } from 'knex';
import type { CountedFacts } from '#shared/note/counted-facts.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import type { Piece } from '#shared/note/pieces.ts';
import type { FigureDimension, FigureTopic } from '#shared/vocabulary/figures.ts';
import { FAMILY_OF_FORM } from '#shared/vocabulary/ware.ts';
import { readJson } from '../../server/database/read-json.ts';

/**
 * Figures made the plain way, from the fields of published revisions and one loop after another, to
 * hold the real ones against. Nothing of `server/figures` is used.
 */
export interface PlainFiring {
  readonly noteId: number;
  readonly kilnId: number;
  readonly member: string;
  readonly fields: NoteFields;
  readonly facts: CountedFacts;
}

export async function plainFirings(db: Knex): Promise<PlainFiring[]> {
  const rows = await db('notes')
    .join('note_revisions', 'note_revisions.id', 'notes.published_revision_id')
    .join('published_firings', 'published_firings.note_id', 'notes.id')
    .where('notes.status', 'published')
    .whereNull('notes.removed_at')
    .orderBy('notes.id')
    .select<
      { id: number; kiln_id: number; author_id: number | null; fields: unknown; facts: unknown }[]
    >(
      'notes.id',
      'note_revisions.kiln_id',
      'notes.author_id',
      'note_revisions.fields',
      'published_firings.facts',
    );
  return rows.map((row) => ({
    noteId: row.id,
    kilnId: row.kiln_id,
    member: row.author_id === null ? `gone ${String(row.id)}` : String(row.author_id),
    fields: readJson(row.fields) as NoteFields,
    facts: readJson(row.facts) as CountedFacts,
  }));
}

interface PlainCase {
  readonly firing: PlainFiring;
  readonly start: string;
  readonly group: string;
  readonly yes: boolean;
  readonly value: number;
}

export interface PlainGroup {
  readonly cases: number;
  readonly firings: number;
  readonly members: number;
  readonly enough: boolean;
  readonly yes: number;
  readonly effective: number;
  readonly share: number | null;
  readonly low: number | null;
  readonly high: number | null;
  readonly q1: number | null;
  readonly median: number | null;
  readonly q3: number | null;
  readonly values: number[];
}

const cut = (value: number | null, names: readonly (readonly [number, string])[]) => {
  if (value === null) return null;
  let name = null;
  for (const [from, each] of names) if (value >= from) name = each;
  return name;
};
const from = (...cuts: number[]): [number, string][] => [
  [-Infinity, 'from-0'],
  ...cuts.map((each): [number, string] => [each, `from-${String(each)}`]),
];
const PACE: [number, string][] = [
  [-Infinity, 'gentle'],
  [20, 'middling'],
  [40, 'fast'],
];

function groupOf(by: FigureDimension, firing: PlainFiring, piece: Piece | null): string | null {
  const { facts, fields } = firing;
  const recipe = piece?.recipe ?? fields.reduction;
  switch (by) {
    case 'form':
      return piece?.form ?? null;
    case 'span':
      return cut(piece?.spanMm ?? null, from(100, 200, 300));
    case 'wall-thickness':
      return cut(piece?.wallMm ?? null, from(6, 8, 10));
    case 'clay':
      return piece?.clay.trim().toLowerCase() || null;
    case 'rate':
      return cut(facts.rate400To700, PACE);
    case 'crossing':
      return cut(facts.crossingRatePerMinute, PACE);
    case 'lies':
      return piece?.lies ?? null;
    case 'preheating':
      return piece?.preheating ?? null;
    case 'bisque':
      return cut(piece?.bisqueCelsius ?? null, from(950, 1000, 1050));
    case 'quench':
      if (recipe.then === null) return null;
      return recipe.then === 'quenched' ? 'quenched' : 'not-quenched';
    case 'route':
      return piece?.route ?? null;
    case 'combustible': {
      const kinds = new Set(recipe.combustibles.map(({ kind }) => kind));
      return kinds.size > 1 ? 'several' : ([...kinds][0] ?? null);
    }
    case 'litres-per-litre': {
      const amounts = recipe.combustibles.map(({ litres }) => litres);
      if (amounts.length === 0 || recipe.containerLitres === null) return null;
      let sum = 0;
      for (const litres of amounts) {
        if (litres === null) return null;
        sum += litres;
      }
      return cut(sum / recipe.containerLitres, from(0.1, 0.25, 0.5));
    }
    case 'seconds-in-air':
      return cut(recipe.secondsInAir, from(10, 20, 40));
    case 'volume':
      return cut(facts.volumeLitres, from(50, 100, 200));
    case 'lining':
      if (facts.wall === 'brick') return 'brick';
      if (facts.wall !== 'fibre' || facts.liningMm === null) return null;
      return facts.liningMm < 50 ? 'fibre-thin' : 'fibre-thick';
    case 'fuel':
      return facts.fuel;
    case 'glaze': {
      const families = new Set(fields.pieces.flatMap(({ glazeFamily }) => glazeFamily ?? []));
      return families.size > 1 ? 'several' : ([...families][0] ?? null);
    }
  }
}

function listCases(
  topic: FigureTopic,
  by: FigureDimension,
  firings: readonly PlainFiring[],
  filter: { kiln?: number | undefined; ware?: string | undefined },
): PlainCase[] {
  const cases: PlainCase[] = [];
  for (const firing of firings) {
    if (filter.kiln !== undefined && firing.kilnId !== filter.kiln) continue;
    const start = firing.fields.when.startClass;
    const pieces = firing.fields.pieces.filter(
      ({ form }) => filter.ware === undefined || (form && FAMILY_OF_FORM[form] === filter.ware),
    );
    if (filter.ware !== undefined && pieces.length === 0) continue;
    if (start === null) continue;
    const add = (piece: Piece | null, yes: boolean, value: number): void => {
      const group = groupOf(by, firing, piece);
      if (group !== null) cases.push({ firing, start, group, yes, value });
    };
    const { facts } = firing;
    const addNumber = (value: number | null): void => {
      if (value !== null) add(null, false, value);
    };
    if (topic === 'time') addNumber(facts.timeToTemperatureMinutes);
    if (topic === 'hold') addNumber(facts.holdMinutes);
    if (topic === 'peak') addNumber(facts.peakCelsius);
    if (topic === 'gas') addNumber(firing.fields.setUp.gasUsedKg);
    if (topic === 'stalls') for (const stall of facts.stalls) addNumber(stall.levelCelsius);
    for (const piece of pieces) {
      for (let each = 0; each < (piece.count ?? 1); each += 1) {
        if (topic === 'cracks' && piece.cracked !== null) add(piece, piece.cracked, 0);
        if (topic === 'colour' && piece.colour !== null) add(piece, piece.colour === 'as-hoped', 0);
        if (topic === 'bare-clay' && piece.bareClay && piece.bareClay !== 'not-applicable') {
          add(piece, piece.bareClay === 'black', 0);
        }
      }
    }
  }
  return cases;
}

/** Two-sided 95 % of the standard normal distribution (from memory, to ten figures). */
const Z = 1.959963985;

/** Wilson as the two roots of a quadratic: |p − t| = z √(t(1 − t)/n). */
function roots(p: number, n: number): [number, number] {
  const a = 1 + (Z * Z) / n;
  const b = -(2 * p + (Z * Z) / n);
  const c = p * p;
  const root = Math.sqrt(Math.max(0, b * b - 4 * a * c));
  return [(-b - root) / (2 * a), (-b + root) / (2 * a)];
}

/** Type 7: where x falls among n − 1 equal steps. */
function typeSeven(sorted: readonly number[], p: number): number | null {
  if (sorted.length === 0) return null;
  const place = (sorted.length - 1) * p;
  const low = sorted[Math.floor(place)] ?? 0;
  const high = sorted[Math.ceil(place)] ?? 0;
  return low * (1 - (place - Math.floor(place))) + high * (place - Math.floor(place));
}

function groupFrom(cases: readonly PlainCase[]): PlainGroup {
  const n = cases.length;
  const members = [...new Set(cases.map(({ firing }) => firing.member))];
  const firings = new Set(cases.map(({ firing }) => firing.noteId)).size;
  const enough = firings >= 5 && members.length >= 3;
  let squares = 0;
  for (const member of members) {
    squares += cases.filter(({ firing }) => firing.member === member).length ** 2;
  }
  const effective = n / (1 + 0.2 * (squares / n - 1));
  const yes = cases.filter((each) => each.yes).length;
  const [low, high] = roots(yes / n, effective);
  const values = cases.map(({ value }) => value).sort((a, b) => a - b);
  return {
    cases: n,
    firings,
    members: members.length,
    enough,
    yes,
    effective,
    share: enough ? yes / n : null,
    low: enough ? low : null,
    high: enough ? high : null,
    q1: enough ? typeSeven(values, 0.25) : null,
    median: enough ? typeSeven(values, 0.5) : null,
    q3: enough ? typeSeven(values, 0.75) : null,
    values,
  };
}

/** Cold before hot; groups that have cases, by their id. */
export function plainFigures(
  topic: FigureTopic,
  by: FigureDimension,
  firings: readonly PlainFiring[],
  filter: { kiln?: number | undefined; ware?: string | undefined },
  pair: { readonly a: string; readonly b: string } | null,
) {
  let all = listCases(topic, by, firings, filter);
  if (by === 'clay') {
    const counts = new Map<string, number>();
    for (const { group } of all) counts.set(group, (counts.get(group) ?? 0) + 1);
    const most = [...counts.keys()]
      .sort()
      .sort((a, b) => (counts.get(b) ?? 0) - (counts.get(a) ?? 0));
    all = all.filter(({ group }) => most.slice(0, 12).includes(group));
  }
  const tables = [];
  for (const startClass of ['cold', 'hot'] as const) {
    const own = all.filter(({ start }) => start === startClass);
    if (own.length === 0) continue;
    const groups = new Map<string, PlainGroup>();
    for (const id of new Set(own.map(({ group }) => group))) {
      groups.set(id, groupFrom(own.filter(({ group }) => group === id)));
    }
    const a = pair ? groups.get(pair.a) : undefined;
    const b = pair ? groups.get(pair.b) : undefined;
    let difference = null;
    if (a?.enough && b?.enough && a !== b) {
      const [p, q] = [a.yes / a.cases, b.yes / b.cases];
      const [l1, u1] = roots(p, a.effective);
      const [l2, u2] = roots(q, b.effective);
      difference = {
        share: p - q,
        low: p - q - Math.sqrt((p - l1) ** 2 + (u2 - q) ** 2),
        high: p - q + Math.sqrt((u1 - p) ** 2 + (q - l2) ** 2),
      };
    }
    tables.push({
      startClass,
      cases: own.length,
      firings: new Set(own.map(({ firing }) => firing.noteId)).size,
      members: new Set(own.map(({ firing }) => firing.member)).size,
      groups,
      difference,
    });
  }
  return tables;
}
