import type { Knex } from 'knex';
import type { MemberPage } from '#shared/api/accounts.ts';
import type { Role } from '#shared/vocabulary/statuses.ts';
import { dayOf } from '../database/day.ts';
import { rowsByAuthor } from '../notes/published-repository.ts';

const NOTES_SHOWN = 100;
const KILNS_SHOWN = 100;

interface MemberRow {
  id: number;
  name: string;
  place: string;
  about: string;
  role: Role;
  joinedAt: Date;
  suspendedAt: Date | null;
}

/**
 * What everybody may see of a member: their published notes, newest first, and those of their kilns
 * that somebody has published a firing of. A suspended member's own words are not shown. Null for an
 * unknown member and for one who has never confirmed their address.
 */
export async function findMemberPage(db: Knex, memberId: number): Promise<MemberPage | null> {
  const member = await db('members')
    .where('members.id', memberId)
    .whereNotNull('members.email_verified_at')
    .first<MemberRow | undefined>(
      'members.id',
      'members.name',
      'members.place',
      'members.about',
      'members.role',
      'members.created_at AS joinedAt',
      'members.suspended_at AS suspendedAt',
    );
  if (!member) return null;
  const { joinedAt, suspendedAt, ...shown } = member;
  const [kilns, notes] = await Promise.all([
    findPublicKilns(db, memberId),
    rowsByAuthor(db, memberId, NOTES_SHOWN),
  ]);
  return {
    ...shown,
    ...(suspendedAt === null ? {} : { place: '', about: '' }),
    joinedOn: dayOf(joinedAt),
    kilns,
    notes,
  };
}

async function findPublicKilns(db: Knex, keeperId: number): Promise<MemberPage['kilns']> {
  return db('kilns')
    .join('kiln_versions', (on) =>
      on
        .on('kiln_versions.kiln_id', 'kilns.id')
        .andOn('kiln_versions.version', 'kilns.current_version'),
    )
    .where('kilns.keeper_id', keeperId)
    .whereExists(
      db('published_firings').select(db.raw('1')).whereRaw('published_firings.kiln_id = kilns.id'),
    )
    .orderBy('kilns.name')
    .limit(KILNS_SHOWN)
    .select<MemberPage['kilns']>(
      'kilns.id',
      'kilns.name',
      'kiln_versions.volume_litres AS volumeLitres',
    );
}
