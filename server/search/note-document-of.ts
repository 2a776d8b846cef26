import { noteDocumentSchema, kilnSizeOf, type NoteDocument } from '../../search/note-document.ts';
import type { NoteRow } from '#shared/api/note-rows.ts';
import type { GlazeAsked } from '#shared/question/reading-types.ts';
import { storyTexts } from '#shared/note/story.ts';
import { CAUSES } from '#shared/vocabulary/troubles.ts';
import { TROUBLES } from '#shared/vocabulary/troubles.ts';
import type { CountedRevision } from '../disputes/counted-revision.ts';
import { noteInShort } from '../notes/note-in-short.ts';

const MILLISECONDS_A_DAY = 86_400_000;
/** Routes after the draw that people ask for as if they were glazes. */
const ROUTES_ASKED = ['slip-resist', 'horsehair', 'dipped'] as const;

const unique = <T>(values: readonly T[]): T[] => [...new Set(values)];
const known = <T>(values: readonly (T | null)[]): T[] =>
  unique(values.filter((value): value is T => value !== null));

/** "700°C" and "700 °C" are the same two words in the index. */
function spacedUnits(text: string): string {
  return text.replace(/(\d)\s*°\s*([CF])\b/g, '$1 °$2');
}

/** How a note ended, best first; see the ordering of hits. */
function outcomeOf(row: NoteRow, hasRecord: boolean): NoteDocument['outcome'] {
  if (row.troubles.length === 0) return hasRecord ? 1 : 0;
  const { followOn } = row;
  if (followOn?.outcomes.some(({ outcome }) => outcome === 'gone')) return 3;
  if (followOn && followOn.changes.length > 0) return 2;
  return hasRecord ? 1 : 0;
}

/**
 * A published note as the engine holds it, from the projection and its revision. A trouble that its
 * author disputes is not sought or shown by: neither as a trouble, nor by its level, nor in short.
 */
export function noteDocumentOf(
  row: NoteRow,
  revision: Pick<CountedRevision, 'facts' | 'fields'>,
): NoteDocument {
  const { facts, fields } = revision;
  const texts = storyTexts(fields.story);
  const glazes: GlazeAsked[] = [
    ...known(fields.pieces.map((piece) => piece.glazeFamily)).filter((family) => family !== 'none'),
    ...ROUTES_ASKED.filter((route) => fields.pieces.some((piece) => piece.route === route)),
    ...(fields.pieces.some((piece) => piece.glazeFamily === 'none')
      ? (['bare-clay'] as const)
      : []),
  ];
  const spans = known(facts.pieces.map((piece) => piece.spanMm));
  const hasStall = facts.stalls.length > 0;
  // What the author calls a stall, where no record shows one, is sought at the peak of that firing.
  const namedStall = !hasStall && facts.namedTroubles.includes('stall') ? facts.peakCelsius : null;
  return noteDocumentSchema.parse({
    id: String(row.id),
    noteId: row.id,
    title: row.title,
    inShort: noteInShort(revision).join(' '),
    story: spacedUnits(texts.map((part) => part.text).join('\n')),
    pieceRemarks: fields.pieces
      .map((piece) => piece.remark)
      .filter((remark) => remark !== '')
      .join('\n'),
    troubles: row.troubles,
    measuredTroubles: [...facts.measuredTroubles],
    namedTroubles: [...facts.namedTroubles],
    troubleWords: row.troubles.map((trouble) => TROUBLES[trouble]),
    causeWords: fields.result.causes.map((cause) => CAUSES[cause]),
    causes: fields.result.causes,
    changes: row.changes,
    nextChanges: row.followOn?.changes ?? [],
    outcome: outcomeOf(row, facts.hasRecord),
    forms: known(facts.pieces.map((piece) => piece.family)),
    clays: unique(facts.pieces.map((piece) => piece.clay).filter((clay) => clay !== '')),
    glazes: unique(glazes),
    glazeNames: unique(fields.pieces.map((piece) => piece.glazeName).filter((name) => name !== '')),
    fuel: facts.fuel,
    kilnSize: kilnSizeOf(facts.volumeLitres),
    stallC: hasStall
      ? facts.stalls.map((stall) => Math.round(stall.levelCelsius))
      : namedStall === null
        ? []
        : [Math.round(namedStall)],
    sagC: facts.sags.map((sag) => Math.round(sag.topCelsius)),
    eventC: known(fields.pieces.map((piece) => piece.kilnCelsiusAtLoading)).filter(
      (celsius) => celsius >= -50 && celsius <= 1500,
    ),
    peakC: facts.peakCelsius === null ? null : Math.round(facts.peakCelsius),
    aimC: facts.targetCelsius,
    minutesToPeak: facts.timeToTemperatureMinutes,
    holdMinutes: facts.holdMinutes,
    crossingRatePerMin: facts.crossingRatePerMinute,
    cracks: facts.crackedPieces,
    widestCm: spans.length > 0 ? Math.max(...spans) / 10 : null,
    wind: fields.setUp.wind,
    weather: fields.setUp.weather,
    authorName: row.author?.name ?? '',
    kilnName: row.kiln.name,
    firedOn: Math.floor(Date.parse(`${row.firedOn}T00:00:00Z`) / MILLISECONDS_A_DAY),
    publishedAt: Math.floor(Date.parse(row.publishedAt) / 1000),
  });
}
