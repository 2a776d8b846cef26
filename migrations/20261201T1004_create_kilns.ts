import type { Knex } from 'knex';

// A kiln and its keeper; how it is built lives in its versions.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE kilns (
  id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT,
  keeper_id BIGINT UNSIGNED NULL,
  name VARCHAR(60) NOT NULL,
  current_version INT UNSIGNED NOT NULL DEFAULT 1,
  picture_id BIGINT UNSIGNED NULL,
  removed_at DATETIME(3) NULL,
  created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  PRIMARY KEY (id),
  KEY kilns_keeper_index (keeper_id),
  CONSTRAINT kilns_keeper_foreign FOREIGN KEY (keeper_id) REFERENCES members (id) ON DELETE SET NULL
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE kilns');
}
