import { describe, expect, it } from 'vitest';
import { formatFileSize } from '#shared/units/file-size.ts';
import { tooLargeWords, UPLOAD_LIMITS, whyTooLarge } from '#shared/upload-limits.ts';

const MIB = 1024 * 1024;

describe('whyTooLarge', () => {
  it('lets a file of exactly the limit through, and one byte more no longer', () => {
    for (const kind of ['picture', 'record'] as const) {
      const { bytes } = UPLOAD_LIMITS[kind];
      expect(whyTooLarge(kind, bytes)).toBeNull();
      expect(whyTooLarge(kind, bytes + 1)).not.toBeNull();
    }
  });

  it('says the limit and the file’s own size, which is never shown as the limit itself', () => {
    expect(whyTooLarge('picture', 17.42 * MIB)).toBe(
      'A picture may have at most 16 MiB; this one has 17.5 MiB.',
    );
    expect(whyTooLarge('record', 10 * MIB + 1)).toBe(
      'A record may have at most 10 MiB; this one has 10.1 MiB.',
    );
    expect(tooLargeWords('record')).toBe('A record may have at most 10 MiB.');
  });
});

describe('formatFileSize', () => {
  it('is in the unit a person would take', () => {
    expect(formatFileSize(0)).toBe('0 bytes');
    expect(formatFileSize(1023)).toBe('1023 bytes');
    expect(formatFileSize(1024)).toBe('1 kiB');
    expect(formatFileSize(1536)).toBe('1.5 kiB');
    expect(formatFileSize(3 * 1024 * MIB)).toBe('3 GiB');
  });
});
