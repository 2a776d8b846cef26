import type { Knex } from 'knex';

// The revision that waits at the desk.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
ALTER TABLE notes ADD CONSTRAINT notes_handed_in_foreign FOREIGN KEY (handed_in_revision_id) REFERENCES note_revisions (id)
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('ALTER TABLE notes DROP FOREIGN KEY notes_handed_in_foreign');
}
