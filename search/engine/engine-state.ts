import type { JsonObject } from './json.ts';
import type { ApiKey } from './keys.ts';
import { defaultSettings, type Settings } from './settings.ts';
import type { Task, TaskPayload } from './tasks.ts';

/** What an index is made of, before anything is derived for searching. */
export type StoredIndex = {
  uid: string;
  primaryKey: string | null;
  createdAt: string;
  updatedAt: string;
  settings: Settings;
  /** By id as text, in order of first arrival. */
  documents: Map<string, JsonObject>;
};

/** Everything that must survive a restart. */
export type EngineState = {
  indexes: Map<string, StoredIndex>;
  /** In uid order. */
  tasks: Map<number, Task>;
  /** Of tasks not yet finished. */
  payloads: Map<number, TaskPayload>;
  nextTaskUid: number;
  keys: Map<string, ApiKey>;
};

export function createEngineState(): EngineState {
  return {
    indexes: new Map(),
    tasks: new Map(),
    payloads: new Map(),
    nextTaskUid: 0,
    keys: new Map(),
  };
}

export function createStoredIndex(
  uid: string,
  primaryKey: string | null,
  now: string,
): StoredIndex {
  return {
    uid,
    primaryKey,
    createdAt: now,
    updatedAt: now,
    settings: defaultSettings(),
    documents: new Map(),
  };
}
