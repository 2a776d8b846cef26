import type { Knex } from 'knex';
import type { Me } from '#shared/api/accounts.ts';
import { memberSettingsSchema, type MemberSettings } from '#shared/api/settings.ts';
import type { Role } from '#shared/vocabulary/statuses.ts';
import { isDuplicate } from '../database/constraint-errors.ts';
import { readJson } from '../database/read-json.ts';
import { AppError } from '../http/problem.ts';

/** A member with what signing in needs. Never leaves the server. */
export interface Account {
  readonly id: number;
  readonly name: string;
  readonly email: string;
  readonly emailVerified: boolean;
  readonly role: Role;
  readonly suspended: boolean;
  readonly passwordHash: string;
  readonly place: string;
  readonly about: string;
  readonly settings: MemberSettings;
}

const COLUMNS = [
  'members.id',
  'members.name',
  'members.email',
  'members.email_verified_at AS verifiedAt',
  'members.role',
  'members.suspended_at AS suspendedAt',
  'members.password_hash AS passwordHash',
  'members.place',
  'members.about',
  'members.settings',
];

interface AccountRow {
  id: number;
  name: string;
  email: string;
  verifiedAt: Date | null;
  role: Role;
  suspendedAt: Date | null;
  passwordHash: string;
  place: string;
  about: string;
  settings: unknown;
}

function toAccount({ verifiedAt, suspendedAt, settings, ...row }: AccountRow): Account {
  const kept = memberSettingsSchema.safeParse(readJson(settings));
  return {
    ...row,
    emailVerified: verifiedAt !== null,
    suspended: suspendedAt !== null,
    settings: kept.success ? kept.data : memberSettingsSchema.parse({}),
  };
}

async function findBy(db: Knex, where: Record<string, number | string>): Promise<Account | null> {
  const row = await db('members')
    .where(where)
    .first<AccountRow | undefined>(...COLUMNS);
  return row ? toAccount(row) : null;
}

/** @param emailKey from `emailKeyOf` */
export const findAccountByEmail = (db: Knex, emailKey: string): Promise<Account | null> =>
  findBy(db, { 'members.email': emailKey });
export const findAccountById = (db: Knex, id: number): Promise<Account | null> =>
  findBy(db, { 'members.id': id });

/** Who has this name or one that looks like it. */
export async function findNameHolder(
  db: Knex,
  nameKey: string,
): Promise<{ id: number; email: string } | null> {
  const row = await db('members')
    .where('members.name_key', nameKey)
    .first<{ id: number; email: string } | undefined>('members.id', 'members.email');
  return row ?? null;
}

export interface NewAccount {
  readonly name: string;
  readonly nameKey: string;
  readonly email: string;
  readonly passwordHash: string;
}

/** @returns null when somebody joined with the same address a moment ago @throws AppError same-name */
export async function insertAccount(trx: Knex, account: NewAccount): Promise<number | null> {
  try {
    const [id] = await trx('members').insert({
      name: account.name,
      name_key: account.nameKey,
      email: account.email,
      password_hash: account.passwordHash,
      settings: JSON.stringify(memberSettingsSchema.parse({})),
    });
    return id ?? null;
  } catch (error) {
    if (isDuplicate(error, 'members_email_unique')) return null;
    throw sameNameOr(error);
  }
}

function sameNameOr(error: unknown): unknown {
  return isDuplicate(error, 'members_name_key_unique') ? sameName() : error;
}

export function sameName(): AppError {
  const detail = 'Another member has this name, or one that looks like it.';
  return new AppError('same-name', { detail, errors: [{ pointer: '/name', detail }] });
}

export async function storeHash(db: Knex, id: number, passwordHash: string): Promise<void> {
  await db('members').where({ id }).update({ password_hash: passwordHash });
}

export async function storeVerified(trx: Knex, id: number): Promise<void> {
  await trx('members')
    .where({ id })
    .whereNull('email_verified_at')
    .update({ email_verified_at: trx.raw('NOW(3)') });
}

/** @returns false when the address meanwhile belongs to somebody else */
export async function storeNewEmail(trx: Knex, id: number, email: string): Promise<boolean> {
  try {
    await trx('members')
      .where({ id })
      .update({ email, email_verified_at: trx.raw('NOW(3)') });
    return true;
  } catch (error) {
    if (isDuplicate(error, 'members_email_unique')) return false;
    throw error;
  }
}

/** @throws AppError same-name */
export async function storeProfile(
  db: Knex,
  id: number,
  profile: { name: string; nameKey: string; place: string; about: string },
): Promise<void> {
  const { name, nameKey, place, about } = profile;
  try {
    await db('members').where({ id }).update({ name, name_key: nameKey, place, about });
  } catch (error) {
    throw sameNameOr(error);
  }
}

export async function storeSettings(db: Knex, id: number, settings: MemberSettings): Promise<void> {
  await db('members')
    .where({ id })
    .update({ settings: JSON.stringify(settings) });
}

/** What a member is told about themselves: no hash, nothing of others. */
export function presentMe(account: Account): Me {
  const { id, name, email, emailVerified, role, place, about, settings } = account;
  return { id, name, email, emailVerified, role, place, about, settings };
}
