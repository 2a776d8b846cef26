import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { Meilisearch } from 'meilisearch';
import { readQuestion } from '#shared/question/read-question.ts';
import { NOTE_INDEX_SETTINGS } from '../../search/index-settings.ts';
import { NOTES_INDEX, type NoteDocument } from '../../search/note-document.ts';
import { createTextMaker } from '../../seeds/many/told-text.ts';
import { seededRandom } from '../../seeds/simulation/seeded-random.ts';
import { searchEngine } from '../../server/search/engine-search.ts';
import { readShownHits } from '../../server/search/shown-hits.ts';
import { suggestTitles } from '../../server/search/suggest-service.ts';
import { testConfig } from '../support/test-config.ts';
import { QUESTIONS } from './bench-search.ts';
import { startEngineProcess, type EngineProcess } from './bench-stack.ts';
import { generatedDocuments } from './generated-documents.ts';
import { milliseconds, print, timeEach } from './measure.ts';

const BATCH = 1000;
const ROUNDS = 60;

/** What a reader has in memory and on disk. */
async function megabytesOf(engine: EngineProcess): Promise<string> {
  const status = await readFile(`/proc/${String(engine.pid)}/status`, 'utf8').catch(() => '');
  const kilobytes = Number(/VmRSS:\s+(\d+)/.exec(status)?.[1] ?? Number.NaN);
  return `${(kilobytes / 1024).toFixed(0)} MB in memory`;
}

async function fill(engine: EngineProcess, count: number): Promise<void> {
  const client = new Meilisearch({ host: engine.url, apiKey: engine.key });
  const index = client.index<NoteDocument>(NOTES_INDEX);
  await client.createIndex(NOTES_INDEX, { primaryKey: 'id' }).waitTask();
  await index.updateSettings(NOTE_INDEX_SETTINGS).waitTask();
  const from = performance.now();
  let batch: NoteDocument[] = [];
  const send = async (): Promise<void> => {
    await index.addDocuments(batch).waitTask({ timeout: 120_000, interval: 5 });
    batch = [];
  };
  for (const document of generatedDocuments(count)) {
    batch.push(document);
    if (batch.length === BATCH) await send();
  }
  if (batch.length > 0) await send();
  const seconds = (performance.now() - from) / 1000;
  print(
    `engine: ${String(count)} documents indexed`,
    `${seconds.toFixed(1)} s, ${(count / seconds).toFixed(0)} per s, ${await megabytesOf(engine)}`,
  );
}

/** Beginnings of words as they are typed: one letter up to the whole word. */
function typedTexts(): string[] {
  const text = createTextMaker(seededRandom(5));
  return Array.from({ length: 40 }, (_, at) => {
    const [word, next] = [text.word(), text.word()];
    return at % 4 === 0 ? word.slice(0, 1) : `${word} ${next.slice(0, 1 + (at % 5))}`;
  });
}

/**
 * The local engine by itself with many made-up documents, asked what the application asks it: the
 * growth of its times, its memory and its start from what is on disk.
 */
export async function benchEngine(count: number): Promise<void> {
  const folder = await mkdtemp(path.join(tmpdir(), 'spyhole-bench-engine-'));
  let engine = await startEngineProcess(folder);
  try {
    await fill(engine, count);
    const config = testConfig({ search: { url: engine.url, key: engine.key } });
    const pick = <T>(list: readonly T[], round: number): T | undefined => list[round % list.length];
    const ask = async (question: string, ticked: Parameters<typeof searchEngine>[2]) => {
      const { hits } = await searchEngine(config, readQuestion(question), ticked, {});
      await readShownHits(config, hits.slice(0, 20));
    };
    for (const question of QUESTIONS) {
      print(`engine: ${question}`, milliseconds(await timeEach(ROUNDS, () => ask(question, {}))));
    }
    const ticked = await timeEach(ROUNDS, (round) =>
      ask(pick(QUESTIONS, round) ?? '', { fuel: ['propane'], kilnSize: ['small', 'medium'] }),
    );
    print('engine: the four with two facets ticked', milliseconds(ticked));
    print('engine: everything, newest', milliseconds(await timeEach(ROUNDS, () => ask('', {}))));
    const text = createTextMaker(seededRandom(9));
    const told = Array.from({ length: ROUNDS }, () => text.words(4));
    const words = await timeEach(ROUNDS, (round) => ask(pick(told, round) ?? '', {}));
    print('engine: four words of a story', milliseconds(words));
    const typed = typedTexts();
    const ahead = await timeEach(ROUNDS * 2, (round) =>
      suggestTitles(config, pick(typed, round) ?? '', 6),
    );
    print('engine: type-ahead', milliseconds(ahead));
    await engine.stop();
    engine = await startEngineProcess(folder);
    print(
      'engine: start from disk',
      `${(engine.startMilliseconds / 1000).toFixed(1)} s, ${await megabytesOf(engine)}`,
    );
  } finally {
    await engine.stop();
    await rm(folder, { recursive: true, force: true });
  }
}
