import type { Knex } from 'knex';

// Answers to a question: one of each member who may answer it, changed in place.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE question_answers (
  id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT,
  question_id BIGINT UNSIGNED NOT NULL,
  member_id BIGINT UNSIGNED NULL,
  text VARCHAR(2000) NOT NULL,
  answered_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  changed_at DATETIME(3) NULL,
  PRIMARY KEY (id),
  UNIQUE KEY question_answers_member_unique (question_id, member_id),
  KEY question_answers_member_index (member_id),
  CONSTRAINT question_answers_question_foreign FOREIGN KEY (question_id) REFERENCES note_questions (id) ON DELETE CASCADE,
  CONSTRAINT question_answers_member_foreign FOREIGN KEY (member_id) REFERENCES members (id) ON DELETE SET NULL
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE question_answers');
}
