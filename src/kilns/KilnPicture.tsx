import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useRef, useState, type ChangeEvent } from 'react';
import type { Kiln } from '#shared/api/kilns.ts';
import { PICTURE_ACCEPT, pictureSchema } from '#shared/api/pictures.ts';
import { whyTooLarge } from '#shared/upload-limits.ts';
import { upload } from '../http/upload.ts';
import { Button } from '../ui/Button.tsx';
import { ProgressBar } from '../ui/ProgressBar.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { kilnPath, kilnQueries } from './kiln-queries.ts';
import { RemoveKilnPicture } from './RemoveKilnPicture.tsx';
import { KilnPhotograph } from './KilnPhotograph.tsx';

/** Why a chosen file cannot be a picture here, in a sentence; null when it can. */
function whyNot(file: File): string | null {
  if (/hei[cf]/i.test(file.type) || /\.hei[cf]$/i.test(file.name)) {
    return 'This picture is in the phone’s own format (HEIC). Choose it from the gallery once more, or save it as JPEG first.';
  }
  return whyTooLarge('picture', file.size);
}

/** The kiln's picture, and the way to give it another. */
export function KilnPicture({ kiln }: { readonly kiln: Kiln }) {
  const client = useQueryClient();
  const tell = useMessages();
  const chooser = useRef<HTMLInputElement>(null);
  const stop = useRef<AbortController | null>(null);
  const [share, setShare] = useState(0);
  const [refused, setRefused] = useState<string | null>(null);
  const send = useMutation({
    mutationFn: (file: File) => {
      stop.current = new AbortController();
      setShare(0);
      return upload({
        path: kilnPath(kiln.id, '/picture'),
        kind: 'picture',
        file,
        fileName: file.name,
        answer: pictureSchema,
        onProgress: setShare,
        signal: stop.current.signal,
      });
    },
    onSuccess: () => {
      tell({ kind: 'done', text: 'The picture is kept.' });
      return client.invalidateQueries({ queryKey: kilnQueries.all });
    },
    onError: (error) => {
      if (!(error instanceof DOMException && error.name === 'AbortError')) {
        setRefused(error.message);
      }
    },
  });
  const onChosen = (event: ChangeEvent<HTMLInputElement>): void => {
    const [file] = event.currentTarget.files ?? [];
    if (!file) return;
    const because = whyNot(file);
    setRefused(because);
    if (because === null) send.mutate(file);
    // The same file can be chosen again.
    event.currentTarget.value = '';
  };
  return (
    <section aria-labelledby="picture" className="max-w-measure space-y-3">
      <h2 id="picture" className="border-t-2 border-soot pt-3 text-section">
        Picture
      </h2>
      {kiln.picture && <KilnPhotograph picture={kiln.picture} name={kiln.fields.name} />}
      <input
        ref={chooser}
        type="file"
        accept={PICTURE_ACCEPT}
        aria-label="Picture of the kiln"
        tabIndex={-1}
        className="sr-only"
        onChange={onChosen}
      />
      {send.isPending ? (
        <ProgressBar
          label="The picture is being sent"
          done={share}
          of={1}
          cancel={<Button onClick={() => stop.current?.abort()}>Cancel</Button>}
        />
      ) : (
        <div className="flex flex-wrap gap-3">
          <Button icon="add" onClick={() => chooser.current?.click()}>
            {kiln.picture ? 'Another picture' : 'Add a picture'}
          </Button>
          {kiln.picture && <RemoveKilnPicture kiln={kiln} />}
        </div>
      )}
      {refused !== null && (
        <p role="alert" className="text-small text-caution">
          {refused}
        </p>
      )}
      <p className="text-note text-soot-2">
        JPEG, PNG or WebP. Where and with what it was taken is not kept.
      </p>
    </section>
  );
}
