import { useState, type ClipboardEvent, type KeyboardEvent } from 'react';
import type { CellKind } from './typed-cells.ts';

interface Props {
  /** "Minute, row 3". */
  readonly label: string;
  readonly kind: CellKind;
  readonly value: number | null;
  readonly onValue: (value: number | null) => void;
  readonly unit?: string;
  readonly invalid?: boolean;
  readonly disabled?: boolean;
  /** Finds the cell for the keyboard: "3:minute". */
  readonly place?: string;
  readonly onKeyDown?: (event: KeyboardEvent<HTMLInputElement>) => void;
  readonly onPaste?: (event: ClipboardEvent<HTMLInputElement>) => void;
}

/** One figure in a grid. What is typed is the typist's until the cell is left, or while unreadable. */
export function CellInput(props: Props) {
  const { kind, value } = props;
  const [typed, setTyped] = useState<string | null>(null);
  const [focused, setFocused] = useState(false);
  const read = kind.read(typed ?? '');
  const keepTyped = typed !== null && (focused || (read.kind === 'unreadable' && value === null));
  const unreadable = keepTyped && !focused && read.kind === 'unreadable' ? read.because : null;
  return (
    <span className="block min-w-0">
      <span className="field-corner inline-flex w-full items-baseline gap-1">
        <input
          className="reading w-full min-w-0 bg-transparent text-body outline-none"
          inputMode="text"
          autoComplete="off"
          aria-label={unreadable === null ? props.label : `${props.label}: ${unreadable}`}
          aria-invalid={unreadable !== null || props.invalid || undefined}
          data-place={props.place}
          disabled={props.disabled}
          value={keepTyped ? typed : kind.write(value)}
          onFocus={(event) => {
            setTyped(keepTyped ? typed : kind.write(value));
            setFocused(true);
            event.currentTarget.select();
          }}
          onChange={(event) => {
            setTyped(event.currentTarget.value);
            const now = kind.read(event.currentTarget.value);
            props.onValue(now.kind === 'number' ? now.value : null);
          }}
          onBlur={() => setFocused(false)}
          onKeyDown={props.onKeyDown}
          onPaste={props.onPaste}
        />
        {props.unit && <span className="shrink-0 text-small text-soot-2">{props.unit}</span>}
      </span>
      {unreadable !== null && (
        <span className="block pt-0.5 text-note text-caution">{unreadable}</span>
      )}
    </span>
  );
}
