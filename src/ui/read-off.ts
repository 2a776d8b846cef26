import { celsiusAt } from '#shared/heat/heat-stops.ts';
import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import { formatNumber } from '#shared/units/number.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';

/** "31.5 min, 712 °C": what a record shows at a minute; the minute alone outside it. */
export function readOff(
  points: readonly HeatPoint[],
  minute: number,
  unit: TemperatureUnit,
): string {
  const celsius = celsiusAt(points, minute);
  const time = `${formatNumber(minute, 1)}\u00a0min`;
  return celsius === null ? time : `${time}, ${formatTemperature(celsius, unit)}`;
}
