import type { Knex } from 'knex';

// A moderator’s remark, pinned to a field; kept for whoever takes the note next.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE remarks (
  id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT,
  note_id BIGINT UNSIGNED NOT NULL,
  revision_id BIGINT UNSIGNED NOT NULL,
  moderator_id BIGINT UNSIGNED NULL,
  pointer VARCHAR(120) NOT NULL,
  text VARCHAR(1000) NOT NULL,
  sent_at DATETIME(3) NULL,
  mended_at DATETIME(3) NULL,
  created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  PRIMARY KEY (id),
  KEY remarks_note_index (note_id, created_at),
  CONSTRAINT remarks_note_foreign FOREIGN KEY (note_id) REFERENCES notes (id) ON DELETE CASCADE,
  CONSTRAINT remarks_revision_foreign FOREIGN KEY (revision_id) REFERENCES note_revisions (id) ON DELETE CASCADE,
  CONSTRAINT remarks_moderator_foreign FOREIGN KEY (moderator_id) REFERENCES members (id) ON DELETE SET NULL
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE remarks');
}
