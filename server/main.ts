import { createServer, type Server } from 'node:http';
import { createApp } from './app.ts';
import { readConfig, type Config } from './config.ts';
import { findUnsafeSettings } from './database/check-settings.ts';
import { openDatabase } from './database/open-database.ts';
import type { Deps } from './deps.ts';
import { createLog } from './log.ts';
import { diskStore } from './storage/file-store.ts';
import { UPLOAD_MILLISECONDS, limitRequestTime } from './request-time-limit.ts';
import { startWorkers } from './workers.ts';

/** Slow or silent clients may hold a connection this long; Node's own limits are far more patient. */
const HEADERS_MILLISECONDS = 15_000;
const IDLE_MILLISECONDS = 5_000;
const CHECK_MILLISECONDS = 5_000;
const HEADER_BYTES = 16_384;

/** How long an orderly stop waits for requests that are being answered. */
const FINISH_MILLISECONDS = 10_000;

const config = loadConfig();
const log = createLog(config);
const db = openDatabase(config.databaseUrl);
let isStopping = false;
const deps: Deps = {
  config,
  db,
  log,
  store: diskStore(config.uploadsFolder),
  stopping: () => isStopping,
};

// After an error nobody caught, nothing in memory can be trusted: say it and let us be restarted.
for (const event of ['uncaughtException', 'unhandledRejection'] as const) {
  process.on(event, (error: unknown) => {
    log.fatal({ err: error }, event);
    process.exit(1);
  });
}

const unsafe = await findUnsafeSettings(db);
if (unsafe.length > 0) {
  console.error(`The database could lose what it has accepted: ${unsafe.join('; ')}.`);
  process.exit(78);
}

const server = createServer(
  {
    maxHeaderSize: HEADER_BYTES,
    headersTimeout: HEADERS_MILLISECONDS,
    requestTimeout: UPLOAD_MILLISECONDS,
    keepAliveTimeout: IDLE_MILLISECONDS,
    connectionsCheckingInterval: CHECK_MILLISECONDS,
  },
  createApp(deps),
);
server.prependListener('request', (request) => limitRequestTime(request));
server.once('error', (error: NodeJS.ErrnoException) => {
  const taken = error.code === 'EADDRINUSE';
  console.error(taken ? `Port ${config.port} is taken by another program.` : error.message);
  process.exit(1);
});
const workers = startWorkers(deps);
server.listen(config.port, config.host, () => {
  log.info({ host: config.host, port: config.port }, 'listening');
});

process.once('SIGTERM', () => void stop('SIGTERM'));
process.once('SIGINT', () => void stop('SIGINT'));
// The start command holds the other end of this channel: without it nobody would stop us.
if (process.channel) process.once('disconnect', () => void stop('start command gone'));

/** No new work, finish what was begun, then go. */
async function stop(reason: string): Promise<void> {
  if (isStopping) return;
  isStopping = true;
  log.info({ reason }, 'stopping');
  await Promise.all([closeServer(server), workers.stop()]);
  await db.destroy();
  log.info('stopped');
  process.exit(0);
}

/** Ends when every answer is out, or when the time is up and the rest are cut. */
function closeServer(closing: Server): Promise<void> {
  return new Promise((resolve) => {
    const cut = setTimeout(() => closing.closeAllConnections(), FINISH_MILLISECONDS);
    closing.close(() => {
      clearTimeout(cut);
      resolve();
    });
    closing.closeIdleConnections();
  });
}

function loadConfig(): Config {
  try {
    return readConfig(process.env);
  } catch (error) {
    console.error(error instanceof Error ? error.message : error);
    process.exit(78);
  }
}
