import { mkdirSync, readFileSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startMariadb } from './mariadb.ts';
import { commandLineOf, isAlive, stopProcess } from './processes.ts';

/** A database for tests and tools, gone when it is stopped. */
export interface ThrowawayDatabase {
  url: string;
  pid: number;
  stop: () => Promise<void>;
}

const FOLDER = join(tmpdir(), `spyhole-throwaway-${process.getuid?.() ?? 0}`);

let started = 0;

/** Starts a database that nobody will keep; it is not migrated yet. */
export async function startThrowawayDatabase(): Promise<ThrowawayDatabase> {
  await sweepAbandoned();
  started += 1;
  const folder = join(FOLDER, `${process.pid}-${started}`);
  rmSync(folder, { recursive: true, force: true });
  const server = await startMariadb({ folder, durable: false });
  return {
    url: server.url,
    pid: server.pid,
    stop: async () => {
      await server.stop();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

/** Runs `work` with a throwaway database and stops it whatever happens. */
export async function withThrowawayDatabase<T>(work: (url: string) => Promise<T>): Promise<T> {
  const database = await startThrowawayDatabase();
  try {
    return await work(database.url);
  } finally {
    await database.stop();
  }
}

/** A run that was killed leaves its server and folder behind; the next one clears them away. */
async function sweepAbandoned(): Promise<void> {
  mkdirSync(FOLDER, { recursive: true, mode: 0o700 });
  for (const name of readdirSync(FOLDER)) {
    if (isAlive(Number.parseInt(name, 10))) continue;
    const folder = join(FOLDER, name);
    const pid = readPid(join(folder, 'mariadb.pid'));
    if (commandLineOf(pid)?.includes(folder) === true) await stopProcess(pid, 0);
    rmSync(folder, { recursive: true, force: true });
  }
}

function readPid(path: string): number {
  try {
    return Number.parseInt(readFileSync(path, 'utf8'), 10);
  } catch {
    return -1;
  }
}
