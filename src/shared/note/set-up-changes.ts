import { NO_BREAK_SPACE } from '../units/units.ts';
import { PRIMARY_AIR, SHELF_KINDS, STANDS_ON, WIND_SHELTERS } from '../vocabulary/kiln.ts';
import { idsOf } from '../vocabulary/terms.ts';
import * as threshold from './change-thresholds.ts';
import { compareNumbers, compareOrder, compareShares, insteadOf } from './compare-fields.ts';
import type { NoteFields } from './note-fields.ts';
import type { ProposedChange } from './proposed-changes.ts';
import type { SetUp } from './set-up.ts';

const mm = insteadOf(`${NO_BREAK_SPACE}mm`);
const kg = insteadOf(`${NO_BREAK_SPACE}kg`);
const percent = insteadOf(`${NO_BREAK_SPACE}%`);
const NOTHING_THERE = /^(nothing|none|no|clear|free|-|–)\b/i;

function burnerChanges(before: SetUp, now: SetUp): ProposedChange[] {
  return [
    ...compareNumbers(
      before.regulatorBar,
      now.regulatorBar,
      threshold.PRESSURE_BAR,
      { up: 'gas-more', down: 'gas-less' },
      (a, b) => `regulator at ${insteadOf(`${NO_BREAK_SPACE}bar`)(a, b)}`,
    ),
    ...compareOrder(
      before.primaryAir,
      now.primaryAir,
      idsOf(PRIMARY_AIR),
      { up: 'air-more', down: 'air-less' },
      (a, b) =>
        `primary air ${PRIMARY_AIR[a].toLowerCase()} instead of ${PRIMARY_AIR[b].toLowerCase()}`,
    ),
    ...compareNumbers(
      before.burnerAngleDegrees,
      now.burnerAngleDegrees,
      threshold.ANGLE_DEGREES,
      { up: 'burner-straighter', down: 'burner-more-sweeping' },
      (a, b) => `burner at ${insteadOf('°')(a, b)}`,
    ),
    ...compareNumbers(
      before.burnerSetbackMm,
      now.burnerSetbackMm,
      threshold.SETBACK_MM,
      { up: 'setback-longer', down: 'setback-shorter' },
      (a, b) => `burner set back ${mm(a, b)}`,
    ),
    ...compareNumbers(
      before.cylinderKg,
      now.cylinderKg,
      threshold.CYLINDER_KG,
      { up: 'cylinder-bigger' },
      (a, b) => `cylinder of ${kg(a, b)}`,
    ),
    ...compareNumbers(
      before.flueCoverPercent,
      now.flueCoverPercent,
      threshold.FLUE_COVER_PERCENT,
      { up: 'flue-more-covered', down: 'flue-more-open' },
      (a, b) => `flue covered ${percent(a, b)}`,
    ),
    ...compareNumbers(
      before.lidGapMm,
      now.lidGapMm,
      threshold.LID_GAP_MM,
      { down: 'leaks-sealed' },
      (a, b) => `lid gap of ${mm(a, b)}`,
    ),
  ];
}

function kilnSurroundings(before: SetUp, now: SetUp): ProposedChange[] {
  const found: ProposedChange[] = [];
  if (before.fibreBeneath === false && now.fibreBeneath === true) {
    found.push({ change: 'floor-insulated', text: 'fibre beneath the kiln, where there was none' });
  } else if (before.standsOn === 'bare-ground' && now.standsOn && now.standsOn !== 'bare-ground') {
    found.push({
      change: 'floor-insulated',
      text: `on ${STANDS_ON[now.standsOn].toLowerCase()} instead of bare ground`,
    });
  }
  if (before.kilnDamp === true && now.kilnDamp === false) {
    found.push({ change: 'kiln-dried', text: 'the kiln dry instead of damp' });
  }
  const path = before.inFlamePath.trim();
  const pathNow = now.inFlamePath.trim();
  if (path !== '' && !NOTHING_THERE.test(path) && (pathNow === '' || NOTHING_THERE.test(pathNow))) {
    found.push({
      change: 'flame-path-cleared',
      text: `nothing named in the flame’s path, where there was “${path}”`,
    });
  }
  found.push(
    ...compareOrder(
      before.windShelter,
      now.windShelter,
      idsOf(WIND_SHELTERS),
      { up: 'wind-shelter' },
      (a, b) =>
        `wind shelter: ${WIND_SHELTERS[a].toLowerCase()} instead of ${WIND_SHELTERS[b].toLowerCase()}`,
    ),
  );
  return found;
}

const HEAVY_SHELVES = ['cordierite', 'silicon-carbide', 'brick'];

function shelfChanges(before: SetUp, now: SetUp): ProposedChange[] {
  const found: ProposedChange[] = [];
  if (
    before.shelfKind !== null &&
    HEAVY_SHELVES.includes(before.shelfKind) &&
    (now.shelfKind === 'fibre' || now.shelfKind === 'none')
  ) {
    const kind = now.shelfKind === 'none' ? 'no shelf' : 'a fibre shelf';
    found.push({
      change: 'shelf-lighter',
      text: `${kind} instead of ${SHELF_KINDS[before.shelfKind].toLowerCase()}`,
    });
  }
  found.push(
    ...compareNumbers(
      before.shelfThicknessMm,
      now.shelfThicknessMm,
      threshold.SHELF_THICKNESS_MM,
      { down: 'shelf-lighter' },
      (a, b) => `shelf ${mm(a, b)} thick`,
    ),
    ...compareNumbers(
      before.shelfFloorSharePercent,
      now.shelfFloorSharePercent,
      threshold.SHELF_SHARE_PERCENT,
      { down: 'shelf-lighter' },
      (a, b) => `shelf over ${percent(a, b)} of the floor`,
    ),
    ...compareNumbers(
      before.shelfHeightMm,
      now.shelfHeightMm,
      threshold.SHELF_HEIGHT_MM,
      { up: 'shelf-raised' },
      (a, b) => `shelf ${mm(a, b)} high`,
    ),
  );
  return found;
}

const load = { up: 'load-more', down: 'load-less' } as const;

/** By weight where both are known, else by pieces said, else by the rows of pieces. */
function loadChanges(before: NoteFields, now: NoteFields): ProposedChange[] {
  const size = { share: threshold.LOAD_SHARE };
  if (before.setUp.loadKg !== null && now.setUp.loadKg !== null) {
    return compareShares(
      before.setUp.loadKg,
      now.setUp.loadKg,
      size,
      load,
      (a, b) => `load of ${kg(a, b)}`,
    );
  }
  const piecesOf = ({ setUp, pieces }: NoteFields): number | null => {
    if (setUp.loadPieces !== null) return setUp.loadPieces;
    if (pieces.length === 0 || pieces.some(({ count }) => count === null)) return null;
    return pieces.reduce((sum, { count }) => sum + (count ?? 0), 0);
  };
  return compareShares(
    piecesOf(before),
    piecesOf(now),
    { ...size, least: 1 },
    load,
    (a, b) => `${String(a)} ${a === 1 ? 'piece' : 'pieces'} instead of ${String(b)}`,
  );
}

function probeChanges(before: SetUp, now: SetUp): ProposedChange[] {
  const moved = { up: 'probe-moved-or-replaced', down: 'probe-moved-or-replaced' } as const;
  const places = [
    ['probeDepthMm', 'probe in by'],
    ['probeFromFlameMm', 'probe away from the flame by'],
    ['probeFromWareMm', 'probe away from the ware by'],
  ] as const;
  return places.flatMap(([field, words]) =>
    compareNumbers(
      before[field],
      now[field],
      threshold.PROBE_MM,
      moved,
      (a, b) => `${words} ${mm(a, b)}`,
    ),
  );
}

/** What another set-up of the same kiln proposes. */
export function setUpChanges(before: NoteFields, now: NoteFields): ProposedChange[] {
  return [
    ...burnerChanges(before.setUp, now.setUp),
    ...kilnSurroundings(before.setUp, now.setUp),
    ...shelfChanges(before.setUp, now.setUp),
    ...loadChanges(before, now),
    ...probeChanges(before.setUp, now.setUp),
  ];
}
