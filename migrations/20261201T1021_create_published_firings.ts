import type { Knex } from 'knex';

// One row a published note: the facts that pooled evidence and lists read, kept in step inside the publishing transaction.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE published_firings (
  note_id BIGINT UNSIGNED NOT NULL,
  revision_id BIGINT UNSIGNED NOT NULL,
  kiln_id BIGINT UNSIGNED NOT NULL,
  author_id BIGINT UNSIGNED NULL,
  fired_on DATE NOT NULL,
  fired_at_time CHAR(5) CHARACTER SET ascii COLLATE ascii_bin NULL,
  tried_note_id BIGINT UNSIGNED NULL,
  slug VARCHAR(140) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  title VARCHAR(120) NOT NULL,
  facts JSON NOT NULL,
  note_row JSON NOT NULL,
  story_text MEDIUMTEXT NOT NULL,
  published_at DATETIME(3) NOT NULL,
  PRIMARY KEY (note_id),
  KEY published_firings_kiln_index (kiln_id, fired_on, fired_at_time, note_id),
  KEY published_firings_newest_index (published_at, note_id),
  KEY published_firings_author_index (author_id, published_at),
  KEY published_firings_tried_index (tried_note_id),
  FULLTEXT KEY published_firings_text (title, story_text),
  CONSTRAINT published_firings_note_foreign FOREIGN KEY (note_id) REFERENCES notes (id) ON DELETE CASCADE,
  CONSTRAINT published_firings_revision_foreign FOREIGN KEY (revision_id) REFERENCES note_revisions (id)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE published_firings');
}
