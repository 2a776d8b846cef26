import { spawn } from 'node:child_process';
import { mkdirSync, readFileSync, renameSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { once } from 'node:events';
import { findMariadbShare } from './find-program.mjs';
import { StartFailure, explainLog } from './start-failure.mjs';

/** The name of the database and of its user. */
export const DATABASE_NAME = 'spyhole';

/** Passwords of a database of our own; kept in a file only its owner can read. */
export interface DatabaseCredentials {
  user: string;
  password: string;
  rootPassword: string;
}

/** MariaDB's own tables, in the order they must be created; the names up to 10.11, and later ones. */
const SYSTEM_SQL = ['system_tables.sql', 'performance_tables.sql', 'system_tables_data.sql'];

/**
 * Creates a data folder that never had an open login: the passwords are set in the same run that
 * creates the tables, before the server ever listens. We feed the server its own SQL instead of
 * calling `mariadb-install-db`, because that script needs a helper from another package.
 *
 * The folder is made under another name and renamed when complete, so an interrupted run leaves
 * something to throw away and never a half-made database.
 *
 * @param grantAll true lets the user create databases of any name (tests need one for each worker)
 */
export async function initialiseMariadb(
  mariadbd: string,
  dataFolder: string,
  credentials: DatabaseCredentials,
  grantAll: boolean,
): Promise<void> {
  const share = findMariadbShare(mariadbd);
  if (share === null) {
    throw new StartFailure(
      `The SQL files that belong to ${mariadbd} are missing: install MariaDB's server package again.`,
    );
  }
  const halfMade = `${dataFolder}.new`;
  rmSync(halfMade, { recursive: true, force: true });
  mkdirSync(halfMade, { recursive: true, mode: 0o700 });
  await bootstrap(mariadbd, halfMade, initialSql(share, credentials, grantAll));
  rmSync(temporaryFolder(halfMade), { recursive: true, force: true });
  renameSync(halfMade, dataFolder);
}

function initialSql(share: string, credentials: DatabaseCredentials, grantAll: boolean): string {
  const target = grantAll ? '*.*' : `\`${DATABASE_NAME}\`.*`;
  const account = `'${credentials.user}'@'127.0.0.1'`;
  // Bootstrap mode reads one statement a line. Passwords are our own base64url: nothing to escape.
  return [
    'CREATE DATABASE mysql;',
    'USE mysql;',
    'SET @auth_root_socket=NULL;',
    ...SYSTEM_SQL.map((name) => readSystemSql(share, name)),
    "DELETE FROM mysql.global_priv WHERE User='' OR (User='root' AND Host<>'localhost');",
    'DELETE FROM mysql.proxies_priv;',
    'FLUSH PRIVILEGES;',
    `ALTER USER 'root'@'localhost' IDENTIFIED BY '${credentials.rootPassword}';`,
    `CREATE DATABASE ${DATABASE_NAME} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci;`,
    `CREATE USER ${account} IDENTIFIED BY '${credentials.password}';`,
    `GRANT ALL PRIVILEGES ON ${target} TO ${account};`,
    '',
  ].join('\n');
}

function readSystemSql(share: string, name: string): string {
  for (const prefix of ['mysql_', 'mariadb_']) {
    try {
      return readFileSync(join(share, `${prefix}${name}`), 'utf8');
    } catch {
      // The other name is tried next.
    }
  }
  throw new StartFailure(`${name} is missing in ${share}: install MariaDB's server package again.`);
}

async function bootstrap(mariadbd: string, folder: string, sql: string): Promise<void> {
  const args = [
    '--no-defaults',
    '--bootstrap',
    ...runAsRoot(),
    `--datadir=${folder}`,
    `--tmpdir=${temporaryFolder(folder)}`,
    '--log-warnings=0',
    '--enforce-storage-engine=',
    '--max-allowed-packet=8M',
    '--innodb-log-file-size=16M',
    // Nothing here is worth keeping until the whole folder is complete.
    '--innodb-flush-log-at-trx-commit=0',
  ];
  const child = spawn(mariadbd, args, { stdio: ['pipe', 'ignore', 'pipe'], detached: true });
  let log = '';
  child.stderr.setEncoding('utf8').on('data', (text: string) => (log += text));
  // A server that gives up early closes its input; its exit code and log tell why.
  child.stdin.on('error', () => undefined);
  child.stdin.end(sql);
  const [code] = (await once(child, 'close')) as [number | null];
  if (code === 0) return;
  const errors = log.split('\n').filter((line) => line.includes('ERROR'));
  throw new StartFailure(
    explainLog(log) ?? `The database could not be created: ${errors[0] ?? 'it gave no reason.'}`,
  );
}

/**
 * A folder for temporary tables beside the data, made when missing. In a shared one a second server
 * that starts takes the first one's temporary tables for leftovers and removes them.
 */
export function temporaryFolder(dataFolder: string): string {
  const folder = `${dataFolder}-tmp`;
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  return folder;
}

/** MariaDB refuses to run as root unless told so; containers often have no other user. */
export function runAsRoot(): string[] {
  return process.getuid?.() === 0 ? ['--user=root'] : [];
}
