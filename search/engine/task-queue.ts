import { applyTask, type Change, type ResolvedPayload } from './apply-task.ts';
import type { Engine } from './engine.ts';
import { compileFilter } from './filter-compile.ts';
import { filterTarget } from './filter-target.ts';
import { EngineError, errorBody, indexNotFound, toEngineError } from './errors.ts';
import { buildSearchIndex, updateSearchIndex } from './index-builder.ts';
import type { Json, JsonObject } from './json.ts';
import { documentsAllowed } from './live-documents.ts';
import { createSearchIndex, nothingDerived } from './search-index.ts';
import { initialDetails, type Task, type TaskPayload } from './tasks.ts';

/** Writes that arrive together wait this long, so that none runs inside its own request. */
const GATHER_MS = 10;

/** Puts a write in the queue; resolves once it cannot be lost any more. */
export async function enqueueTask(
  engine: Engine,
  indexUid: string | null,
  payload: TaskPayload,
  customMetadata: string | null = null,
): Promise<Task> {
  const task: Task = {
    uid: engine.state.nextTaskUid,
    indexUid,
    status: 'enqueued',
    type: payload.type,
    canceledBy: null,
    details: initialDetails(payload),
    error: null,
    enqueuedAt: new Date().toISOString(),
    startedAt: null,
    finishedAt: null,
    customMetadata,
  };
  engine.state.nextTaskUid += 1;
  engine.state.tasks.set(task.uid, task);
  engine.state.payloads.set(task.uid, payload);
  try {
    await engine.storage.append({ kind: 'task', task, payload });
  } catch (error) {
    // Not on the disk, so never promised to anyone; it must not hold up what comes after.
    engine.state.tasks.delete(task.uid);
    engine.state.payloads.delete(task.uid);
    throw error;
  }
  engine.durableTasks.add(task.uid);
  if (payload.type === 'taskCancelation') engine.queue.urgent.push(task.uid);
  wakeQueue(engine);
  return { ...task, status: 'enqueued' };
}

/** Starts the queue if it rests. */
export function wakeQueue(engine: Engine): void {
  const { queue } = engine;
  if (queue.stopped || queue.running !== null || queue.timer !== null) return;
  queue.timer = setTimeout(() => {
    queue.timer = null;
    queue.running = runQueue(engine).finally(() => {
      queue.running = null;
      if (nextUid(engine) !== undefined) wakeQueue(engine);
    });
  }, GATHER_MS);
}

/** Lets the task at work finish, and starts no other. */
export async function stopQueue(engine: Engine): Promise<void> {
  engine.queue.stopped = true;
  if (engine.queue.timer !== null) clearTimeout(engine.queue.timer);
  engine.queue.timer = null;
  await engine.queue.running;
}

/** The oldest unfinished task, once it is on the disk; a cancelation goes first. */
function nextUid(engine: Engine): number | undefined {
  const [urgent] = engine.queue.urgent;
  if (urgent !== undefined) return urgent;
  const first = engine.state.payloads.keys().next();
  if (first.done || !engine.durableTasks.has(first.value)) return undefined;
  return first.value;
}

async function runQueue(engine: Engine): Promise<void> {
  for (;;) {
    const uid = engine.queue.stopped ? undefined : nextUid(engine);
    if (uid === undefined) return;
    try {
      await runTask(engine, uid);
      await engine.storage.compactIfLarge(engine.state);
    } catch (error) {
      // Only the disk can fail here. Nothing may be called done any more; a restart runs it again.
      console.error('The search engine cannot keep its log:', error);
      engine.queue.stopped = true;
      return;
    }
  }
}

async function runTask(engine: Engine, uid: number): Promise<void> {
  const { state } = engine;
  const task = state.tasks.get(uid);
  const payload = state.payloads.get(uid);
  if (task === undefined || payload === undefined) return;
  task.status = 'processing';
  task.startedAt = new Date().toISOString();
  const finished: Task = { ...task };
  let resolvedIds: string[] | null = null;
  let removedTasks: number[] = [];
  try {
    if (payload.type === 'taskCancelation') {
      finished.details = await cancelTasks(engine, uid, payload);
    } else if (payload.type === 'taskDeletion') {
      removedTasks = payload.uids.filter((each) => isDeletable(engine, each));
      finished.details = { ...task.details, deletedTasks: removedTasks.length };
    } else {
      const resolved = resolvePayload(engine, task.indexUid, payload);
      if (resolved !== payload && 'target' in resolved && 'ids' in resolved.target) {
        resolvedIds = resolved.target.ids;
      }
      const applied = applyTask(state, task.indexUid, resolved, task.startedAt);
      for (const change of applied.changes) await bringToSearch(engine, change);
      finished.details = mergeDetails(task.details, applied.details, resolvedIds !== null);
    }
    finished.status = 'succeeded';
  } catch (error) {
    if (!(error instanceof EngineError)) console.error(`Task ${uid} failed:`, error);
    finished.status = 'failed';
    finished.error = errorBody(toEngineError(error));
    finished.details = failedDetails(task.details);
  }
  finished.finishedAt = new Date().toISOString();
  // A swap renames finished tasks only, so this one keeps the name it was sent to.
  await engine.storage.append({ kind: 'done', task: finished, resolvedIds, removedTasks });
  state.tasks.set(uid, finished);
  state.payloads.delete(uid);
  engine.durableTasks.delete(uid);
  engine.queue.urgent = engine.queue.urgent.filter((each) => each !== uid);
  for (const each of removedTasks) state.tasks.delete(each);
}

/** Counts of a failed task are 0 instead of unknown. */
function failedDetails(details: JsonObject): JsonObject {
  const counts = ['indexedDocuments', 'deletedDocuments', 'canceledTasks', 'deletedTasks'];
  return Object.fromEntries(
    Object.entries(details).map(([name, value]) => [name, counts.includes(name) ? 0 : value]),
  );
}

function mergeDetails(before: JsonObject, after: JsonObject, byFilter: boolean): JsonObject {
  const kept: JsonObject = {};
  if (before['originalFilter'] !== undefined) kept['originalFilter'] = before['originalFilter'];
  if (byFilter) kept['providedIds'] = 0;
  return { ...before, ...after, ...kept };
}

/** Turns a deletion by filter into one by ids, so that a replay removes the same documents. */
function resolvePayload(
  engine: Engine,
  indexUid: string | null,
  payload: ResolvedPayload,
): ResolvedPayload {
  if (payload.type !== 'documentDeletion' || !('filter' in payload.target)) return payload;
  const ids = idsMatching(engine, indexUid ?? '', payload.target.filter);
  return { type: 'documentDeletion', target: { ids } };
}

function idsMatching(engine: Engine, uid: string, filter: Json): string[] {
  const index = engine.searchIndexes.get(uid);
  if (index === undefined) throw indexNotFound(uid);
  const node = compileFilter(filter, filterTarget(index.settings, uid, 'invalid_document_filter'));
  if (node === null) return [];
  const found = documentsAllowed(index, node);
  return index.documents.flatMap((document, number) =>
    document !== undefined && found[number] ? [document.id] : [],
  );
}

function isDeletable(engine: Engine, uid: number): boolean {
  return engine.state.tasks.has(uid) && !engine.state.payloads.has(uid);
}

async function cancelTasks(
  engine: Engine,
  byUid: number,
  payload: Extract<TaskPayload, { type: 'taskCancelation' }>,
): Promise<JsonObject> {
  const { state } = engine;
  let canceled = 0;
  for (const uid of payload.uids) {
    const task = state.tasks.get(uid);
    if (task === undefined || uid === byUid || !state.payloads.has(uid)) continue;
    const finishedAt = new Date().toISOString();
    const done: Task = {
      ...task,
      status: 'canceled',
      canceledBy: byUid,
      finishedAt,
      details: failedDetails(task.details),
    };
    await engine.storage.append({ kind: 'done', task: done, resolvedIds: null, removedTasks: [] });
    state.tasks.set(uid, done);
    state.payloads.delete(uid);
    engine.durableTasks.delete(uid);
    canceled += 1;
  }
  return {
    matchedTasks: payload.uids.length,
    canceledTasks: canceled,
    originalFilter: payload.originalFilter,
  };
}

/** Carries a change of the state over to the search side. */
async function bringToSearch(engine: Engine, change: Change): Promise<void> {
  const { searchIndexes, state } = engine;
  switch (change.kind) {
    case 'created': {
      const stored = state.indexes.get(change.uid);
      if (stored) searchIndexes.set(change.uid, createSearchIndex(stored.settings));
      return;
    }
    case 'deleted':
      searchIndexes.delete(change.uid);
      return;
    case 'renamed':
    case 'swapped': {
      const [from, to] =
        change.kind === 'renamed' ? [change.from, change.to] : [change.first, change.second];
      const moved = searchIndexes.get(from);
      const other = searchIndexes.get(to);
      if (other === undefined) searchIndexes.delete(from);
      else searchIndexes.set(from, other);
      if (moved !== undefined) searchIndexes.set(to, moved);
      return;
    }
    case 'documents': {
      const index = searchIndexes.get(change.uid);
      if (index) await updateSearchIndex(index, change.stored, change.removed);
      return;
    }
    case 'settings': {
      const stored = state.indexes.get(change.uid);
      const index = searchIndexes.get(change.uid);
      if (stored === undefined || index === undefined) return;
      if (change.reindex) searchIndexes.set(change.uid, await buildSearchIndex(stored));
      else {
        index.settings = stored.settings;
        index.derived = nothingDerived();
      }
    }
  }
}
