import type { Knex } from 'knex';
import { addToAuditLog } from '../audit/audit-log.ts';
import type { Revision } from '../notes/revision-repository.ts';
import { disputesOfNote, insertDispute, sayDispute } from './dispute-repository.ts';
import { disputesAtPublishing } from './standing-disputes.ts';

/**
 * Puts in force what the revision about to be published disputes, in the publishing transaction and
 * before the projection. The caller holds the note's row locked.
 */
export async function takeOverDisputes(
  trx: Knex,
  revision: Revision,
  authorId: number | null,
): Promise<void> {
  const { noteId } = revision;
  for (const taking of disputesAtPublishing(revision, await disputesOfNote(trx, noteId))) {
    const entry = { actorId: authorId, targetKind: 'note', targetId: noteId } as const;
    switch (taking.act) {
      case 'keep':
        break;
      case 'add': {
        const { code, fromMinute: minute } = taking.finding;
        const { sentence } = taking;
        const disputeId = await insertDispute(trx, { noteId, code, minute, sentence });
        await addToAuditLog(trx, {
          ...entry,
          act: 'finding-disputed',
          after: { disputeId, code, minute, revisionId: revision.id },
          reason: sentence,
        });
        break;
      }
      case 'say': {
        const { row, sentence } = taking;
        await sayDispute(trx, row, { state: 'disputed', sentence });
        await addToAuditLog(trx, {
          ...entry,
          act: 'finding-disputed',
          before: { state: row.state, sentence: row.sentence },
          after: { disputeId: row.id, code: row.code, minute: row.minute, revisionId: revision.id },
          reason: sentence,
        });
        break;
      }
      case 'withdraw': {
        const { row } = taking;
        await sayDispute(trx, row, { state: 'withdrawn' });
        await addToAuditLog(trx, {
          ...entry,
          act: 'dispute-withdrawn',
          before: { state: row.state, sentence: row.sentence },
          after: { disputeId: row.id, code: row.code, minute: row.minute, revisionId: revision.id },
        });
        break;
      }
    }
  }
}
