import type { Knex } from 'knex';

// Which pictures stand in the story of which revision: a reader may see those of the published one.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE revision_pictures (
  revision_id BIGINT UNSIGNED NOT NULL,
  picture_id BIGINT UNSIGNED NOT NULL,
  PRIMARY KEY (revision_id, picture_id),
  KEY revision_pictures_picture_index (picture_id),
  CONSTRAINT revision_pictures_revision_foreign FOREIGN KEY (revision_id) REFERENCES note_revisions (id) ON DELETE CASCADE,
  CONSTRAINT revision_pictures_picture_foreign FOREIGN KEY (picture_id) REFERENCES pictures (id) ON DELETE CASCADE
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE revision_pictures');
}
