import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { identityOf, isAlive } from '../../../../server/start/processes.ts';
import { writePrivateJson } from '../../../../server/start/private-files.ts';
import { takeRunLock } from '../../../../server/start/run-lock.ts';

const URL = 'http://localhost:3000';
let folder: string;
let path: string;

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'spyhole-lock-'));
  path = join(folder, 'running.json');
});

afterEach(() => rmSync(folder, { recursive: true, force: true }));

function startSleeper(): number {
  const child = spawn('sleep', ['60'], { stdio: 'ignore', detached: true });
  child.unref();
  return child.pid ?? -1;
}

describe('takeRunLock', () => {
  it('is readable by its owner only and gone when released', async () => {
    const lock = await takeRunLock(path, URL);
    expect(statSync(path).mode & 0o777).toBe(0o600);
    lock.release();
    expect(existsSync(path)).toBe(false);
  });

  it('says where Spyhole is running when a living start holds it', async () => {
    const pid = startSleeper();
    writePrivateJson(path, { name: 'start', pid, identity: identityOf(pid), url: URL, parts: [] });
    await expect(takeRunLock(path, URL)).rejects.toThrow(
      `Spyhole is already running at ${URL} (process ${pid}).`,
    );
    process.kill(pid, 'SIGKILL');
  });

  it('clears away a dead start and stops what that one had left running', async () => {
    const left = startSleeper();
    const parts = [{ name: 'server', pid: left, identity: identityOf(left) }];
    const dead = { name: 'start', pid: 2 ** 22 + 1, identity: '1', url: URL, parts };
    writePrivateJson(path, dead);
    const lock = await takeRunLock(path, URL);
    expect(isAlive(left)).toBe(false);
    lock.release();
  });

  it('leaves a process alone that merely got the number of an old part', async () => {
    const stranger = startSleeper();
    const parts = [{ name: 'server', pid: stranger, identity: 'another time' }];
    writePrivateJson(path, {
      name: 'start',
      pid: stranger,
      identity: 'another time',
      url: URL,
      parts,
    });
    const lock = await takeRunLock(path, URL);
    expect(isAlive(stranger)).toBe(true);
    process.kill(stranger, 'SIGKILL');
    lock.release();
  });

  it('remembers the parts while they run', async () => {
    const lock = await takeRunLock(path, URL);
    lock.remember('database', process.pid);
    const kept = JSON.parse(readFileSync(path, 'utf8')) as { parts: { name: string }[] };
    expect(kept.parts.map((part) => part.name)).toEqual(['database']);
    lock.release();
  });

  it('clears away a lock that is not readable as one', async () => {
    writePrivateJson(path, 'nonsense');
    const lock = await takeRunLock(path, URL);
    lock.release();
  });
});
