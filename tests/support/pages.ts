import { once } from 'node:events';
import { copyFile, mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { createApp } from '../../server/app.ts';
import type { Deps } from '../../server/deps.ts';
import { test as base, type Client } from './api.ts';

/** The client's cookies as a header, for a plain `fetch`. */
export const cookiesOf = (client: Client): string =>
  [...client.cookies].map(([name, value]) => `${name}=${value}`).join('; ');

/** Words of our own machinery that no answer may show. */
export const LEAKS =
  /SELECT |INSERT |mysql|mariadb|knex|node_modules|\/work\/|\/home\/|\/tmp\/|server\/\w+\/|at \w+ \(|password_hash|Express|SECRET/i;

/** The application with pages: the client's document as it is, and one built file. */
export const test = base.extend<{ serve: (deps: Deps) => Promise<string> }>({
  serve: async ({ task: _task }, use) => {
    const dist = await mkdtemp(path.join(tmpdir(), 'spyhole-test-dist-'));
    await mkdir(path.join(dist, 'assets'));
    await copyFile(
      path.resolve(import.meta.dirname, '../../index.html'),
      path.join(dist, 'index.html'),
    );
    await writeFile(path.join(dist, 'assets', 'a-1b2c.js'), 'export {};\n');
    const servers: ReturnType<typeof createServer>[] = [];
    await use(async (deps) => {
      const server = createServer(createApp(deps, dist));
      servers.push(server);
      server.listen(0, '127.0.0.1');
      await once(server, 'listening');
      return `http://127.0.0.1:${String((server.address() as AddressInfo).port)}`;
    });
    for (const server of servers) {
      server.closeAllConnections();
      server.close();
    }
    await rm(dist, { recursive: true, force: true });
  },
});
