import { FAULT_NUMBERS } from './record-words.ts';

/** A leap to a number that faults are written as, degrees of any unit: more than a kiln goes in one step. */
const LEAP = 60;
/** From zeros at a record's very beginning it goes at once to the air's temperature, which is less far. */
const FIRST_LEAP = 5;
/** Larger than this no cell of a temperature is, whatever its unit. */
const MOST = 1e5;

/**
 * Which of a probe's numbers are what a logger writes when nothing is connected: known numbers, where
 * the readings leap to them, or where nothing else is written half of the time. A number reached step
 * by step is a reading, whatever it is.
 * @returns for every value whether it is such a fault; null is none
 */
export function faultsIn(values: readonly (number | null)[]): Uint8Array {
  const faults = new Uint8Array(values.length);
  const held = mostlyHeld(values);
  const next = nextSane(values);
  let before: number | null = null;
  values.forEach((value, i) => {
    if (value === null) return;
    if (Math.abs(value) > MOST || held.has(value)) {
      faults[i] = 1;
      return;
    }
    if (FAULT_NUMBERS.has(value)) {
      const beside: number = before ?? next[i] ?? NaN;
      const isWaiting = value === 0 && (values[i - 1] === 0 || values[i + 1] === 0);
      const least = before === null && isWaiting ? FIRST_LEAP : LEAP;
      if (Math.abs(value - beside) > least) {
        faults[i] = 1;
        return;
      }
    }
    before = value;
  });
  return faults;
}

/** Numbers at which no kiln is held, that are half of all. */
function mostlyHeld(values: readonly (number | null)[]): ReadonlySet<number> {
  const counts = new Map<number, number>();
  let all = 0;
  for (const value of values) {
    if (value === null) continue;
    all += 1;
    const isHeld = FAULT_NUMBERS.has(value) && (value === 0 || value <= -99 || value >= 1300);
    if (isHeld) counts.set(value, (counts.get(value) ?? 0) + 1);
  }
  const held = new Set<number>();
  for (const [value, count] of counts) if (count >= 3 && count >= 0.5 * all) held.add(value);
  return held;
}

/** For every place the next number behind it that is no known fault; NaN for none. */
function nextSane(values: readonly (number | null)[]): Float64Array {
  const next = new Float64Array(values.length);
  let sane = NaN;
  for (let i = values.length - 1; i >= 0; i -= 1) {
    next[i] = sane;
    const value = values[i];
    if (value != null && !FAULT_NUMBERS.has(value)) sane = value;
  }
  return next;
}
