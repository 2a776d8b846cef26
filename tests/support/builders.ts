import { randomBytes } from 'node:crypto';
import type { Knex } from 'knex';
import argon2 from 'argon2';
import { memberSettingsSchema, type MemberSettings } from '#shared/api/settings.ts';
import type { Role } from '#shared/vocabulary/statuses.ts';
import { nameKeyOf } from '../../server/accounts/normal-forms.ts';

/** The password of every member that a builder makes. */
export const PASSWORD = 'ember lantern gravel 88';

let hash: Promise<string> | undefined;
/** One cheap hash for all of them: tests that measure hashing make their own. */
function passwordHash(): Promise<string> {
  hash ??= argon2.hash(PASSWORD, { type: argon2.argon2id, memoryCost: 1024, timeCost: 1 });
  return hash;
}

export interface MemberTraits {
  name: string;
  email: string;
  role: Role;
  emailVerified: boolean;
  suspended: boolean;
  settings: Partial<MemberSettings>;
}
export interface BuiltMember {
  readonly id: number;
  readonly name: string;
  readonly email: string;
  readonly role: Role;
}

let count = 0;

/** Puts a member into the database: verified, not suspended, with a name nobody else has. */
export async function aMember(db: Knex, traits: Partial<MemberTraits> = {}): Promise<BuiltMember> {
  count += 1;
  const unique = `${String(count)}${randomBytes(3).toString('hex')}`;
  const {
    name = `Member ${unique}`,
    email = `member-${unique}@example.org`,
    role = 'member',
    emailVerified = true,
    suspended = false,
    settings = {},
  } = traits;
  const [id] = await db('members').insert({
    name,
    name_key: nameKeyOf(name),
    email,
    email_verified_at: emailVerified ? db.raw('NOW(3)') : null,
    role,
    password_hash: await passwordHash(),
    settings: JSON.stringify(memberSettingsSchema.parse(settings)),
    suspended_at: suspended ? db.raw('NOW(3)') : null,
  });
  return { id: Number(id), name, email, role };
}
