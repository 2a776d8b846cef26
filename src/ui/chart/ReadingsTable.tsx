import { memo } from 'react';
import { formatNumber } from '#shared/units/number.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';
import { Disclosure } from '../Disclosure.tsx';
import type { MinuteWindow } from './minute-window.ts';
import { tableRows, type TableSources } from './table-rows.ts';
import { windowWords } from './window-words.ts';

interface Props {
  readonly sources: TableSources;
  readonly window: MinuteWindow;
  readonly unit: TemperatureUnit;
  /** All readings of the record. */
  readonly count: number;
  readonly overlayLabel: string | null;
  readonly csvHref: string | null;
}

/** What the chart shows, as rows: every reading of a short record, else even minutes, saying so. */
export const ReadingsTable = memo(function ReadingsTable(props: Props) {
  const { sources, window, unit, count, overlayLabel, csvHref } = props;
  const { rows, stepMinutes } = tableRows(sources, window);
  const shown = (celsius: number | null) =>
    celsius === null ? '–' : formatTemperature(celsius, unit);
  const decimals = stepMinutes === null || stepMinutes < 0.5 ? 2 : 1;
  const columns = [
    ...(sources.secondProbe ? ['Second probe'] : []),
    ...(sources.overlay && overlayLabel !== null ? [overlayLabel] : []),
  ];
  return (
    <Disclosure summary="The readings as a table">
      <div className="overflow-x-auto">
        <table
          className={`w-full text-small ${columns.length === 0 ? 'max-w-80' : 'max-w-measure'}`}
        >
          <caption className="pb-2 text-left text-note text-soot-2">
            {stepMinutes === null
              ? `All ${rows.length} readings from ${windowWords(window)}.`
              : `Every ${formatNumber(stepMinutes, 2)} min from ${windowWords(window)}, and the highest reading between; the record has ${formatNumber(count)} readings.`}
          </caption>
          <thead>
            <tr className="border-b border-soot text-left align-bottom">
              <th scope="col" className="py-1 font-[550]">
                Minute
              </th>
              {['Temperature', ...columns].map((words) => (
                <th key={words} scope="col" className="py-1 pl-4 text-right font-[550]">
                  {words}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map((row, index) => (
              <tr key={index} className="border-b border-line">
                <th scope="row" className="reading py-1 text-left font-[400]">
                  {formatNumber(row.minute, decimals)}
                  {row.highest && <span className="font-sans text-soot-2">{' highest'}</span>}
                </th>
                <td className="reading py-1 pl-4 text-right">{shown(row.celsius)}</td>
                {sources.secondProbe && (
                  <td className="reading py-1 pl-4 text-right">{shown(row.second)}</td>
                )}
                {sources.overlay && overlayLabel !== null && (
                  <td className="reading py-1 pl-4 text-right">{shown(row.overlay)}</td>
                )}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {csvHref !== null && (
        <p className="pt-2">
          <a className="link" href={csvHref}>
            All {formatNumber(count)} readings as CSV
          </a>{' '}
          <span className="text-soot-2">(minutes and °C)</span>
        </p>
      )}
    </Disclosure>
  );
});
