import { quantile } from '../statistics/quantile.ts';
import {
  ANSWER_MINUTES,
  APPROACH_MINUTES,
  JUST_SHORT,
  LEVEL_FALL,
  LEVEL_FEWEST_READINGS,
  LEVEL_GAP_CELSIUS,
  LEVEL_GAP_MINUTES,
  LEVEL_MINUTES,
  LEVEL_PACE_CELSIUS,
  LEVEL_PACE_SHARE,
  LEVEL_RATE,
  PASSED_BY,
  PAUSE_BELOW,
  REACHED_BELOW_AIM,
  WARM_UP_BELOW,
  WIDE_HALF_MINUTES,
} from './constants.ts';
import { confidenceOf } from './confidence.ts';
import type { Course } from './course.ts';
import { indexAtOrAfter } from './course.ts';
import { firstAtOrAbove, stepAt } from './curve.ts';
import { settledMinute } from './settling.ts';
import type { LevelAnswer, LevelKind, LevelStretch } from './types.ts';

/** A stretch's first and last half minute may hold the corner itself. */
const EDGE_MINUTES = 0.5;

/** A stretch by its first and last step. */
interface Run {
  from: number;
  to: number;
}

/** The greatest rate, °C/min, that still counts as level at this pace. */
export function levelRateLimit(pace: number | null): number {
  return pace === null ? LEVEL_RATE : Math.min(LEVEL_RATE, pace / LEVEL_PACE_SHARE);
}

/** The shortest level stretch, minutes, at this pace. */
export function shortestLevelMinutes(pace: number | null): number {
  return pace === null ? LEVEL_MINUTES : Math.max(LEVEL_MINUTES, LEVEL_PACE_CELSIUS / pace);
}

/**
 * The level stretches of a firing, named. `aim` is what the names are taken against; where it is
 * unknown the caller passes the peak, so that a stay at the top is no stall.
 */
export function levelStretches(
  course: Course,
  aim: number,
  pace: number | null,
  answers: readonly LevelAnswer[],
): LevelStretch[] {
  const limit = levelRateLimit(pace);
  const shortest = shortestLevelMinutes(pace);
  const { minutes, celsius } = course.steady;
  const at = (step: number) => minutes[step] ?? 0;
  const level = (step: number) => celsius[step] ?? 0;
  const runs = merged(
    levelRuns(course.wide.rates, limit)
      .map((run) => adjusted(course, run, limit))
      .map((run) => settled(course, run, limit)),
    at,
    level,
  );
  const edge = Math.round(EDGE_MINUTES / course.steady.stepMinutes);
  const stretches: LevelStretch[] = [];
  for (const run of runs) {
    const length = at(run.to) - at(run.from);
    if (length < shortest - 0.01) continue;
    if (fallOver(run, level, edge) >= LEVEL_FALL) continue;
    const inside = readingsIn(course, at(run.from), at(run.to));
    if (inside.length < LEVEL_FEWEST_READINGS) continue;
    const median = quantile(inside, 0.5) ?? level(run.from);
    const kind = kindOf(course, run, median, aim);
    stretches.push({
      kind,
      fromMinute: at(run.from),
      toMinute: at(run.to),
      minutes: length,
      levelCelsius: median,
      then: kind === 'stall' ? whatCameAfter(course, run, median) : null,
      confidence: confidenceOf(course, at(run.from), at(run.to), LEVEL_GAP_CELSIUS),
    });
  }
  return stretches.map((stretch) => answered(course, stretch, stretches, answers));
}

/** From its beginning to its end, the corners at both ends included. */
function fallOver(run: Run, level: (step: number) => number, edge: number): number {
  let top = -Infinity;
  let bottom = Infinity;
  for (let i = 0; i <= Math.min(edge, run.to - run.from); i += 1) {
    top = Math.max(top, level(run.from + i));
    bottom = Math.min(bottom, level(run.to - i));
  }
  return top - bottom;
}

function levelRuns(rates: Float64Array, limit: number): Run[] {
  const runs: Run[] = [];
  let from: number | null = null;
  for (let i = 0; i <= rates.length; i += 1) {
    const isLevel = i < rates.length && Math.abs(rates[i] ?? 0) <= limit + 1e-9;
    if (isLevel && from === null) from = i;
    if (!isLevel && from !== null) {
      runs.push({ from, to: Math.min(i, rates.length - 1) });
      from = null;
    }
  }
  return runs;
}

/**
 * The wide window rounds corners off: its ends are moved, by no more than its half width, to where
 * the rate of the moment leaves the stretch.
 */
function adjusted(course: Course, run: Run, limit: number): Run {
  if (course.swingMinutes !== null) return run;
  const { fine } = course;
  const most = Math.round(WIDE_HALF_MINUTES / fine.stepMinutes);
  const last = fine.minutes.length - 1;
  const isLevel = (i: number) => Math.abs(fine.rates[i] ?? Infinity) <= limit + 1e-9;
  let { from, to } = run;
  while (from < to && from < run.from + most && !isLevel(from)) from += 1;
  while (to > from && to > run.to - most && !isLevel(to - 1)) to -= 1;
  if (from === run.from) while (from > 0 && from > run.from - most && isLevel(from - 1)) from -= 1;
  if (to === run.to) while (to < last && to < run.to + most && isLevel(to)) to += 1;
  return { from, to };
}

/** Begins where a climb that settles by itself comes to be level. */
function settled(course: Course, run: Run, limit: number): Run {
  const { minutes } = course.steady;
  const minute = settledMinute(course, minutes[run.from] ?? 0, minutes[run.to] ?? 0, limit);
  return minute === null ? run : { ...run, from: Math.min(stepAt(course.steady, minute), run.to) };
}

/** Stretches less than 2 min and 10 °C apart are one. */
function merged(
  runs: readonly Run[],
  at: (step: number) => number,
  level: (step: number) => number,
): Run[] {
  const out: Run[] = [];
  for (const run of runs) {
    const last = out[out.length - 1];
    const isOne =
      last !== undefined &&
      (run.from <= last.to ||
        (at(run.from) - at(last.to) < LEVEL_GAP_MINUTES &&
          Math.abs(level(run.from) - level(last.to)) < LEVEL_GAP_CELSIUS));
    if (isOne) last.to = Math.max(last.to, run.to);
    else out.push({ ...run });
  }
  return out;
}

function readingsIn(course: Course, from: number, to: number): number[] {
  const { minutes, celsius } = course.record;
  const edge = course.fine.stepMinutes;
  return Array.from(
    celsius.subarray(
      indexAtOrAfter(minutes, from - edge),
      Math.min(course.to, indexAtOrAfter(minutes, to + edge)),
    ),
  );
}

/** The first name that fits. */
function kindOf(course: Course, run: Run, median: number, aim: number): LevelKind {
  const { steady: fine } = course;
  const edge = Math.round(EDGE_MINUTES / fine.stepMinutes);
  // The last half minute may hold the corner into what came after.
  const end = fine.celsius
    .subarray(Math.max(run.from, run.to - edge), run.to + 1)
    .reduce((most, value) => Math.max(most, value), -Infinity);
  const endMinute = fine.minutes[run.to] ?? 0;
  const reachedLater =
    end >= aim - REACHED_BELOW_AIM
      ? endMinute
      : firstAtOrAbove(fine, aim - REACHED_BELOW_AIM, endMinute);
  if (reachedLater !== null && reachedLater <= endMinute + APPROACH_MINUTES) {
    return median >= aim - JUST_SHORT ? 'hold' : 'approach';
  }
  if (end >= aim - JUST_SHORT && reachedLater === null) return 'just-short';
  if (median < WARM_UP_BELOW) return 'warm-up';
  if (median < PAUSE_BELOW && firstAtOrAbove(fine, median + PASSED_BY, endMinute) !== null) {
    return 'pause';
  }
  return 'stall';
}

function whatCameAfter(course: Course, run: Run, median: number): LevelStretch['then'] {
  const { steady: fine } = course;
  const endMinute = fine.minutes[run.to] ?? 0;
  if (endMinute >= course.shutOff.minute - APPROACH_MINUTES) return 'shut-off';
  if (firstAtOrAbove(fine, median + LEVEL_GAP_CELSIUS, endMinute) !== null) return 'climbed';
  const lowest = fine.celsius.subarray(run.to).reduce((a, b) => Math.min(a, b), Infinity);
  if (lowest <= median - LEVEL_GAP_CELSIUS) return 'fell';
  return course.to < course.record.minutes.length || !course.shutOff.inferred ? 'shut-off' : null;
}

/** The author's answer moves a stretch between pause and stall. */
function answered(
  course: Course,
  stretch: LevelStretch,
  all: readonly LevelStretch[],
  answers: readonly LevelAnswer[],
): LevelStretch {
  if (stretch.kind !== 'pause' && stretch.kind !== 'stall') return stretch;
  const mine = answers.findLast((answer) => nearest(all, answer.fromMinute) === stretch);
  if (mine === undefined) return stretch;
  if (mine.answer === 'meant') return { ...stretch, kind: 'pause', then: null };
  const end = course.fine.minutes.findLastIndex((minute) => minute <= stretch.toMinute + 1e-9);
  return {
    ...stretch,
    kind: 'stall',
    then: whatCameAfter(course, { from: 0, to: Math.max(0, end) }, stretch.levelCelsius),
  };
}

function nearest(all: readonly LevelStretch[], minute: number): LevelStretch | null {
  let best: LevelStretch | null = null;
  for (const stretch of all) {
    const distance = Math.abs(stretch.fromMinute - minute);
    if (distance > ANSWER_MINUTES) continue;
    if (best === null || distance < Math.abs(best.fromMinute - minute)) best = stretch;
  }
  return best;
}
