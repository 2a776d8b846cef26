import type { Knex } from 'knex';

// People with an account. `name_key` and `email` are the normal forms that look-ups use.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE members (
  id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT,
  email VARCHAR(254) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  email_verified_at DATETIME(3) NULL,
  name VARCHAR(60) NOT NULL,
  name_key VARCHAR(190) COLLATE utf8mb4_bin NOT NULL,
  role VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'member',
  password_hash VARCHAR(200) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  place VARCHAR(80) NOT NULL DEFAULT '',
  about VARCHAR(1000) NOT NULL DEFAULT '',
  settings JSON NOT NULL,
  suspended_at DATETIME(3) NULL,
  created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  PRIMARY KEY (id),
  UNIQUE KEY members_email_unique (email),
  UNIQUE KEY members_name_key_unique (name_key),
  CONSTRAINT members_role_check CHECK (role IN ('member', 'moderator', 'admin'))
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE members');
}
