import { Button } from '../ui/Button.tsx';
import { Icon } from '../ui/Icon.tsx';
import { LiveRegion } from '../ui/LiveRegion.tsx';
import type { SaveState } from './save-state.ts';

interface Props {
  readonly state: SaveState;
  readonly onRetry: () => void;
  readonly onSeeBoth: () => void;
}

function clockOf(iso: string): string {
  return new Intl.DateTimeFormat('en-GB', { timeStyle: 'short' }).format(new Date(iso));
}

/** The state of saving in a few words. */
export function savedWords(state: SaveState): string {
  switch (state.kind) {
    case 'saved':
      return `Saved ${clockOf(state.at)}`;
    case 'waiting':
      return 'Not saved yet';
    case 'saving':
      return 'Saving…';
    case 'unsent':
      return state.keptHere
        ? 'Not sent: kept in this browser'
        : 'Not sent, and this browser keeps nothing: leave this page open';
    case 'conflict':
      return 'Saved elsewhere too, so nothing is sent';
    case 'refused':
      return `Not saved: ${state.reason}`;
  }
}

/** Whether saving has more to say than when it was done. */
export function isTroubled({ kind }: SaveState): boolean {
  return kind === 'unsent' || kind === 'refused' || kind === 'conflict';
}

/** When the work was last saved, or why it was not. Trouble is spoken; every save is not. */
export function SavedLine({ state, onRetry, onSeeBoth }: Props) {
  const words = savedWords(state);
  const isTrouble = isTroubled(state);
  return (
    <p className="flex flex-wrap items-center gap-x-3 text-small">
      <span
        className={`inline-flex items-center gap-1.5 ${isTrouble ? 'font-[650] text-caution' : 'text-soot-2'}`}
      >
        {isTrouble && <Icon name="look-again" />}
        {words}
      </span>
      {state.kind === 'conflict' && (
        <Button kind="quiet" onClick={onSeeBoth}>
          See both versions
        </Button>
      )}
      {isTrouble && state.kind !== 'conflict' && (
        <Button kind="quiet" icon="retry" onClick={onRetry}>
          Send again
        </Button>
      )}
      <LiveRegion text={isTrouble ? words : ''} quietMs={300} />
    </p>
  );
}
