import type { Knex } from 'knex';

// A member's questions with their filters. `looked_until` says up to which publishing time a search
// has been looked through for news, `mailed_at` when its member was last written to about it.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE saved_searches (
  id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT,
  member_id BIGINT UNSIGNED NOT NULL,
  name VARCHAR(80) NOT NULL,
  search VARCHAR(5000) NOT NULL,
  mails TINYINT(1) NOT NULL DEFAULT 1,
  saved_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  looked_until DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  mailed_at DATETIME(3) NULL,
  PRIMARY KEY (id),
  KEY saved_searches_member_index (member_id, id),
  CONSTRAINT saved_searches_member_foreign FOREIGN KEY (member_id) REFERENCES members (id) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE saved_searches');
}
