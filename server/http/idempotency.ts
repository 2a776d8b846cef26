import type { Knex } from 'knex';
import { isDuplicate } from '../database/constraint-errors.ts';
import { readJson } from '../database/read-json.ts';
import type { Reply } from './define-route.ts';
import { AppError } from './problem.ts';

export interface IdempotentRequest {
  readonly memberId: number;
  readonly key: string | undefined;
  readonly route: string;
  readonly bodyHash: string;
}

const KEY = /^[A-Za-z0-9_-]{8,64}$/;

/**
 * Gives the first answer again when the same create comes twice. The key row stands in the same
 * transaction as the create: a second request waits on the row until the first has committed, so
 * there is never a moment with two creates under way.
 */
export async function recallOrRemember(
  trx: Knex,
  request: IdempotentRequest,
  create: () => Promise<Reply>,
): Promise<Reply> {
  const { key } = request;
  if (key === undefined || !KEY.test(key)) throw new AppError('idempotency-key-missing');
  const row = { member_id: request.memberId, idempotency_key: key };
  try {
    await trx('idempotency_keys').insert({
      ...row,
      route: request.route.slice(0, 120),
      body_hash: request.bodyHash,
    });
  } catch (error) {
    if (!isDuplicate(error, 'PRIMARY')) throw error;
    // A locking read sees what the first request committed after our snapshot began. Shared, as the
    // refused insert already holds it: several repeats would block one another over an exclusive one.
    const first = await trx('idempotency_keys')
      .select('body_hash', 'route', 'status', 'answer')
      .where(row)
      .forShare()
      .first<{ body_hash: string; route: string; status: number | null; answer: unknown }>();
    if (!first) throw new AppError('conflict');
    if (first.body_hash !== request.bodyHash || first.route !== request.route.slice(0, 120)) {
      throw new AppError('key-reused');
    }
    return {
      status: first.status ?? 200,
      body: readJson(first.answer) as object | null,
      headers: { 'Idempotent-Replay': 'true' },
      isReply: true,
    };
  }
  const answer = await create();
  await trx('idempotency_keys')
    .where(row)
    .update({ status: answer.status, answer: JSON.stringify(answer.body) });
  return answer;
}
