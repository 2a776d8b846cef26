import type { Knex } from 'knex';

// The revision that readers see.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
ALTER TABLE notes ADD CONSTRAINT notes_published_foreign FOREIGN KEY (published_revision_id) REFERENCES note_revisions (id)
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('ALTER TABLE notes DROP FOREIGN KEY notes_published_foreign');
}
