import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { MAX_PICTURES, pictureUrl, type Picture } from '#shared/api/pictures.ts';
import { Button } from '../../ui/Button.tsx';
import { Dialog } from '../../ui/Dialog.tsx';
import { useMessages } from '../../ui/useMessages.ts';
import { removePicture } from '../draft-mutations.ts';
import type { DraftKeeper } from '../draft-keeper.ts';

interface Props {
  readonly pictures: readonly Picture[];
  readonly onPlace: (picture: Picture) => void;
  readonly numberOf: (picture: Picture) => number;
  readonly editable: boolean;
  readonly keeper: DraftKeeper;
}

/** Pictures the note has and its story does not show: to be placed, or deleted. */
export function UnplacedPictures({ pictures, onPlace, numberOf, editable, keeper }: Props) {
  const [asked, setAsked] = useState<Picture | null>(null);
  const tell = useMessages();
  const remove = useMutation({
    mutationFn: async ({ name }: Picture) => {
      // The server must know first that the story no longer shows it.
      await keeper.flush();
      return removePicture(keeper.current().draft.id, name);
    },
    onSuccess: ({ message }, { name }) => {
      const { draft, fields } = keeper.current();
      const left = draft.pictures.filter((picture) => picture.name !== name);
      keeper.accept({ ...draft, fields, pictures: left });
      setAsked(null);
      tell({ kind: 'done', text: message });
    },
  });
  const close = (): void => {
    setAsked(null);
    remove.reset();
  };
  if (pictures.length === 0) return null;
  return (
    <div className="space-y-1">
      <h3 className="text-body">Not in the story</h3>
      <p className="max-w-measure text-small text-soot-2">
        Uploaded, and seen by nobody but you until placed. They count among the {MAX_PICTURES} a
        note may have.
      </p>
      <ul className="max-w-measure border-t border-line">
        {pictures.map((picture) => (
          <li
            key={picture.name}
            className="flex flex-wrap items-center gap-x-4 gap-y-1 border-b border-line py-1.5"
          >
            <img
              src={pictureUrl(picture.name, picture.widths[0] ?? picture.width)}
              alt={`Number ${numberOf(picture)}, not in the story`}
              width={picture.width}
              height={picture.height}
              loading="lazy"
              className="mr-auto h-14 w-auto max-w-40 object-cover"
            />
            {editable && (
              <>
                <Button
                  label={`Place picture ${numberOf(picture)} at the cursor`}
                  onClick={() => onPlace(picture)}
                >
                  Place
                </Button>
                <Button
                  kind="danger"
                  label={`Delete picture ${numberOf(picture)}`}
                  onClick={() => setAsked(picture)}
                >
                  Delete
                </Button>
              </>
            )}
          </li>
        ))}
      </ul>
      <Dialog
        open={asked !== null}
        onClose={close}
        title="Delete this picture?"
        actions={
          <>
            <Button
              kind="danger"
              busy={remove.isPending}
              onClick={() => asked && remove.mutate(asked)}
            >
              Delete it
            </Button>
            <Button onClick={close}>Keep it</Button>
          </>
        }
      >
        <p>This cannot be undone. What is published with it keeps it.</p>
        {remove.isError && (
          <p role="alert" className="text-caution">
            {remove.error.message}
          </p>
        )}
      </Dialog>
    </div>
  );
}
