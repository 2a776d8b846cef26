import { cToF, formatTemperature, fToC } from '../../units/temperature.ts';
import { formatNumber } from '../../units/number.ts';
import { NO_BREAK_SPACE } from '../../units/units.ts';
import { labelOf } from '../field-labels.ts';
import { outOfRange } from '../ranges.ts';
import type { OutOfRange } from '../ranges.ts';
import { lookAgain, mustMend } from './check.ts';
import type { Check, CheckContext, Offer } from './check.ts';

/** No pot of this trade is fired above 1150 °C: a higher number was meant as °F. */
export const HOTTEST_CELSIUS = 1150;
/** A target or peak under 1100 °F (593 °C), typed as °F, was probably meant as °C. */
export const COOLEST_FAHRENHEIT = 1100;
/** The lowest target or peak asked for. */
const LOWEST_CELSIUS = 400;

const isFired = (celsius: number): boolean =>
  celsius >= LOWEST_CELSIUS && celsius <= HOTTEST_CELSIUS;

/**
 * A target or peak typed in the other unit: over 1150 typed as °C, or under 1100 typed as °F, with
 * the other reading of the same digits offered when it is a temperature of this trade.
 */
function otherUnit(pointer: string, celsius: number, typedIn: 'C' | 'F'): Check | null {
  const label = labelOf(pointer);
  if (typedIn === 'C') {
    if (celsius <= HOTTEST_CELSIUS) return null;
    const meant = Math.round(fToC(celsius));
    const said = `${formatNumber(celsius)}${NO_BREAK_SPACE}°F is ${formatTemperature(meant, 'C')}`;
    const text = `${label}: ${formatTemperature(celsius, 'C')} is hotter than this trade fires (up to ${formatTemperature(HOTTEST_CELSIUS, 'C')}).`;
    const offer: Offer = { pointer, value: meant, label: said };
    return isFired(meant)
      ? mustMend('fahrenheit-as-celsius', pointer, `${text} Was it °F? ${said}.`, offer)
      : mustMend('fahrenheit-as-celsius', pointer, `${text} Correct the number.`);
  }
  const typed = Math.round(cToF(celsius));
  if (typed >= COOLEST_FAHRENHEIT) return null;
  const text = `${label}: ${formatTemperature(celsius, 'F')} is only ${formatTemperature(celsius, 'C')}, before any glaze melts.`;
  const offer: Offer = {
    pointer,
    value: typed,
    label: `${formatNumber(typed)}${NO_BREAK_SPACE}°C is ${formatTemperature(typed, 'F')}`,
  };
  return isFired(typed)
    ? mustMend('celsius-as-fahrenheit', pointer, `${text} Was it °C? ${offer.label}.`, offer)
    : mustMend('celsius-as-fahrenheit', pointer, `${text} Correct the number.`);
}

function asked({ pointer, value, range, unit }: OutOfRange, typedIn: 'C' | 'F'): string {
  const [low, high] = range;
  const label = labelOf(pointer);
  const shown = (number: number, withUnit: boolean): string => {
    if (unit === '°C') return formatTemperature(number, typedIn);
    const gap = unit === '' || unit === '°' ? '' : NO_BREAK_SPACE;
    return withUnit ? `${formatNumber(number, 2)}${gap}${unit}` : formatNumber(number, 2);
  };
  return `${label}: ${shown(value, true)} lies outside ${shown(low, false)} to ${shown(high, true)}. Correct it, or leave it blank if you do not know it.`;
}

/** Numbers outside their declared ranges, and temperatures typed in the other unit. */
export function rangeChecks({ fields }: CheckContext): Check[] {
  const { typedIn } = fields.plan;
  const checks: Check[] = [];
  const settled = new Set<string>();
  const fired: [string, number | null][] = [
    ['/plan/targetCelsius', fields.plan.targetCelsius],
    ['/plan/peakCelsius', fields.plan.peakCelsius],
    ...fields.pieces.map((piece, row): [string, number | null] => [
      `/pieces/${String(row)}/targetCelsius`,
      piece.targetCelsius,
    ]),
  ];
  for (const [pointer, celsius] of fired) {
    const check = celsius === null ? null : otherUnit(pointer, celsius, typedIn);
    if (check === null) continue;
    checks.push(check);
    settled.add(pointer);
  }
  for (const found of outOfRange(fields)) {
    if (settled.has(found.pointer)) continue;
    checks.push(mustMend('out-of-range', found.pointer, asked(found, typedIn)));
  }
  const { startClass, startCelsius } = fields.when;
  if (
    startCelsius !== null &&
    startClass !== null &&
    startCelsius >= 100 !== (startClass === 'hot')
  ) {
    checks.push(
      lookAgain(
        'start-class-disagrees',
        '/when/startClass',
        `The kiln is said to have been ${startClass} at the start, and at ${formatTemperature(startCelsius, typedIn)}. Below ${formatTemperature(100, typedIn)} is cold. Which is right?`,
        {
          pointer: '/when/startClass',
          value: startCelsius >= 100 ? 'hot' : 'cold',
          label: startCelsius >= 100 ? 'It was hot' : 'It was cold',
        },
      ),
    );
  }
  return checks;
}
