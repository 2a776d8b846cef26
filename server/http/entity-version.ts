import type { Request } from 'express';
import { AppError } from './problem.ts';

/** The strong ETag of something with a version number (RFC 9110 section 8.8.3). */
export function versionTag(version: number): string {
  return `"v${String(version)}"`;
}

/**
 * The version a save started from, by If-Match. Missing: 428 (RFC 6585); weak, several or `*`
 * would let a save overwrite what its author never saw, so they are refused as missing.
 */
export function versionFromIfMatch(request: Request): number {
  const given = request.get('If-Match');
  const match = given === undefined ? null : /^"v(\d{1,10})"$/.exec(given.trim());
  if (!match) throw new AppError('version-missing');
  return Number(match[1]);
}
