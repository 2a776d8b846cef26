import { KILN_LABELS } from '#shared/note/kiln-labels.ts';
import type { KilnFields } from '#shared/note/kiln-fields.ts';
import type { Kiln, KilnPage } from '#shared/api/kilns.ts';
import type { Picture } from '#shared/api/pictures.ts';
import type { Actor } from '../authorization/actor.ts';
import { canOnKiln, kilnAbilities } from '../authorization/rules.ts';
import type { KilnRow } from './kiln-repository.ts';
import { kilnSubject } from './kiln-service.ts';

/** A kiln as this reader may see it; whom it is lent to is told to keeper and borrowers only. */
export function presentKiln(kiln: KilnRow, actor: Actor, picture: Picture | null): Kiln {
  const subject = kilnSubject(kiln);
  return {
    id: kiln.id,
    version: kiln.version,
    keeper:
      kiln.keeperId !== null && kiln.keeperName !== null
        ? { id: kiln.keeperId, name: kiln.keeperName }
        : null,
    fields: kiln.fields,
    volumeLitres: kiln.volumeLitres,
    picture,
    removed: kiln.removed,
    lentTo: canOnKiln(actor, 'read-loans', subject) ? [...kiln.lentTo] : [],
    abilities: kilnAbilities(actor, subject),
  };
}

/** The labels of the fields in which two versions differ. */
export function changedLabels(before: KilnFields, after: KilnFields): string[] {
  return (Object.keys(KILN_LABELS) as (keyof KilnFields)[])
    .filter((field) => before[field] !== after[field])
    .map((field) => KILN_LABELS[field]);
}

export function presentVersions(
  versions: readonly { version: number; fields: KilnFields; createdAt: Date }[],
): KilnPage['versions'] {
  return versions.map((version, index) => {
    const before = versions[index - 1];
    return {
      version: version.version,
      madeOn: version.createdAt.toISOString().slice(0, 10),
      changed: before ? changedLabels(before.fields, version.fields) : [],
    };
  });
}
