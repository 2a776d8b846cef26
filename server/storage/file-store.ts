import { randomBytes } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, open, rename, rm, rmdir, stat } from 'node:fs/promises';
import path from 'node:path';
import type { Readable } from 'node:stream';

/**
 * Where uploads live: local disk now, an object store later. Keys are made by the server
 * (`pictures/<32 hex>/480.webp`), never taken from a client's file name.
 */
export interface FileStore {
  /** Whole or not at all: written aside, flushed, then renamed. */
  put(key: string, bytes: Uint8Array): Promise<void>;
  /** Null when there is no such file. */
  read(key: string): Promise<{ stream: Readable; size: number } | null>;
  remove(prefix: string): Promise<void>;
}

const KEY = /^[a-z]+\/[0-9a-f]{16,64}(\/[a-z0-9]{1,20}\.[a-z]{2,5})?$/;

/** A store below one folder. The folder is made when missing; files are not executable. */
export function diskStore(folder: string): FileStore {
  const root = path.resolve(folder);
  const locate = (key: string): string => {
    if (!KEY.test(key)) throw new Error('A storage key has a fixed form.');
    return path.join(root, key);
  };
  return {
    async put(key, bytes) {
      const target = locate(key);
      await mkdir(path.dirname(target), { recursive: true, mode: 0o750 });
      const aside = `${target}.${randomBytes(6).toString('hex')}.part`;
      try {
        const file = await open(aside, 'wx', 0o640);
        try {
          await file.writeFile(bytes);
          await file.sync();
        } finally {
          await file.close();
        }
        await rename(aside, target);
        const directory = await open(path.dirname(target), 'r');
        try {
          await directory.sync();
        } finally {
          await directory.close();
        }
      } catch (error) {
        await rm(aside, { force: true });
        throw error;
      }
    },
    async read(key) {
      const target = locate(key);
      try {
        const { size } = await stat(target);
        return { stream: createReadStream(target), size };
      } catch (error) {
        if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
        throw error;
      }
    },
    async remove(prefix) {
      await rm(locate(prefix), { recursive: true, force: true });
      // The folder of a picture goes with its last file; rmdir leaves one alone that is not empty.
      const parent = path.dirname(locate(prefix));
      if (path.dirname(path.dirname(parent)) === root) await rmdir(parent).catch(() => undefined);
    },
  };
}
