import type { Knex } from 'knex';

// Counters of failed or frequent acts by hashed key (account, client address), within a window.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE throttles (
  key_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  count INT UNSIGNED NOT NULL,
  window_ends_at DATETIME(3) NOT NULL,
  PRIMARY KEY (key_hash),
  KEY throttles_window_index (window_ends_at)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE throttles');
}
