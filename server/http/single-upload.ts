import type { RequestHandler } from 'express';
import multer from 'multer';
import { tooLargeWords, UPLOAD_LIMITS, type UploadKind } from '#shared/upload-limits.ts';
import { AppError } from './problem.ts';

/** The one file of a multipart request, held in memory, and its text fields. */
export interface Upload {
  readonly bytes: Buffer;
  /** Only ever shown as text; never part of a path. */
  readonly fileName: string;
  readonly fields: Readonly<Record<string, string>>;
}

/** Reads one file called `file` within the limit of its kind, and at most 10 small text fields. */
export function readSingleUpload(kind: UploadKind): RequestHandler {
  const maxBytes = UPLOAD_LIMITS[kind].bytes;
  const tooLarge = () => new AppError('too-large', tooLargeWords(kind));
  const read = multer({
    storage: multer.memoryStorage(),
    limits: {
      fileSize: maxBytes,
      files: 1,
      fields: 10,
      parts: 11,
      fieldSize: 20_000,
      fieldNameSize: 100,
      headerPairs: 50,
    },
  }).single('file');
  return (request, response, next) => {
    if (!request.is('multipart/form-data')) {
      next(new AppError('wrong-type', 'Send the file as multipart/form-data.'));
      return;
    }
    const declared = Number(request.get('Content-Length') ?? 0);
    if (declared > maxBytes + 300_000) {
      next(tooLarge());
      return;
    }
    read(request, response, (error: unknown) => {
      if (error instanceof multer.MulterError && error.code === 'LIMIT_FILE_SIZE') {
        next(tooLarge());
      } else if (error instanceof multer.MulterError && error.code.startsWith('LIMIT_')) {
        next(new AppError('too-large', 'One file and at most 10 fields a request.'));
      } else if (error) {
        next(new AppError('bad-request', 'The upload was cut short or is not well formed.'));
      } else {
        next();
      }
    });
  };
}

/** The upload a request brought. @throws AppError when it brought none. */
export function uploadOf(request: Express.Request & { body?: unknown }): Upload {
  const { file } = request;
  if (!file || file.size === 0) throw new AppError('bad-request', 'Choose a file first.');
  const fields: Record<string, string> = Object.create(null) as Record<string, string>;
  if (typeof request.body === 'object' && request.body !== null) {
    for (const [name, value] of Object.entries(request.body)) {
      if (typeof value === 'string') fields[name] = value;
    }
  }
  return { bytes: file.buffer, fileName: cleanFileName(file.originalname), fields };
}

/** Control and direction characters out, at most 120 characters. */
function cleanFileName(name: string): string {
  return [...Buffer.from(name, 'latin1').toString('utf8').normalize('NFC')]
    .filter((character) => !/[\p{Cc}\p{Cf}\p{Cs}]/u.test(character))
    .join('')
    .slice(0, 120);
}
