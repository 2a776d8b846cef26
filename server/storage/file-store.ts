import { randomBytes } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, open, readdir, rename, rm, rmdir, stat } from 'node:fs/promises';
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
  /** Keys directly below a folder (`pictures`, `records`) that were last written before `before`. */
  listOlder(folder: string, before: Date): Promise<string[]>;
  /** Removes a key unless it has been written again since `before`. */
  removeOlder(key: string, before: Date): Promise<void>;
}

const KEY = /^[a-z]+\/[0-9a-f]{16,64}(\/[a-z0-9]{1,20}\.[a-z]{2,5})?$/;

/** A store below one folder. The folder is made when missing; files are not executable. */
export function diskStore(folder: string): FileStore {
  const root = path.resolve(folder);
  const locate = (key: string): string => {
    if (!KEY.test(key)) throw new Error('A storage key has a fixed form.');
    return path.join(root, key);
  };
  const isOlder = async (file: string, before: Date): Promise<boolean> => {
    const found = await stat(file).catch(() => null);
    return found !== null && found.mtimeMs < before.getTime();
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
    async listOlder(folder, before) {
      const names = await readdir(path.join(root, folder)).catch(() => []);
      const keys: string[] = [];
      for (const name of names) {
        if (await isOlder(path.join(root, folder, name), before)) keys.push(`${folder}/${name}`);
      }
      return keys;
    },
    async removeOlder(key, before) {
      // Parts of writes that were cut short end otherwise than keys, but are as removable.
      const target = locate(key.replace(/\.[0-9a-f]{12}\.part$/, ''));
      const file = path.join(path.dirname(target), path.basename(key));
      if (await isOlder(file, before)) await rm(file, { recursive: true, force: true });
    },
  };
}
