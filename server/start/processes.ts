import { execFileSync, spawn, type ChildProcess } from 'node:child_process';
import { closeSync, openSync, readFileSync, renameSync, statSync } from 'node:fs';
import { createServer } from 'node:net';

/** How a process ended: with a code, or by a signal. */
export interface Ending {
  code: number | null;
  signal: NodeJS.Signals | null;
}

/** A process started by us, and the promise of its end. */
export interface Started {
  name: string;
  pid: number;
  child: ChildProcess;
  ended: Promise<Ending>;
}

/** Logs of earlier runs are kept up to this size, then moved aside once. */
const LOG_BYTES_KEPT = 10_000_000;

/** True while a process with this number exists (also when it belongs to somebody else). */
export function isAlive(pid: number): boolean {
  if (pid <= 0) return false;
  try {
    process.kill(pid, 0);
    return !isZombie(pid);
  } catch (error) {
    return (error as NodeJS.ErrnoException).code === 'EPERM';
  }
}

function isZombie(pid: number): boolean {
  try {
    return /^State:\s+Z/m.test(readFileSync(`/proc/${pid}/status`, 'utf8'));
  } catch {
    return false;
  }
}

/**
 * The command line of a living process, or null. Numbers are given out again after a restart of the
 * machine, so a number alone never proves that a process is ours.
 */
export function commandLineOf(pid: number): string | null {
  if (!isAlive(pid)) return null;
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').replaceAll('\0', ' ').trim();
  } catch {
    return askPs(pid, 'command=');
  }
}

/**
 * When a living process began, in the system's own words; null when it does not live. Together with
 * its number this tells one process from any other that later gets the same number.
 */
export function identityOf(pid: number): string | null {
  if (!isAlive(pid)) return null;
  try {
    // Field 22 is the start time in ticks; the name in brackets before it may hold spaces.
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19] ?? null;
  } catch {
    return askPs(pid, 'lstart=');
  }
}

function askPs(pid: number, column: string): string | null {
  try {
    return execFileSync('ps', ['-ww', '-o', column, '-p', String(pid)], {
      encoding: 'utf8',
      stdio: ['ignore', 'pipe', 'ignore'],
    }).trim();
  } catch {
    return null;
  }
}

/** Opens a log for appending; a log that has grown large is moved aside first. */
export function openLog(path: string): number {
  try {
    if (statSync(path).size > LOG_BYTES_KEPT) renameSync(path, `${path}.1`);
  } catch {
    // There is no log yet.
  }
  return openSync(path, 'a', 0o600);
}

/** The end of a log, from `offset` bytes on: what this run has written. */
export function readLog(path: string, offset = 0): string {
  try {
    return readFileSync(path).subarray(offset).toString('utf8');
  } catch {
    return '';
  }
}

/**
 * Starts a program in a process group of its own, so that Ctrl-C at the terminal reaches only us and
 * we can stop the parts in order. Standard output is read by the caller when `stdout` is 'pipe'.
 */
export function startProcess(
  name: string,
  command: string,
  args: string[],
  options: {
    cwd: string;
    env: NodeJS.ProcessEnv;
    logPath?: string;
    stdout?: 'pipe' | 'inherit' | 'log';
    tied?: boolean;
  },
): Started {
  const log = options.logPath === undefined ? 'ignore' : openLog(options.logPath);
  const stdout = options.stdout === undefined || options.stdout === 'log' ? log : options.stdout;
  const stderr = options.stdout === 'inherit' ? 'inherit' : log;
  const child = spawn(command, args, {
    cwd: options.cwd,
    env: options.env,
    detached: true,
    // A channel tells a Node child when we are gone, even after kill -9.
    stdio: options.tied === true ? ['ignore', stdout, stderr, 'ipc'] : ['ignore', stdout, stderr],
  });
  if (typeof log === 'number') closeSync(log);
  const ended = new Promise<Ending>((resolve, reject) => {
    child.once('error', reject);
    child.once('exit', (code, signal) => resolve({ code, signal }));
  });
  // Whoever waits for the end sees the error; nobody waiting must not bring us down.
  ended.catch(() => undefined);
  return { name, pid: child.pid ?? -1, child, ended };
}

/** Asks a process to end, and kills it when it has not ended in time. */
export async function stopProcess(
  pid: number,
  graceMilliseconds: number,
  signal: NodeJS.Signals = 'SIGTERM',
): Promise<void> {
  if (pid <= 0) return;
  send(pid, signal);
  if (await waitForEnd(pid, graceMilliseconds)) return;
  send(pid, 'SIGKILL');
  await waitForEnd(pid, 5_000);
}

function send(pid: number, signal: NodeJS.Signals): void {
  try {
    process.kill(pid, signal);
  } catch {
    // It has already ended.
  }
}

async function waitForEnd(pid: number, milliseconds: number): Promise<boolean> {
  const deadline = performance.now() + milliseconds;
  while (isAlive(pid)) {
    if (performance.now() > deadline) return false;
    await new Promise((resolve) => setTimeout(resolve, 25));
  }
  return true;
}

/** A port of the loopback interface that nobody uses at this moment. */
export async function findFreePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const address = server.address();
      const port = typeof address === 'object' && address !== null ? address.port : 0;
      server.close(() => resolve(port));
    });
  });
}

/** True when `port` can be listened on at `host`. */
export async function isPortFree(port: number, host: string): Promise<boolean> {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', () => resolve(false));
    server.listen({ port, host, exclusive: true }, () => server.close(() => resolve(true)));
  });
}
