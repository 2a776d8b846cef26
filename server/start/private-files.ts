import {
  closeSync,
  fsyncSync,
  mkdirSync,
  openSync,
  readFileSync,
  renameSync,
  writeSync,
} from 'node:fs';

/** A folder that only its owner can read. */
export function makePrivateFolder(path: string): void {
  mkdirSync(path, { recursive: true, mode: 0o700 });
}

/** Writes JSON that only its owner can read; a crash leaves the old file or the new one, whole. */
export function writePrivateJson(path: string, value: unknown): void {
  const temporary = `${path}.${process.pid}.new`;
  const file = openSync(temporary, 'w', 0o600);
  try {
    writeSync(file, `${JSON.stringify(value, null, 2)}\n`);
    fsyncSync(file);
  } finally {
    closeSync(file);
  }
  renameSync(temporary, path);
}

/** Reads JSON; null when the file is missing or not JSON. */
export function readJsonFile(path: string): unknown {
  try {
    return JSON.parse(readFileSync(path, 'utf8')) as unknown;
  } catch {
    return null;
  }
}
