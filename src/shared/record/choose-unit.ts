import type { TableColumn } from './describe-columns.ts';
import { columnWords } from './describe-columns.ts';
import type { TableRow } from './detect-layout.ts';
import { guessUnit, unitOfAir } from './guess-unit.ts';
import type { TemperatureUnit } from './parse-number.ts';
import { temperatureUnit } from './record-words.ts';

export interface ChosenUnit {
  readonly unit: TemperatureUnit;
  readonly assumed: readonly string[];
}

const WORDS: Readonly<Record<TemperatureUnit, string>> = { C: '°C', F: '°F', K: 'kelvin' };
/** Above this no kiln of ours is in °C. */
const HOTTEST_CELSIUS = 1400;
/** Below this no kiln or shed is in kelvin: a "K" then is the thermocouple's type. */
const COLDEST_KELVIN = 200;
/** So much likelier than the next unit and it needs no second sentence. */
const SURE = 20;

/**
 * The unit of a probe's numbers: the cells' own, the name's, that of the other temperatures, what the
 * lines above the table say; failing these by the air's temperature beside it, or by range and the
 * firing's target, where one is known.
 */
export function chooseUnit(
  probe: TableColumn,
  columns: readonly TableColumn[],
  preamble: readonly TableRow[],
  targetCelsius: number | null = null,
): ChosenUnit {
  const own = probe.cellUnit ?? namedUnit(probe);
  const name = columnWords(probe);
  if (own !== null) {
    const isTooHot = own === 'C' && probe.high > HOTTEST_CELSIUS;
    return {
      unit: own,
      assumed: isTooHot
        ? [
            `${name} says °C, but ${probe.high} is above what a kiln shows in °C; look whether it is °F.`,
          ]
        : [],
    };
  }
  const told = columns.find((column) => column.index > probe.index && unitOfCells(column) !== null);
  const toldUnit = told === undefined ? null : unitOfCells(told);
  if (told !== undefined && toldUnit !== null) {
    return {
      unit: toldUnit,
      assumed: [`${name} is in ${WORDS[toldUnit]}, as ${columnWords(told)} says.`],
    };
  }
  const isType = probe.name.temperatureUnit === 'K' && probe.low < COLDEST_KELVIN;
  const assumed = isType
    ? [
        `The K in the name of ${name} is taken as the type of thermocouple: ${probe.low} is no kiln in kelvin.`,
      ]
    : [];
  const take = (unit: TemperatureUnit, because: string): ChosenUnit => ({
    unit,
    assumed: [...assumed, `${name} names no unit; it is taken as ${WORDS[unit]}, ${because}.`],
  });
  for (const other of columns) {
    const unit = other.index === probe.index ? null : (other.cellUnit ?? namedUnit(other));
    if (unit !== null) return take(unit, `as ${columnWords(other)} is`);
  }
  const above = unitAbove(preamble, probe);
  if (above !== null) return take(above.unit, `as line ${above.line} says`);
  const { connected, high } = probe;
  const start = Math.min(connected[0] ?? 0, probe.low);
  const air = airUnit(columns);
  if (air !== null)
    return take(air.unit, `because ${columnWords(air.column)} is the air's temperature in it`);
  if (high - start < 60 && connected.length > 0) {
    const unit = unitOfAir((high + start) / 2) ?? 'C';
    return take(
      unit,
      `because its numbers, ${start} to ${high}, are near the air's temperature in it`,
    );
  }
  const guess = guessUnit(start, probe.low, high, targetCelsius);
  const doubt = guess.odds < SURE ? ` It could also be ${WORDS[guess.next]}: please look.` : '';
  const taken = take(
    guess.unit,
    `because its numbers, ${start} to ${high}, are those of a kiln in ${WORDS[guess.unit]}`,
  );
  const words = [...taken.assumed];
  const last = words.pop() ?? '';
  return { unit: guess.unit, assumed: [...words, `${last}${doubt}`] };
}

/** The unit that is all a column holds, one and the same: "°C" on every line. */
function unitOfCells(column: TableColumn): TemperatureUnit | null {
  if (/type|typ\b/i.test(column.name.text)) return null;
  const filled = column.cells.filter((cell) => cell !== '');
  const unit = temperatureUnit(filled[0] ?? '');
  return unit !== null && filled.every((cell) => temperatureUnit(cell) === unit) ? unit : null;
}

/** The unit a column's name tells, if its numbers allow it. */
function namedUnit(column: TableColumn): TemperatureUnit | null {
  const unit = column.name.temperatureUnit;
  if (unit === null) return null;
  if (unit === 'K' && column.low < COLDEST_KELVIN && column.connected.length > 0) return null;
  return column.name.isUnitALetter && unit === 'C' && column.high > HOTTEST_CELSIUS ? null : unit;
}

/**
 * The one unit that the lines above a table name, alone in a cell or behind "unit". A bare K is kelvin
 * only there, and only if the numbers allow it: else it is the thermocouple's type.
 */
function unitAbove(
  preamble: readonly TableRow[],
  probe: TableColumn,
): { unit: TemperatureUnit; line: number } | null {
  const mayBeKelvin = probe.connected.length > 0 && probe.low >= COLDEST_KELVIN;
  let found: { unit: TemperatureUnit; line: number } | null = null;
  for (const { line, cells } of preamble) {
    const text = cells.join(' ').toLowerCase();
    const isAboutUnits = /unit|scale|einheit|unité|temp/.test(text);
    const saysUnit = /unit|scale|einheit|unité/.test(text) && !/typ/.test(text);
    for (const word of text.split(/[\s,;:=()[\]"'#]+/)) {
      const unit = word.length > 1 || isAboutUnits ? temperatureUnit(word) : null;
      if (unit === null) continue;
      if (unit === 'K' && word.length < 4 && !(saysUnit && mayBeKelvin)) continue;
      if (found !== null && found.unit !== unit) return null;
      found = { unit, line };
    }
  }
  return found;
}

/** A column named after the air or the cold junction, whose numbers are that in one unit only. */
function airUnit(
  columns: readonly TableColumn[],
): { unit: TemperatureUnit; column: TableColumn } | null {
  for (const column of columns) {
    const { connected, name } = column;
    if (!name.meanings.has('reference') || name.hasOtherUnit || connected.length === 0) continue;
    if (column.high - column.low > 60) continue;
    const unit = unitOfAir((column.low + column.high) / 2);
    if (unit !== null) return { unit, column };
  }
  return null;
}
