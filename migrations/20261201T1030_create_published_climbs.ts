import type { Knex } from 'knex';

// One row a published note: its climb as look-alikes are found by, kept in the publishing transaction.
// A note without a record has a row without a signature, so that it is known to have been looked at.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE published_climbs (
  note_id BIGINT UNSIGNED NOT NULL,
  revision_id BIGINT UNSIGNED NOT NULL,
  version SMALLINT UNSIGNED NOT NULL,
  signature VARBINARY(360) NULL,
  traits JSON NULL,
  kept_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  PRIMARY KEY (note_id),
  KEY published_climbs_kept_index (kept_at),
  CONSTRAINT published_climbs_note_foreign FOREIGN KEY (note_id) REFERENCES notes (id) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE published_climbs');
}
