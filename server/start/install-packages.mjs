import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { say, step } from './progress.mjs';
import { lastLines, runProgram } from './run-program.mjs';
import { StartFailure } from './start-failure.mjs';

/**
 * @typedef {{ version?: string, optional?: boolean, devOptional?: boolean, peer?: boolean, link?: boolean }} Package
 * @typedef {{ packages?: Record<string, Package> }} LockFile
 */

/**
 * @param {string} path
 * @returns {LockFile | null}
 */
function readLock(path) {
  try {
    return /** @type {LockFile} */ (JSON.parse(readFileSync(path, 'utf8')));
  } catch {
    return null;
  }
}

/**
 * True when node_modules holds what package-lock.json asks for. npm writes its own list of what it
 * installed (node_modules/.package-lock.json) as the last act of an installation, so an interrupted
 * one has none and counts as missing.
 * @param {string} root
 * @returns {boolean}
 */
export function arePackagesCurrent(root) {
  const wanted = readLock(join(root, 'package-lock.json'))?.packages;
  const installed = readLock(join(root, 'node_modules/.package-lock.json'))?.packages;
  if (wanted === undefined || installed === undefined) return false;
  return Object.entries(wanted).every(([path, entry]) => {
    // Packages for other machines are left out by npm.
    if (path === '' || entry.optional || entry.devOptional || entry.peer) return true;
    return installed[path]?.version === entry.version;
  });
}

/**
 * Installs the packages of package-lock.json when they are missing or others.
 * @param {string} root the project's folder
 */
export async function installPackages(root) {
  if (arePackagesCurrent(root)) return;
  const count = Object.keys(readLock(join(root, 'package-lock.json'))?.packages ?? {}).length;
  say(`  Packages are missing or have changed: npm installs ${count} of them, once.`);
  const npm = process.env['npm_execpath'];
  const [command, ...first] = npm?.endsWith('.js') ? [process.execPath, npm] : ['npm'];
  const args = [...first, 'ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'];
  const { code, output } = await step('Installing packages', () =>
    runProgram(command, args, { cwd: root, env: { NODE_ENV: 'development' } }),
  );
  if (code === 0) return;
  if (/ENOSPC|no space left/i.test(output)) {
    throw new StartFailure('The disk is full: free some space and start again.');
  }
  if (/EACCES|EPERM|EROFS/.test(output)) {
    throw new StartFailure(
      `npm may not write to ${root}: give this user the right to write there.`,
    );
  }
  throw new StartFailure(`npm could not install the packages:\n${lastLines(output)}`);
}
