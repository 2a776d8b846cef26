import { formatDuration } from '../../units/duration.ts';
import { formatDifference, formatTemperature } from '../../units/temperature.ts';
import type { FiringReading } from '../../firing/types.ts';
import { GAS_FUELS } from '../../vocabulary/kiln.ts';
import { TROUBLES } from '../../vocabulary/troubles.ts';
import type { MeasuredTrouble } from '../../vocabulary/troubles.ts';
import { lookAgain } from './check.ts';
import type { Check, CheckContext } from './check.ts';
import { disputedTroubles } from './dispute-checks.ts';

/** What the record shows of a trouble, in words with its numbers; null when it does not. */
function shown(trouble: MeasuredTrouble, reading: FiringReading, unit: 'C' | 'F'): string | null {
  switch (trouble) {
    case 'stall': {
      const stalls = reading.levels.filter(({ kind }) => kind === 'stall');
      const longest = stalls.sort((a, b) => b.minutes - a.minutes)[0];
      return longest
        ? `a level stretch at ${formatTemperature(longest.levelCelsius, unit)} for ${formatDuration(longest.minutes)}`
        : null;
    }
    case 'sag': {
      const deepest = [...reading.sags].sort((a, b) => b.dropCelsius - a.dropCelsius)[0];
      return deepest
        ? `a fall of ${formatDifference(deepest.dropCelsius, unit)} from ${formatTemperature(deepest.topCelsius, unit)}`
        : null;
    }
    case 'slow-climb':
      return reading.slowClimbMinutes === null
        ? null
        : `a climb of ${formatDuration(reading.slowClimbMinutes)}`;
    case 'overshoot':
      return reading.overshootCelsius === null
        ? null
        : `a peak ${formatDifference(reading.overshootCelsius, unit)} over the target`;
    case 'uneven-heat':
      return reading.unevenHeat === null
        ? null
        : `two probes ${formatDifference(reading.unevenHeat.largestCelsius, unit)} apart`;
  }
}

/** Whether this record could show the trouble if it were there: else its absence says nothing. */
function couldShow(trouble: MeasuredTrouble, { fields, kiln, reading }: CheckContext): boolean {
  if (!reading) return false;
  switch (trouble) {
    case 'stall':
    case 'sag':
      return true;
    case 'slow-climb':
      return (
        reading.timeToTemperatureMinutes !== null &&
        fields.when.startClass === 'cold' &&
        kiln !== null &&
        GAS_FUELS.includes(kiln.fuel)
      );
    case 'overshoot':
      return fields.plan.targetBy === 'temperature' && fields.plan.targetCelsius !== null;
    case 'uneven-heat':
      // One probe cannot show it, and a reading does not say whether there were two.
      return false;
  }
}

const MEASURED: readonly MeasuredTrouble[] = [
  'stall',
  'sag',
  'slow-climb',
  'overshoot',
  'uneven-heat',
];

/** Troubles the record shows and the author did not name, and the reverse. */
export function troubleChecks(context: CheckContext): Check[] {
  const { fields, reading } = context;
  if (!reading) return [];
  const named = fields.result.troubles;
  const disputed = disputedTroubles(context);
  const checks: Check[] = [];
  for (const trouble of MEASURED) {
    const words = TROUBLES[trouble].toLowerCase();
    const evidence = shown(trouble, reading, fields.plan.typedIn);
    if (evidence !== null && !named.includes(trouble) && !disputed.includes(trouble)) {
      checks.push(
        lookAgain(
          `${trouble}-not-named`,
          '/result/troubles',
          `The record shows ${evidence}, and you do not name “${words}” among the troubles. Add it, or say why it was none.`,
          {
            pointer: '/result/troubles',
            value: [...named, trouble],
            label: `Add “${words}”`,
          },
        ),
      );
    }
    if (evidence === null && named.includes(trouble) && couldShow(trouble, context)) {
      checks.push(
        lookAgain(
          `${trouble}-not-shown`,
          '/result/troubles',
          `You name “${words}”, and the record does not show it. Take it out, or say what you saw.`,
          {
            pointer: '/result/troubles',
            value: named.filter((other) => other !== trouble),
            label: `Take out “${words}”`,
          },
        ),
      );
    }
  }
  return checks;
}
