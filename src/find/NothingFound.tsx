import { Link } from 'react-router-dom';
import type { FindAnswer } from '#shared/api/search.ts';
import { paths } from '#shared/paths.ts';
import { Button } from '../ui/Button.tsx';
import { EmptyState } from '../ui/EmptyState.tsx';
import { tickedCount, type FindAddress } from './find-address.ts';

interface Props {
  readonly address: FindAddress;
  /** How many parts the question was read as and asks for. */
  readonly partCount: number;
  readonly loosen: FindAnswer['loosen'];
  readonly onLeaveOut: (key: string) => void;
  readonly onClearFilters: () => void;
}

/** No note fits: which part to leave out, and how many notes that would find. */
export function NothingFound({ address, partCount, loosen, onLeaveOut, onClearFilters }: Props) {
  const ticked = tickedCount(address);
  return (
    <EmptyState
      title={
        ticked === 0 && partCount === 0 ? 'No note has these words' : 'No note fits all of this'
      }
      action={
        <>
          {ticked > 0 && (
            <Button onClick={onClearFilters}>
              Take {ticked === 1 ? 'the filter' : `all ${String(ticked)} filters`} off
            </Button>
          )}
          {loosen.map(({ key, label, count }) => (
            <Button key={key} onClick={() => onLeaveOut(key)}>
              Leave out “{label}”: {count} {count === 1 ? 'note' : 'notes'}
            </Button>
          ))}
        </>
      }
    >
      {loosen.length > 0 || ticked > 0
        ? 'Loosen one part of it, or look through'
        : partCount > 1
          ? 'Leave more than one part of it out, say it otherwise, or look through'
          : 'Say it in other words, or with fewer; or look through'}{' '}
      <Link to={paths.newest} className="link">
        all notes, newest first
      </Link>
      . Or, with a temperature record,{' '}
      <Link to={paths.lookAlikes} className="link">
        find firings that climbed like it
      </Link>
      .
    </EmptyState>
  );
}
