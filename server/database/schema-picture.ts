import type { Knex } from 'knex';
import { selectRows } from './select-rows.ts';

/** Knex's own tables say which migrations have run; they are not part of the product's schema. */
const BOOKKEEPING = ['knex_migrations', 'knex_migrations_lock'];

/**
 * The statements that create the database as it is now: every table and trigger, sorted by name,
 * without counters, owners and session settings, so that two equal schemas give equal text. Tables
 * refer to each other: run them with foreign_key_checks off.
 */
export async function readSchema(db: Knex): Promise<string[]> {
  const tables: string[] = [];
  for (const table of await listTables(db)) {
    const rows = await selectRows<Record<string, string>>(db, 'SHOW CREATE TABLE ??', [table]);
    tables.push((rows[0]?.['Create Table'] ?? '').replace(/ AUTO_INCREMENT=\d+/, ''));
  }
  const triggerRows = await selectRows<{ Trigger: string }>(db, 'SHOW TRIGGERS');
  const triggers: string[] = [];
  for (const name of triggerRows.map((row) => row.Trigger).sort()) {
    const rows = await selectRows<Record<string, string>>(db, 'SHOW CREATE TRIGGER ??', [name]);
    const statement = rows[0]?.['SQL Original Statement'] ?? '';
    triggers.push(statement.replace(/^CREATE\s+DEFINER\s*=\s*\S+/i, 'CREATE'));
  }
  return [...tables, ...triggers];
}

/** The product's own tables, sorted by name. */
export async function listTables(db: Knex): Promise<string[]> {
  const rows = await selectRows<{ name: string }>(
    db,
    `SELECT table_name AS name FROM information_schema.tables
     WHERE table_schema = DATABASE() AND table_type = 'BASE TABLE'`,
  );
  return rows
    .map((row) => row.name)
    .filter((name) => !BOOKKEEPING.includes(name))
    .sort();
}

/** Tables whose triggers refuse a DELETE, or do more than delete. */
export async function listTablesWithDeleteTriggers(db: Knex): Promise<string[]> {
  const rows = await selectRows<{ name: string }>(
    db,
    `SELECT DISTINCT event_object_table AS name FROM information_schema.triggers
     WHERE trigger_schema = DATABASE() AND event_manipulation = 'DELETE'`,
  );
  return rows.map((row) => row.name);
}

/** The same statements as one file to read. */
export function printSchema(statements: string[]): string {
  const header =
    '-- The schema that all migrations together make. Written by `npm run migrate -- --write-schema`;\n' +
    '-- a test compares it with a migrated database. Not meant to be run by hand.\n';
  return `${header}\n${statements.map((statement) => `${statement};\n`).join('\n')}`;
}
