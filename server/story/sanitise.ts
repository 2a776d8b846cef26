import { Worker } from 'node:worker_threads';
import { AppError } from '../http/problem.ts';

const LIMIT_MILLISECONDS = 2000;
/** The first story also waits for the parser to load. */
const FIRST_MILLISECONDS = 10_000;
const MAX_BYTES = 400_000;
const MAX_ELEMENTS = 4000;
const MAX_DEPTH = 60;

interface Waiting {
  readonly resolve: (html: string) => void;
  readonly reject: (error: Error) => void;
  readonly timer: NodeJS.Timeout;
}
interface WorkerAnswer {
  readonly id: number;
  readonly html: string | null;
}

let worker: Worker | null = null;
let isWarm = false;
let nextId = 1;
const waiting = new Map<number, Waiting>();

/** Size, number of elements and depth by one linear scan, before any tree is built. */
export function isWithinBounds(html: string): boolean {
  if (Buffer.byteLength(html) > MAX_BYTES) return false;
  let elements = 0;
  let depth = 0;
  for (let at = html.indexOf('<'); at >= 0; at = html.indexOf('<', at + 1)) {
    const closing = html[at + 1] === '/';
    elements += closing ? 0 : 1;
    // Void elements make this an overestimate by a little, never an underestimate.
    depth += closing ? -1 : /^<(br|hr|img)[\s>]/i.test(html.slice(at, at + 6)) ? 0 : 1;
    if (elements > MAX_ELEMENTS || depth > MAX_DEPTH) return false;
  }
  return true;
}

const tooMuch = (): AppError =>
  new AppError('bad-input', 'This story is too long or nested too deeply to be kept.');

function failAll(error: Error): void {
  for (const [id, { reject, timer }] of waiting) {
    clearTimeout(timer);
    waiting.delete(id);
    reject(error);
  }
}

function start(): Worker {
  const started = new Worker(new URL('./sanitise-worker.mjs', import.meta.url), { execArgv: [] });
  started.on('message', (answer: WorkerAnswer) => {
    const asked = waiting.get(answer.id);
    if (!asked) return;
    isWarm = true;
    clearTimeout(asked.timer);
    waiting.delete(answer.id);
    if (answer.html === null) asked.reject(tooMuch());
    else asked.resolve(answer.html);
  });
  started.on('error', (error) => {
    if (worker === started) worker = null;
    isWarm = false;
    failAll(error);
  });
  started.on('exit', () => {
    if (worker === started) worker = null;
    isWarm = false;
  });
  // After the listeners, which would hold on to it again: an idle thread keeps no command alive.
  started.unref();
  return started;
}

/**
 * HTML reduced to the closed list of elements and attributes, on a thread of its own.
 *
 * @throws AppError 'bad-input' when it is too long, too deep or takes over two seconds
 */
export function sanitise(html: string): Promise<string> {
  if (!isWithinBounds(html)) return Promise.reject(tooMuch());
  worker ??= start();
  const own = worker;
  const id = nextId++;
  return new Promise((resolve, reject) => {
    const timer = setTimeout(
      () => {
        // The thread is stuck on this one: end it; others waiting on it are told to try again.
        waiting.delete(id);
        reject(tooMuch());
        if (worker === own) worker = null;
        isWarm = false;
        void own.terminate();
        failAll(new AppError('busy', { retryAfter: 1 }));
      },
      isWarm ? LIMIT_MILLISECONDS : FIRST_MILLISECONDS,
    );
    waiting.set(id, { resolve, reject, timer });
    own.postMessage({ id, html });
  });
}
