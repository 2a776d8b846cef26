import type { Engine } from './engine.ts';
import type { Route } from './http-route.ts';
import type { JsonObject } from './json.ts';
import { mayUseIndex } from './keys.ts';
import { indexStats } from './routes-indexes.ts';

/** The 1.x generation whose protocol is spoken here. */
const PROTOCOL_VERSION = '1.53.0';

function lastUpdate(engine: Engine): string | null {
  const moments = [...engine.state.indexes.values()].map((index) => index.updatedAt);
  return moments.sort().at(-1) ?? null;
}

export const serverRoutes: readonly Route[] = [
  {
    method: 'GET',
    path: '/health',
    action: null,
    handle: () => ({ status: 200, body: { status: 'available' } }),
  },
  {
    method: 'GET',
    path: '/version',
    action: 'version',
    handle: () => ({
      status: 200,
      body: { commitSha: 'unknown', commitDate: 'unknown', pkgVersion: PROTOCOL_VERSION },
    }),
  },
  {
    method: 'GET',
    path: '/stats',
    action: 'stats.get',
    handle: ({ engine, access }) => {
      const indexes: JsonObject = Object.fromEntries(
        [...engine.state.indexes.keys()]
          .filter((uid) => mayUseIndex(access, uid))
          .map((uid) => [uid, indexStats(engine, uid)]),
      );
      const databaseSize = engine.storage.databaseSize();
      return {
        status: 200,
        body: {
          databaseSize,
          usedDatabaseSize: databaseSize,
          lastUpdate: lastUpdate(engine),
          indexes,
        },
      };
    },
  },
];
