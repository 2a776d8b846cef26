import type { Knex } from 'knex';
import type { DeskNote, DeskQueue } from '#shared/api/desk.ts';
import type { StripPoints } from '#shared/api/note-rows.ts';
import type { Check } from '#shared/note/checks/check.ts';
import type { SignedIn } from '../authorization/actor.ts';
import { canOnNote } from '../authorization/rules.ts';
import { readJson } from '../database/read-json.ts';
import { AppError } from '../http/problem.ts';
import { presentNotePage } from '../notes/note-presenter.ts';
import { findNote, type NoteRecord } from '../notes/note-repository.ts';
import { toShow } from '../notes/note-service.ts';
import { noteSubject } from '../notes/note-subject.ts';
import { findRevision } from '../notes/revision-repository.ts';
import { differencesBetween } from './differences.ts';
import { decisionsOf, remarksForDesk } from './remark-repository.ts';

interface RawQueueRow {
  id: number;
  revision_id: number;
  title: string;
  author_id: number | null;
  author_name: string | null;
  kiln_name: string;
  handed_in_at: Date;
  number: number;
  strip: unknown;
  strip_words: string;
  checks: unknown;
  claimed_by: number | null;
  claimer_name: string | null;
  claimed_until: Date | null;
  claim_held: number;
}

/** The pile by waiting time, the longest waiting first. */
export async function presentQueue(db: Knex, actor: SignedIn): Promise<DeskQueue> {
  const rows = await db('notes')
    .join('note_revisions', 'note_revisions.id', 'notes.handed_in_revision_id')
    .join('kilns', 'kilns.id', 'note_revisions.kiln_id')
    .leftJoin('members as author', 'author.id', 'notes.author_id')
    .leftJoin('members as claimer', 'claimer.id', 'notes.claimed_by')
    .whereIn('notes.status', ['handed-in', 'on-the-desk'])
    .whereNull('notes.removed_at')
    .orderBy('notes.handed_in_at')
    .limit(200)
    .select<RawQueueRow[]>(
      'notes.id',
      'note_revisions.id as revision_id',
      db.raw("JSON_VALUE(note_revisions.fields, '$.title') AS title"),
      'notes.author_id',
      'author.name as author_name',
      'kilns.name as kiln_name',
      'notes.handed_in_at',
      'note_revisions.number',
      'note_revisions.strip',
      'note_revisions.strip_words',
      'note_revisions.checks',
      'notes.claimed_by',
      'claimer.name as claimer_name',
      'notes.claimed_until',
      db.raw('COALESCE(notes.claimed_until >= CURRENT_TIMESTAMP(3), 0) AS claim_held'),
    );
  return {
    waiting: rows.map((row) => {
      const checks = readJson(row.checks) as (Check & { answer?: string })[];
      return {
        noteId: row.id,
        revisionId: row.revision_id,
        title: row.title,
        author:
          row.author_id !== null && row.author_name !== null
            ? { id: row.author_id, name: row.author_name }
            : null,
        kilnName: row.kiln_name,
        handedInAt: row.handed_in_at.toISOString(),
        firstRevision: row.number === 1,
        strip: readJson(row.strip) as StripPoints | null,
        stripWords: row.strip_words,
        answeredChecks: checks.filter((check) => check.answer !== undefined).length,
        unsafeWords: checks.filter((check) => check.code === 'unsafe-practice').length,
        claim:
          row.claim_held === 1 && row.claimed_by !== null && row.claimed_until !== null
            ? {
                by: { id: row.claimed_by, name: row.claimer_name ?? '' },
                until: row.claimed_until.toISOString(),
                mine: row.claimed_by === actor.id,
              }
            : null,
        own: row.author_id === actor.id,
      };
    }),
  };
}

function claimOf(note: NoteRecord, actor: SignedIn): DeskNote['claim'] {
  if (note.claimedBy === null || note.claimedUntil === null || note.claimLapsed) return null;
  return {
    by: { id: note.claimedBy, name: note.claimedByName ?? '' },
    until: note.claimedUntil.toISOString(),
    mine: note.claimedBy === actor.id,
  };
}

/** A note at the desk with everything the decision needs in front of one. */
export async function presentDeskNote(
  db: Knex,
  actor: SignedIn,
  noteId: number,
): Promise<DeskNote> {
  const note = await findNote(db, noteId);
  if (!note || !canOnNote(actor, 'read-handed-in', noteSubject(note)))
    throw new AppError('not-found');
  const revision =
    note.handedInRevisionId === null ? null : await findRevision(db, note.handedInRevisionId);
  if (!revision || note.handedInAt === null) throw new AppError('not-found');
  const [show, before, remarks, earlierDecisions] = await Promise.all([
    toShow(db, note, revision),
    note.publishedRevisionId === null ? null : findRevision(db, note.publishedRevisionId),
    remarksForDesk(db, noteId),
    decisionsOf(db, noteId),
  ]);
  const decide = canOnNote(actor, 'decide', noteSubject(note));
  return {
    page: await presentNotePage(db, actor, show),
    revisionId: revision.id,
    status: note.status,
    handedInAt: note.handedInAt.toISOString(),
    claim: claimOf(note, actor),
    checks: revision.checks,
    findings: revision.findings,
    differences: before ? differencesBetween(before.fields, revision.fields) : null,
    storyBefore: before && before.storyHtml !== revision.storyHtml ? before.storyHtml : null,
    unsafe: revision.checks
      .filter((check) => check.code === 'unsafe-practice')
      .map((check) => ({ passage: quotedPart(check.text), reason: check.text })),
    remarks,
    earlierDecisions,
    abilities: { decide, remark: decide },
  };
}

/** The passage a check of unsafe practice quotes, to be highlighted where it stands. */
function quotedPart(text: string): string {
  const from = text.indexOf('“');
  const to = text.lastIndexOf('”');
  return from < 0 || to <= from ? '' : text.slice(from + 1, to).replace(/^…|…$/g, '');
}
