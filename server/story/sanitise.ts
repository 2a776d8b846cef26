import { Worker } from 'node:worker_threads';
import { AppError } from '../http/problem.ts';
import { turnstile } from '../http/turnstile.ts';

const LIMIT_MILLISECONDS = 2000;
/** The first story also waits for the parser to load. */
const FIRST_MILLISECONDS = 30_000;
const MAX_BYTES = 400_000;
const MAX_ELEMENTS = 2000;
const MAX_DEPTH = 60;
/** Characters of one tag with its attributes. */
const MAX_TAG = 16_384;
const CHILDLESS = new Set(['br', 'hr', 'img']);

/** One after the other on the one thread, so that each is given its own time. */
const inTurn = turnstile(1, 50);

let worker: Worker | null = null;
let isWarm = false;

/**
 * Size, number of elements and depth by one linear scan, before any tree is built. Only an end tag
 * of the innermost element counts as one: broken markup is taken for deeper than it is, never for
 * flatter.
 */
export function isWithinBounds(html: string): boolean {
  if (Buffer.byteLength(html) > MAX_BYTES) return false;
  const open: string[] = [];
  let elements = 0;
  for (let at = html.indexOf('<'); at >= 0; at = html.indexOf('<', at + 1)) {
    const [, slash, letters = ''] =
      /^<(\/?)([a-z!?][^\s/>]{0,20})/i.exec(html.slice(at, at + 24)) ?? [];
    const name = letters.toLowerCase();
    if (slash === '/') {
      if (open.at(-1) === name) open.pop();
      continue;
    }
    if (name === '') continue;
    elements += 1;
    if (!CHILDLESS.has(name) && !/^[!?]/.test(name)) open.push(name);
    if (elements > MAX_ELEMENTS || open.length > MAX_DEPTH) return false;
    if (!html.slice(at, at + MAX_TAG).includes('>')) return false;
  }
  return true;
}

const tooMuch = (): AppError =>
  new AppError('bad-input', 'This story is too long or nested too deeply to be kept.');

function start(): Worker {
  const started = new Worker(new URL('./sanitise-worker.mjs', import.meta.url), { execArgv: [] });
  started.unref();
  started.once('exit', () => forget(started));
  isWarm = false;
  return started;
}

function forget(ended: Worker): void {
  if (worker === ended) worker = null;
}

/**
 * HTML reduced to the closed list of elements and attributes, on a thread of its own.
 *
 * @throws AppError 'bad-input' when it is too long or too deep, 'busy' when it takes over two seconds
 */
export async function sanitise(html: string): Promise<string> {
  if (!isWithinBounds(html)) throw tooMuch();
  return inTurn(() => ask(html));
}

function ask(html: string): Promise<string> {
  worker ??= start();
  const own = worker;
  return new Promise((resolve, reject) => {
    const onMessage = (clean: string | null): void => {
      isWarm = true;
      end(() => (clean === null ? reject(tooMuch()) : resolve(clean)));
    };
    const onError = (error: Error): void => end(() => reject(error));
    const onExit = (): void => end(() => reject(new AppError('busy', { retryAfter: 1 })));
    const timer = setTimeout(
      () => {
        // The thread is stuck on this one; the next one gets a new thread.
        forget(own);
        void own.terminate();
        end(() =>
          reject(
            new AppError('busy', {
              detail: 'Reading this story took too long. Try again; if it stays so, shorten it.',
              retryAfter: 2,
            }),
          ),
        );
      },
      isWarm ? LIMIT_MILLISECONDS : FIRST_MILLISECONDS,
    );
    const end = (settle: () => void): void => {
      clearTimeout(timer);
      own.off('message', onMessage).off('error', onError).off('exit', onExit);
      settle();
    };
    own.once('message', onMessage).once('error', onError).once('exit', onExit);
    own.postMessage(html);
  });
}
