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
