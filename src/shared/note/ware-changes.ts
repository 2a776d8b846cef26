import { formatNumber } from '../units/number.ts';
import { NO_BREAK_SPACE } from '../units/units.ts';
import { FORMS, GLAZE_FAMILIES } from '../vocabulary/ware.ts';
import { BISQUE_CELSIUS, WALL_MM } from './change-thresholds.ts';
import {
  compareNumbers,
  distinct,
  haveNothingInCommon,
  insteadOf,
  listed,
  meanOf,
} from './compare-fields.ts';
import type { Piece } from './pieces.ts';
import type { ProposedChange } from './proposed-changes.ts';

/**
 * A cone's place among cones: 022 is the coolest, then 021 … 01, 1, 2 …. Null when it is none.
 */
export function coneOrder(cone: string): number | null {
  const match = /^(?:cone|c\/?|\^)?\s*(0?)(\d{1,2})$/i.exec(cone.trim());
  if (!match) return null;
  const number = Number(match[2]);
  if (number === 0) return null;
  return match[1] === '0' ? -number : number - 1;
}

function bisqueChanges(before: readonly Piece[], now: readonly Piece[]): ProposedChange[] {
  const directions = { up: 'bisque-higher', down: 'bisque-lower' } as const;
  const celsius = (pieces: readonly Piece[]) => meanOf(pieces.map((piece) => piece.bisqueCelsius));
  const byDegrees = compareNumbers(
    celsius(before),
    celsius(now),
    BISQUE_CELSIUS,
    directions,
    (a, b) => `bisque at ${insteadOf(`${NO_BREAK_SPACE}°C`)(Math.round(a), Math.round(b))}`,
  );
  if (byDegrees.length > 0) return byDegrees;
  const cones = [before, now].map((pieces) => distinct(pieces.map((piece) => piece.bisqueCone)));
  const [coneBefore, coneNow] = cones.map((each) => (each.length === 1 ? each[0] : undefined));
  if (coneBefore === undefined || coneNow === undefined) return [];
  return compareNumbers(
    coneOrder(coneBefore),
    coneOrder(coneNow),
    1,
    directions,
    () => `bisque to cone ${coneNow.trim()} instead of ${coneBefore.trim()}`,
  );
}

/** Walls are compared within one form, which is the only fair comparison. */
function wallChanges(before: readonly Piece[], now: readonly Piece[]): ProposedChange[] {
  for (const form of distinct(now.map((piece) => piece.form))) {
    const walls = [before, now].map((pieces) =>
      meanOf(pieces.filter((piece) => piece.form === form).map((piece) => piece.wallMm)),
    );
    const found = compareNumbers(
      walls[0] ?? null,
      walls[1] ?? null,
      WALL_MM,
      { up: 'wall-thickness', down: 'wall-thickness' },
      (a, b) =>
        `${FORMS[form].toLowerCase()} walls of ${formatNumber(a, 1)} instead of ${formatNumber(b, 1)}${NO_BREAK_SPACE}mm`,
    );
    if (found.length > 0) return found;
  }
  return [];
}

function preparationChanges(before: readonly Piece[], now: readonly Piece[]): ProposedChange[] {
  const found: ProposedChange[] = [];
  const is = <Key extends keyof Piece>(pieces: readonly Piece[], key: Key, value: Piece[Key]) =>
    pieces.some((piece) => piece[key] === value);
  if (
    is(before, 'dampness', 'damp') &&
    is(now, 'dampness', 'dry') &&
    !is(now, 'dampness', 'damp')
  ) {
    found.push({ change: 'ware-dried', text: 'all the ware dry instead of some damp' });
  }
  const preheated = (pieces: readonly Piece[]) =>
    is(pieces, 'preheating', 'on-the-lid') || is(pieces, 'preheating', 'at-the-flue');
  if (is(before, 'preheating', 'cold') && !preheated(before) && preheated(now)) {
    found.push({ change: 'ware-preheated', text: 'ware preheated instead of put in cold' });
  }
  const lifted = is(now, 'lies', 'on-points') || is(now, 'lies', 'on-edge');
  if (is(before, 'lies', 'flat') && lifted && !is(now, 'lies', 'flat')) {
    const how = is(now, 'lies', 'on-points') ? 'on points' : 'on edge';
    found.push({ change: 'ware-off-the-shelf', text: `ware ${how} instead of flat on the shelf` });
  }
  return found;
}

/** What other ware proposes. Only what the two firings have nothing in common of counts as other. */
export function wareChanges(before: readonly Piece[], now: readonly Piece[]): ProposedChange[] {
  const found: ProposedChange[] = [];
  const other = (
    change: 'form' | 'clay' | 'glaze',
    wordsBefore: readonly string[],
    wordsNow: readonly string[],
  ): void => {
    if (!haveNothingInCommon(wordsBefore, wordsNow)) return;
    found.push({ change, text: `${listed(wordsNow)} instead of ${listed(wordsBefore)}` });
  };
  const formsOf = (pieces: readonly Piece[]) =>
    distinct(pieces.map(({ form }) => form)).map((form) => FORMS[form].toLowerCase());
  const glazesOf = (pieces: readonly Piece[]) =>
    distinct(pieces.map((piece) => piece.glazeName.trim()));
  const familiesOf = (pieces: readonly Piece[]) =>
    distinct(pieces.map(({ glazeFamily }) => glazeFamily)).map((family) =>
      GLAZE_FAMILIES[family].toLowerCase(),
    );
  const claysOf = (pieces: readonly Piece[]) => distinct(pieces.map((piece) => piece.clay.trim()));
  other('form', formsOf(before), formsOf(now));
  other('clay', claysOf(before), claysOf(now));
  const namesKnown = glazesOf(before).length > 0 && glazesOf(now).length > 0;
  const glazes = namesKnown ? glazesOf : familiesOf;
  other('glaze', glazes(before), glazes(now));
  found.push(
    ...wallChanges(before, now),
    ...bisqueChanges(before, now),
    ...preparationChanges(before, now),
  );
  return found;
}
