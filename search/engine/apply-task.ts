import { createStoredIndex, type EngineState, type StoredIndex } from './engine-state.ts';
import { EngineError, indexNotFound } from './errors.ts';
import type { JsonObject } from './json.ts';
import { idOfDocument, inferPrimaryKey } from './primary-key.ts';
import { patchSettings } from './settings-patch.ts';
import { needsReindex } from './settings.ts';
import { isFinished, type Swap, type TaskPayload } from './tasks.ts';

/** What a done task means for the search side, which is derived from the state. */
export type Change =
  | { kind: 'documents'; uid: string; stored: [string, JsonObject][]; removed: string[] }
  | { kind: 'settings'; uid: string; reindex: boolean }
  | { kind: 'created'; uid: string }
  | { kind: 'deleted'; uid: string }
  | { kind: 'renamed'; from: string; to: string }
  | { kind: 'swapped'; first: string; second: string };

export type Applied = { details: JsonObject; changes: Change[] };

/** A payload whose outcome depends on the state alone, so that replaying it gives the same result. */
export type ResolvedPayload = Exclude<
  TaskPayload,
  { type: 'taskCancelation' } | { type: 'taskDeletion' }
>;

type Mutable = { changes: Change[]; state: EngineState; now: string };

/**
 * Does one task to the state, or throws an EngineError and leaves the state as it was. `now` is the
 * moment written into created and updated indexes; deletions by filter must have been resolved to
 * ids before.
 */
export function applyTask(
  state: EngineState,
  indexUid: string | null,
  payload: ResolvedPayload,
  now: string,
): Applied {
  const run: Mutable = { changes: [], state, now };
  if (payload.type === 'indexSwap') {
    swapIndexes(run, payload.swaps);
    return { details: { swaps: payload.swaps }, changes: run.changes };
  }
  if (indexUid === null) throw new EngineError('internal', 'A task without an index.');
  const details = applyToIndex(run, indexUid, payload);
  return { details, changes: run.changes };
}

function applyToIndex(
  run: Mutable,
  uid: string,
  payload: Exclude<ResolvedPayload, { type: 'indexSwap' }>,
): JsonObject {
  switch (payload.type) {
    case 'documentAdditionOrUpdate':
      return addDocuments(run, uid, payload);
    case 'documentDeletion':
      return deleteDocuments(run, uid, payload.target);
    case 'settingsUpdate': {
      const index = ensureIndex(run, uid);
      const after = patchSettings(index.settings, payload.patch);
      const reindex = needsReindex(index.settings, after);
      index.settings = after;
      index.updatedAt = run.now;
      run.changes.push({ kind: 'settings', uid, reindex });
      return payload.patch;
    }
    case 'indexCreation': {
      if (run.state.indexes.has(uid)) {
        throw new EngineError('index_already_exists', `Index \`${uid}\` already exists.`);
      }
      ensureIndex(run, uid).primaryKey = payload.primaryKey;
      return { primaryKey: payload.primaryKey };
    }
    case 'indexUpdate':
      return updateIndex(run, uid, payload);
    case 'indexDeletion': {
      const index = findIndex(run.state, uid);
      run.state.indexes.delete(uid);
      run.changes.push({ kind: 'deleted', uid });
      return { deletedDocuments: index.documents.size };
    }
  }
}

function findIndex(state: EngineState, uid: string): StoredIndex {
  const index = state.indexes.get(uid);
  if (index === undefined) throw indexNotFound(uid);
  return index;
}

function ensureIndex(run: Mutable, uid: string): StoredIndex {
  let index = run.state.indexes.get(uid);
  if (index === undefined) {
    index = createStoredIndex(uid, null, run.now);
    run.state.indexes.set(uid, index);
    run.changes.push({ kind: 'created', uid });
  }
  return index;
}

function addDocuments(
  run: Mutable,
  uid: string,
  payload: Extract<TaskPayload, { type: 'documentAdditionOrUpdate' }>,
): JsonObject {
  const { documents } = payload;
  const existing = run.state.indexes.get(uid);
  const details = { receivedDocuments: documents.length, indexedDocuments: documents.length };
  const known = existing?.primaryKey ?? null;
  if (known !== null && payload.primaryKey !== null && payload.primaryKey !== known) {
    throw primaryKeyExists(uid);
  }
  const first = documents[0];
  const primaryKey =
    known ?? payload.primaryKey ?? (first === undefined ? null : inferPrimaryKey(uid, first));

  // Every document is checked before the first is stored: one bad document fails the whole task.
  const stored = new Map<string, JsonObject>();
  for (const document of documents) {
    const id = idOfDocument(uid, primaryKey ?? '', document);
    const before = stored.get(id) ?? existing?.documents.get(id);
    if (payload.skipCreation && before === undefined) {
      details.indexedDocuments -= 1;
      continue;
    }
    stored.set(id, payload.merge && before !== undefined ? { ...before, ...document } : document);
  }

  const index = ensureIndex(run, uid);
  index.primaryKey = primaryKey;
  index.updatedAt = run.now;
  for (const [id, document] of stored) index.documents.set(id, document);
  run.changes.push({ kind: 'documents', uid, stored: [...stored], removed: [] });
  return details;
}

function deleteDocuments(
  run: Mutable,
  uid: string,
  target: Extract<TaskPayload, { type: 'documentDeletion' }>['target'],
): JsonObject {
  const index = findIndex(run.state, uid);
  if ('filter' in target) throw new EngineError('internal', 'An unresolved filter.');
  const ids = 'all' in target ? [...index.documents.keys()] : target.ids;
  const removed = ids.filter((id) => index.documents.delete(id));
  index.updatedAt = run.now;
  run.changes.push({ kind: 'documents', uid, stored: [], removed });
  return {
    providedIds: 'ids' in target ? target.ids.length : 0,
    deletedDocuments: removed.length,
    originalFilter: null,
  };
}

function primaryKeyExists(uid: string): EngineError {
  return new EngineError(
    'index_primary_key_already_exists',
    `Index \`${uid}\`: Index already has a primary key and holds documents, so the key cannot be changed.`,
  );
}

function updateIndex(
  run: Mutable,
  uid: string,
  payload: Extract<TaskPayload, { type: 'indexUpdate' }>,
): JsonObject {
  const { state } = run;
  const index = findIndex(state, uid);
  const { primaryKey, newUid } = payload;
  if (primaryKey !== null && primaryKey !== index.primaryKey && index.documents.size > 0) {
    throw primaryKeyExists(uid);
  }
  if (newUid !== null && newUid !== uid && state.indexes.has(newUid)) {
    throw new EngineError('index_already_exists', `Index \`${newUid}\` already exists.`);
  }
  if (primaryKey !== null) index.primaryKey = primaryKey;
  index.updatedAt = run.now;
  if (newUid !== null && newUid !== uid) renameIndex(run, uid, newUid);
  return {
    primaryKey: index.primaryKey,
    ...(newUid === null ? {} : { oldIndexUid: uid, newIndexUid: newUid }),
  };
}

/** Finished tasks follow the documents; waiting ones keep the name they were sent to. */
function renameHistory(state: EngineState, rename: (uid: string) => string): void {
  for (const task of state.tasks.values()) {
    if (task.indexUid !== null && isFinished(task)) task.indexUid = rename(task.indexUid);
  }
}

function renameIndex(run: Mutable, from: string, to: string): void {
  const index = findIndex(run.state, from);
  run.state.indexes.delete(from);
  index.uid = to;
  run.state.indexes.set(to, index);
  renameHistory(run.state, (uid) => (uid === from ? to : uid));
  run.changes.push({ kind: 'renamed', from, to });
}

function swapIndexes(run: Mutable, swaps: readonly Swap[]): void {
  const { state } = run;
  // All pairs are checked first: either every pair is exchanged or none is.
  for (const { indexes, rename } of swaps) {
    findIndex(state, indexes[0]);
    if (!rename) findIndex(state, indexes[1]);
    else if (state.indexes.has(indexes[1])) {
      throw new EngineError('index_already_exists', `Index \`${indexes[1]}\` already exists.`);
    }
  }
  for (const { indexes, rename } of swaps) {
    const [first, second] = indexes;
    if (rename) {
      renameIndex(run, first, second);
      continue;
    }
    const a = findIndex(state, first);
    const b = findIndex(state, second);
    a.uid = second;
    b.uid = first;
    state.indexes.set(second, a);
    state.indexes.set(first, b);
    renameHistory(state, (uid) => (uid === first ? second : uid === second ? first : uid));
    run.changes.push({ kind: 'swapped', first, second });
  }
}
