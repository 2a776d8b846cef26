import { Button } from '../ui/Button.tsx';
import { Icon } from '../ui/Icon.tsx';
import { LiveRegion } from '../ui/LiveRegion.tsx';
import type { SaveState } from './draft-keeper.ts';

interface Props {
  readonly state: SaveState;
  readonly onRetry: () => void;
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
      return 'Saved elsewhere too';
    case 'refused':
      return `Not saved: ${state.reason}`;
  }
}

/** When the work was last saved, or why it was not. Trouble is spoken; every save is not. */
export function SavedLine({ state, onRetry }: Props) {
  const words = savedWords(state);
  const isTrouble = state.kind === 'unsent' || state.kind === 'refused';
  return (
    <p className="flex flex-wrap items-center gap-x-3 text-small">
      <span
        className={`inline-flex items-center gap-1.5 ${isTrouble ? 'font-[650] text-caution' : 'text-soot-2'}`}
      >
        {isTrouble && <Icon name="look-again" />}
        {words}
      </span>
      {isTrouble && (
        <Button kind="quiet" icon="retry" onClick={onRetry}>
          Send again
        </Button>
      )}
      <LiveRegion text={isTrouble ? words : ''} quietMs={300} />
    </p>
  );
}
