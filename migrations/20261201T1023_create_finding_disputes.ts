import type { Knex } from 'knex';

// One row for each finding of a published note that its author ever disputed. Rows are never
// removed while the note is there, so that the sum of their versions tells when figures changed.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE finding_disputes (
  id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT,
  note_id BIGINT UNSIGNED NOT NULL,
  code VARCHAR(24) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  minute DOUBLE NOT NULL,
  sentence VARCHAR(300) NOT NULL,
  state VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'disputed',
  version INT UNSIGNED NOT NULL DEFAULT 1,
  said_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  answer VARCHAR(300) NOT NULL DEFAULT '',
  answered_by BIGINT UNSIGNED NULL,
  answered_at DATETIME(3) NULL,
  PRIMARY KEY (id),
  UNIQUE KEY finding_disputes_finding_unique (note_id, code, minute),
  KEY finding_disputes_state_index (state, said_at),
  CONSTRAINT finding_disputes_note_foreign FOREIGN KEY (note_id) REFERENCES notes (id) ON DELETE CASCADE,
  CONSTRAINT finding_disputes_answered_by_foreign FOREIGN KEY (answered_by) REFERENCES members (id) ON DELETE SET NULL,
  CONSTRAINT finding_disputes_state_check CHECK (state IN ('disputed','left','restored','withdrawn'))
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE finding_disputes');
}
