import type { Knex } from 'knex';
import type { Notebook } from '#shared/api/notes.ts';
import { openChecks } from '#shared/note/checks/check.ts';
import type { Actor, SignedIn } from '../authorization/actor.ts';
import { canOnNote } from '../authorization/rules.ts';
import { AppError } from '../http/problem.ts';
import { findKilnVersion } from '../kilns/kiln-repository.ts';
import { findNote, notesOf, type NoteRecord } from './note-repository.ts';
import { noteSubject } from './note-subject.ts';
import type { NoteToShow } from './note-presenter.ts';
import { findRevision, type Revision } from './revision-repository.ts';
import { openRemarkCounts, lastDecisionReasons } from '../desk/remark-repository.ts';
import { stripsOfNotes } from './note-strips.ts';
import { slugOf } from './slug.ts';
import { revisionSummaries } from './notebook-repository.ts';

/** A revision with its author and the kiln as it was then. */
export async function toShow(db: Knex, note: NoteRecord, revision: Revision): Promise<NoteToShow> {
  const [author, kiln, fields] = await Promise.all([
    note.authorId === null
      ? undefined
      : db('members')
          .where('members.id', note.authorId)
          .first<{ id: number; name: string } | undefined>('members.id', 'members.name'),
    db('kilns')
      .where('kilns.id', revision.kilnId)
      .first<{ name: string; removed_at: Date | null } | undefined>(
        'kilns.name',
        'kilns.removed_at',
      ),
    findKilnVersion(db, revision.kilnId, revision.kilnVersion),
  ]);
  if (!kiln || !fields) throw new Error('A revision has lost its kiln.');
  return {
    note,
    revision,
    author: author ?? null,
    kiln: { name: kiln.name, removed: kiln.removed_at !== null, fields },
  };
}

/**
 * The note as readers see it: its published revision. Its author, before that, sees the revision
 * handed in; to everybody else an unpublished note is not there.
 */
export async function readNotePage(db: Knex, actor: Actor, noteId: number): Promise<NoteToShow> {
  const note = await findNote(db, noteId);
  if (!note || !canOnNote(actor, 'read', noteSubject(note))) throw new AppError('not-found');
  const revisionId = note.publishedRevisionId ?? note.handedInRevisionId;
  const revision = revisionId === null ? null : await findRevision(db, revisionId);
  if (!revision) throw new AppError('not-found');
  return toShow(db, note, revision);
}

/** One's own notes with what the desk said and how much is still open. */
export async function readNotebook(db: Knex, actor: SignedIn): Promise<Notebook> {
  const notes = await notesOf(db, actor.id);
  const ids = notes.map((note) => note.id);
  const kilnIds = [...new Set(notes.map((note) => note.kilnId))].filter((id) => id !== null);
  const [kilns, remarks, reasons, summaries, strips] = await Promise.all([
    db('kilns')
      .whereIn('kilns.id', kilnIds)
      .select<{ id: number; name: string }[]>('kilns.id', 'kilns.name'),
    openRemarkCounts(db, ids),
    lastDecisionReasons(db, ids),
    revisionSummaries(db, ids),
    stripsOfNotes(db, notes),
  ]);
  const kilnNames = new Map(kilns.map((kiln) => [kiln.id, kiln.name]));
  return {
    notes: notes.map((note) => {
      const summary = summaries.get(note.id);
      const kilnName = note.kilnId === null ? undefined : kilnNames.get(note.kilnId);
      return {
        id: note.id,
        slug: slugOf(note.draft.title),
        title: note.draft.title,
        status: note.status,
        published: note.publishedRevisionId !== null,
        revising: note.publishedRevisionId !== null && note.status !== 'published',
        kiln:
          note.kilnId !== null && kilnName !== undefined
            ? { id: note.kilnId, name: kilnName }
            : null,
        firedOn: note.firedOn,
        savedAt: note.draftSavedAt.toISOString(),
        strip: strips.get(note.id)?.strip ?? null,
        stripWords: strips.get(note.id)?.stripWords ?? '',
        openChecks: summary ? openChecks(summary.checks, note.draft.checkAnswers).length : 0,
        openRemarks: remarks.get(note.id) ?? 0,
        peakCelsius: note.draft.plan.peakCelsius,
        timeToTemperatureMinutes: note.draft.plan.timeToTemperatureMinutes,
        changes: note.draft.changes.map(({ change }) => change),
        decisionReason: ['sent-back', 'declined', 'taken-down'].includes(note.status)
          ? (reasons.get(note.id) ?? null)
          : null,
      };
    }),
  };
}
