import type { Knex } from 'knex';
import { answerTo, canHandIn } from '#shared/note/checks/check.ts';
import { firingFacts } from '#shared/note/facts.ts';
import { readingsOf } from '#shared/note/read-note.ts';
import { picturesIn } from '#shared/note/story.ts';
import { stripSignature } from '#shared/firing/strip.ts';
import { stripWords } from '#shared/firing/strip-words.ts';
import { METRIC_UNITS } from '#shared/units/units.ts';
import { addToAuditLog } from '../audit/audit-log.ts';
import type { SignedIn } from '../authorization/actor.ts';
import { canOnNote } from '../authorization/rules.ts';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';
import { nudgeOutbox } from '../outbox/nudge.ts';
import { enqueue } from '../outbox/outbox.ts';
import { picturesOfNote } from '../pictures/picture-repository.ts';
import { storeContent } from '../records/record-content.ts';
import { storyHtml } from '../story/story-html.ts';
import { lockedOwnNote, ownNote } from './draft-service.ts';
import { moveNote } from './note-repository.ts';
import { noteSubject } from './note-subject.ts';
import { statusAfter } from './note-status.ts';
import { readDraft } from './read-draft.ts';
import { insertRevision } from './revision-repository.ts';

/** Points of the strip kept with a revision: enough for full width on a large screen. */
const STRIP_POINTS = 240;

/**
 * Hands the working copy in: reads the whole record, sanitises the story, makes the revision and
 * puts it on the desk's pile. The heavy reading happens before the transaction; the version check
 * inside it makes sure that what was read is what is handed in.
 */
export async function handInNote(
  db: Knex,
  actor: SignedIn,
  noteId: number,
  fromVersion: number,
): Promise<void> {
  const note = await ownNote(db, actor, noteId);
  if (note.version !== fromVersion) throw staleHandIn();
  const fields = note.draft;
  const read = await readDraft(db, { id: noteId, authorId: actor.id, fields }, true);
  if (read.record?.status === 'reading') {
    throw new AppError('wrong-status', 'The record is still being read. Try again in a moment.');
  }
  if (
    canOnNote(actor, 'hand-in', noteSubject(note)) &&
    (!canHandIn(read.checks, fields.checkAnswers) || !read.kiln)
  ) {
    throw new AppError('checks-open', {
      detail: 'Mend what must be mended and answer what is asked; then hand it in again.',
      errors: read.checks
        .filter((check) => check.kind === 'must-mend')
        .map((check) => ({ pointer: check.pointer, detail: check.text })),
    });
  }
  const { kiln } = read;
  const pictures = await picturesOfNote(db, noteId);
  const html = await storyHtml(fields.story, pictures);
  const readings = readingsOf(fields, read.stored);

  await inTransaction(db, async (trx) => {
    const locked = await lockedOwnNote(trx, actor, noteId, 'hand-in');
    if (locked.version !== fromVersion) throw staleHandIn();
    if (!kiln) throw new AppError('checks-open');
    const contentId =
      read.record?.contentId ??
      (readings.length > 0 ? await storeContent(trx, { readings, secondProbe: null }) : null);
    const revisionId = await insertRevision(trx, {
      noteId,
      fields,
      storyHtml: html,
      kilnId: kiln.id,
      kilnVersion: kiln.version,
      recordContentId: contentId,
      findings: [...read.findings],
      checks: read.checks.map((check) => {
        const answer = answerTo(check, fields.checkAnswers);
        return answer === null ? check : { ...check, answer };
      }),
      facts: firingFacts({
        fields,
        kiln: kiln.fields,
        reading: read.reading,
        readings: read.stored?.readings ?? readings,
        hasSecondProbe: read.stored?.secondProbe != null,
      }),
      strip: readings.length > 0 ? stripSignature(readings, STRIP_POINTS) : null,
      stripWords: read.reading ? stripWords(read.reading, METRIC_UNITS) : '',
      pictureNames: picturesIn(fields.story),
    });
    const to = statusAfter('hand-in', locked.status);
    const moved =
      to !== null &&
      (await moveNote(trx, noteId, 'hand-in', to, {
        handed_in_revision_id: revisionId,
        handed_in_at: trx.raw('CURRENT_TIMESTAMP(3)'),
        claimed_by: null,
        claimed_until: null,
      }));
    if (!moved) throw new AppError('wrong-status');
    await addToAuditLog(trx, {
      actorId: actor.id,
      act: 'handed-in',
      targetKind: 'note',
      targetId: noteId,
      before: { status: locked.status },
      after: { status: to, revisionId },
    });
    await tellTheDesk(trx, noteId, revisionId, actor.id);
  });
  nudgeOutbox();
}

function staleHandIn(): AppError {
  return new AppError('stale', 'The note was saved elsewhere since. Look at it once more first.');
}

/** A mail to each moderator who wants one; the mail's handler asks for the wish when it sends. */
async function tellTheDesk(trx: Knex, noteId: number, revisionId: number, authorId: number) {
  const staff = await trx('members')
    .whereIn('members.role', ['moderator', 'admin'])
    .whereNot('members.id', authorId)
    .whereNull('members.suspended_at')
    .select<{ id: number }[]>('members.id');
  for (const member of staff) {
    await enqueue(trx, 'mail', `handed-in:${String(revisionId)}:${String(member.id)}`, {
      kind: 'note-handed-in',
      memberId: member.id,
      noteId,
    });
  }
}
