import type { Knex } from 'knex';
import type { Audit } from '#shared/api/admin.ts';

const PAGE_SIZE = 50;

interface Row {
  id: number;
  at: Date;
  actorId: number | null;
  actorName: string | null;
  act: string;
  targetKind: string;
  targetId: number;
  reason: string;
}

/** The log of acts, newest first, with the names things have now. */
export async function listAuditLog(db: Knex, page: number): Promise<Audit> {
  const [total, rows] = await Promise.all([
    db('audit_log').count({ total: '*' }).first<{ total: number }>(),
    db('audit_log')
      .leftJoin('members', 'members.id', 'audit_log.actor_id')
      .orderBy('audit_log.id', 'desc')
      .limit(PAGE_SIZE)
      .offset((page - 1) * PAGE_SIZE)
      .select<Row[]>(
        'audit_log.id',
        'audit_log.at',
        'audit_log.actor_id AS actorId',
        'members.name AS actorName',
        'audit_log.act',
        'audit_log.target_kind AS targetKind',
        'audit_log.target_id AS targetId',
        'audit_log.reason',
      ),
  ]);
  const labelOf = await readLabels(db, rows);
  return {
    entries: rows.map((row) => ({
      id: row.id,
      at: row.at.toISOString(),
      actor:
        row.actorId === null
          ? null
          : { id: row.actorId, name: row.actorName ?? `Member ${String(row.actorId)}` },
      act: row.act,
      target: { kind: row.targetKind, id: row.targetId, label: labelOf(row) },
      reason: row.reason,
    })),
    total: Number(total?.total ?? 0),
  };
}

/** Titles of published notes only: what is written in a draft is nobody else's business. */
async function readLabels(db: Knex, rows: readonly Row[]) {
  const idsOf = (kind: string): number[] =>
    rows.filter((row) => row.targetKind === kind).map((row) => row.targetId);
  const [notes, members, kilns] = await Promise.all([
    db('published_firings')
      .whereIn('published_firings.note_id', idsOf('note'))
      .select<{ id: number; label: string }[]>(
        'published_firings.note_id AS id',
        'published_firings.title AS label',
      ),
    namesIn(db, 'members', idsOf('member')),
    namesIn(db, 'kilns', idsOf('kiln')),
  ]);
  const labels = new Map<string, string>();
  for (const { id, label } of notes) labels.set(`note ${String(id)}`, label);
  for (const { id, label } of members) labels.set(`member ${String(id)}`, label);
  for (const { id, label } of kilns) labels.set(`kiln ${String(id)}`, label);
  const KINDS: Readonly<Record<string, string>> = { note: 'Note', member: 'Member', kiln: 'Kiln' };
  return (row: Row): string =>
    labels.get(`${row.targetKind} ${String(row.targetId)}`) ??
    `${KINDS[row.targetKind] ?? row.targetKind} ${String(row.targetId)}`;
}

function namesIn(db: Knex, table: 'members' | 'kilns', ids: readonly number[]) {
  return db(table)
    .whereIn(`${table}.id`, [...ids])
    .select<{ id: number; label: string }[]>(`${table}.id`, `${table}.name AS label`);
}
