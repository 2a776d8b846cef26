import type { Knex } from 'knex';

// A note: whose, where in its life, and the working copy. `version` is what a save compares.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE notes (
  id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT,
  author_id BIGINT UNSIGNED NULL,
  status VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'draft',
  version INT UNSIGNED NOT NULL DEFAULT 1,
  draft JSON NOT NULL,
  draft_saved_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  handed_in_revision_id BIGINT UNSIGNED NULL,
  handed_in_at DATETIME(3) NULL,
  published_revision_id BIGINT UNSIGNED NULL,
  published_at DATETIME(3) NULL,
  revised_at DATETIME(3) NULL,
  claimed_by BIGINT UNSIGNED NULL,
  claimed_until DATETIME(3) NULL,
  kiln_id BIGINT UNSIGNED NULL,
  fired_on DATE NULL,
  fired_at_time CHAR(5) CHARACTER SET ascii COLLATE ascii_bin NULL,
  removed_at DATETIME(3) NULL,
  created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  PRIMARY KEY (id),
  KEY notes_author_index (author_id, draft_saved_at),
  KEY notes_published_index (published_at, id),
  KEY notes_desk_index (status, handed_in_at),
  KEY notes_kiln_index (kiln_id, fired_on, fired_at_time),
  CONSTRAINT notes_author_foreign FOREIGN KEY (author_id) REFERENCES members (id) ON DELETE SET NULL,
  CONSTRAINT notes_claimed_by_foreign FOREIGN KEY (claimed_by) REFERENCES members (id) ON DELETE SET NULL,
  CONSTRAINT notes_kiln_foreign FOREIGN KEY (kiln_id) REFERENCES kilns (id) ON DELETE SET NULL,
  CONSTRAINT notes_status_check CHECK (status IN ('draft', 'handed-in', 'on-the-desk', 'sent-back', 'published', 'declined', 'taken-down'))
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE notes');
}
