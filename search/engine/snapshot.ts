import { createLineChain } from './checked-lines.ts';
import { createStoredIndex, type EngineState, type StoredIndex } from './engine-state.ts';
import type { JsonObject } from './json.ts';
import type { ApiKey } from './keys.ts';
import { defaultSettings } from './settings.ts';
import type { Task, TaskPayload } from './tasks.ts';

type SnapshotLine =
  | { kind: 'snapshot'; log: number; nextTaskUid: number }
  | { kind: 'key'; key: ApiKey }
  | { kind: 'task'; task: Task; payload: TaskPayload | null }
  | { kind: 'index'; index: Omit<StoredIndex, 'documents'> }
  | { kind: 'document'; index: string; id: string; document: JsonObject }
  /** The last line: so many stand before it. */
  | { kind: 'end'; lines: number };

/** Finished tasks kept in a snapshot; older ones are forgotten. */
const KEPT_FINISHED_TASKS = 10_000;

/**
 * The whole state as lines. What may change while they are written (tasks and keys) is taken at
 * once; documents only change by tasks, and none runs meanwhile.
 */
export function snapshotLines(state: EngineState, log: number): Iterable<string> {
  const { write } = createLineChain();
  const line = (content: SnapshotLine): string => write(JSON.stringify(content));
  const head = [line({ kind: 'snapshot', log, nextTaskUid: state.nextTaskUid })];
  for (const key of state.keys.values()) head.push(line({ kind: 'key', key }));
  const tasks = [...state.tasks.values()];
  const finished = tasks.length - state.payloads.size;
  let toForget = Math.max(0, finished - KEPT_FINISHED_TASKS);
  for (const task of tasks) {
    const payload = state.payloads.get(task.uid) ?? null;
    if (payload === null && toForget > 0) {
      toForget -= 1;
      state.tasks.delete(task.uid);
      continue;
    }
    head.push(line({ kind: 'task', task, payload }));
  }
  return withDocuments(head, state, line);
}

function* withDocuments(
  head: string[],
  state: EngineState,
  line: (content: SnapshotLine) => string,
): Iterable<string> {
  yield* head;
  let lines = head.length;
  for (const { documents, ...index } of state.indexes.values()) {
    yield line({ kind: 'index', index });
    lines += 1 + documents.size;
    for (const [id, document] of documents) {
      yield line({ kind: 'document', index: index.uid, id, document });
    }
  }
  yield line({ kind: 'end', lines });
}

/**
 * Reads a whole snapshot into the state. @returns the generation of the log that follows it;
 * undefined where a line is not what was written, or lines are missing
 */
export function readSnapshot(
  state: EngineState,
  lines: Iterable<{ line: string }>,
): number | undefined {
  const { read } = createLineChain();
  let generation = 0;
  let count = 0;
  for (const { line: kept } of lines) {
    const text = read(kept);
    if (text === undefined) return undefined;
    // Only this program writes snapshots, and the checksum says that this one is whole.
    const content = JSON.parse(text) as SnapshotLine;
    if (content.kind === 'end') return content.lines === count ? generation : undefined;
    if (content.kind === 'snapshot') generation = content.log;
    addLine(state, content);
    count += 1;
  }
  return undefined;
}

function addLine(state: EngineState, content: Exclude<SnapshotLine, { kind: 'end' }>): void {
  switch (content.kind) {
    case 'snapshot':
      state.nextTaskUid = content.nextTaskUid;
      return;
    case 'key':
      state.keys.set(content.key.uid, content.key);
      return;
    case 'task':
      state.tasks.set(content.task.uid, content.task);
      if (content.payload !== null) state.payloads.set(content.task.uid, content.payload);
      return;
    case 'index': {
      const index = createStoredIndex(content.index.uid, null, content.index.createdAt);
      const settings = { ...defaultSettings(), ...content.index.settings };
      state.indexes.set(index.uid, { ...index, ...content.index, settings });
      return;
    }
    case 'document':
      state.indexes.get(content.index)?.documents.set(content.id, content.document);
  }
}
