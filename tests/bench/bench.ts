import { parseArgs } from 'node:util';
import express from 'express';
import mysql from 'mysql2/promise';
import sharp from 'sharp';
import { loadDemo } from '../../seeds/development/load-demo.ts';
import type { Deps } from '../../server/deps.ts';
import { encodePicture } from '../../server/pictures/encode-picture.ts';
import { reindex } from '../../server/search/reindex.ts';
import { benchEngine } from './bench-engine.ts';
import { benchJudgedSearch } from './bench-judged-search.ts';
import { benchManyNotes } from './bench-many-notes.ts';
import { benchReader } from './bench-reader.ts';
import { benchSearch } from './bench-search.ts';
import { get, listen, withStack } from './bench-stack.ts';
import { benchLookAlikes } from './look-alikes.ts';
import { percentile, print, throughput, timeEach } from './measure.ts';

/**
 * `npm run bench`: performance as ratios of one run, because absolute times belong to a machine.
 * Everything is real: MariaDB, the local engine in a process of its own, HTTP over loopback, the
 * demo's notes.
 */
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

/**
 * `npm run bench -- --documents 100000`: the engine alone. `-- --notes 10000`: the whole product
 * with so many notes, which takes a while. `-- --reader`: the reading of records alone. Without
 * any of them, the usual run.
 */
const { values: options } = parseArgs({
  options: {
    documents: { type: 'string' },
    notes: { type: 'string' },
    reader: { type: 'boolean' },
  },
});

if (options.documents !== undefined) {
  await benchEngine(Number(options.documents));
} else if (options.reader === true) {
  await benchReader();
} else if (options.notes !== undefined) {
  const count = Number(options.notes);
  await withStack((stack) => benchManyNotes(stack, count));
} else {
  await withStack(async ({ deps, databaseUrl, serve }) => {
    await loadDemo(deps);
    await reindex(deps);
    const port = await serve();
    await benchNotePage(deps, port, databaseUrl);
    await benchSearch(deps, port);
    await benchJudgedSearch(deps);
    await benchReader();
    await benchLookAlikes();
    await benchPictures();
  });
}
