import type { Knex } from 'knex';

// A trouble whose every finding is disputed is kept, counted as disputed, and counted as nothing else.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(
    'ALTER TABLE firing_troubles ADD COLUMN disputed BOOLEAN NOT NULL DEFAULT FALSE AFTER named',
  );
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('ALTER TABLE firing_troubles DROP COLUMN disputed');
}
