import { join } from 'node:path';
import { startMailCatcher } from '../mail/catcher.ts';
import { migrate } from '../database/migrate.ts';
import { startMariadb } from './mariadb.ts';
import type { Part } from './parts.ts';
import { findFreePort, startProcess, stopProcess, type Started } from './processes.ts';
import { StartFailure } from './start-failure.mjs';

/** Where things are and how a started part is made known. */
export interface StartContext {
  root: string;
  dataFolder: string;
  env: NodeJS.ProcessEnv;
  add: (part: Part, pid?: number) => Promise<void>;
}

/** The server first, so that nothing is asked of the parts behind it when they go. */
const SERVER_ORDER = 1;
const OTHERS_ORDER = 2;

/** A little more than the server itself allows for requests that are being answered. */
const SERVER_STOP_MILLISECONDS = 10_500;
const OTHERS_STOP_MILLISECONDS = 3_500;
const ENGINE_READY_MILLISECONDS = 30_000;
const SERVER_READY_MILLISECONDS = 60_000;

/** Starts our own MariaDB and gives its address. */
export async function startDatabase(context: StartContext): Promise<string> {
  const database = await startMariadb({ folder: context.dataFolder, durable: true });
  await context.add(
    {
      name: 'database',
      stopOrder: OTHERS_ORDER,
      stop: database.stop,
      ended: database.ended,
      logPath: join(context.dataFolder, 'mariadb.log'),
    },
    database.pid,
  );
  return database.url;
}

/** Brings the database up to date; what goes wrong is told in one sentence with its reason. */
export async function migrateDatabase(url: string): Promise<void> {
  try {
    await migrate(url);
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    throw new StartFailure(`The database could not be brought up to date: ${reason}`);
  }
}

/** Starts the local search engine and gives its address. */
export async function startEngine(context: StartContext, key: string): Promise<string> {
  const logPath = join(context.dataFolder, 'search.log');
  const engine = startTypeScript(context, 'search engine', 'search/engine/main.ts', {
    logPath,
    stdout: 'pipe',
    env: {
      ENGINE_HOST: '127.0.0.1',
      ENGINE_PORT: String(await findFreePort()),
      ENGINE_MASTER_KEY: key,
      ENGINE_DATA: join(context.dataFolder, 'search'),
    },
  });
  await context.add(asPart(engine, OTHERS_ORDER, OTHERS_STOP_MILLISECONDS, logPath), engine.pid);
  return readListening(engine, ENGINE_READY_MILLISECONDS);
}

/** Waits for the line `{"listening":"http://..."}`; everything else it says is let go. */
function readListening(engine: Started, milliseconds: number): Promise<string> {
  return new Promise((resolve, reject) => {
    const tooLate = setTimeout(
      () => reject(new StartFailure('The search engine did not get ready.')),
      milliseconds,
    );
    let text = '';
    engine.child.stdout?.setEncoding('utf8').on('data', (chunk: string) => {
      const url = /^\{.*"listening":\s*"([^"]+)"/m.exec((text += chunk))?.[1];
      if (url === undefined) return;
      clearTimeout(tooLate);
      text = '';
      resolve(url);
    });
    engine.ended.then(
      () => {
        clearTimeout(tooLate);
        reject(new StartFailure('The search engine ended while it was starting.'));
      },
      () => undefined,
    );
  });
}

/** Starts the mail catcher, which lives in this process, and gives its address. */
export async function catchMail(context: StartContext): Promise<string> {
  const catcher = await startMailCatcher(join(context.dataFolder, 'mail'));
  await context.add({
    name: 'mail catcher',
    stopOrder: OTHERS_ORDER,
    stop: catcher.stop,
    ended: null,
  });
  return catcher.smtpUrl;
}

/** Starts the server and waits until it says that it is ready. */
export async function startServer(
  context: StartContext,
  settings: NodeJS.ProcessEnv,
  origin: string,
  dev: boolean,
): Promise<void> {
  const logPath = join(context.dataFolder, 'server.log');
  const main = join(context.root, 'server/main.ts');
  const server = dev
    ? startProcess(
        'server',
        process.execPath,
        [join(context.root, 'node_modules/tsx/dist/cli.mjs'), 'watch', main],
        { cwd: context.root, env: { ...context.env, ...settings }, logPath, stdout: 'inherit' },
      )
    : startTypeScript(context, 'server', 'server/main.ts', { logPath, env: settings, tied: true });
  await context.add(asPart(server, SERVER_ORDER, SERVER_STOP_MILLISECONDS, logPath), server.pid);
  await waitUntilReady(`${origin}/health/ready`, server);
}

async function waitUntilReady(url: string, server: Started): Promise<void> {
  let hasEnded = false;
  server.ended.then(
    () => (hasEnded = true),
    () => (hasEnded = true),
  );
  const deadline = performance.now() + SERVER_READY_MILLISECONDS;
  while (!hasEnded) {
    if (performance.now() > deadline) throw new StartFailure('The server did not get ready.');
    const answer = await fetch(url, { signal: AbortSignal.timeout(3_000) }).catch(() => null);
    if (answer?.ok === true) return;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  throw new StartFailure('The server ended while it was starting.');
}

/** Starts Vite, which serves the pages while they are being worked on. */
export async function startPages(
  context: StartContext,
  port: number,
  apiPort: number,
): Promise<void> {
  const vite = join(context.root, 'node_modules/vite/bin/vite.js');
  const pages = startProcess(
    'page server',
    process.execPath,
    [vite, '--port', String(port), '--strictPort'],
    {
      cwd: context.root,
      env: { ...context.env, NODE_ENV: 'development', API_PORT: String(apiPort) },
      stdout: 'inherit',
    },
  );
  await context.add(asPart(pages, SERVER_ORDER, OTHERS_STOP_MILLISECONDS), pages.pid);
}

/** Fills the empty database with the demo. */
export async function seedDemo(context: StartContext, settings: NodeJS.ProcessEnv): Promise<void> {
  const logPath = join(context.dataFolder, 'seed.log');
  const seed = startTypeScript(context, 'demo', 'server/commands/seed.ts', {
    logPath,
    env: settings,
  });
  const part = asPart(seed, SERVER_ORDER, OTHERS_STOP_MILLISECONDS, logPath);
  await context.add({ ...part, isTask: true }, seed.pid);
  const { code } = await seed.ended;
  if (code !== 0) throw new StartFailure(`The demo could not be loaded: ${logPath} says why.`);
}

function startTypeScript(
  context: StartContext,
  name: string,
  file: string,
  options: { env: NodeJS.ProcessEnv; logPath: string; stdout?: 'pipe'; tied?: boolean },
): Started {
  const args = ['--import', 'tsx', join(context.root, file)];
  return startProcess(name, process.execPath, args, {
    ...options,
    cwd: context.root,
    env: { ...context.env, ...options.env },
  });
}

/** A started process as a part that can be stopped. */
export function asPart(
  started: Started,
  stopOrder: number,
  graceMilliseconds: number,
  logPath?: string,
): Part {
  return {
    name: started.name,
    stopOrder,
    stop: () => stopProcess(started.pid, graceMilliseconds),
    ended: started.ended,
    ...(logPath === undefined ? {} : { logPath }),
  };
}
