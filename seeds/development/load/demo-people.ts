import type { Knex } from 'knex';
import { memberSettingsSchema } from '#shared/api/settings.ts';
import type { Role } from '#shared/vocabulary/statuses.ts';
import {
  insertAccount,
  storeProfile,
  storeSettings,
  storeVerified,
} from '../../../server/accounts/account-repository.ts';
import { hashPassword } from '../../../server/accounts/hashing.ts';
import { nameForms } from '../../../server/accounts/join.ts';
import { emailKeyOf } from '../../../server/accounts/normal-forms.ts';
import { addToAuditLog } from '../../../server/audit/audit-log.ts';
import type { SignedIn } from '../../../server/authorization/actor.ts';
import type { DemoPerson } from '../people.ts';

/** Somebody who can sign in to the demo. */
export interface DemoAccount {
  readonly name: string;
  readonly email: string;
  readonly password: string;
  readonly role: Role;
}
/** By the person's key. */
export type DemoActors = ReadonlyMap<string, SignedIn>;

/** Whose passwords are told: one of each role, and one who reads in °F. The others' nobody knows. */
const TOLD = ['imke', 'tunde', 'noor', 'saoirse'];

export async function addDemoPeople(
  trx: Knex,
  people: readonly DemoPerson[],
  drawPassword: () => string,
): Promise<{ accounts: DemoAccount[]; actors: DemoActors }> {
  const accounts: DemoAccount[] = [];
  const actors = new Map<string, SignedIn>();
  for (const person of people) {
    const { name, nameKey } = nameForms(person.name);
    const email = emailKeyOf(person.email);
    if (email === null) throw new Error(`${person.key} has no proper address.`);
    const password = drawPassword();
    const passwordHash = await hashPassword(password);
    const id = await insertAccount(trx, { name, nameKey, email, passwordHash });
    if (id === null) throw new Error(`${email} is a member already.`);
    await storeVerified(trx, id);
    await storeProfile(trx, id, { name, nameKey, place: person.place, about: person.about });
    const settings = { temperature: person.temperatureUnit, system: person.measureUnits };
    await storeSettings(trx, id, memberSettingsSchema.parse(settings));
    await addToAuditLog(trx, { actorId: id, act: 'joined', targetKind: 'member', targetId: id });
    // Roles are given by an admin; the first one, as on any new site, by whoever runs the machine.
    await trx('members').where({ id }).update({ role: person.role });
    const confirmedAt = Date.now();
    actors.set(person.key, {
      kind: 'member',
      id,
      name,
      role: person.role,
      emailVerified: true,
      confirmedAt,
    });
    if (TOLD.includes(person.key)) accounts.push({ name, email, password, role: person.role });
  }
  return { accounts, actors };
}

export function actorOf(actors: DemoActors, key: string): SignedIn {
  const actor = actors.get(key);
  if (!actor) throw new Error(`Nobody in the demo is called ${key}.`);
  return actor;
}
