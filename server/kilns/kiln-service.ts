import type { Knex } from 'knex';
import { insideVolumeLitres, type KilnFields } from '#shared/note/kiln-fields.ts';
import { nameKeyOf } from '../accounts/normal-forms.ts';
import { addToAuditLog } from '../audit/audit-log.ts';
import type { Actor, SignedIn } from '../authorization/actor.ts';
import { canOnKiln, type KilnAction } from '../authorization/rules.ts';
import { inTransaction } from '../database/transaction.ts';
import { AppError } from '../http/problem.ts';
import {
  advanceVersion,
  findKiln,
  hasPublishedFirings,
  insertKiln,
  insertVersion,
  type KilnRow,
  markKilnRemoved,
  membersByNameKeys,
  replaceLoans,
} from './kiln-repository.ts';

/** What the rules need to know of a kiln. */
export function kilnSubject(kiln: KilnRow) {
  return {
    keeperId: kiln.keeperId,
    removed: kiln.removed,
    lentTo: kiln.lentTo.map((member) => member.id),
  };
}

/** A kiln the actor may see: its keeper's, lent to them, or with a published firing. */
export async function readKiln(db: Knex, actor: Actor, kilnId: number): Promise<KilnRow> {
  const kiln = await findKiln(db, kilnId);
  if (!kiln) throw new AppError('not-found');
  const mayRead =
    canOnKiln(actor, 'read', kilnSubject(kiln)) || (await hasPublishedFirings(db, kilnId));
  if (!mayRead) throw new AppError('not-found');
  return kiln;
}

async function kilnFor(db: Knex, actor: Actor, action: KilnAction, kilnId: number) {
  const kiln = await readKiln(db, actor, kilnId);
  if (!canOnKiln(actor, action, kilnSubject(kiln))) throw new AppError('not-allowed');
  return kiln;
}

export async function addKiln(db: Knex, actor: SignedIn, fields: KilnFields): Promise<number> {
  return inTransaction(db, (trx) =>
    insertKiln(trx, { keeperId: actor.id, fields, volumeLitres: insideVolumeLitres(fields) }),
  );
}

/** Describes the kiln anew. Notes handed in before keep the version they were fired in. */
export async function alterKiln(
  db: Knex,
  actor: Actor,
  kilnId: number,
  from: number,
  fields: KilnFields,
): Promise<void> {
  await inTransaction(db, async (trx) => {
    const kiln = await kilnFor(trx, actor, 'edit', kilnId);
    if (!(await advanceVersion(trx, kilnId, from, fields.name))) {
      throw new AppError('stale', {
        detail: 'This kiln was altered elsewhere since you opened it. Both versions are shown.',
        current: { version: kiln.version, fields: kiln.fields },
      });
    }
    await insertVersion(trx, kilnId, from + 1, fields, insideVolumeLitres(fields));
  });
}

/** Lends the kiln to members by their names, and to nobody else. */
export async function lendKiln(
  db: Knex,
  actor: Actor,
  kilnId: number,
  names: readonly string[],
): Promise<void> {
  await inTransaction(db, async (trx) => {
    const kiln = await kilnFor(trx, actor, 'lend', kilnId);
    const wanted = new Map(names.map((name, index) => [nameKeyOf(name), index]));
    const members = await membersByNameKeys(trx, [...wanted.keys()]);
    const found = new Set(members.map((member) => member.nameKey));
    const missing = [...wanted].filter(([key]) => !found.has(key));
    if (missing.length > 0) {
      throw new AppError('bad-input', {
        detail: 'Some of these names belong to nobody here.',
        errors: missing.map(([, index]) => ({
          pointer: `/members/${String(index)}`,
          detail: `There is no member called “${names[index] ?? ''}”.`,
        })),
      });
    }
    await replaceLoans(
      trx,
      kilnId,
      members.map((member) => member.id).filter((id) => id !== kiln.keeperId),
    );
  });
}

/** Takes the kiln out of use; what was fired in it stays. */
export async function removeKiln(db: Knex, actor: SignedIn, kilnId: number): Promise<void> {
  await inTransaction(db, async (trx) => {
    await kilnFor(trx, actor, 'remove', kilnId);
    await markKilnRemoved(trx, kilnId);
    await addToAuditLog(trx, {
      actorId: actor.id,
      act: 'removed',
      targetKind: 'kiln',
      targetId: kilnId,
    });
  });
}
