import type { Knex } from 'knex';

// A record given to a note: the upload, how far its reading has come, and what had to be assumed.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE records (
  id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT,
  note_id BIGINT UNSIGNED NOT NULL,
  source VARCHAR(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  file_name VARCHAR(255) NOT NULL DEFAULT '',
  status VARCHAR(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'reading',
  storage_key VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NULL,
  choice JSON NOT NULL,
  content_id BIGINT UNSIGNED NULL,
  unit CHAR(1) CHARACTER SET ascii COLLATE ascii_bin NULL,
  assumed JSON NOT NULL,
  skipped JSON NOT NULL,
  skipped_count INT UNSIGNED NOT NULL DEFAULT 0,
  error JSON NULL,
  created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  PRIMARY KEY (id),
  KEY records_note_index (note_id),
  KEY records_content_index (content_id),
  CONSTRAINT records_note_foreign FOREIGN KEY (note_id) REFERENCES notes (id) ON DELETE CASCADE,
  CONSTRAINT records_content_foreign FOREIGN KEY (content_id) REFERENCES record_contents (id),
  CONSTRAINT records_source_check CHECK (source IN ('file', 'pasted', 'typed')),
  CONSTRAINT records_status_check CHECK (status IN ('reading', 'ready', 'failed'))
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE records');
}
