import { dirname } from 'node:path';

/** A reason why Spyhole cannot start, told in one clear sentence; the process ends with `exitCode`. */
export class StartFailure extends Error {
  /**
   * @param {string} message one sentence for the person at the terminal
   * @param {number} [exitCode]
   */
  constructor(message, exitCode = 1) {
    super(message);
    this.name = 'StartFailure';
    this.exitCode = exitCode;
  }
}

/** @type {Record<string, string>} */
const SENTENCES = {
  ENOSPC: 'The disk is full: free some space and start again',
  EDQUOT: 'The disk quota is used up: free some space and start again',
  EACCES: 'Spyhole may not write here: give this user the right to write, or move the folder',
  EPERM: 'Spyhole may not write here: give this user the right to write, or move the folder',
  EROFS: 'This disk is read-only: move the folder to one that can be written to',
  EMFILE: 'Too many files are open: raise the limit (ulimit -n) and start again',
};

/**
 * Turns an error of the operating system into a sentence; what is not known is passed on unchanged.
 * @param {unknown} error
 * @returns {unknown}
 */
export function explainSystemError(error) {
  if (error instanceof StartFailure || !(error instanceof Error)) return error;
  const { code, path } = /** @type {NodeJS.ErrnoException} */ (error);
  const sentence = code === undefined ? undefined : SENTENCES[code];
  if (sentence === undefined) return error;
  return new StartFailure(`${sentence}${path === undefined ? '' : ` (${dirname(path)})`}.`);
}

/**
 * Looks for the operating system's words for a full or locked disk in the last lines of a log.
 * @param {string} log
 * @returns {string | null} a sentence, or null when the log says nothing of the kind
 */
export function explainLog(log) {
  if (/no space left on device|errno: 28|error 28\b|disk full/i.test(log)) {
    return `${SENTENCES['ENOSPC']}.`;
  }
  if (/permission denied|errno: 13\b/i.test(log)) return `${SENTENCES['EACCES']}.`;
  return null;
}
