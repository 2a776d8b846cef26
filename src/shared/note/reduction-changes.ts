import { formatDuration, formatSeconds } from '../units/duration.ts';
import { NO_BREAK_SPACE } from '../units/units.ts';
import { COMBUSTIBLES, SEALS } from '../vocabulary/ware.ts';
import * as threshold from './change-thresholds.ts';
import {
  compareNumbers,
  compareShares,
  distinct,
  haveNothingInCommon,
  insteadOf,
  listed,
} from './compare-fields.ts';
import type { NoteFields } from './note-fields.ts';
import type { Recipe } from './pieces.ts';
import type { ProposedChange } from './proposed-changes.ts';

const litres = insteadOf(`${NO_BREAK_SPACE}l`);

/** How tight a seal is; sand seals best (common practice, no source). */
const TIGHTNESS: Readonly<Record<keyof typeof SEALS, number>> = {
  none: 0,
  lid: 1,
  'wet-cloth': 2,
  fibre: 2,
  sand: 3,
};

/** The recipe most pieces had: the shared one, unless every piece has its own. */
function mainRecipe({ pieces, reduction }: NoteFields): Recipe {
  const own = pieces.map(({ recipe }) => recipe);
  return own.length > 0 && own.every((recipe) => recipe !== null)
    ? (own[0] ?? reduction)
    : reduction;
}

function totalLitres({ combustibles }: Recipe): number | null {
  if (combustibles.length === 0 || combustibles.some((each) => each.litres === null)) return null;
  return combustibles.reduce((sum, each) => sum + (each.litres ?? 0), 0);
}

function combustibleChanges(before: Recipe, now: Recipe): ProposedChange[] {
  const kindsOf = ({ combustibles }: Recipe) =>
    distinct(
      combustibles.map(({ kind, other }) =>
        kind === 'other' ? other.trim() : COMBUSTIBLES[kind].toLowerCase(),
      ),
    );
  const found: ProposedChange[] = [];
  if (haveNothingInCommon(kindsOf(before), kindsOf(now))) {
    found.push({
      change: 'combustible-kind',
      text: `${listed(kindsOf(now))} instead of ${listed(kindsOf(before))}`,
    });
  }
  found.push(
    ...compareShares(
      totalLitres(before),
      totalLitres(now),
      { share: threshold.COMBUSTIBLE_SHARE },
      { up: 'combustible-more', down: 'combustible-less' },
      (a, b) => `${litres(a, b)} of combustible`,
    ),
  );
  const wasDamp = before.combustibles.some(({ dampness }) => dampness === 'damp');
  const isDry =
    now.combustibles.length > 0 && now.combustibles.every(({ dampness }) => dampness === 'dry');
  if (wasDamp && isDry) {
    found.push({ change: 'combustible-drier', text: 'dry combustible instead of damp' });
  }
  return found;
}

function coveringChanges(before: Recipe, now: Recipe): ProposedChange[] {
  const found = [
    ...compareShares(
      before.secondsInAir,
      now.secondsInAir,
      { share: threshold.TIME_SHARE, least: threshold.AIR_SECONDS },
      { up: 'covered-later', down: 'covered-sooner' },
      (a, b) => `${formatSeconds(a)} in air instead of ${formatSeconds(b)}`,
    ),
    ...compareShares(
      before.minutesCovered,
      now.minutesCovered,
      { share: threshold.TIME_SHARE, least: threshold.COVERED_MINUTES },
      { up: 'covered-longer', down: 'covered-shorter' },
      (a, b) => `covered for ${formatDuration(a)} instead of ${formatDuration(b)}`,
    ),
    ...compareShares(
      before.containerLitres,
      now.containerLitres,
      { share: threshold.CONTAINER_SHARE },
      { up: 'container-bigger', down: 'container-smaller' },
      (a, b) => `container of ${litres(a, b)}`,
    ),
  ];
  if (before.seal !== null && now.seal !== null) {
    const text = `seal: ${SEALS[now.seal].toLowerCase()} instead of ${SEALS[before.seal].toLowerCase()}`;
    found.push(
      ...compareNumbers(
        TIGHTNESS[before.seal],
        TIGHTNESS[now.seal],
        1,
        { up: 'sealed-better' },
        () => text,
      ),
    );
  }
  return found;
}

function yesNoChanges(before: Recipe, now: Recipe): ProposedChange[] {
  const found: ProposedChange[] = [];
  const compare = (
    was: boolean | null,
    is: boolean | null,
    [yes, yesText]: readonly ['burped' | 'quenched', string],
    [no, noText]: readonly ['not-burped' | 'not-quenched', string],
  ): void => {
    if (was === null || is === null || was === is) return;
    found.push(is ? { change: yes, text: yesText } : { change: no, text: noText });
  };
  const burped = ({ burpedTimes }: Recipe) => (burpedTimes === null ? null : burpedTimes > 0);
  const quenched = ({ then }: Recipe) => (then === null ? null : then === 'quenched');
  compare(
    burped(before),
    burped(now),
    ['burped', 'burped, which it was not before'],
    ['not-burped', 'not burped, which it was before'],
  );
  compare(
    quenched(before),
    quenched(now),
    ['quenched', 'quenched in water, which it was not before'],
    ['not-quenched', 'not quenched in water, which it was before'],
  );
  return found;
}

/** What another reduction recipe proposes. */
export function reductionChanges(before: NoteFields, now: NoteFields): ProposedChange[] {
  const recipes = [mainRecipe(before), mainRecipe(now)] as const;
  return [
    ...combustibleChanges(...recipes),
    ...coveringChanges(...recipes),
    ...yesNoChanges(...recipes),
  ];
}
