import { MAX_PICTURES, pictureUrl, type Picture } from '#shared/api/pictures.ts';
import { Button } from '../../ui/Button.tsx';
import { LiveRegion } from '../../ui/LiveRegion.tsx';
import { Notice } from '../../ui/Notice.tsx';
import { ProgressBar } from '../../ui/ProgressBar.tsx';
import type { usePictureUploads } from './usePictureUploads.ts';

interface Props {
  readonly work: ReturnType<typeof usePictureUploads>;
}

/** Pictures on their way, each with its progress and what can be done about it. */
export function PictureUploads({ work }: Props) {
  const { uploads, retry, cancel } = work;
  const failed = uploads.filter(({ state }) => state.kind === 'failed').length;
  const going = uploads.length - failed;
  if (uploads.length === 0) return null;
  return (
    <div className="space-y-3">
      <ul className="space-y-3" aria-label="Pictures on their way">
        {uploads.map(({ id, file, state }) => (
          <li key={id}>
            {state.kind === 'failed' ? (
              <Notice
                kind="error"
                heading={file.name}
                action={
                  <>
                    {state.again && (
                      <Button
                        icon="retry"
                        label={`Try again: ${file.name}`}
                        onClick={() => retry(id)}
                      >
                        Try again
                      </Button>
                    )}
                    <Button label={`Leave out ${file.name}`} onClick={() => cancel(id)}>
                      Leave it out
                    </Button>
                  </>
                }
              >
                {state.reason}
              </Notice>
            ) : (
              <ProgressBar
                label={file.name}
                done={state.kind === 'sending' ? state.share : 0}
                of={1}
                {...progressWords(state)}
                cancel={
                  <Button label={`Cancel ${file.name}`} onClick={() => cancel(id)}>
                    Cancel
                  </Button>
                }
              />
            )}
          </li>
        ))}
      </ul>
      <LiveRegion
        text={[
          going > 0 ? `${going} pictures on their way` : '',
          failed > 0 ? `${failed} pictures were not sent` : '',
        ]
          .filter(Boolean)
          .join(', ')}
      />
    </div>
  );
}

function progressWords(state: { kind: string; share?: number }): { words?: string } {
  if (state.kind === 'waiting') return { words: 'waiting' };
  return state.share === 1 ? { words: 'being read' } : {};
}

interface UnplacedProps {
  readonly pictures: readonly Picture[];
  readonly onPlace: (picture: Picture) => void;
  readonly numberOf: (picture: Picture) => number;
}

/** Pictures the note has and its story does not show. */
export function UnplacedPictures({ pictures, onPlace, numberOf }: UnplacedProps) {
  if (pictures.length === 0) return null;
  return (
    <div className="space-y-1">
      <h3 className="text-body">Not in the story</h3>
      <p className="max-w-measure text-small text-soot-2">
        Uploaded, and seen by nobody but you until placed. They count among the {MAX_PICTURES} a
        note may have.
      </p>
      <ul className="border-t border-line">
        {pictures.map((picture) => (
          <li
            key={picture.name}
            className="grid max-w-measure grid-cols-[1fr_auto] items-center gap-4 border-b border-line py-1.5"
          >
            <img
              src={pictureUrl(picture.name, picture.widths[0] ?? picture.width)}
              alt={`Number ${numberOf(picture)}, not in the story`}
              width={picture.width}
              height={picture.height}
              loading="lazy"
              className="h-14 w-auto max-w-40 object-cover"
            />
            <Button
              label={`Place picture ${numberOf(picture)} at the cursor`}
              onClick={() => onPlace(picture)}
            >
              Place
            </Button>
          </li>
        ))}
      </ul>
    </div>
  );
}
