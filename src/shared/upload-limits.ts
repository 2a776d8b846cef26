import { formatFileSize } from './units/file-size.ts';

const MIB = 1024 * 1024;

/** What one file may weigh, bytes: asked before it is sent, and again by the server. */
export const UPLOAD_LIMITS = {
  /** A phone's largest photograph, with room. */
  picture: { what: 'A picture', bytes: 16 * MIB },
  /** A second's logging for two days, with room. */
  record: { what: 'A record', bytes: 10 * MIB },
} as const;
export type UploadKind = keyof typeof UPLOAD_LIMITS;

/** The limit in a sentence, with the file's own size beside it where that is known. */
export function tooLargeWords(kind: UploadKind, bytes?: number): string {
  const { what, bytes: most } = UPLOAD_LIMITS[kind];
  const limit = `${what} may have at most ${formatFileSize(most)}`;
  return bytes === undefined ? `${limit}.` : `${limit}; this one has ${formatFileSize(bytes)}.`;
}

/** Why a file of this size cannot be sent; null when it can. */
export function whyTooLarge(kind: UploadKind, bytes: number): string | null {
  return bytes > UPLOAD_LIMITS[kind].bytes ? tooLargeWords(kind, bytes) : null;
}
