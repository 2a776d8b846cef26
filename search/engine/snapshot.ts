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
  | { kind: 'document'; index: string; id: string; document: JsonObject };

/** Finished tasks kept in a snapshot; older ones are forgotten. */
const KEPT_FINISHED_TASKS = 10_000;

function line(content: SnapshotLine): string {
  return `${JSON.stringify(content)}\n`;
}

/**
 * The whole state as lines. What may change while they are written (tasks and keys) is taken at
 * once; documents only change by tasks, and none runs meanwhile.
 */
export function snapshotLines(state: EngineState, log: number): Iterable<string> {
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
  return withDocuments(head, state);
}

function* withDocuments(head: string[], state: EngineState): Iterable<string> {
  yield* head;
  for (const { documents, ...index } of state.indexes.values()) {
    yield line({ kind: 'index', index });
    for (const [id, document] of documents) {
      yield line({ kind: 'document', index: index.uid, id, document });
    }
  }
}

/** Adds one line of a snapshot to the state; answers the generation of the log that follows it. */
export function readSnapshotLine(state: EngineState, text: string, generation: number): number {
  // Only this program writes snapshots, and a half-written one is never given its final name.
  const content = JSON.parse(text) as SnapshotLine;
  switch (content.kind) {
    case 'snapshot':
      state.nextTaskUid = content.nextTaskUid;
      return content.log;
    case 'key':
      state.keys.set(content.key.uid, content.key);
      return generation;
    case 'task':
      state.tasks.set(content.task.uid, content.task);
      if (content.payload !== null) state.payloads.set(content.task.uid, content.payload);
      return generation;
    case 'index': {
      const index = createStoredIndex(content.index.uid, null, content.index.createdAt);
      const settings = { ...defaultSettings(), ...content.index.settings };
      state.indexes.set(index.uid, { ...index, ...content.index, settings });
      return generation;
    }
    case 'document':
      state.indexes.get(content.index)?.documents.set(content.id, content.document);
      return generation;
  }
}
