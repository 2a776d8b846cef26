import {
  mkdir,
  open,
  readdir,
  readFile,
  rename,
  rm,
  unlink,
  type FileHandle,
} from 'node:fs/promises';
import { join } from 'node:path';
import { applyTask } from './apply-task.ts';
import { createEngineState, type EngineState } from './engine-state.ts';
import type { ApiKey } from './keys.ts';
import { createLineChain, DamagedStorageError, linesOf, type LineChain } from './checked-lines.ts';
import { readSnapshot, snapshotLines } from './snapshot.ts';
import type { Task, TaskPayload } from './tasks.ts';

/** One line of the log. Replaying the lines in order gives the state again. */
export type LogEntry =
  | { kind: 'task'; task: Task; payload: TaskPayload }
  | { kind: 'done'; task: Task; resolvedIds: string[] | null; removedTasks: number[] }
  | { kind: 'key'; key: ApiKey }
  | { kind: 'key-removed'; uid: string };

export type Storage = {
  /** Resolves once the entry is on the disk. Entries keep their order. */
  append: (entry: LogEntry) => Promise<void>;
  /** Writes a snapshot and starts a new log if the current one has grown; call between tasks. */
  compactIfLarge: (state: EngineState) => Promise<void>;
  databaseSize: () => number;
  close: () => Promise<void>;
};

const SNAPSHOT = 'snapshot.jsonl';
/** Bytes of log after which a snapshot is worth its writing. */
const COMPACT_AFTER_BYTES = 64 * 1024 * 1024;
const WRITE_CHUNK = 1 << 20;

const logName = (generation: number): string => `log-${generation}.jsonl`;

async function syncFolder(folder: string): Promise<void> {
  const handle = await open(folder, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

async function readIfThere(path: string): Promise<Buffer | undefined> {
  try {
    return await readFile(path);
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return undefined;
    throw error;
  }
}

function parseEntry(line: string, chain: LineChain): LogEntry | undefined {
  const text = chain.read(line);
  if (text === undefined) return undefined;
  try {
    const value: unknown = JSON.parse(text);
    // Only this program writes the log, one checked entry per line.
    return typeof value === 'object' && value !== null && 'kind' in value
      ? (value as LogEntry)
      : undefined;
  } catch {
    return undefined;
  }
}

/** Repeats one logged event. Tasks without a `done` line stay enqueued and will run again. */
export function replayEntry(state: EngineState, entry: LogEntry): void {
  switch (entry.kind) {
    case 'task':
      if (state.tasks.has(entry.task.uid)) return;
      state.tasks.set(entry.task.uid, entry.task);
      state.payloads.set(entry.task.uid, entry.payload);
      state.nextTaskUid = Math.max(state.nextTaskUid, entry.task.uid + 1);
      return;
    case 'done': {
      const { task } = entry;
      const payload = state.payloads.get(task.uid);
      if (payload === undefined) return;
      if (
        task.status === 'succeeded' &&
        payload.type !== 'taskCancelation' &&
        payload.type !== 'taskDeletion'
      ) {
        const resolved: typeof payload =
          payload.type === 'documentDeletion' && entry.resolvedIds !== null
            ? { type: 'documentDeletion', target: { ids: entry.resolvedIds } }
            : payload;
        applyTask(state, task.indexUid, resolved, task.startedAt ?? task.enqueuedAt);
      }
      state.payloads.delete(task.uid);
      state.tasks.set(task.uid, task);
      for (const uid of entry.removedTasks) state.tasks.delete(uid);
      return;
    }
    case 'key':
      state.keys.set(entry.key.uid, entry.key);
      return;
    case 'key-removed':
      state.keys.delete(entry.uid);
  }
}

async function replayLog(
  state: EngineState,
  path: string,
  isNewest: boolean,
  chain: LineChain,
): Promise<number> {
  const content = await readIfThere(path);
  if (content === undefined) return 0;
  let sound = 0;
  for (const { line, end, complete } of linesOf(content)) {
    const entry = complete ? parseEntry(line, chain) : undefined;
    if (entry === undefined) {
      // The last line may be torn: its append was never acknowledged. Damage before it is not that.
      if (isNewest && end >= content.length) break;
      throw new DamagedStorageError(`The search log ${path} is damaged at byte ${sound}.`);
    }
    replayEntry(state, entry);
    sound = end;
  }
  if (sound < content.length) {
    const handle = await open(path, 'r+');
    await handle.truncate(sound);
    await handle.sync();
    await handle.close();
  }
  return sound;
}

async function loadSnapshot(state: EngineState, path: string): Promise<number> {
  const content = await readIfThere(path);
  if (content === undefined) return 0;
  const found = readSnapshot(state, linesOf(content));
  if (found === undefined) throw new DamagedStorageError(`The snapshot ${path} is damaged.`);
  return found;
}

/** Where files that cannot be trusted are put, so that nobody has to start without them. */
const SET_ASIDE = 'damaged';

/** Moves all files of the folder into one beside them; what was moved before is overwritten. */
export async function setAside(folder: string): Promise<void> {
  const aside = join(folder, SET_ASIDE);
  await rm(aside, { recursive: true, force: true });
  await mkdir(aside, { recursive: true });
  for (const name of await readdir(folder)) {
    if (name !== SET_ASIDE) await rename(join(folder, name), join(aside, name));
  }
}

/**
 * Opens the folder, reads the state kept there, and prepares to append to its log.
 *
 * @throws DamagedStorageError where the files are not what was written
 */
export async function openStorage(
  folder: string,
  compactAfterBytes = COMPACT_AFTER_BYTES,
): Promise<{ state: EngineState; storage: Storage }> {
  await mkdir(folder, { recursive: true });
  const state = createEngineState();
  const snapshotPath = join(folder, SNAPSHOT);
  const first = await loadSnapshot(state, snapshotPath);
  const generations = (await readdir(folder))
    .map((name) => /^log-(\d+)\.jsonl$/.exec(name)?.[1])
    .filter((text) => text !== undefined)
    .map(Number)
    .sort((a, b) => a - b);
  let generation = generations.at(-1) ?? first;
  let logBytes = 0;
  let chain = createLineChain();
  for (const each of generations.filter((candidate) => candidate >= first)) {
    chain = createLineChain();
    logBytes = await replayLog(state, join(folder, logName(each)), each === generation, chain);
  }
  for (const old of generations.filter((each) => each < first)) {
    await unlink(join(folder, logName(old)));
  }

  let log: FileHandle = await open(join(folder, logName(generation)), 'a');
  await syncFolder(folder);
  let waiting: { text: string; resolve: () => void; reject: (error: Error) => void }[] = [];
  let writing: Promise<void> = Promise.resolve();
  let failure: Error | undefined;
  let snapshotBytes = 0;

  /** Writes all waiting lines with one flush, so that many small writes share its cost. */
  async function flush(): Promise<void> {
    const batch = waiting;
    waiting = [];
    if (batch.length === 0) return;
    try {
      if (failure) throw failure;
      const bytes = Buffer.from(batch.map(({ text }) => chain.write(text)).join(''));
      await log.appendFile(bytes);
      await log.datasync();
      logBytes += bytes.length;
      for (const { resolve } of batch) resolve();
    } catch (error) {
      // After a failed write the end of the log is unknown: nothing more may be acknowledged.
      failure ??= error instanceof Error ? error : new Error('The log cannot be written.');
      for (const { reject } of batch) reject(failure);
    }
  }

  function append(entry: LogEntry): Promise<void> {
    return new Promise((resolve, reject) => {
      waiting.push({ text: JSON.stringify(entry), resolve, reject });
      if (waiting.length === 1) writing = writing.then(flush);
    });
  }

  async function compact(current: EngineState): Promise<void> {
    await writing;
    const next = generation + 1;
    const nextLog = await open(join(folder, logName(next)), 'a');
    await syncFolder(folder);
    let previous = log;
    // From here on new entries go to the new log, while the state of this moment is written. Both
    // may tell of the same task; replaying it twice does nothing.
    writing = writing.then(() => {
      previous = log;
      log = nextLog;
      chain = createLineChain();
      generation = next;
      logBytes = 0;
    });
    await writing;
    const temporary = `${snapshotPath}.new`;
    const file = await open(temporary, 'w');
    let chunk = '';
    snapshotBytes = 0;
    const write = async (): Promise<void> => {
      snapshotBytes += Buffer.byteLength(chunk);
      await file.appendFile(chunk);
      chunk = '';
    };
    for (const line of snapshotLines(current, next)) {
      chunk += line;
      if (chunk.length > WRITE_CHUNK) await write();
    }
    await write();
    await file.sync();
    await file.close();
    await rename(temporary, snapshotPath);
    await syncFolder(folder);
    await previous.close();
    for (const name of await readdir(folder)) {
      const old = /^log-(\d+)\.jsonl$/.exec(name)?.[1];
      if (old !== undefined && Number(old) < next) await unlink(join(folder, name));
    }
  }

  const storage: Storage = {
    append,
    compactIfLarge: async (current) => {
      if (logBytes > compactAfterBytes) await compact(current);
    },
    databaseSize: () => logBytes + snapshotBytes,
    close: async () => {
      await writing;
      await log.close();
    },
  };
  return { state, storage };
}
