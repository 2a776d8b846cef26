import { mkdtemp, rm } from 'node:fs/promises';
import { createServer, Agent, request as httpRequest, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import express from 'express';
import mysql from 'mysql2/promise';
import { pino } from 'pino';
import sharp from 'sharp';
import { readFiring } from '#shared/firing/read-firing.ts';
import { readQuestion } from '#shared/question/read-question.ts';
import { startEngine } from '../../search/engine/start-engine.ts';
import { loadDemo } from '../../seeds/development/load-demo.ts';
import { FIRING_KINDS } from '../../seeds/simulation/firing-kinds.ts';
import { simulateFiring } from '../../seeds/simulation/simulate-firing.ts';
import { createApp } from '../../server/app.ts';
import { migrate } from '../../server/database/migrate.ts';
import { openDatabase } from '../../server/database/open-database.ts';
import type { Deps } from '../../server/deps.ts';
import { encodePicture } from '../../server/pictures/encode-picture.ts';
import { searchEngine } from '../../server/search/engine-search.ts';
import { reindex } from '../../server/search/reindex.ts';
import { withThrowawayDatabase } from '../../server/start/throwaway-database.ts';
import { diskStore } from '../../server/storage/file-store.ts';
import { testConfig } from '../support/test-config.ts';
import { milliseconds, percentile, print, throughput, timeEach } from './measure.ts';

/**
 * `npm run bench`: performance as ratios of one run, because absolute times belong to a machine.
 * Everything is real: MariaDB, the local engine, HTTP over loopback, the demo's notes.
 */
const agent = new Agent({ keepAlive: true, maxSockets: 64 });

function get(port: number, url: string): Promise<number> {
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

async function listen(handler: express.Express): Promise<{ server: Server; port: number }> {
  const server = createServer(handler);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return { server, port: (server.address() as AddressInfo).port };
}

/** The note page against a bare handler that runs the very statements the page runs. */
async function benchNotePage(deps: Deps, port: number, databaseUrl: string): Promise<void> {
  const [note] = await deps
    .db('published_firings')
    .orderBy('note_id')
    .limit(1)
    .select<{ note_id: number }[]>('note_id');
  const url = `/api/notes/${String(note?.note_id)}`;
  const statements: { sql: string; bindings: unknown[] }[] = [];
  const listen_ = (query: { sql: string; bindings?: unknown[] }): void => {
    statements.push({ sql: query.sql, bindings: query.bindings ?? [] });
  };
  deps.db.on('query', listen_);
  await get(port, url);
  deps.db.removeListener('query', listen_);

  const pool = mysql.createPool({ uri: databaseUrl, connectionLimit: 10 });
  const bare = express();
  bare.get('/note', async (_request, response) => {
    const rows = await Promise.all(
      statements.map(async ({ sql, bindings }) => (await pool.query(sql, bindings))[0]),
    );
    response.json(rows);
  });
  const own = await listen(bare);
  await throughput(() => get(port, url), 8, 1);
  await throughput(() => get(own.port, '/note'), 8, 1);
  const rates = { page: [] as number[], bare: [] as number[] };
  for (let round = 0; round < 3; round += 1) {
    rates.bare.push(await throughput(() => get(own.port, '/note'), 8, 2));
    rates.page.push(await throughput(() => get(port, url), 8, 2));
  }
  const page = percentile(rates.page, 0.5);
  const plain = percentile(rates.bare, 0.5);
  print(
    `note page / bare handler (${String(statements.length)} selects)`,
    `${page.toFixed(0)} / ${plain.toFixed(0)} per s = ${(page / plain).toFixed(2)}`,
    'aim ≥ 0.6',
  );
  own.server.close();
  await pool.end();
}

/** The whole way of a search against the engine’s own part of it. */
async function benchSearch(deps: Deps, port: number): Promise<void> {
  const questions = [
    'stalled at 700 °C',
    'stuck at 1300F',
    'cracked flat plate',
    'copper matt no colour',
  ];
  const ask = (round: number): string => questions[round % questions.length] ?? '';
  const whole: number[] = [];
  // In portions, because a visitor may ask only so often; the count of it is cleared between them.
  for (let portion = 0; portion < 5; portion += 1) {
    await deps.db('throttles').delete();
    whole.push(
      ...(await timeEach(
        40,
        (round) => get(port, `/api/search?q=${encodeURIComponent(ask(round))}`),
        4,
      )),
    );
  }
  const engine = await timeEach(200, (round) =>
    searchEngine(deps.config, readQuestion(ask(round)), {}),
  );
  print('search, whole stack', milliseconds(whole));
  print('search, engine alone (same queries)', milliseconds(engine));
  print(
    'search, whole / engine',
    (percentile(whole, 0.5) / percentile(engine, 0.5)).toFixed(2),
    'aim ≤ 1.5',
  );
}

async function benchReading(): Promise<void> {
  const { readings, marks } = simulateFiring({ ...FIRING_KINDS.plain, seed: 1 });
  const step = Math.max(1, Math.floor(readings.length / 500));
  const points = readings.filter((_reading, index) => index % step === 0).slice(0, 500);
  const times = await timeEach(200, () =>
    readFiring({ readings: points, marks, targetCelsius: 1000, fuel: 'propane' }),
  );
  print(`reading one note (${String(points.length)} points)`, milliseconds(times));
}

async function benchPictures(): Promise<void> {
  const photo = await sharp({
    create: {
      width: 4000,
      height: 3000,
      channels: 3,
      noise: { type: 'gaussian', mean: 120, sigma: 40 },
      background: '#777',
    },
  })
    .blur(2)
    .jpeg({ quality: 90 })
    .toBuffer();
  const alone = async (): Promise<void> => {
    const decoded = sharp(photo).rotate();
    await Promise.all([
      ...[480, 960, 1920].map((width) =>
        decoded.clone().resize({ width }).webp({ quality: 80, effort: 3 }).toBuffer(),
      ),
      decoded.clone().resize({ width: 1200 }).jpeg({ quality: 80 }).toBuffer(),
    ]);
  };
  const own = await timeEach(6, () => encodePicture(photo), 1);
  const plain = await timeEach(6, alone, 1);
  print(
    'picture pipeline / sharp alone (12 MP)',
    `${percentile(own, 0.5).toFixed(0)} / ${percentile(plain, 0.5).toFixed(0)} ms = ${(percentile(own, 0.5) / percentile(plain, 0.5)).toFixed(2)}`,
  );
}

await withThrowawayDatabase(async (databaseUrl) => {
  const folder = await mkdtemp(path.join(tmpdir(), 'spyhole-bench-'));
  await migrate(databaseUrl);
  const db = openDatabase(databaseUrl);
  const engine = await startEngine({
    host: '127.0.0.1',
    port: 0,
    masterKey: 'a-key-for-the-bench-only-0123456789',
    dataDir: path.join(folder, 'search'),
  });
  const config = testConfig({
    databaseUrl,
    uploadsFolder: path.join(folder, 'uploads'),
    search: { url: engine.url, key: 'a-key-for-the-bench-only-0123456789' },
  });
  const deps: Deps = {
    config,
    db,
    log: pino({ level: 'silent' }),
    store: diskStore(config.uploadsFolder),
  };
  try {
    await loadDemo(deps);
    await reindex(deps);
    const { server, port } = await listen(createApp(deps));
    await benchNotePage(deps, port, databaseUrl);
    await benchSearch(deps, port);
    await benchReading();
    await benchPictures();
    server.closeAllConnections();
    server.close();
  } finally {
    agent.destroy();
    await engine.close();
    await db.destroy();
    await rm(folder, { recursive: true, force: true });
  }
});
