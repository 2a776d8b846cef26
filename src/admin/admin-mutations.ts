import { doneSchema, type Done } from '#shared/api/accounts.ts';
import { reindexStateSchema, type ReindexState } from '#shared/api/admin.ts';
import type { Role } from '#shared/vocabulary/statuses.ts';
import { send } from '../http/client.ts';

/** An act on a member, with the reason that is kept with it. */
export type MemberAct =
  | { readonly kind: 'role'; readonly memberId: number; readonly role: Role }
  | { readonly kind: 'suspended'; readonly memberId: number; readonly suspended: boolean };

export function actOnMember({ act, reason }: { act: MemberAct; reason: string }): Promise<Done> {
  return send({
    method: 'PUT',
    path: `/api/admin/members/${String(act.memberId)}/${act.kind}`,
    body: act.kind === 'role' ? { role: act.role, reason } : { suspended: act.suspended, reason },
    answer: doneSchema,
  });
}

export function retryJob(id: number): Promise<Done> {
  return send({
    method: 'POST',
    path: `/api/admin/outbox/${String(id)}/retry`,
    answer: doneSchema,
  });
}

export function startReindex(): Promise<ReindexState> {
  return send({ method: 'POST', path: '/api/admin/reindex', answer: reindexStateSchema });
}

export function cancelReindex(): Promise<ReindexState> {
  return send({ method: 'DELETE', path: '/api/admin/reindex', answer: reindexStateSchema });
}
