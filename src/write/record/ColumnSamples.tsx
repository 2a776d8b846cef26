import type { RecordChoice } from '#shared/record/record-choice.ts';
import type { TableColumn } from './choice-columns.ts';
import { FACT_SEPARATOR } from '../../ui/fact-separator.ts';

interface Props {
  readonly columns: readonly TableColumn[];
  readonly choice: RecordChoice;
}

function roleOf(index: number, choice: RecordChoice): string {
  if (index === choice.timeColumn) return 'Time';
  if (index === choice.dateColumn) return 'Date';
  if (index === choice.temperatureColumn) return 'Temperature';
  return index === choice.secondColumn ? 'Second probe' : '';
}

/** The columns, one a line, each with its first cells and with what it is taken for. */
export function ColumnSamples({ columns, choice }: Props) {
  return (
    <table className="w-full text-small">
      <caption className="pb-1 text-left text-soot-2">Columns and their first cells</caption>
      <thead className="sr-only">
        <tr>
          <th scope="col">Column</th>
          <th scope="col">Taken for</th>
          <th scope="col">First cells</th>
        </tr>
      </thead>
      <tbody className="border-t border-soot">
        {columns.map(({ index, name, samples }) => {
          const role = roleOf(index, choice);
          return (
            <tr
              key={index}
              className={`border-b border-line align-baseline ${role ? '' : 'text-soot-2'}`}
            >
              <th scope="row" className="py-1.5 pr-3 text-left font-[550]">
                <span className="reading">{index + 1}</span> {name}
              </th>
              <td className={`py-1.5 pr-3 ${role ? 'font-[650]' : ''}`}>{role || 'Not used'}</td>
              <td className="py-1.5 wrap-anywhere">
                {samples
                  .filter((sample) => sample !== '')
                  .slice(0, 3)
                  .map((sample, at) => (
                    <span key={at}>
                      {at > 0 && <span aria-hidden="true">{FACT_SEPARATOR}</span>}
                      <span className="reading">{sample.slice(0, 24)}</span>
                    </span>
                  ))}
              </td>
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}
