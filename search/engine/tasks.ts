import type { ErrorBody } from './errors.ts';
import type { Json, JsonObject } from './json.ts';

export const TASK_TYPES = [
  'documentAdditionOrUpdate',
  'documentDeletion',
  'settingsUpdate',
  'indexCreation',
  'indexUpdate',
  'indexDeletion',
  'indexSwap',
  'taskCancelation',
  'taskDeletion',
] as const;
export type TaskType = (typeof TASK_TYPES)[number];

export const TASK_STATUSES = ['enqueued', 'processing', 'succeeded', 'failed', 'canceled'] as const;
export type TaskStatus = (typeof TASK_STATUSES)[number];

/** A write as its request described it, before it is done. */
export type TaskPayload =
  | {
      type: 'documentAdditionOrUpdate';
      merge: boolean;
      primaryKey: string | null;
      documents: JsonObject[];
      skipCreation: boolean;
    }
  | { type: 'documentDeletion'; target: DeletionTarget }
  | { type: 'settingsUpdate'; patch: JsonObject }
  | { type: 'indexCreation'; primaryKey: string | null }
  | { type: 'indexUpdate'; primaryKey: string | null; newUid: string | null }
  | { type: 'indexDeletion' }
  | { type: 'indexSwap'; swaps: Swap[] }
  | { type: 'taskCancelation'; uids: number[]; originalFilter: string }
  | { type: 'taskDeletion'; uids: number[]; originalFilter: string };

export type DeletionTarget = { ids: string[] } | { filter: Json } | { all: true };

export type Swap = { indexes: [string, string]; rename: boolean };

export type Task = {
  uid: number;
  indexUid: string | null;
  status: TaskStatus;
  type: TaskType;
  canceledBy: number | null;
  details: JsonObject;
  error: ErrorBody | null;
  /** RFC 3339, UTC. */
  enqueuedAt: string;
  startedAt: string | null;
  finishedAt: string | null;
  customMetadata: string | null;
};

export function isFinished(task: Task): boolean {
  return task.status === 'succeeded' || task.status === 'failed' || task.status === 'canceled';
}

/** ISO 8601 duration between two moments, to the millisecond: `PT0.012S`. */
export function durationBetween(startedAt: string, finishedAt: string): string {
  const milliseconds = Math.max(0, Date.parse(finishedAt) - Date.parse(startedAt));
  return `PT${(milliseconds / 1000).toFixed(3)}S`;
}

export function presentTask(task: Task): JsonObject {
  const { startedAt, finishedAt } = task;
  return {
    uid: task.uid,
    batchUid: task.status === 'enqueued' ? null : task.uid,
    indexUid: task.indexUid,
    status: task.status,
    type: task.type,
    canceledBy: task.canceledBy,
    details: task.details,
    error: task.error,
    duration: startedAt && finishedAt ? durationBetween(startedAt, finishedAt) : null,
    enqueuedAt: task.enqueuedAt,
    startedAt,
    finishedAt,
    ...(task.customMetadata === null ? {} : { customMetadata: task.customMetadata }),
  };
}

export function presentEnqueued(task: Task): JsonObject {
  return {
    taskUid: task.uid,
    indexUid: task.indexUid,
    status: 'enqueued',
    type: task.type,
    enqueuedAt: task.enqueuedAt,
    ...(task.customMetadata === null ? {} : { customMetadata: task.customMetadata }),
  };
}

/** Details as shown while the outcome is unknown: its counts are null. */
export function initialDetails(payload: TaskPayload): JsonObject {
  switch (payload.type) {
    case 'documentAdditionOrUpdate':
      return { receivedDocuments: payload.documents.length, indexedDocuments: null };
    case 'documentDeletion': {
      const { target } = payload;
      return {
        providedIds: 'ids' in target ? target.ids.length : 0,
        deletedDocuments: null,
        originalFilter: 'filter' in target ? JSON.stringify(target.filter) : null,
      };
    }
    case 'settingsUpdate':
      return payload.patch;
    case 'indexCreation':
      return { primaryKey: payload.primaryKey };
    case 'indexUpdate':
      return {
        primaryKey: payload.primaryKey,
        ...(payload.newUid === null ? {} : { newIndexUid: payload.newUid }),
      };
    case 'indexDeletion':
      return { deletedDocuments: null };
    case 'indexSwap':
      return { swaps: payload.swaps };
    case 'taskCancelation':
      return {
        matchedTasks: payload.uids.length,
        canceledTasks: null,
        originalFilter: payload.originalFilter,
      };
    case 'taskDeletion':
      return {
        matchedTasks: payload.uids.length,
        deletedTasks: null,
        originalFilter: payload.originalFilter,
      };
  }
}
