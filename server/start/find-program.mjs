import { accessSync, constants, realpathSync } from 'node:fs';
import { delimiter, dirname, join } from 'node:path';

/** Folders outside many people's PATH in which servers are installed. */
const SYSTEM_FOLDERS = [
  '/usr/sbin',
  '/usr/local/sbin',
  '/usr/local/bin',
  '/opt/homebrew/bin',
  '/usr/bin',
];

/**
 * @param {string} path
 * @returns {boolean}
 */
function isExecutable(path) {
  try {
    accessSync(path, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/**
 * The full path of a program on PATH or in a usual system folder, or null.
 * @param {string} name
 * @param {string} [searchPath]
 * @returns {string | null}
 */
export function findProgram(name, searchPath = process.env['PATH'] ?? '') {
  const folders = [...searchPath.split(delimiter).filter(Boolean), ...SYSTEM_FOLDERS];
  return folders.map((folder) => join(folder, name)).find(isExecutable) ?? null;
}

/** @returns {string | null} the path of the MariaDB server program */
export function findMariadbd() {
  return findProgram('mariadbd');
}

/**
 * The folder with the SQL that creates MariaDB's own tables, or null. Its name differs between
 * Debian, other distributions and a build from source.
 * @param {string} mariadbd
 * @returns {string | null}
 */
export function findMariadbShare(mariadbd) {
  const prefix = join(dirname(realpathSync(mariadbd)), '..');
  const folders = ['mysql', 'mariadb', '.'].map((name) => join(prefix, 'share', name));
  return folders.find((folder) => SYSTEM_TABLES.some((name) => exists(join(folder, name)))) ?? null;
}

/** The file of system tables under its name up to MariaDB 10.11 and its later one. */
const SYSTEM_TABLES = ['mysql_system_tables.sql', 'mariadb_system_tables.sql'];

/**
 * @param {string} path
 * @returns {boolean}
 */
function exists(path) {
  try {
    accessSync(path, constants.R_OK);
    return true;
  } catch {
    return false;
  }
}
