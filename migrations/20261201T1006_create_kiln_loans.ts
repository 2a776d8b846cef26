import type { Knex } from 'knex';

// Members a kiln is lent to: they may fire it and write it up.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE kiln_loans (
  kiln_id BIGINT UNSIGNED NOT NULL,
  member_id BIGINT UNSIGNED NOT NULL,
  created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  PRIMARY KEY (kiln_id, member_id),
  KEY kiln_loans_member_index (member_id),
  CONSTRAINT kiln_loans_kiln_foreign FOREIGN KEY (kiln_id) REFERENCES kilns (id) ON DELETE CASCADE,
  CONSTRAINT kiln_loans_member_foreign FOREIGN KEY (member_id) REFERENCES members (id) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE kiln_loans');
}
