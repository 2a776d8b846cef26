import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';
import { addToAuditLog } from '../audit/audit-log.ts';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';
import { nudgeOutbox } from '../outbox/nudge.ts';
import { enqueue } from '../outbox/outbox.ts';
import {
  findAccountByEmail,
  findNameHolder,
  insertAccount,
  sameName,
} from './account-repository.ts';
import { passwordFault, type Person } from './common-passwords.ts';
import { hashPassword } from './hashing.ts';
import { cleanName, emailKeyOf, nameKeyOf } from './normal-forms.ts';

export interface Joining {
  readonly name: string;
  readonly email: string;
  readonly password: string;
}

/**
 * Makes an account, or writes to the owner of the one that has this address: the asker cannot tell
 * which. Both cost one hash and one job.
 *
 * @throws AppError bad-input, same-name or busy
 */
export async function join(db: Knex, { name: given, email, password }: Joining): Promise<void> {
  const emailKey = emailKeyOf(email);
  if (emailKey === null) throw fault('/email', 'This does not look like an e-mail address.');
  const { name, nameKey } = nameForms(given);
  requireGoodPassword(password, { name, email: emailKey }, '/password');
  const holder = await findNameHolder(db, nameKey);
  // Asked again with the same name and address: the same answer as the first time.
  if (holder && holder.email !== emailKey) throw sameName();
  const passwordHash = await hashPassword(password);
  await inTransaction(db, async (trx) => {
    const known = await findAccountByEmail(trx, emailKey);
    const id = known
      ? null
      : await insertAccount(trx, { name, nameKey, email: emailKey, passwordHash });
    if (id !== null) {
      await addToAuditLog(trx, { actorId: id, act: 'joined', targetKind: 'member', targetId: id });
      await enqueue(trx, 'mail', `verify-email:${String(id)}:${randomUUID()}`, {
        kind: 'verify-email',
        memberId: id,
      });
      return;
    }
    const owner = known ?? (await findAccountByEmail(trx, emailKey));
    if (!owner) throw new AppError('conflict', 'Try once more.');
    await enqueue(trx, 'mail', `already-joined:${String(owner.id)}:${randomUUID()}`, {
      kind: 'already-joined',
      memberId: owner.id,
    });
  });
  nudgeOutbox();
}

/** A name as it is kept, and its key. @throws AppError bad-input when nothing of it can be seen */
export function nameForms(given: string): { name: string; nameKey: string } {
  const name = cleanName(given);
  const nameKey = nameKeyOf(name);
  if ([...name].length < 2 || nameKey === '') {
    throw fault('/name', 'A name has at least two characters that can be seen.');
  }
  return { name, nameKey };
}

/** @throws AppError bad-input with the reason, at `pointer` */
export function requireGoodPassword(password: string, person: Person, pointer: string): void {
  const reason = passwordFault(password, person);
  if (reason !== null) throw fault(pointer, reason);
}

export function fault(pointer: string, detail: string): AppError {
  return new AppError('bad-input', { detail, errors: [{ pointer, detail }] });
}
