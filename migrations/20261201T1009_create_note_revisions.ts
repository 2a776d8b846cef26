import type { Knex } from 'knex';

// What was handed in, never changed: fields, the kiln as it was, the sanitised story, and what the server read.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE note_revisions (
  id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT,
  note_id BIGINT UNSIGNED NOT NULL,
  number INT UNSIGNED NOT NULL,
  fields JSON NOT NULL,
  story_html MEDIUMTEXT NOT NULL,
  kiln_id BIGINT UNSIGNED NOT NULL,
  kiln_version INT UNSIGNED NOT NULL,
  record_content_id BIGINT UNSIGNED NULL,
  findings JSON NOT NULL,
  checks JSON NOT NULL,
  facts JSON NOT NULL,
  strip JSON NULL,
  strip_words VARCHAR(400) NOT NULL DEFAULT '',
  created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  PRIMARY KEY (id),
  UNIQUE KEY note_revisions_number_unique (note_id, number),
  KEY note_revisions_record_index (record_content_id),
  CONSTRAINT note_revisions_note_foreign FOREIGN KEY (note_id) REFERENCES notes (id) ON DELETE CASCADE,
  CONSTRAINT note_revisions_kiln_foreign FOREIGN KEY (kiln_id, kiln_version) REFERENCES kiln_versions (kiln_id, version),
  CONSTRAINT note_revisions_record_foreign FOREIGN KEY (record_content_id) REFERENCES record_contents (id)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE note_revisions');
}
