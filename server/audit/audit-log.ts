import type { Knex } from 'knex';

/** Everything that is worth an entry: acts on notes, members and roles. */
export type AuditAct =
  | 'handed-in'
  | 'taken-back'
  | 'claimed'
  | 'claim-given-up'
  | 'sent-back'
  | 'published'
  | 'declined'
  | 'taken-down'
  | 'finding-disputed'
  | 'dispute-withdrawn'
  | 'finding-restored'
  | 'dispute-left'
  | 'question-removed'
  | 'removed'
  | 'brought-back'
  | 'role-changed'
  | 'suspended'
  | 'reinstated'
  | 'joined';

export interface AuditEntry {
  readonly actorId: number | null;
  readonly act: AuditAct;
  readonly targetKind: 'note' | 'member' | 'kiln';
  readonly targetId: number;
  readonly before?: object | null;
  readonly after?: object | null;
  readonly reason?: string;
}

/** Adds an entry in the caller's transaction; the table refuses changes and removals. */
export async function addToAuditLog(trx: Knex, entry: AuditEntry): Promise<void> {
  await trx('audit_log').insert({
    actor_id: entry.actorId,
    act: entry.act,
    target_kind: entry.targetKind,
    target_id: entry.targetId,
    before_value: entry.before ? JSON.stringify(entry.before) : null,
    after_value: entry.after ? JSON.stringify(entry.after) : null,
    reason: entry.reason ?? '',
  });
}
