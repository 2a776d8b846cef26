import type { Knex } from 'knex';
import type { FindingDispute } from '#shared/api/disputes.ts';
import type { FindingCode } from '#shared/firing/findings.ts';
import type { DisputeState } from '#shared/note/finding-disputes.ts';

/** A finding of a published note that its author disputes, or once did. */
export interface Dispute {
  readonly id: number;
  readonly noteId: number;
  readonly code: FindingCode;
  readonly minute: number;
  readonly sentence: string;
  readonly state: DisputeState | 'withdrawn';
  readonly version: number;
  /** When the author last said or took back something. */
  readonly saidAt: Date;
  readonly answer: string;
  readonly answeredBy: { readonly id: number; readonly name: string } | null;
  readonly answeredAt: Date | null;
}

interface RawDispute {
  id: number;
  note_id: number;
  code: FindingCode;
  minute: number;
  sentence: string;
  state: Dispute['state'];
  version: number;
  said_at: Date;
  answer: string;
  answered_by: number | null;
  answerer_name: string | null;
  answered_at: Date | null;
}

const selectDisputes = (db: Knex) =>
  db('finding_disputes')
    .leftJoin('members as answerer', 'answerer.id', 'finding_disputes.answered_by')
    .orderBy('finding_disputes.id')
    .select<RawDispute[]>(
      'finding_disputes.id',
      'finding_disputes.note_id',
      'finding_disputes.code',
      'finding_disputes.minute',
      'finding_disputes.sentence',
      'finding_disputes.state',
      'finding_disputes.version',
      'finding_disputes.said_at',
      'finding_disputes.answer',
      'finding_disputes.answered_by',
      'answerer.name as answerer_name',
      'finding_disputes.answered_at',
    );

const toDispute = (row: RawDispute): Dispute => ({
  id: row.id,
  noteId: row.note_id,
  code: row.code,
  minute: row.minute,
  sentence: row.sentence,
  state: row.state,
  version: row.version,
  saidAt: row.said_at,
  answer: row.answer,
  answeredBy:
    row.answered_by !== null && row.answerer_name !== null
      ? { id: row.answered_by, name: row.answerer_name }
      : null,
  answeredAt: row.answered_at,
});

/** All of a note's, those taken back too. */
export async function disputesOfNote(db: Knex, noteId: number): Promise<Dispute[]> {
  return (await selectDisputes(db).where('finding_disputes.note_id', noteId)).map(toDispute);
}

export async function findDispute(db: Knex, disputeId: number): Promise<Dispute | null> {
  const [row] = await selectDisputes(db).where('finding_disputes.id', disputeId);
  return row ? toDispute(row) : null;
}

/** Those in force of published notes: the unanswered first, each group oldest first. */
export async function standingOnPublished(db: Knex, limit: number): Promise<Dispute[]> {
  const rows = await selectDisputes(db)
    .join('published_firings', 'published_firings.note_id', 'finding_disputes.note_id')
    .whereNot('finding_disputes.state', 'withdrawn')
    .clearOrder()
    .orderByRaw("finding_disputes.state <> 'disputed', finding_disputes.said_at")
    .limit(limit);
  return rows.map(toDispute);
}

export interface NewDispute {
  readonly noteId: number;
  readonly code: FindingCode;
  readonly minute: number;
  readonly sentence: string;
}

export async function insertDispute(trx: Knex, dispute: NewDispute): Promise<number> {
  const [id] = await trx('finding_disputes').insert({
    note_id: dispute.noteId,
    code: dispute.code,
    minute: dispute.minute,
    sentence: dispute.sentence,
  });
  if (id === undefined) throw new Error('MariaDB gave no id.');
  return id;
}

interface Change {
  state: Dispute['state'];
  sentence?: string;
  answer?: string;
  answered_by?: number | null;
}

async function change(
  trx: Knex,
  { id, version }: Pick<Dispute, 'id' | 'version'>,
  columns: object,
): Promise<boolean> {
  const changed = await trx('finding_disputes')
    .where({ id, version })
    .update({ ...columns, version: version + 1 });
  return changed === 1;
}

/** What the author says or takes back. False when it is no longer the version that was read. */
export async function sayDispute(
  trx: Knex,
  read: Pick<Dispute, 'id' | 'version'>,
  columns: Pick<Change, 'state' | 'sentence'>,
): Promise<boolean> {
  return change(trx, read, {
    ...columns,
    said_at: trx.fn.now(3),
    answer: '',
    answered_by: null,
    answered_at: null,
  });
}

/** What a moderator says. False when it is no longer the version that was read. */
export async function answerDisputeRow(
  trx: Knex,
  read: Pick<Dispute, 'id' | 'version'>,
  answer: { state: 'restored' | 'left'; sentence: string; moderatorId: number },
): Promise<boolean> {
  return change(trx, read, {
    state: answer.state,
    answer: answer.sentence,
    answered_by: answer.moderatorId,
    answered_at: trx.fn.now(3),
  });
}

/** As it is sent to readers. */
export function presentDispute(
  dispute: Dispute & { readonly state: DisputeState },
): FindingDispute & { id: number } {
  return {
    id: dispute.id,
    version: dispute.version,
    code: dispute.code,
    minute: dispute.minute,
    sentence: dispute.sentence,
    state: dispute.state,
    at: dispute.saidAt.toISOString(),
    answer:
      dispute.answeredAt === null
        ? null
        : {
            sentence: dispute.answer,
            by: dispute.answeredBy,
            at: dispute.answeredAt.toISOString(),
          },
  };
}
