import type { z } from 'zod';
import { problemSchema } from '#shared/api/problem.ts';
import { whyTooLarge, type UploadKind } from '#shared/upload-limits.ts';
import { changeHeaders, forgetToken, OfflineError, ProblemError } from './client.ts';

export interface UploadOptions<Schema extends z.ZodType> {
  readonly path: string;
  readonly kind: UploadKind;
  readonly file: Blob;
  readonly fileName: string;
  readonly fields?: Readonly<Record<string, string>>;
  readonly answer: Schema;
  /** 0..1 of the bytes sent. */
  readonly onProgress?: (share: number) => void;
  readonly signal?: AbortSignal;
}

/** A file that the server would refuse for its size: a browser may take that for a lost network. */
export class TooLargeError extends Error {
  constructor(words: string) {
    super(words);
    this.name = 'TooLargeError';
  }
}

/**
 * Sends one file with progress and a way to cancel, which fetch cannot tell of yet.
 * @throws TooLargeError before anything is sent
 */
export async function upload<Schema extends z.ZodType>(
  options: UploadOptions<Schema>,
): Promise<z.output<Schema>> {
  const because = whyTooLarge(options.kind, options.file.size);
  if (because !== null) throw new TooLargeError(because);
  try {
    return await uploadOnce(options);
  } catch (error) {
    if (!(error instanceof ProblemError) || error.problem.code !== 'token-refused') throw error;
    forgetToken();
    return uploadOnce(options);
  }
}

async function uploadOnce<Schema extends z.ZodType>(
  options: UploadOptions<Schema>,
): Promise<z.output<Schema>> {
  const headers = await changeHeaders();
  const form = new FormData();
  for (const [name, value] of Object.entries(options.fields ?? {})) form.append(name, value);
  form.append('file', options.file, options.fileName);
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    request.open('POST', options.path);
    request.responseType = 'json';
    for (const [name, value] of Object.entries(headers)) request.setRequestHeader(name, value);
    request.upload.onprogress = (event) => {
      if (event.lengthComputable) options.onProgress?.(event.loaded / event.total);
    };
    request.onerror = () => {
      reject(new OfflineError());
    };
    request.onabort = () => {
      reject(new DOMException('Cancelled', 'AbortError'));
    };
    request.onload = () => {
      const body: unknown = request.response;
      if (request.status >= 200 && request.status < 300) {
        const parsed = options.answer.safeParse(body);
        if (parsed.success) resolve(parsed.data);
        else reject(parsed.error);
        return;
      }
      const problem = problemSchema.safeParse(body);
      reject(problem.success ? new ProblemError(problem.data) : new OfflineError());
    };
    options.signal?.addEventListener('abort', () => {
      request.abort();
    });
    request.send(form);
  });
}
