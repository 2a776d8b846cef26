import type { Knex } from 'knex';

// A kiln as it was described at a time; never changed, so that an old note keeps the kiln it was fired in.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE kiln_versions (
  kiln_id BIGINT UNSIGNED NOT NULL,
  version INT UNSIGNED NOT NULL,
  fields JSON NOT NULL,
  volume_litres DOUBLE NULL,
  created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  PRIMARY KEY (kiln_id, version),
  CONSTRAINT kiln_versions_kiln_foreign FOREIGN KEY (kiln_id) REFERENCES kilns (id) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE kiln_versions');
}
