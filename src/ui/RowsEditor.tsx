import { useRef, useState } from 'react';
import type { ReactNode } from 'react';
import { Button } from './Button.tsx';
import { IconButton } from './IconButton.tsx';
import { LiveRegion } from './LiveRegion.tsx';
import { moveRow, removeRow } from './row-changes.ts';

interface Props<Row extends { readonly id: string }> {
  readonly rows: readonly Row[];
  readonly onRows: (rows: readonly Row[]) => void;
  /** A blank row with an id of its own. */
  readonly newRow: () => Row;
  /** A copy of a row under an id of its own; leave out where copying makes no sense. */
  readonly copyOf?: (row: Row) => Row;
  /** "Piece 2": how a row is called by its buttons and by screen readers. */
  readonly nameOf: (row: Row, index: number) => string;
  readonly renderRow: (row: Row, change: (row: Row) => void, index: number) => ReactNode;
  readonly addWords: string;
  readonly most?: number;
  readonly least?: number;
}

/** A list of like things: add, copy the one above, move, remove; everything by button. */
export function RowsEditor<Row extends { readonly id: string }>(props: Props<Row>) {
  const { rows, onRows, nameOf, most = Infinity, least = 0 } = props;
  const [spoken, setSpoken] = useState('');
  const list = useRef<HTMLOListElement>(null);
  const addButton = useRef<HTMLButtonElement>(null);
  const last = rows[rows.length - 1];

  const put = (next: readonly Row[], words: string) => {
    onRows(next);
    setSpoken(words);
  };
  const add = (row: Row, words: string) => {
    put([...rows, row], words);
    // The new row is there after the next paint; its first field takes the focus.
    requestAnimationFrame(() => {
      list.current?.lastElementChild
        ?.querySelector<HTMLElement>('input, select, textarea')
        ?.focus();
    });
  };

  return (
    <div className="space-y-3">
      <ol ref={list} className="border-t border-soot-2">
        {rows.map((row, index) => {
          const name = nameOf(row, index);
          return (
            <li key={row.id} className="border-b border-soot-2 py-3">
              <div role="group" aria-label={name}>
                <div className="flex items-center justify-between gap-3">
                  <p className="text-small font-[650]">{name}</p>
                  <span className="flex">
                    <IconButton
                      icon="up"
                      label={`Move ${name} up`}
                      disabled={index === 0}
                      onClick={() => put(moveRow(rows, index, -1), `${name} moved up`)}
                    />
                    <IconButton
                      icon="down"
                      label={`Move ${name} down`}
                      disabled={index === rows.length - 1}
                      onClick={() => put(moveRow(rows, index, 1), `${name} moved down`)}
                    />
                    <IconButton
                      icon="remove"
                      label={`Remove ${name}`}
                      disabled={rows.length <= least}
                      onClick={() => {
                        put(removeRow(rows, index), `${name} removed`);
                        addButton.current?.focus();
                      }}
                    />
                  </span>
                </div>
                <div className="@container">
                  {props.renderRow(
                    row,
                    (next) => onRows(rows.map((one) => (one.id === row.id ? next : one))),
                    index,
                  )}
                </div>
              </div>
            </li>
          );
        })}
      </ol>
      <div className="flex flex-wrap gap-3">
        <Button
          ref={addButton}
          icon="add"
          disabled={rows.length >= most}
          onClick={() => add(props.newRow(), 'Row added')}
        >
          {props.addWords}
        </Button>
        {props.copyOf && last && (
          <Button
            icon="copy"
            disabled={rows.length >= most}
            onClick={() => props.copyOf && add(props.copyOf(last), 'Row copied')}
          >
            As the row above
          </Button>
        )}
      </div>
      <LiveRegion text={spoken} quietMs={300} />
    </div>
  );
}
