import { crc32 } from 'node:zlib';

/** What is kept on disk cannot be trusted; everything in it can be made anew from the database. */
export class DamagedStorageError extends Error {
  constructor(message: string) {
    super(message);
    this.name = 'DamagedStorageError';
  }
}

const CHECKSUM_LENGTH = 8;

const written = (checksum: number): string => checksum.toString(16).padStart(CHECKSUM_LENGTH, '0');

/**
 * A file whose lines carry a checksum before their text: `1c291ca3 {"kind":...}`. Each goes on from
 * the one before, so that a changed, missing or misplaced line shows.
 */
export type LineChain = {
  /** The text as the file's next line. */
  write: (text: string) => string;
  /** The text of the file's next line, or undefined where it is not what was written there. */
  read: (line: string) => string | undefined;
};

export function createLineChain(): LineChain {
  let last = 0;
  return {
    write: (text) => {
      last = crc32(text, last);
      return `${written(last)} ${text}\n`;
    },
    read: (line) => {
      const text = line.slice(CHECKSUM_LENGTH + 1);
      const checksum = crc32(text, last);
      if (line !== `${written(checksum)} ${text}`) return undefined;
      last = checksum;
      return text;
    },
  };
}

/** Lines of a file without decoding it as one string, which V8 limits to half a gigabyte. */
export function* linesOf(
  content: Buffer,
): Iterable<{ line: string; end: number; complete: boolean }> {
  let start = 0;
  while (start < content.length) {
    const newline = content.indexOf(10, start);
    const end = newline < 0 ? content.length : newline;
    yield { line: content.toString('utf8', start, end), end: end + 1, complete: newline >= 0 };
    start = end + 1;
  }
}
