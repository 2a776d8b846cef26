import type { Knex } from 'knex';
import { selectRows } from './select-rows.ts';

interface Settings {
  flush: number;
  doublewrite: number | string;
  mode: string;
  logs: number;
  sync: number;
}

/**
 * What the server must promise before anything is entrusted to it: a commit is on disk, a torn page
 * can be repaired, a value that does not fit is refused (MariaDB documentation: flush at commit = 1
 * is required for full durability).
 *
 * @returns one sentence for each broken promise; empty when all is well
 */
export async function findUnsafeSettings(db: Knex): Promise<string[]> {
  const [settings] = await selectRows<Settings>(
    db,
    `SELECT @@innodb_flush_log_at_trx_commit AS flush, @@innodb_doublewrite AS doublewrite,
            @@sql_mode AS mode, @@log_bin AS logs, @@sync_binlog AS sync`,
  );
  if (settings === undefined) return ['the database does not tell its settings'];
  const faults: string[] = [];
  if (settings.flush !== 1) faults.push('innodb_flush_log_at_trx_commit must be 1');
  if (settings.doublewrite === 0 || settings.doublewrite === 'OFF') {
    faults.push('innodb_doublewrite must be on');
  }
  if (!settings.mode.includes('STRICT_TRANS_TABLES')) faults.push('sql_mode must be strict');
  if (settings.logs === 1 && settings.sync !== 1) {
    faults.push('sync_binlog must be 1 while the binary log is on');
  }
  return faults;
}
