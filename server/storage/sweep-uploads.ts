import type { Knex } from 'knex';
import { inTransaction } from '../database/transaction.ts';
import type { Deps } from '../deps.ts';

const BATCH = 200;
/** A picture that is in no text is kept this long beside the draft it was made for. */
const DRAFT_DAYS = 7;

/**
 * Pictures that nothing refers to: in no revision, in no working copy, of no kiln. A day after the
 * upload; a week while the note is still being written, where they wait to be placed.
 */
const unreferenced = (db: Knex) =>
  db('pictures')
    .leftJoin('notes', 'notes.id', 'pictures.note_id')
    .leftJoin('kilns', 'kilns.id', 'pictures.kiln_id')
    .whereRaw('pictures.created_at < NOW(3) - INTERVAL 24 HOUR')
    .whereNotExists(
      db('revision_pictures')
        .select(db.raw('1'))
        .whereRaw('revision_pictures.picture_id = pictures.id'),
    )
    .where((either) => {
      void either
        .where((none) => {
          void none.whereNull('pictures.note_id').whereNull('pictures.kiln_id');
        })
        .orWhere((ofKiln) => {
          void ofKiln
            .whereNotNull('pictures.kiln_id')
            .whereRaw('NOT (kilns.picture_id <=> pictures.id)');
        })
        .orWhere((ofNote) => {
          void ofNote
            .whereNotNull('pictures.note_id')
            .whereRaw("notes.draft NOT LIKE CONCAT('%', pictures.name, '%')")
            .whereRaw(
              "(notes.status NOT IN ('draft', 'sent-back') OR pictures.created_at < NOW(3) - INTERVAL ? DAY)",
              [DRAFT_DAYS],
            );
        });
    });

async function sweepPictures({ db, store }: Pick<Deps, 'db' | 'store'>): Promise<number> {
  const found = await unreferenced(db)
    .limit(BATCH)
    .select<{ id: number; name: string; note_id: number | null }[]>(
      'pictures.id',
      'pictures.name',
      'pictures.note_id',
    );
  let removed = 0;
  for (const { id, name, note_id: noteId } of found) {
    const isGone = await inTransaction(db, async (trx) => {
      // Under the note's lock, so that nobody places it in the same moment.
      if (noteId !== null) await trx('notes').where({ id: noteId }).forUpdate().select('id');
      const [still] = await unreferenced(trx)
        .where('pictures.id', id)
        .select<{ id: number }[]>('pictures.id');
      return still !== undefined && (await trx('pictures').where({ id }).delete()) > 0;
    });
    // The row first: a file without a row is found again below, a row without files is a hole.
    if (isGone) await store.remove(`pictures/${name}`);
    removed += isGone ? 1 : 0;
  }
  return removed;
}

/** Files of uploads that were cut short, or whose rows are gone. */
async function sweepFiles({ db, store }: Pick<Deps, 'db' | 'store'>): Promise<number> {
  const [clock] = await db.select<{ before: Date }[]>(
    db.raw('NOW(3) - INTERVAL 24 HOUR AS `before`'),
  );
  const before = clock?.before ?? new Date(0);
  const isKnown = {
    pictures: (key: string) =>
      db('pictures')
        .where({ name: key.slice('pictures/'.length) })
        .first('id'),
    records: (key: string) => db('records').where({ storage_key: key }).first('id'),
  };
  let removed = 0;
  for (const folder of ['pictures', 'records'] as const) {
    for (const key of await store.listOlder(folder, before)) {
      if ((await isKnown[folder](key)) !== undefined) continue;
      await store.removeOlder(key, before);
      removed += 1;
    }
  }
  return removed;
}

/** Removes uploads that nothing refers to any more; what is referred to is never touched. */
export async function sweepUploads(deps: Pick<Deps, 'db' | 'store'>): Promise<number> {
  return (await sweepPictures(deps)) + (await sweepFiles(deps));
}
