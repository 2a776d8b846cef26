import type { Knex } from 'knex';

// What was done by whom to what, and why: rows are added, never changed or removed.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE audit_log (
  id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT,
  actor_id BIGINT UNSIGNED NULL,
  act VARCHAR(40) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  target_kind VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  target_id BIGINT UNSIGNED NOT NULL,
  before_value JSON NULL,
  after_value JSON NULL,
  reason VARCHAR(2000) NOT NULL DEFAULT '',
  at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  PRIMARY KEY (id),
  KEY audit_log_target_index (target_kind, target_id, id),
  KEY audit_log_actor_index (actor_id, id)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE audit_log');
}
