import type { Knex } from 'knex';

// What readers ask about a published note, in plain text. The name goes with the account.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE note_questions (
  id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT,
  note_id BIGINT UNSIGNED NOT NULL,
  asker_id BIGINT UNSIGNED NULL,
  text VARCHAR(500) NOT NULL,
  asked_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  PRIMARY KEY (id),
  KEY note_questions_note_index (note_id, id),
  KEY note_questions_asker_index (asker_id),
  CONSTRAINT note_questions_note_foreign FOREIGN KEY (note_id) REFERENCES notes (id) ON DELETE CASCADE,
  CONSTRAINT note_questions_asker_foreign FOREIGN KEY (asker_id) REFERENCES members (id) ON DELETE SET NULL
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE note_questions');
}
