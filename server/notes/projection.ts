import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import type { FollowOn } from '#shared/api/note-rows.ts';
import type { CountedFacts } from '#shared/note/counted-facts.ts';
import { storyTexts } from '#shared/note/story.ts';
import type { Trouble } from '#shared/vocabulary/troubles.ts';
import { countedRevision, type CountedRevision } from '../disputes/counted-revision.ts';
import { figureRow } from '../figures/catch-up-figures.ts';
import { outcomesBetween } from '../figures/outcomes-between.ts';
import { keepClimb } from '../look-alikes/keep-climb.ts';
import { enqueue } from '../outbox/outbox.ts';
import { factsOfKiln, type StoredRow } from './published-repository.ts';
import { findRevision } from './revision-repository.ts';
import { slugOf } from './slug.ts';

/**
 * Keeps `published_firings`, `firing_troubles` and `published_figures` in step with what is published, inside the
 * transaction that publishes, corrects, disputes or takes down, and promises the index its change.
 * What is written is what counts: the facts without what the author disputes.
 */
export async function projectNote(trx: Knex, noteId: number): Promise<void> {
  const note = await trx('notes').where('notes.id', noteId).first<
    | {
        published_revision_id: number | null;
        published_at: Date | null;
        author_id: number | null;
        removed_at: Date | null;
      }
    | undefined
  >('notes.published_revision_id', 'notes.published_at', 'notes.author_id', 'notes.removed_at');
  const before = await trx('published_firings')
    .where('published_firings.note_id', noteId)
    .first<{ kiln_id: number } | undefined>('published_firings.kiln_id');
  const revision =
    note?.published_revision_id && note.removed_at === null
      ? await findRevision(trx, note.published_revision_id)
      : null;

  // One at a time per kiln: what follows what depends on all its firings.
  const kilnIds = [...new Set([before?.kiln_id, revision?.kilnId])].filter(
    (id) => id !== undefined,
  );
  await trx('kilns')
    .whereIn('kilns.id', kilnIds)
    .orderBy('kilns.id')
    .forUpdate()
    .select('kilns.id');

  await trx('published_firings').where({ note_id: noteId }).delete();
  if (revision && note) {
    const counted = await countedRevision(trx, revision);
    await insertFiring(trx, counted, note.author_id, note.published_at ?? new Date());
  }
  await keepClimb(trx, noteId, revision);
  for (const kilnId of kilnIds) await relinkKiln(trx, kilnId);
  await promiseIndex(trx, noteId);
}

async function promiseIndex(trx: Knex, noteId: number): Promise<void> {
  await enqueue(trx, 'index-note', `${String(noteId)}:${randomUUID()}`, { noteId });
}

async function insertFiring(
  trx: Knex,
  revision: CountedRevision,
  authorId: number | null,
  publishedAt: Date,
): Promise<void> {
  const { firing, troubles, figures } = projectedRows(
    revision,
    storedRow(revision),
    authorId,
    publishedAt,
  );
  await trx('published_firings').insert(firing);
  if (troubles.length > 0) await trx('firing_troubles').insert(troubles);
  await trx('published_figures').insert(figures);
}

/** The rows of the published firing, its troubles and its figures that a revision stands for. */
export function projectedRows(
  revision: Pick<CountedRevision, 'id' | 'noteId' | 'kilnId' | 'fields' | 'facts'>,
  row: StoredRow,
  authorId: number | null,
  publishedAt: Date,
) {
  const { fields, facts, noteId } = revision;
  const measured = new Set<Trouble>(facts.measuredTroubles);
  const named = new Set<Trouble>(facts.namedTroubles);
  const disputed = new Set<Trouble>(facts.disputed);
  return {
    firing: {
      note_id: noteId,
      revision_id: revision.id,
      kiln_id: revision.kilnId,
      author_id: authorId,
      fired_on: fields.when.date,
      fired_at_time: fields.when.startTime,
      tried_note_id: fields.triedNoteId,
      slug: slugOf(fields.title),
      title: fields.title,
      facts: JSON.stringify(facts),
      note_row: JSON.stringify(row),
      story_text: storyTexts(fields.story)
        .map((part) => part.text)
        .join('\n'),
      published_at: publishedAt,
    },
    troubles: [...new Set([...measured, ...named, ...disputed])].map((trouble) => ({
      note_id: noteId,
      trouble,
      measured: measured.has(trouble),
      named: named.has(trouble),
      disputed: disputed.has(trouble),
    })),
    figures: figureRow(noteId, fields, facts),
  };
}

/** The row of a revision, without what is joined in when it is read. */
export function storedRow(
  revision: Pick<CountedRevision, 'noteId' | 'fields' | 'facts' | 'strip' | 'stripWords'>,
): StoredRow {
  const { facts, fields } = revision;
  return {
    id: revision.noteId,
    slug: slugOf(fields.title),
    title: fields.title,
    strip: revision.strip,
    stripWords: revision.stripWords,
    troubles: [...new Set<Trouble>([...facts.measuredTroubles, ...facts.namedTroubles])],
    measuredTroubles: [...facts.measuredTroubles],
    disputedTroubles: [...facts.disputed],
    targetCelsius: fields.plan.targetCelsius,
    peakCelsius: facts.peakCelsius,
    timeToTemperatureMinutes: facts.timeToTemperatureMinutes,
    holdMinutes: facts.holdMinutes,
    stallCelsius: facts.stalls.map((stall) => stall.levelCelsius),
    crackedPieces: facts.crackedPieces,
    pieces: facts.pieceCount,
    changes: fields.changes.map((row) => row.change),
    followOn: null,
    volumeLitres: facts.volumeLitres,
  };
}

/** What a firing's row tells of the next firing of its kiln. */
export function followOnOf(
  facts: CountedFacts,
  next: {
    noteId: number;
    title: string;
    firedOn: string;
    row: Pick<StoredRow, 'changes'>;
    facts: CountedFacts;
  },
): FollowOn {
  return {
    noteId: next.noteId,
    title: next.title,
    firedOn: next.firedOn,
    changes: next.row.changes,
    peakCelsius: next.facts.peakCelsius,
    timeToTemperatureMinutes: next.facts.timeToTemperatureMinutes,
    outcomes: outcomesBetween(facts, next.facts),
  };
}

/** Tells every firing of the kiln what came after it; only rows that change are written. */
async function relinkKiln(trx: Knex, kilnId: number): Promise<void> {
  const firings = await factsOfKiln(trx, kilnId);
  for (const [index, firing] of firings.entries()) {
    const next = firings[index + 1];
    const followOn = next ? followOnOf(firing.facts, next) : null;
    if (JSON.stringify(firing.row.followOn) === JSON.stringify(followOn)) continue;
    await trx('published_firings')
      .where({ note_id: firing.noteId })
      .update({ note_row: JSON.stringify({ ...firing.row, followOn }) });
    await promiseIndex(trx, firing.noteId);
  }
}
