import type { Knex } from 'knex';

// Sessions by the SHA-256 of the cookie’s identifier, so that a leaked table signs nobody in.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE sessions (
  id_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  member_id BIGINT UNSIGNED NULL,
  data JSON NOT NULL,
  browser VARCHAR(200) NOT NULL DEFAULT '',
  started_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  seen_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  expires_at DATETIME(3) NOT NULL,
  ends_at DATETIME(3) NOT NULL,
  PRIMARY KEY (id_hash),
  KEY sessions_member_index (member_id),
  KEY sessions_expires_index (expires_at),
  CONSTRAINT sessions_member_foreign FOREIGN KEY (member_id) REFERENCES members (id) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE sessions');
}
