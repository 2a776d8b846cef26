import type { FiringFacts, PieceFacts } from '#shared/note/facts.ts';
import type { Trouble } from '#shared/vocabulary/troubles.ts';

/** Whether a trouble was gone in the next firing; *cannot-say* when the facts do not tell. */
export type Outcome = 'gone' | 'not-gone' | 'cannot-say';

/** Read off a record, or named by the author: never pooled. */
export type Source = 'measured' | 'named';

export type Comparison =
  | { readonly comparable: true; readonly outcome: Outcome }
  | { readonly comparable: false; readonly because: string };

const gone = (isGone: boolean | null): Comparison => ({
  comparable: true,
  outcome: isGone === null ? 'cannot-say' : isGone ? 'gone' : 'not-gone',
});
const notComparable = (because: string): Comparison => ({ comparable: false, because });

/** The next target may lie this much below the earlier one; slow climbs this much either way. */
const TARGET_CELSIUS = 50;
/** A stall or sag is passed when the curve comes this far above its level … */
const PASSED_CELSIUS = 50;
/** … or this close to the lower of both aims. */
const NEAR_AIM_CELSIUS = 15;
/** A slow climb is gone at this share of the earlier time. */
const QUICKER_SHARE = 0.8;
/** A cold cylinder is compared in like air. */
const AIR_CELSIUS = 10;
/** Cracks are compared among pieces of like span. */
const SPAN_SHARE = 0.3;

function climbTrouble(trouble: 'stall' | 'sag', before: FiringFacts, now: FiringFacts): Comparison {
  if (!before.hasRecord || !now.hasRecord) return notComparable('not both have a record');
  if (before.targetCelsius === null || now.targetCelsius === null) {
    return notComparable('not both have a target temperature');
  }
  if (now.targetCelsius < before.targetCelsius - TARGET_CELSIUS) {
    return notComparable('the next target was lower');
  }
  const levels =
    trouble === 'stall'
      ? before.stalls.map(({ levelCelsius }) => levelCelsius)
      : before.sags.map(({ topCelsius }) => topCelsius);
  if (levels.length === 0) return notComparable('the level is not known');
  const again = trouble === 'stall' ? now.stalls.length > 0 : now.sags.length > 0;
  if (again) return gone(false);
  const aims = [before.aimCelsius ?? before.targetCelsius, now.aimCelsius ?? now.targetCelsius];
  const passed =
    now.peakCelsius !== null &&
    (now.peakCelsius >= Math.max(...levels) + PASSED_CELSIUS ||
      now.peakCelsius >= Math.min(...aims) - NEAR_AIM_CELSIUS);
  return gone(passed ? true : null);
}

function slowClimb(source: Source, before: FiringFacts, now: FiringFacts): Comparison {
  if (source === 'measured' && !now.hasRecord) return notComparable('not both have a record');
  if (before.timeToTemperatureMinutes === null || now.timeToTemperatureMinutes === null) {
    return notComparable('not both times to temperature are known');
  }
  if (before.targetCelsius === null || now.targetCelsius === null) {
    return notComparable('not both have a target temperature');
  }
  if (Math.abs(before.targetCelsius - now.targetCelsius) > TARGET_CELSIUS) {
    return notComparable('the targets are too far apart');
  }
  const quicker = now.timeToTemperatureMinutes <= QUICKER_SHARE * before.timeToTemperatureMinutes;
  return gone(quicker && !shows('slow-climb', source, now));
}

const shows = (trouble: Trouble, source: Source, facts: FiringFacts): boolean =>
  source === 'measured'
    ? facts.measuredTroubles.some((found) => found === trouble)
    : facts.namedTroubles.includes(trouble);

function measuredTheSameWay(
  trouble: 'overshoot' | 'uneven-heat',
  source: Source,
  before: FiringFacts,
  now: FiringFacts,
): Comparison {
  if (source === 'measured') {
    if (!now.hasRecord) return notComparable('not measured the same way');
    if (trouble === 'overshoot' && now.targetCelsius === null) {
      return notComparable('not both have a target temperature');
    }
    if (trouble === 'uneven-heat' && !(before.hasSecondProbe && now.hasSecondProbe)) {
      return notComparable('not both had two probes');
    }
  } else if (before.hasRecord !== now.hasRecord) {
    return notComparable('not measured the same way');
  }
  return gone(!shows(trouble, source, now));
}

type Crack = 'crack-in-firing' | 'crack-after-draw';
const cracked = (trouble: Crack, piece: PieceFacts): boolean =>
  trouble === 'crack-in-firing' ? piece.crackedInFiring : piece.crackedAfterDraw;

const likeInSpan = (one: PieceFacts, other: PieceFacts): boolean =>
  one.spanMm !== null &&
  other.spanMm !== null &&
  Math.abs(other.spanMm - one.spanMm) <= SPAN_SHARE * one.spanMm;

/** Pieces like one that cracked: the same form family, and a span within 30 % of its own. */
function cracks(trouble: Crack, before: FiringFacts, now: FiringFacts): Comparison {
  const broken = before.pieces.filter((piece) => piece.family !== null && cracked(trouble, piece));
  if (broken.length === 0) return notComparable('it is not known which form cracked');
  const families = new Set(broken.map(({ family }) => family));
  const ofForm = now.pieces.filter(({ family }) => families.has(family));
  if (ofForm.length === 0) return notComparable('no piece of that form in the next firing');
  const alike = ofForm.filter((piece) =>
    broken.some((other) => other.family === piece.family && likeInSpan(other, piece)),
  );
  if (alike.length === 0) return notComparable('no piece of like span in the next firing');
  if (ofForm.some((piece) => cracked(trouble, piece))) return gone(false);
  // Ticked, but no row of pieces says which: it may have been one of these.
  return gone(now.namedTroubles.includes(trouble) && noneCracked(trouble, now) ? null : true);
}
const noneCracked = (trouble: Crack, facts: FiringFacts): boolean =>
  !facts.pieces.some((piece) => cracked(trouble, piece));

type GlazeTrouble = 'dull-glaze' | 'crawling' | 'blistering';
function hasGlazeTrouble(trouble: GlazeTrouble, { melt, faults }: PieceFacts): boolean {
  if (trouble === 'crawling') return faults.includes('crawling');
  if (trouble === 'blistering') return faults.includes('blisters') || faults.includes('pinholes');
  return melt === 'under-fired' || faults.includes('dull');
}

function glazeTrouble(trouble: GlazeTrouble, before: FiringFacts, now: FiringFacts): Comparison {
  const faulty = before.pieces.filter((piece) => hasGlazeTrouble(trouble, piece));
  const families = new Set(
    (faulty.length > 0 ? faulty : before.pieces).map(({ glazeFamily }) => glazeFamily),
  );
  families.delete(null);
  const alike = now.pieces.filter(({ glazeFamily }) => families.has(glazeFamily));
  if (alike.length === 0) return notComparable('not the same glaze family');
  if (alike.some((piece) => hasGlazeTrouble(trouble, piece))) return gone(false);
  const elsewhere = now.pieces.some((piece) => hasGlazeTrouble(trouble, piece));
  if (now.namedTroubles.includes(trouble) && !elsewhere) return gone(null);
  if (trouble === 'dull-glaze' && alike.some(({ melt }) => melt === null)) return gone(null);
  return gone(true);
}

function weakReduction(before: FiringFacts, now: FiringFacts): Comparison {
  const weak = before.pieces.filter(
    ({ bareClay, colour, faults }) =>
      (bareClay !== null && bareClay !== 'black' && bareClay !== 'not-applicable') ||
      (colour !== null && colour !== 'as-hoped') ||
      faults.includes('colour-lost'),
  );
  const routes = new Set((weak.length > 0 ? weak : before.pieces).map(({ route }) => route));
  routes.delete(null);
  const alike = now.pieces.filter(({ route }) => routes.has(route));
  if (alike.length === 0) return notComparable('not the same route after the draw');
  const failed = alike.some(
    ({ bareClay, colour }) =>
      (bareClay !== null && bareClay !== 'black' && bareClay !== 'not-applicable') ||
      (colour !== null && colour !== 'as-hoped'),
  );
  if (failed) return gone(false);
  const unsaid = alike.some(({ bareClay, colour }) => bareClay === null || colour === null);
  return gone(unsaid ? null : !now.namedTroubles.includes('weak-reduction'));
}

function sameForm(
  trouble: 'stuck-to-shelf' | 'broken-in-handling',
  before: FiringFacts,
  now: FiringFacts,
): Comparison {
  const families = new Set(before.pieces.map(({ family }) => family));
  families.delete(null);
  return now.pieces.some(({ family }) => families.has(family))
    ? gone(!now.namedTroubles.includes(trouble))
    : notComparable('not the same form');
}

/**
 * Whether two firings can be compared for a trouble that the earlier one had, and whether it was
 * then gone. Start class and firings in between are the pairs' matter, not this one's.
 */
export function compareFirings(
  trouble: Trouble,
  source: Source,
  before: FiringFacts,
  now: FiringFacts,
): Comparison {
  switch (trouble) {
    case 'stall':
    case 'sag':
      return climbTrouble(trouble, before, now);
    case 'slow-climb':
      return slowClimb(source, before, now);
    case 'overshoot':
    case 'uneven-heat':
      return measuredTheSameWay(trouble, source, before, now);
    case 'tank-chill':
      return before.airCelsius === null ||
        now.airCelsius === null ||
        Math.abs(before.airCelsius - now.airCelsius) > AIR_CELSIUS
        ? notComparable('the air was not alike')
        : gone(!now.namedTroubles.includes(trouble));
    case 'flame-out':
    case 'burn-back':
    case 'wrong-reading':
      return gone(!now.namedTroubles.includes(trouble));
    case 'crack-in-firing':
    case 'crack-after-draw':
      return cracks(trouble, before, now);
    case 'dull-glaze':
    case 'crawling':
    case 'blistering':
      return glazeTrouble(trouble, before, now);
    case 'weak-reduction':
      return weakReduction(before, now);
    case 'stuck-to-shelf':
    case 'broken-in-handling':
      return sameForm(trouble, before, now);
  }
}
