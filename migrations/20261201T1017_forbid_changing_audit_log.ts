import type { Knex } from 'knex';

// Append-only, whoever asks.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TRIGGER audit_log_no_update BEFORE UPDATE ON audit_log FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'audit_log is append-only'
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TRIGGER audit_log_no_update');
}
