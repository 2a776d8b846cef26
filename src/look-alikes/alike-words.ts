import { ALIKE_WITHIN_CELSIUS } from '#shared/api/look-alikes.ts';
import { formatNumber } from '#shared/units/number.ts';
import { formatDifference } from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';

/** "None of the 214 published firings with a record comes within 80 °C of it, minute by minute." */
export function noneAlikeWords(compared: number, units: Units): string {
  if (compared === 0) return 'No published firing with a record is there yet to compare it with.';
  const within = formatDifference(ALIKE_WITHIN_CELSIUS, units.temperature);
  return compared === 1
    ? `The one published firing with a record does not come within ${within} of it, minute by minute.`
    : `None of the ${formatNumber(compared)} published firings with a record comes within ${within} of it, minute by minute.`;
}
