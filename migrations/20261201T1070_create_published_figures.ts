import type { Knex } from 'knex';

// One row a published firing: the few numbers that pooled plots read, so that they need neither the
// notes nor their whole facts. It goes with the published firing, in the same statement.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE published_figures (
  note_id BIGINT UNSIGNED NOT NULL,
  version SMALLINT UNSIGNED NOT NULL,
  numbers JSON NOT NULL,
  PRIMARY KEY (note_id),
  KEY published_figures_version_index (version, note_id),
  CONSTRAINT published_figures_note_foreign FOREIGN KEY (note_id) REFERENCES published_firings (note_id) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE published_figures');
}
