import type { Knex } from 'knex';

// Stored pictures: encodings live in the upload store under `name`; they follow the rights of their note or kiln.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE pictures (
  id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT,
  name CHAR(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  owner_id BIGINT UNSIGNED NULL,
  note_id BIGINT UNSIGNED NULL,
  kiln_id BIGINT UNSIGNED NULL,
  width INT UNSIGNED NOT NULL,
  height INT UNSIGNED NOT NULL,
  widths JSON NOT NULL,
  placeholder VARCHAR(2000) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  bytes INT UNSIGNED NOT NULL,
  created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  PRIMARY KEY (id),
  UNIQUE KEY pictures_name_unique (name),
  KEY pictures_note_index (note_id),
  KEY pictures_kiln_index (kiln_id),
  KEY pictures_owner_index (owner_id),
  CONSTRAINT pictures_owner_foreign FOREIGN KEY (owner_id) REFERENCES members (id) ON DELETE SET NULL,
  CONSTRAINT pictures_note_foreign FOREIGN KEY (note_id) REFERENCES notes (id) ON DELETE CASCADE,
  CONSTRAINT pictures_kiln_foreign FOREIGN KEY (kiln_id) REFERENCES kilns (id) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE pictures');
}
