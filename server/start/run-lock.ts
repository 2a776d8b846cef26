import { linkSync, rmSync } from 'node:fs';
import { readJsonFile, writePrivateJson } from './private-files.ts';
import { identityOf, stopProcess } from './processes.ts';
import { StartFailure } from './start-failure.mjs';

/** A process as the lock remembers it: the number, and when it began, which together are unique. */
interface Remembered {
  name: string;
  pid: number;
  identity: string | null;
}

interface LockContent extends Remembered {
  url: string;
  parts: Remembered[];
}

/** Held while Spyhole runs from this folder. */
export interface RunLock {
  /** Remembers a started process, so that the next start can stop it if we are killed. */
  remember: (name: string, pid: number) => void;
  release: () => void;
}

const STOP_MILLISECONDS = 12_000;

/**
 * Takes the lock at `path`. One that a killed start has left behind is cleared away, together with
 * the processes which that start had left running.
 *
 * @throws StartFailure when Spyhole is already running here
 */
export async function takeRunLock(path: string, url: string): Promise<RunLock> {
  const content: LockContent = { ...describe('start', process.pid), url, parts: [] };
  while (!tryToCreate(path, content)) {
    const other = readJsonFile(path) as LockContent | null;
    if (other !== null && isSame(other) && other.pid !== process.pid) {
      throw new StartFailure(`Spyhole is already running at ${other.url} (process ${other.pid}).`);
    }
    const left = (other?.parts ?? []).filter(isSame);
    await Promise.all(left.map((part) => stopProcess(part.pid, STOP_MILLISECONDS)));
    rmSync(path, { force: true });
  }
  return {
    remember: (name, pid) => {
      content.parts.push(describe(name, pid));
      writePrivateJson(path, content);
    },
    release: () => rmSync(path, { force: true }),
  };
}

/** Creates the lock whole or not at all: a link to a finished file fails when the name is taken. */
function tryToCreate(path: string, content: LockContent): boolean {
  const own = `${path}.${process.pid}`;
  writePrivateJson(own, content);
  try {
    linkSync(own, path);
    return true;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'EEXIST') return false;
    throw error;
  } finally {
    rmSync(own, { force: true });
  }
}

function describe(name: string, pid: number): Remembered {
  return { name, pid, identity: identityOf(pid) };
}

/** True while the remembered process lives; another process that got its number is not the same. */
export function isSame(remembered: { pid: number; identity: string | null }): boolean {
  const identity = identityOf(remembered.pid);
  return identity !== null && identity === remembered.identity;
}
