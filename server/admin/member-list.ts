import type { Knex } from 'knex';
import type { AdminMembers } from '#shared/api/admin.ts';
import type { Role } from '#shared/vocabulary/statuses.ts';
import { emailKeyOf, nameKeyOf } from '../accounts/normal-forms.ts';
import { dayOf } from '../database/day.ts';

const PAGE_SIZE = 50;

interface Row {
  id: number;
  name: string;
  email: string;
  verifiedAt: Date | null;
  role: Role;
  suspendedAt: Date | null;
  joinedAt: Date;
  publishedNotes: number;
}

/** Members by a part of the name (look-alikes included), or by the whole address; newest first. */
export async function listMembers(
  db: Knex,
  { q, page }: { q: string; page: number },
): Promise<AdminMembers> {
  const wanted = q.trim();
  const emailKey = wanted.includes('@') ? emailKeyOf(wanted) : null;
  const matching = () => {
    const members = db('members');
    if (wanted === '') return members;
    if (emailKey !== null) return members.where('members.email', emailKey);
    return members.where('members.name_key', 'like', `%${escapeLike(nameKeyOf(wanted))}%`);
  };
  const [total, rows] = await Promise.all([
    matching().count({ total: '*' }).first<{ total: number }>(),
    matching()
      .orderBy('members.id', 'desc')
      .limit(PAGE_SIZE)
      .offset((page - 1) * PAGE_SIZE)
      .select<Row[]>(
        'members.id',
        'members.name',
        'members.email',
        'members.email_verified_at AS verifiedAt',
        'members.role',
        'members.suspended_at AS suspendedAt',
        'members.created_at AS joinedAt',
        db('published_firings')
          .count('*')
          .whereRaw('published_firings.author_id = members.id')
          .as('publishedNotes'),
      ),
  ]);
  return {
    members: rows.map((row) => ({
      id: row.id,
      name: row.name,
      emailHint: emailHint(row.email),
      emailVerified: row.verifiedAt !== null,
      role: row.role,
      suspended: row.suspendedAt !== null,
      joinedOn: dayOf(row.joinedAt),
      publishedNotes: Number(row.publishedNotes),
    })),
    total: Number(total.total),
  };
}

/** First letter and domain: enough to recognise an address, not enough to write to it. */
export function emailHint(email: string): string {
  const at = email.lastIndexOf('@');
  return `${email.slice(0, 1)}…${email.slice(at)}`;
}

function escapeLike(text: string): string {
  return text.replace(/[\\%_]/g, (sign) => `\\${sign}`);
}
