import { celsiusAt } from '#shared/heat/heat-stops.ts';
import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import { formatNumber } from '#shared/units/number.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';
import { Disclosure } from './Disclosure.tsx';

const MOST_ROWS = 120;
const STEPS = [1, 2, 5, 10, 15, 30, 60, 120, 240];

interface Props {
  readonly points: readonly HeatPoint[];
  readonly unit: TemperatureUnit;
}

/** A record as rows: every reading of a short one, else the curve at even minutes, saying so. */
export function ReadingsTable({ points, unit }: Props) {
  const [first, last] = [points[0], points[points.length - 1]];
  if (!first || !last) return null;
  const all = points.length <= MOST_ROWS;
  const span = last[0] - first[0];
  const step = STEPS.find((minutes) => span / minutes <= MOST_ROWS) ?? span / MOST_ROWS;
  const rows = all ? points : evenRows(points, first[0], last[0], step);
  return (
    <Disclosure summary="The readings as a table">
      <div className="max-h-96 overflow-y-auto">
        <table className="w-full max-w-80 text-small">
          <caption className="pb-2 text-left text-note text-soot-2">
            {all
              ? `All ${points.length} readings.`
              : `Every ${formatNumber(step, 1)} min of ${points.length} readings.`}
          </caption>
          <thead>
            <tr className="border-b border-soot text-left">
              <th scope="col" className="py-1 font-[550]">
                Minute
              </th>
              <th scope="col" className="py-1 text-right font-[550]">
                Temperature
              </th>
            </tr>
          </thead>
          <tbody>
            {rows.map(([minute, celsius], index) => (
              <tr key={index} className="border-b border-line">
                <td className="reading py-1">{formatNumber(minute, 1)}</td>
                <td className="reading py-1 text-right">{formatTemperature(celsius, unit)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </Disclosure>
  );
}

function evenRows(points: readonly HeatPoint[], from: number, to: number, step: number) {
  const rows: HeatPoint[] = [];
  for (let minute = from; minute < to; minute += step) {
    rows.push([minute, celsiusAt(points, minute) ?? 0]);
  }
  return [...rows, ...points.slice(-1)];
}
