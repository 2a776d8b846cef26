import { createHash, randomBytes } from 'node:crypto';
import type { Knex } from 'knex';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';

export type MailTokenKind = 'verify-email' | 'reset' | 'change-email';

const MINUTES_VALID: Record<MailTokenKind, number> = {
  'verify-email': 24 * 60,
  'change-email': 24 * 60,
  reset: 30,
};

const hashOf = (token: string): string => createHash('sha256').update(token).digest('hex');

/**
 * A link's token: 256 random bits, of which the database holds only the SHA-256. Made when the mail
 * is sent, so its time runs from then; an older one of the same kind is void.
 */
export async function makeMailToken(
  db: Knex,
  memberId: number,
  kind: MailTokenKind,
  newEmail: string | null = null,
): Promise<string> {
  const token = randomBytes(32).toString('base64url');
  await inTransaction(db, async (trx) => {
    await trx('mail_tokens').where({ member_id: memberId, kind }).delete();
    await trx('mail_tokens').insert({
      member_id: memberId,
      kind,
      token_hash: hashOf(token),
      new_email: newEmail,
      expires_at: trx.raw('NOW(3) + INTERVAL ? MINUTE', [MINUTES_VALID[kind]]),
    });
  });
  return token;
}

export interface UsedToken {
  readonly memberId: number;
  readonly kind: MailTokenKind;
  readonly newEmail: string | null;
}

/**
 * Whose link this is, and locks it: of two requests with one link the second finds it used.
 *
 * @throws AppError link-used when it is unknown, used, replaced or too old
 */
export async function lockMailToken(
  trx: Knex,
  token: string,
  kinds: readonly MailTokenKind[],
): Promise<UsedToken> {
  const row = await trx('mail_tokens')
    .where('mail_tokens.token_hash', hashOf(token))
    .whereIn('mail_tokens.kind', kinds)
    .whereNull('mail_tokens.used_at')
    .whereRaw('mail_tokens.expires_at > NOW(3)')
    .forUpdate()
    .first<UsedToken | undefined>(
      'mail_tokens.member_id AS memberId',
      'mail_tokens.kind',
      'mail_tokens.new_email AS newEmail',
    );
  if (!row) throw new AppError('link-used', 'Ask for a new one; it goes to the same address.');
  return row;
}

/** A link works once. */
export async function markTokenUsed(trx: Knex, token: string): Promise<void> {
  await trx('mail_tokens')
    .where({ token_hash: hashOf(token) })
    .update({ used_at: trx.raw('NOW(3)') });
}

/** Links already sent stop working, e.g. when the password changes. */
export async function voidMailTokens(
  trx: Knex,
  memberId: number,
  kinds: readonly MailTokenKind[],
): Promise<void> {
  await trx('mail_tokens').where({ member_id: memberId }).whereIn('kind', kinds).delete();
}
