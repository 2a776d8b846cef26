import { formatLength } from '../units/length.ts';
import { formatNumber } from '../units/number.ts';
import {
  formatDifference,
  formatRate,
  formatTemperature,
  fromCelsius,
  differenceCToF,
} from '../units/temperature.ts';
import type { Units } from '../units/units.ts';
import { CHANGES } from '../vocabulary/changes.ts';
import { FUELS } from '../vocabulary/kiln.ts';
import { CAUSES, TROUBLE_SHORT } from '../vocabulary/troubles.ts';
import { FORM_FAMILIES } from '../vocabulary/ware.ts';
import { coneTargetCelsius } from './cone-targets.ts';
import type { MinutesAsked, PartMeaning, TemperatureWindow } from './reading-types.ts';
import { CLAYS_ASKED, GLAZES_ASKED } from './reading-types.ts';

function temperatureLabel(window: TemperatureWindow, units: Units): string {
  const unit = units.temperature;
  const { tempC, toleranceC, tempMinC, tempMaxC } = window;
  if (tempC !== null && tempMinC !== null) {
    return `from ${formatTemperature(tempC, unit)} down to ${formatTemperature(tempMinC, unit)}`;
  }
  if (tempC !== null) {
    const tolerance = toleranceC ?? 0;
    const half = formatNumber(unit === 'F' ? differenceCToF(tolerance) : tolerance);
    return `near ${formatTemperature(tempC, unit)} ± ${half}`;
  }
  if (tempMinC !== null && tempMaxC !== null) {
    const from = formatNumber(fromCelsius(tempMinC, unit));
    return `${from} to ${formatTemperature(tempMaxC, unit)}`;
  }
  if (tempMinC !== null) return `from ${formatTemperature(tempMinC, unit)} up`;
  return tempMaxC === null ? 'no temperature' : `up to ${formatTemperature(tempMaxC, unit)}`;
}

function minutesLabel({ minutes, op, of }: MinutesAsked): string {
  const length = `${formatNumber(minutes)} min`;
  const said = op === '>' ? `over ${length}` : op === '<' ? `under ${length}` : length;
  return of === 'hold' ? `hold of ${said}` : said;
}

/** A part in words ready to show, in a member's units: "near 700 °C ± 20", "plates", "not stall". */
export function labelOf(part: PartMeaning, units: Units): string {
  switch (part.kind) {
    case 'trouble':
      return TROUBLE_SHORT[part.value];
    case 'not-trouble':
      return `not ${TROUBLE_SHORT[part.value]}`;
    case 'temperature':
      return temperatureLabel(part.value, units);
    case 'cone': {
      const target = coneTargetCelsius(part.value);
      return target === null
        ? `cone ${part.value}`
        : `cone ${part.value} (about ${formatTemperature(target, units.temperature)})`;
    }
    case 'minutes':
      return minutesLabel(part.value);
    case 'rate':
      return formatRate(part.value, units.temperature);
    case 'difference':
      return `${formatDifference(part.value, units.temperature)} apart`;
    case 'form':
      return FORM_FAMILIES[part.value].toLowerCase();
    case 'size':
      return `about ${formatLength(part.value * 10, units)}`;
    case 'glaze':
      return GLAZES_ASKED[part.value];
    case 'cause':
      return CAUSES[part.value].toLowerCase();
    case 'change':
      return CHANGES[part.value].toLowerCase();
    case 'fuel':
      return part.value === 'mixed-lpg' ? FUELS[part.value] : FUELS[part.value].toLowerCase();
    case 'clay':
      return CLAYS_ASKED[part.value];
  }
}
