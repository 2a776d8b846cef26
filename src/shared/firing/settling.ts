import type { Course } from './course.ts';
import { indexAtOrAfter } from './course.ts';
import { valueAt } from './curve.ts';
import { fitExponentialApproach } from './exponential-approach.ts';

/** The approach is looked at from where the climb is still so many times too steep to be level. */
const FROM_RATES = 8;
/** A kiln settles within so many minutes, or it does not settle by itself. */
const LONGEST_APPROACH = 45;
/** A corner sharper than this, minutes, is what was done to the fire; it needs no fit. */
const SHORTEST_APPROACH = 2;
/** The fit sees so much of the level it settles to, minutes. */
const LEVEL_SEEN = 20;
/** A level known no better than this, °C, is none that was settled to. */
const UNKNOWN_END = 15;
const MOST_POINTS = 40;
const FEWEST_POINTS = 8;
/** The approach must describe the readings about as well as the course itself does. */
const AS_GOOD = 1.8;

/**
 * Where a climb that settles by itself comes to be level. The rate dies away so slowly there that
 * scatter moves the moment it passes a threshold by many minutes; the exponential approach fitted to
 * the climb and the level together tells it better. Null where the climb ends at a corner, or the
 * approach does not fit.
 * @param limit the rate that counts as level, °C/min
 */
export function settledMinute(
  course: Course,
  fromMinute: number,
  toMinute: number,
  limit: number,
): number | null {
  const { steady, wide } = course;
  const at = Math.round((fromMinute - (steady.minutes[0] ?? 0)) / steady.stepMinutes);
  let begin = at;
  const earliest = Math.max(0, at - Math.round(LONGEST_APPROACH / steady.stepMinutes));
  while (begin > earliest) {
    const rate = wide.rates[begin - 1] ?? Infinity;
    if (rate > FROM_RATES * limit || rate < 0) break;
    begin -= 1;
  }
  const beginMinute = steady.minutes[begin] ?? fromMinute;
  if (fromMinute - beginMinute < SHORTEST_APPROACH) return null;
  const end = Math.min(toMinute, fromMinute + LEVEL_SEEN);
  const { x, y, left, count } = meansBetween(course, beginMinute, end);
  if (x.length < FEWEST_POINTS) return null;
  const fit = fitExponentialApproach(x, y, {
    shortestTimeConstant: 0.5,
    longestTimeConstant: 2 * LONGEST_APPROACH,
  });
  if (fit === null || fit.end <= fit.start || !(fit.endSd < UNKNOWN_END)) return null;
  const perMean = count / x.length;
  const expected = Math.max(left, (course.scatter.noiseCelsius ** 2 * x.length) / perMean);
  if (fit.residualSumOfSquares > AS_GOOD * expected) return null;
  const rateAtBegin = (fit.end - fit.start) / fit.timeConstant;
  if (rateAtBegin <= limit) return null;
  const settled = beginMinute + fit.timeConstant * Math.log(rateAtBegin / limit);
  return settled < toMinute ? Math.max(settled, course.start.minute) : null;
}

interface Means {
  readonly x: number[];
  readonly y: number[];
  /** Squared distance of the means from the course, °C². */
  readonly left: number;
  readonly count: number;
}

/** At most MOST_POINTS means of the readings between two minutes; x from the first minute. */
function meansBetween(course: Course, fromMinute: number, toMinute: number): Means {
  const { minutes, celsius } = course.record;
  const from = indexAtOrAfter(minutes, fromMinute - 1e-9);
  const to = Math.min(course.to, indexAtOrAfter(minutes, toMinute + 1e-9));
  const size = Math.max(1, Math.ceil((to - from) / MOST_POINTS));
  const x: number[] = [];
  const y: number[] = [];
  let left = 0;
  for (let i = from; i + size <= to; i += size) {
    let t = 0;
    let value = 0;
    for (let j = i; j < i + size; j += 1) {
      t += minutes[j] ?? 0;
      value += celsius[j] ?? 0;
    }
    x.push(t / size - fromMinute);
    y.push(value / size);
    left += (value / size - valueAt(course.fine, t / size)) ** 2;
  }
  return { x, y, left, count: x.length * size };
}
