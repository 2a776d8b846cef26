import type { Knex } from 'knex';
import { signatureBytes, SIGNATURE_VERSION } from '#shared/look-alike/climb-signature.ts';
import { readClimb } from '#shared/look-alike/read-climb.ts';
import { firingInputOf } from '#shared/note/read-note.ts';
import type { Revision } from '../notes/revision-repository.ts';
import { loadContent } from '../records/record-content.ts';

/**
 * Keeps the climb of a published revision, or removes it with the note, inside the transaction that
 * publishes or takes down. A revision whose climb is kept already is not read again: what its
 * author disputes does not change the record.
 */
export async function keepClimb(
  trx: Knex,
  noteId: number,
  revision: Pick<Revision, 'id' | 'fields' | 'recordContentId'> | null,
): Promise<void> {
  if (revision === null) {
    await trx('published_climbs').where({ note_id: noteId }).delete();
    return;
  }
  const kept = await trx('published_climbs')
    .where('published_climbs.note_id', noteId)
    .first<{ revision_id: number; version: number } | undefined>(
      'published_climbs.revision_id',
      'published_climbs.version',
    );
  if (kept?.revision_id === revision.id && kept.version === SIGNATURE_VERSION) return;
  const stored =
    revision.recordContentId === null ? null : await loadContent(trx, revision.recordContentId);
  const climb = readClimb(firingInputOf(revision.fields, null, stored));
  await trx('published_climbs')
    .insert({
      note_id: noteId,
      revision_id: revision.id,
      version: SIGNATURE_VERSION,
      signature: climb ? Buffer.from(signatureBytes(climb.signature)) : null,
      traits: climb ? JSON.stringify(climb.traits) : null,
      kept_at: trx.raw('CURRENT_TIMESTAMP(3)'),
    })
    .onConflict('note_id')
    .merge();
}
