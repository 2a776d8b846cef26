import type { EngineState } from './engine-state.ts';
import type { SearchIndex } from './search-index.ts';
import type { Storage } from './storage.ts';

/** The running engine: what is stored, what is derived from it, and the queue between them. */
export type Engine = {
  masterKey: string | null;
  state: EngineState;
  storage: Storage;
  searchIndexes: Map<string, SearchIndex>;
  /** Tasks whose log line is on the disk; only these may run. */
  durableTasks: Set<number>;
  queue: {
    timer: NodeJS.Timeout | null;
    running: Promise<void> | null;
    stopped: boolean;
    /** Cancelations go before everything else, or they would come too late. */
    urgent: number[];
  };
};
