import type { ReactNode } from 'react';
import { useWidth } from './useWidth.ts';

export interface Column<Row> {
  readonly key: string;
  readonly heading: string;
  readonly cell: (row: Row) => ReactNode;
  /** Figures are set in the mono face and to the right. */
  readonly figures?: boolean;
}

interface Props<Row> {
  readonly caption: string;
  readonly captionHidden?: boolean;
  /** The first column names its row. */
  readonly columns: readonly Column<Row>[];
  readonly rows: readonly Row[];
  readonly rowKey: (row: Row) => string | number;
}

const NARROW_PX = 560;

/** A ruled table; where it has not the width, a list with a block of label and value for each row. */
export function DataTable<Row>(props: Props<Row>) {
  const [ref, width] = useWidth<HTMLDivElement>();
  return <div ref={ref}>{width < NARROW_PX ? <Blocks {...props} /> : <Table {...props} />}</div>;
}

function Table<Row>({ caption, captionHidden, columns, rows, rowKey }: Props<Row>) {
  return (
    <table className="w-full text-small">
      <caption className={captionHidden ? 'sr-only' : 'pb-2 text-left text-soot-2'}>
        {caption}
      </caption>
      <thead>
        <tr className="border-y border-t-2 border-soot">
          {columns.map((column) => (
            <th
              key={column.key}
              scope="col"
              className={`px-3 py-2 align-bottom font-[550] text-soot-2 first:pl-0 last:pr-0 ${column.figures ? 'text-right' : 'text-left'}`}
            >
              {column.heading}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={rowKey(row)} className="border-b border-line">
            {columns.map((column, index) => {
              const Cell = index === 0 ? 'th' : 'td';
              return (
                <Cell
                  key={column.key}
                  scope={index === 0 ? 'row' : undefined}
                  className={`px-3 py-2 align-baseline first:pl-0 last:pr-0 ${index === 0 ? 'font-[600]' : 'font-[400]'} ${column.figures ? 'text-right' : 'text-left'}`}
                >
                  {column.figures ? (
                    <span className="reading">{column.cell(row)}</span>
                  ) : (
                    column.cell(row)
                  )}
                </Cell>
              );
            })}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Blocks<Row>({ caption, captionHidden, columns, rows, rowKey }: Props<Row>) {
  return (
    <figure className="text-small">
      <figcaption className={captionHidden ? 'sr-only' : 'pb-2 text-soot-2'}>{caption}</figcaption>
      <ul className="border-t-2 border-soot">
        {rows.map((row) => (
          <li key={rowKey(row)} className="border-b border-line py-2">
            <dl>
              {columns.map((column, index) => (
                <div key={column.key} className="grid grid-cols-[2fr_3fr] gap-x-4 py-0.5">
                  <dt className="text-soot-2">{column.heading}</dt>
                  <dd className={index === 0 ? 'font-[600]' : ''}>
                    {column.figures ? (
                      <span className="reading">{column.cell(row)}</span>
                    ) : (
                      column.cell(row)
                    )}
                  </dd>
                </div>
              ))}
            </dl>
          </li>
        ))}
      </ul>
    </figure>
  );
}
