import type { Knex } from 'knex';
import type { Logger } from 'pino';
import type { Config } from './config.ts';
import type { FileStore } from './storage/file-store.ts';

/** What the routes and workers are given: opened once in main.ts, made small in tests. */
export interface Deps {
  readonly config: Config;
  readonly db: Knex;
  readonly log: Logger;
  /** Uploaded pictures and record files. */
  readonly store: FileStore;
  /** True once an orderly stop has begun. */
  readonly stopping?: () => boolean;
}
