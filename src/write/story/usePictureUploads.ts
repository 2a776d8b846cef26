import { useEffect, useEffectEvent, useRef, useState } from 'react';
import { pictureSchema, type Picture } from '#shared/api/pictures.ts';
import { whyTooLarge } from '#shared/upload-limits.ts';
import { ProblemError } from '../../http/client.ts';
import { upload } from '../../http/upload.ts';

export interface PictureUpload {
  readonly id: number;
  readonly file: File;
  readonly state:
    | { readonly kind: 'waiting' }
    | { readonly kind: 'sending'; readonly share: number }
    | {
        readonly kind: 'failed';
        readonly reason: string;
        /** Sent again it may go through; what the server refused it refuses again. */
        readonly again: boolean;
      };
}

/** Too large, wrong type, no picture: about the file, not about the way to the server. */
const REFUSALS = [413, 415, 422];

/**
 * Pictures on their way to the server, one after another in the order they were chosen in; each can
 * be cancelled, and sent again where it failed. Those that came through leave the list.
 */
export function usePictureUploads(noteId: number, onPicture: (picture: Picture) => void) {
  const [uploads, setUploads] = useState<readonly PictureUpload[]>([]);
  const nextId = useRef(1);
  const running = useRef<{ readonly id: number; readonly abort: AbortController } | null>(null);

  const setState = (id: number, state: PictureUpload['state']): void =>
    setUploads((all) => all.map((one) => (one.id === id ? { ...one, state } : one)));
  const drop = (id: number): void => setUploads((all) => all.filter((one) => one.id !== id));

  const sendOne = useEffectEvent(async ({ id, file }: PictureUpload) => {
    const abort = new AbortController();
    running.current = { id, abort };
    setState(id, { kind: 'sending', share: 0 });
    try {
      const picture = await upload({
        path: `/api/notes/${String(noteId)}/pictures`,
        kind: 'picture',
        file,
        fileName: file.name || 'picture',
        answer: pictureSchema,
        onProgress: (share) => setState(id, { kind: 'sending', share }),
        signal: abort.signal,
      });
      running.current = null;
      drop(id);
      onPicture(picture);
    } catch (error) {
      running.current = null;
      if (abort.signal.aborted) drop(id);
      else {
        setState(id, {
          kind: 'failed',
          reason: error instanceof Error ? error.message : 'The upload did not work.',
          again: !(error instanceof ProblemError && REFUSALS.includes(error.problem.status)),
        });
      }
    }
  });

  const waiting = uploads.find(({ state }) => state.kind === 'waiting');
  const isSending = uploads.some(({ state }) => state.kind === 'sending');
  useEffect(() => {
    if (waiting && !isSending && running.current === null) void sendOne(waiting);
  }, [waiting, isSending]);
  useEffect(() => () => running.current?.abort.abort(), []);

  return {
    uploads,
    add: (files: readonly File[]): void => {
      const added = files.map((file): PictureUpload => {
        nextId.current += 1;
        const tooLarge = whyTooLarge('picture', file.size);
        return {
          id: nextId.current,
          file,
          // What the server would refuse anyway is not sent first.
          state:
            tooLarge === null
              ? { kind: 'waiting' }
              : { kind: 'failed', reason: tooLarge, again: false },
        };
      });
      setUploads((all) => [...all, ...added]);
    },
    retry: (id: number) => setState(id, { kind: 'waiting' }),
    cancel: (id: number): void => {
      if (running.current?.id === id) running.current.abort.abort();
      else drop(id);
    },
  };
}
