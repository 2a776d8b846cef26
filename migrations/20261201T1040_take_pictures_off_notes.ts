import type { Knex } from 'knex';

// A picture its author took off a note stays for the revisions that show it, and for them only.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw('ALTER TABLE pictures ADD COLUMN taken_off_at DATETIME(3) NULL AFTER bytes');
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('ALTER TABLE pictures DROP COLUMN taken_off_at');
}
