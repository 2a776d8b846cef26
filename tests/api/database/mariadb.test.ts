import { existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createConnection } from 'mysql2/promise';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { findUnsafeSettings } from '../../../server/database/check-settings.ts';
import { openDatabase } from '../../../server/database/open-database.ts';
import { startMariadb, type RunningMariadb } from '../../../server/start/mariadb.ts';
import { isAlive } from '../../../server/start/processes.ts';

let folder: string;
let running: RunningMariadb[];

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'spyhole-mariadb-'));
  running = [];
});

afterEach(async () => {
  await Promise.all(running.map((server) => server.stop()));
  rmSync(folder, { recursive: true, force: true });
});

async function start(): Promise<RunningMariadb> {
  const server = await startMariadb({ folder, durable: true });
  running.push(server);
  return server;
}

async function run(url: string, sql: string): Promise<unknown> {
  const connection = await createConnection(url);
  try {
    const [rows] = await connection.query(sql);
    return rows;
  } finally {
    await connection.end();
  }
}

describe('startMariadb', () => {
  it('makes a database whose settings lose nothing that was accepted', async () => {
    const server = await start();
    const db = openDatabase(server.url);
    expect(await findUnsafeSettings(db)).toEqual([]);
    await db.destroy();
  });

  it('never has a login without a password, and keeps its passwords to their owner', async () => {
    const server = await start();
    const port = server.port;
    const socketPath = join(folder, 'mariadb.sock');
    for (const attempt of [
      { socketPath, user: 'root' },
      { socketPath, user: 'anybody' },
      { host: '127.0.0.1', port, user: 'root' },
      { host: '127.0.0.1', port, user: 'root', password: server.credentials.rootPassword },
      { host: '127.0.0.1', port, user: 'spyhole' },
    ]) {
      await expect(createConnection(attempt), JSON.stringify(attempt)).rejects.toMatchObject({
        errno: expect.toSatisfy((errno) => errno === 1045 || errno === 1130) as unknown,
      });
    }
    expect(statSync(join(folder, 'database.json')).mode & 0o777).toBe(0o600);
  });

  it('lets its user do nothing outside the one database', async () => {
    const server = await start();
    await expect(run(server.url, 'CREATE DATABASE other')).rejects.toMatchObject({ errno: 1044 });
    await expect(run(server.url, 'SELECT user FROM mysql.user')).rejects.toThrow(/denied/);
  });

  it('has every committed row again after kill -9, with the same password', async () => {
    const server = await start();
    await run(server.url, 'CREATE TABLE pots (id int PRIMARY KEY)');
    for (let id = 1; id <= 20; id += 1) await run(server.url, `INSERT INTO pots VALUES (${id})`);
    process.kill(server.pid, 'SIGKILL');
    await server.ended;
    expect(existsSync(join(folder, 'mariadb.pid'))).toBe(true);
    const again = await start();
    expect(again.credentials).toEqual(server.credentials);
    expect(await run(again.url, 'SELECT COUNT(*) AS pots FROM pots')).toEqual([{ pots: 20 }]);
  });

  it('stops the server that a killed start has left running, and takes over', async () => {
    const left = await start();
    await run(left.url, 'CREATE TABLE pots (id int PRIMARY KEY)');
    const next = await start();
    expect(isAlive(left.pid)).toBe(false);
    expect(await run(next.url, 'SELECT COUNT(*) AS pots FROM pots')).toEqual([{ pots: 0 }]);
  });

  it('throws away what an interrupted first start had half made', async () => {
    const halfMade = join(folder, 'mariadb.new');
    mkdirSync(join(halfMade, 'mysql'), { recursive: true });
    const server = await start();
    expect(await run(server.url, 'SELECT 1 AS ok')).toEqual([{ ok: 1 }]);
    expect(existsSync(halfMade)).toBe(false);
  });

  it('does not touch a data folder whose password is lost, and says what to do', async () => {
    const server = await start();
    await server.stop();
    const before = readFileSync(join(folder, 'mariadb/ibdata1'));
    rmSync(join(folder, 'database.json'));
    await expect(start()).rejects.toThrow(/database\.json with the database's password is missing/);
    expect(readFileSync(join(folder, 'mariadb/ibdata1')).equals(before)).toBe(true);
  });

  it('finds a socket path that is short enough below a very long folder', async () => {
    folder = join(folder, 'a-very-long-name-of-a-folder-'.repeat(5));
    const server = await start();
    expect(await run(server.url, 'SELECT 1 AS ok')).toEqual([{ ok: 1 }]);
  });
});
