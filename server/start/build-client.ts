import { createHash } from 'node:crypto';
import { readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { lastLines } from './run-program.mjs';
import { readLog, startProcess, type Started } from './processes.ts';
import { StartFailure } from './start-failure.mjs';

/** All that the built client is made from. */
const SOURCES = ['index.html', 'vite.config.ts', 'package-lock.json', 'src', 'public'];

/** True when dist/ was built from the sources as they are now. */
export function isClientCurrent(root: string): boolean {
  try {
    return readFileSync(stampPath(root), 'utf8') === hashSources(root);
  } catch {
    return false;
  }
}

/**
 * Builds the client into dist/. The stamp is removed first and written last, so an interrupted build
 * is never taken for a finished one.
 *
 * @param onStart is given the process, so that it can be stopped
 */
export async function buildClient(
  root: string,
  logPath: string,
  onStart: (started: Started) => void,
): Promise<void> {
  rmSync(stampPath(root), { force: true });
  rmSync(logPath, { force: true });
  const hash = hashSources(root);
  const vite = join(root, 'node_modules/vite/bin/vite.js');
  const build = startProcess('client build', process.execPath, [vite, 'build'], {
    cwd: root,
    env: { ...process.env, NODE_ENV: 'production' },
    logPath,
  });
  onStart(build);
  const { code } = await build.ended;
  if (code !== 0) {
    throw new StartFailure(`The pages could not be built:\n${lastLines(readLog(logPath))}`);
  }
  writeFileSync(stampPath(root), hash);
}

function stampPath(root: string): string {
  return join(root, 'dist/.stamp');
}

function hashSources(root: string): string {
  const hash = createHash('sha256');
  for (const file of SOURCES.flatMap((source) => listFiles(root, source))) {
    hash
      .update(`${file}\0`)
      .update(readFileSync(join(root, file)))
      .update('\0');
  }
  return hash.digest('hex');
}

/** The file itself, or all files below a folder, sorted; nothing when it does not exist. */
function listFiles(root: string, source: string): string[] {
  try {
    return readdirSync(join(root, source), { recursive: true, withFileTypes: true })
      .filter((entry) => entry.isFile())
      .map((entry) => join(entry.parentPath, entry.name).slice(root.length + 1))
      .sort();
  } catch (error) {
    const { code } = error as NodeJS.ErrnoException;
    if (code === 'ENOTDIR') return [source];
    if (code === 'ENOENT') return [];
    throw error;
  }
}
