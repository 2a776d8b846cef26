import type { AddressInfo } from 'node:net';
import type { Engine } from './engine.ts';
import { createHttpServer } from './http-server.ts';
import type { Route } from './http-route.ts';
import { buildSearchIndex } from './index-builder.ts';
import { defaultKeys } from './keys.ts';
import { documentRoutes } from './routes-documents.ts';
import { indexRoutes } from './routes-indexes.ts';
import { keyRoutes } from './routes-keys.ts';
import { searchRoutes } from './routes-search.ts';
import { serverRoutes } from './routes-server.ts';
import { settingsRoutes } from './routes-settings.ts';
import { taskRoutes } from './routes-tasks.ts';
import { DamagedStorageError } from './checked-lines.ts';
import { openStorage, setAside } from './storage.ts';
import { stopQueue, wakeQueue } from './task-queue.ts';

export type EngineOptions = {
  host: string;
  /** 0 picks a free port. */
  port: number;
  /** Without one (null) every request may do everything. */
  masterKey: string | null;
  /** Folder of the snapshot and the log; made if missing. One engine per folder. */
  dataDir: string;
};

export type RunningEngine = { url: string; close: () => Promise<void> };

const ROUTES: readonly Route[] = [
  ...serverRoutes,
  ...keyRoutes,
  ...taskRoutes,
  ...indexRoutes,
  ...settingsRoutes,
  ...searchRoutes,
  ...documentRoutes,
];

/**
 * What the folder holds; where that cannot be trusted, nothing: the files are set aside, and the
 * application fills the empty index from the database.
 */
async function openOrBeginAnew(folder: string): ReturnType<typeof openStorage> {
  try {
    return await openStorage(folder);
  } catch (error) {
    if (!(error instanceof DamagedStorageError)) throw error;
    console.error(`${error.message} It is set aside; the index has to be made anew.`);
    await setAside(folder);
    return openStorage(folder);
  }
}

/** Starts the engine on what its folder holds, and resumes tasks that were not finished. */
export async function startEngine(options: EngineOptions): Promise<RunningEngine> {
  const { state, storage } = await openOrBeginAnew(options.dataDir);
  if (options.masterKey !== null && state.keys.size === 0) {
    for (const key of defaultKeys(new Date().toISOString())) {
      state.keys.set(key.uid, key);
      await storage.append({ kind: 'key', key });
    }
  }
  const engine: Engine = {
    masterKey: options.masterKey,
    state,
    storage,
    searchIndexes: new Map(),
    durableTasks: new Set(state.payloads.keys()),
    queue: { timer: null, running: null, stopped: false, urgent: [] },
  };
  for (const [uid, payload] of state.payloads) {
    if (payload.type === 'taskCancelation') engine.queue.urgent.push(uid);
  }
  for (const stored of state.indexes.values()) {
    engine.searchIndexes.set(stored.uid, await buildSearchIndex(stored));
  }
  const server = createHttpServer(engine, ROUTES);
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(options.port, options.host, resolve);
  });
  wakeQueue(engine);
  // Listening on a host and port, the address is never a pipe name.
  const { address, port, family } = server.address() as AddressInfo;
  const host = family === 'IPv6' ? `[${address}]` : address;
  return {
    url: `http://${host}:${port}`,
    close: async () => {
      const closed = new Promise<void>((resolve) => server.close(() => resolve()));
      server.closeIdleConnections();
      await stopQueue(engine);
      server.closeAllConnections();
      await closed;
      await storage.close();
    },
  };
}
