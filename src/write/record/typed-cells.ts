import { parseTime } from '#shared/record/parse-time.ts';
import { fromCelsius, toCelsius, type TemperatureUnit } from '#shared/units/temperature.ts';
import { readTypedNumber, writeTypedNumber, type TypedNumber } from '../../ui/typed-number.ts';

/** A record's minutes, as the note keeps them: the pen may start a day before the fire. */
const FIRST_MINUTE = -1440;
const LAST_MINUTE = 20_160;
/** More than any probe shows in any unit: a slip of the keyboard. */
const HOTTEST_CELSIUS = 10_000;

/** How a cell's text becomes what is kept, and back. */
export interface CellKind {
  readonly read: (text: string) => TypedNumber;
  readonly write: (value: number | null) => string;
}

/** Minutes ("12", "12,5") or hours and minutes ("0:12", "1:05:30"). */
export const minuteCell: CellKind = {
  read(text) {
    const tidy = text.trim();
    const minutes = tidy.includes(':') ? parseTime(tidy, 'h:mm:ss', '.') : null;
    const typed: TypedNumber = tidy.includes(':')
      ? minutes === null
        ? { kind: 'unreadable', because: 'Write minutes, or hours and minutes such as 1:05.' }
        : { kind: 'number', value: Math.round(minutes * 1e4) / 1e4 }
      : readTypedNumber(text);
    if (typed.kind === 'number' && !(typed.value >= FIRST_MINUTE && typed.value <= LAST_MINUTE)) {
      return { kind: 'unreadable', because: 'A record lasts at most two weeks.' };
    }
    return typed;
  },
  write: (value) => writeTypedNumber(value, 2),
};

/** Degrees in the member's unit, kept in °C. */
export function temperatureCell(unit: TemperatureUnit): CellKind {
  return {
    read(text) {
      const typed = readTypedNumber(text);
      if (typed.kind !== 'number') return typed;
      const celsius = toCelsius(typed.value, unit);
      return Math.abs(celsius) > HOTTEST_CELSIUS
        ? { kind: 'unreadable', because: 'No probe shows this.' }
        : { kind: 'number', value: celsius };
    },
    write: (value) => writeTypedNumber(value === null ? null : fromCelsius(value, unit), 1),
  };
}

/** A share of the flue, in per cent. */
export const percentCell: CellKind = {
  read(text) {
    const typed = readTypedNumber(text);
    return typed.kind === 'number' && !(typed.value >= 0 && typed.value <= 100)
      ? { kind: 'unreadable', because: '0 to 100 %.' }
      : typed;
  },
  write: (value) => writeTypedNumber(value, 1),
};
