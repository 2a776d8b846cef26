import { spawn } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { findFreePort } from '../../server/start/processes.ts';

export interface DemoAccount {
  readonly name: string;
  readonly email: string;
  readonly password: string;
  readonly role: string;
}

export interface Product {
  readonly baseUrl: string;
  readonly dataFolder: string;
  readonly demoAccounts: readonly DemoAccount[];
  readonly stop: () => Promise<void>;
}

const ROOT = path.resolve(import.meta.dirname, '../..');
/** Loading the demo and building the pages takes most of it. */
const START_MILLISECONDS = 300_000;

/** Starts the whole product as `npm start` does, with the demo, in a folder of its own. */
export async function startProduct(): Promise<Product> {
  const dataFolder = mkdtempSync(path.join(tmpdir(), 'spyhole-browser-'));
  const port = await findFreePort();
  const baseUrl = `http://localhost:${String(port)}`;
  const { NODE_ENV: _vitest, ...env } = process.env;
  const product = spawn(process.execPath, ['server/start/start.mjs'], {
    cwd: ROOT,
    env: { ...env, PORT: String(port), SPYHOLE_DATA: dataFolder, LOG_LEVEL: 'warn' },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let said = '';
  for (const stream of [product.stdout, product.stderr]) {
    stream.setEncoding('utf8').on('data', (text: string) => (said += text));
  }
  const ended = new Promise<void>((resolve) => product.once('exit', () => resolve()));
  const stop = async (): Promise<void> => {
    product.kill('SIGTERM');
    await ended;
    rmSync(dataFolder, { recursive: true, force: true });
  };
  try {
    await Promise.race([
      untilReady(baseUrl),
      ended.then(() => {
        throw new Error(`The product did not start:\n${said}`);
      }),
    ]);
  } catch (error) {
    await stop();
    throw error;
  }
  return {
    baseUrl,
    dataFolder,
    demoAccounts: JSON.parse(
      readFileSync(path.join(dataFolder, 'demo-accounts.json'), 'utf8'),
    ) as DemoAccount[],
    stop,
  };
}

async function untilReady(baseUrl: string): Promise<void> {
  const deadline = Date.now() + START_MILLISECONDS;
  while (Date.now() < deadline) {
    const answer = await fetch(`${baseUrl}/health/ready`).catch(() => null);
    if (answer?.ok === true) return;
    await new Promise((resolve) => setTimeout(resolve, 250));
  }
  throw new Error('The product was not ready in time.');
}
