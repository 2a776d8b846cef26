import { spawn } from 'node:child_process';
import { mkdtemp, rm } from 'node:fs/promises';
import { Agent, createServer, request as httpRequest, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { Express } from 'express';
import { pino } from 'pino';
import { createApp } from '../../server/app.ts';
import { migrate } from '../../server/database/migrate.ts';
import { openDatabase } from '../../server/database/open-database.ts';
import type { Deps } from '../../server/deps.ts';
import { withThrowawayDatabase } from '../../server/start/throwaway-database.ts';
import { diskStore } from '../../server/storage/file-store.ts';
import { testConfig } from '../support/test-config.ts';

const ROOT = path.resolve(import.meta.dirname, '../..');
const ENGINE_KEY = 'a-key-for-the-bench-only-0123456789';
const agent = new Agent({ keepAlive: true, maxSockets: 64 });

/** The local engine as the product runs it: a process of its own on loopback. */
export interface EngineProcess {
  readonly url: string;
  readonly key: string;
  readonly pid: number;
  /** Until the process was listening. */
  readonly startMilliseconds: number;
  readonly stop: () => Promise<void>;
}

export async function startEngineProcess(dataFolder: string): Promise<EngineProcess> {
  const from = performance.now();
  const child = spawn(
    process.execPath,
    ['--import', 'tsx', path.join(ROOT, 'search/engine/main.ts')],
    {
      cwd: ROOT,
      env: {
        ...process.env,
        ENGINE_PORT: '0',
        ENGINE_MASTER_KEY: ENGINE_KEY,
        ENGINE_DATA: dataFolder,
      },
      stdio: ['ignore', 'pipe', 'inherit'],
    },
  );
  const ended = new Promise<void>((resolve) => child.once('exit', () => resolve()));
  const url = await new Promise<string>((resolve, reject) => {
    let said = '';
    child.stdout.setEncoding('utf8').on('data', (chunk: string) => {
      const listening = /"listening":"([^"]+)"/.exec((said += chunk))?.[1];
      if (listening !== undefined) resolve(listening);
    });
    void ended.then(() => reject(new Error('The engine ended while it was starting.')));
  });
  return {
    url,
    key: ENGINE_KEY,
    pid: child.pid ?? 0,
    startMilliseconds: performance.now() - from,
    stop: async () => {
      child.kill('SIGTERM');
      await ended;
    },
  };
}

/** A request of a reader, over connections that stay open. @returns the length of the answer */
export function get(port: number, url: string): Promise<number> {
  return new Promise((resolve, reject) => {
    httpRequest({ host: '127.0.0.1', port, path: url, agent }, (response) => {
      let size = 0;
      response.on('data', (chunk: Buffer) => (size += chunk.length));
      response.on('end', () => {
        if (response.statusCode === 200) resolve(size);
        else reject(new Error(`${url}: ${String(response.statusCode)}`));
      });
    })
      .on('error', reject)
      .end();
  });
}

export async function listen(handler: Express): Promise<{ server: Server; port: number }> {
  const server = createServer(handler);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return { server, port: (server.address() as AddressInfo).port };
}

export interface BenchStack {
  readonly deps: Deps;
  readonly databaseUrl: string;
  readonly engine: EngineProcess;
  /** Serves the application over `deps`; gives its port. */
  readonly serve: () => Promise<number>;
}

/** MariaDB, the engine and an empty, migrated database, all gone when the work is done. */
export async function withStack(work: (stack: BenchStack) => Promise<void>): Promise<void> {
  await withThrowawayDatabase(async (databaseUrl) => {
    const folder = await mkdtemp(path.join(tmpdir(), 'spyhole-bench-'));
    await migrate(databaseUrl);
    const db = openDatabase(databaseUrl, { statementSeconds: 120 });
    const engine = await startEngineProcess(path.join(folder, 'search'));
    const config = testConfig({
      databaseUrl,
      uploadsFolder: path.join(folder, 'uploads'),
      search: { url: engine.url, key: engine.key },
    });
    const deps: Deps = {
      config,
      db,
      log: pino({ level: 'silent' }),
      store: diskStore(config.uploadsFolder),
    };
    const servers: Server[] = [];
    const serve = async (): Promise<number> => {
      const { server, port } = await listen(createApp(deps));
      servers.push(server);
      return port;
    };
    try {
      await work({ deps, databaseUrl, engine, serve });
    } finally {
      agent.destroy();
      for (const server of servers) {
        server.closeAllConnections();
        server.close();
      }
      await engine.stop();
      await db.destroy();
      await rm(folder, { recursive: true, force: true });
    }
  });
}
