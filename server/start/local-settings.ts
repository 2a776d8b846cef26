import { join, resolve } from 'node:path';
import { readJsonFile } from './private-files.ts';
import { isSame } from './run-lock.ts';

/** The project's folder. */
export const ROOT = join(import.meta.dirname, '../..');

/** Where a start without settings keeps everything it makes; SPYHOLE_DATA names another folder. */
export const DATA_FOLDER = resolve(ROOT, process.env['SPYHOLE_DATA'] || '.data');

/** The settings the start command made for the parts it started; only its owner can read the file. */
export const LOCAL_SETTINGS_PATH = join(DATA_FOLDER, 'settings.json');

/** Says which start is running. */
export const RUN_LOCK_PATH = join(DATA_FOLDER, 'running.json');

/**
 * The settings for a command typed by hand (`npm run make-admin`, `npm run migrate`): those of the
 * environment, or, when no database is named there, those of the Spyhole that is running here.
 */
export function withLocalSettings(env: NodeJS.ProcessEnv): NodeJS.ProcessEnv {
  if (env['DATABASE_URL'] !== undefined || !isRunningHere()) return env;
  const settings = readJsonFile(LOCAL_SETTINGS_PATH) as Record<string, string> | null;
  return { ...settings, ...env };
}

function isRunningHere(): boolean {
  const lock = readJsonFile(RUN_LOCK_PATH) as { pid: number; identity: string | null } | null;
  return lock !== null && isSame(lock);
}
