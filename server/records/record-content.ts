import { createHash } from 'node:crypto';
import { promisify } from 'node:util';
import { gunzip, gzip } from 'node:zlib';
import type { Knex } from 'knex';
import { stripSignature } from '#shared/firing/strip.ts';
import type { Reading } from '#shared/firing/types.ts';
import type { StripPoints } from '#shared/api/note-rows.ts';
import { isDuplicate } from '../database/constraint-errors.ts';
import { readJson } from '../database/read-json.ts';

const zip = promisify(gzip);
const unzip = promisify(gunzip);

export interface RecordContent {
  readonly readings: readonly Reading[];
  readonly secondProbe: readonly Reading[] | null;
}

/** Readings as bytes: pairs of doubles, so that nothing is rounded. */
function toBytes(readings: readonly Reading[]): Buffer {
  const values = new Float64Array(readings.length * 2);
  readings.forEach((reading, index) => {
    values[index * 2] = reading.minute;
    values[index * 2 + 1] = reading.celsius;
  });
  return Buffer.from(values.buffer);
}

function fromBytes(bytes: Buffer): Reading[] {
  // A copy, because a Float64Array must start on a multiple of eight.
  const values = new Float64Array(new Uint8Array(bytes).buffer);
  const readings: Reading[] = [];
  for (let index = 0; index + 1 < values.length; index += 2) {
    readings.push({ minute: values[index] ?? 0, celsius: values[index + 1] ?? 0 });
  }
  return readings;
}

/** Keeps the readings whole, once for the same content. @returns the content's id */
export async function storeContent(db: Knex, content: RecordContent): Promise<number> {
  const readings = toBytes(content.readings);
  const second = content.secondProbe ? toBytes(content.secondProbe) : null;
  const sha256 = createHash('sha256')
    .update(readings)
    .update('|')
    .update(second ?? '')
    .digest('hex');
  const known = () =>
    db('record_contents')
      .where('record_contents.sha256', sha256)
      .first<{ id: number } | undefined>('record_contents.id');
  const before = await known();
  if (before) return before.id;
  try {
    const [id] = await db('record_contents').insert({
      sha256,
      readings: await zip(readings),
      second_probe: second ? await zip(second) : null,
      count: content.readings.length,
      strip: JSON.stringify(stripSignature(content.readings)),
    });
    if (id === undefined) throw new Error('MariaDB gave no id.');
    return id;
  } catch (error) {
    if (!isDuplicate(error, 'record_contents_sha256_unique')) throw error;
    const other = await known();
    if (!other) throw error;
    return other.id;
  }
}

/** Contents never change under their id, so the last few stay at hand while their notes are edited. */
const recent = new Map<number, RecordContent>();
const RECENT = 8;

/** @throws when there is no such content: ids come from rows that refer to it */
export async function loadContent(db: Knex, contentId: number): Promise<RecordContent> {
  const kept = recent.get(contentId);
  if (kept) return kept;
  const row = await db('record_contents')
    .where('record_contents.id', contentId)
    .first<{ readings: Buffer; second_probe: Buffer | null } | undefined>(
      'record_contents.readings',
      'record_contents.second_probe',
    );
  if (!row) throw new Error('A record has lost its readings.');
  const content: RecordContent = {
    readings: fromBytes(await unzip(row.readings)),
    secondProbe: row.second_probe ? fromBytes(await unzip(row.second_probe)) : null,
  };
  // Inside a test's rolled-back transaction ids may be given twice; the pool's are final.
  if (db.isTransaction !== true) {
    recent.set(contentId, content);
    const oldest = recent.keys().next().value;
    if (recent.size > RECENT && oldest !== undefined) recent.delete(oldest);
  }
  return content;
}

export async function loadStrip(db: Knex, contentId: number): Promise<StripPoints | null> {
  const row = await db('record_contents')
    .where('record_contents.id', contentId)
    .first<{ strip: unknown } | undefined>('record_contents.strip');
  return row ? (readJson(row.strip) as StripPoints) : null;
}
