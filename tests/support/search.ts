import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { Knex } from 'knex';
import { findAnswerSchema, type FindAnswer } from '#shared/api/search.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { startEngine, type RunningEngine } from '../../search/engine/start-engine.ts';
import { createHandlers } from '../../server/outbox/handlers.ts';
import { workOnce } from '../../server/outbox/worker.ts';
import { indexNote } from '../../server/search/index-note.ts';
import { startApi, test as base, type Api } from './api.ts';
import { addKiln, completeFields, publishedNote, type NoteTraits } from './notes.ts';

const KEY = 'a-master-key-for-tests-only';

/** The application with an engine of its own, which can be stopped and started again. */
export interface SearchApi extends Api {
  engine: { url: string; stop: () => Promise<void>; start: () => Promise<void> };
  find: (q: string, more?: Record<string, string>) => Promise<FindAnswer>;
  /** Does all promised work of the index. */
  catchUp: () => Promise<void>;
}

async function startSearchApi(db: Knex) {
  const dataDir = await mkdtemp(path.join(tmpdir(), 'spyhole-test-engine-'));
  const start = (port: number): Promise<RunningEngine> =>
    startEngine({ host: '127.0.0.1', port, masterKey: KEY, dataDir });
  let running: RunningEngine | null = await start(0);
  const { url } = running;
  const api = await startApi(db, { config: { search: { url, key: KEY } } });
  const handler = createHandlers(api.deps, {
    indexNote,
    readRecord: () => Promise.resolve(),
  })['index-note'];
  const searchApi: SearchApi = {
    ...api,
    engine: {
      url,
      stop: async () => {
        await running?.close();
        running = null;
      },
      start: async () => {
        running = await start(Number(new URL(url).port));
      },
    },
    find: async (q, more = {}) => {
      const query = new URLSearchParams({ q, ...more });
      const answer = await api.client().get(`/api/search?${query.toString()}`);
      if (answer.status !== 200) throw new Error(answer.text);
      return answer.as(findAnswerSchema);
    },
    catchUp: async () => {
      await db('outbox')
        .where({ topic: 'index-note' })
        .update({ available_at: db.raw('NOW(3)') });
      while ((await workOnce(api.deps, 'index-note', handler)) > 0);
    },
  };
  return {
    searchApi,
    stop: async () => {
      await api.stop();
      await running?.close();
      await rm(dataDir, { recursive: true, force: true });
    },
  };
}

export const test = base.extend<{ searchApi: SearchApi }>({
  searchApi: async ({ committedDb }, use) => {
    const { searchApi, stop } = await startSearchApi(committedDb);
    await use(searchApi);
    await stop();
  },
});

/** Six notes: stalls at three levels, a cracked plate, a cracked bowl, a plain one. */
export async function aSmallNotebook(api: Api) {
  const author = await api.signedIn();
  const moderator = await api.signedIn('moderator');
  const kilns = await Promise.all(
    Array.from({ length: 6 }, (_, index) => addKiln(author, { name: `Kiln ${String(index)}` })),
  );
  const cracked = (kilnId: number, form: 'flat-plate' | 'bowl'): Partial<NoteFields> => {
    const fields = completeFields(kilnId);
    return {
      pieces: fields.pieces.map((piece) => ({
        ...piece,
        form,
        cracked: true,
        cracks: [{ place: 'rim', noticed: 'in-the-water' }],
        spanMm: 300,
      })),
      result: { ...fields.result, troubles: ['crack-after-draw'] },
    };
  };
  const traits: ((kilnId: number) => NoteTraits)[] = [
    () => ({ title: 'Stuck near seven hundred', stalledAt: 702 }),
    () => ({ title: 'Stuck far higher', stalledAt: 905 }),
    () => ({ title: 'Stuck in the fog', stalledAt: 760 }),
    (kilnId) => ({
      title: 'The great plate broke',
      overrides: cracked(kilnId, 'flat-plate'),
    }),
    (kilnId) => ({
      title: 'A rim gone',
      overrides: cracked(kilnId, 'bowl'),
    }),
    () => ({ title: 'All went well', story: 'The heron watched from the willow.' }),
  ];
  const ids: number[] = [];
  for (const [index, kiln] of kilns.entries()) {
    ids.push(await publishedNote(author, moderator, kiln.id, traits[index]?.(kiln.id) ?? {}));
  }
  return { author, moderator, kilns, ids };
}
