import type { Knex } from 'knex';

// The troubles of published firings, read off the record or named by the author, for counts and filters.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE firing_troubles (
  note_id BIGINT UNSIGNED NOT NULL,
  trouble VARCHAR(24) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  measured BOOLEAN NOT NULL,
  named BOOLEAN NOT NULL,
  PRIMARY KEY (note_id, trouble),
  KEY firing_troubles_trouble_index (trouble, note_id),
  CONSTRAINT firing_troubles_note_foreign FOREIGN KEY (note_id) REFERENCES published_firings (note_id) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE firing_troubles');
}
