import { describe, expect, it, vi } from 'vitest';
import { pictureSchema } from '#shared/api/pictures.ts';
import { UPLOAD_LIMITS } from '#shared/upload-limits.ts';
import { TooLargeError, upload } from '../../../src/http/upload.ts';

describe('upload', () => {
  it('sends nothing of a file that is too large, and says so with both sizes', async () => {
    const asked = vi.fn(() => Promise.reject(new Error('Nothing is to be asked.')));
    vi.stubGlobal('fetch', asked);
    const file = new Blob([new Uint8Array(UPLOAD_LIMITS.picture.bytes + 300_000)]);
    const sent = upload({
      path: '/api/notes/1/pictures',
      kind: 'picture',
      file,
      fileName: 'large.jpg',
      answer: pictureSchema,
    });
    await expect(sent).rejects.toThrow(TooLargeError);
    await expect(sent).rejects.toThrow('at most 16 MiB; this one has 16.3 MiB');
    expect(asked).not.toHaveBeenCalled();
    vi.unstubAllGlobals();
  });
});
