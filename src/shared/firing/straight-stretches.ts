/**
 * The course of a kiln told as straight stretches. A window that smooths a record rounds off its
 * corners; but a corner is where something was done, or happened, so here each stays where the
 * readings put it, and the long straight parts between are known all the better.
 */
import { fittedCorners } from './fitted-corners.ts';

/** Means of readings close together, in order of time, each with its standard error. */
export interface Points {
  readonly minutes: Float64Array;
  readonly celsius: Float64Array;
  /** °C, above zero. */
  readonly errors: Float64Array;
}

/** Corners of a course, in order of time: between two of them it runs straight. */
export interface Corners {
  readonly minutes: Float64Array;
  readonly celsius: Float64Array;
}

/** Corners before they are fitted; those where lines meet may move along, the others stay. */
export interface RoughCorners extends Corners {
  readonly mayMove: readonly boolean[];
}

/** A step between two lines of no more than so many standard errors is none. */
const SCATTER_JUMP = 4;

/** Rates, °C/min, and the time between readings from which on a turn between them is not drawn out. */
const TURN_RATE = 2;
const UNSEEN_MINUTES = 0.75;

interface Line {
  /** First and last point, both included. */
  readonly from: number;
  readonly to: number;
  /** °C at `originMinute`. */
  readonly level: number;
  readonly originMinute: number;
  readonly slope: number;
}

/** Numbers that one line more adds to the telling: its level, its slope and where it begins. */
const NUMBERS_PER_LINE = 3;
/** Lines meet as far outside the gap between their points as this share of it, for scatter's sake. */
const MEETS_WITHIN = 1;

/**
 * The corners of the course through the points: the division into straight lines that leaves the
 * least squared distance, in standard errors, plus 3·ln n for each line (Schwarz, Annals of
 * Statistics 6, 461, 1978), found exactly by dynamic programming with pruning (Killick, Fearnhead and
 * Eckley, Journal of the American Statistical Association 107, 1590, 2012). Neighbours are joined
 * where they meet, else straight across the gap between their points.
 * @param points at least two
 */
export function cornersOf(points: Points): Corners {
  return fittedCorners(points, joined(points, straightLines(points)));
}

/**
 * Running sums, by which the line through any span of points costs a few multiplications: of weight,
 * time, level and their products w, wt, wy, wtt, wty, wyy, six beside each other for each point.
 */
interface Sums {
  readonly all: Float64Array;
  readonly originMinute: number;
  readonly originCelsius: number;
}
const SIX = 6;

function straightLines(points: Points): Line[] {
  const n = points.minutes.length;
  const sums = sumsOf(points);
  const price = NUMBERS_PER_LINE * Math.log(Math.max(3, n));
  const least = new Float64Array(n + 1);
  const cameFrom = new Int32Array(n + 1);
  const open = new Int32Array(n + 1);
  const costs = new Float64Array(n + 1);
  let count = 1;
  for (let end = 1; end <= n; end += 1) {
    let best = Infinity;
    let bestFrom = 0;
    for (let i = 0; i < count; i += 1) {
      const from = at(open, i);
      const cost = at(least, from) + leftOver(sums, from, end);
      costs[i] = cost;
      if (cost >= best) continue;
      best = cost;
      bestFrom = from;
    }
    least[end] = best + price;
    cameFrom[end] = bestFrom;
    let kept = 0;
    for (let i = 0; i < count; i += 1) {
      if (at(costs, i) > best + price) continue;
      open[kept] = at(open, i);
      kept += 1;
    }
    open[kept] = end;
    count = kept + 1;
  }
  const lines: Line[] = [];
  for (let end = n; end > 0; end = at(cameFrom, end)) {
    lines.push(lineThrough(sums, at(cameFrom, end), end));
  }
  return lines.reverse();
}

function sumsOf({ minutes, celsius, errors }: Points): Sums {
  const n = minutes.length;
  const originMinute = at(minutes, n >> 1);
  const originCelsius = at(celsius, n >> 1);
  const all = new Float64Array(SIX * (n + 1));
  for (let i = 0; i < n; i += 1) {
    const t = at(minutes, i) - originMinute;
    const y = at(celsius, i) - originCelsius;
    const w = 1 / at(errors, i) ** 2;
    const added = [w, w * t, w * y, w * t * t, w * t * y, w * y * y];
    for (let k = 0; k < SIX; k += 1) {
      all[SIX * (i + 1) + k] = at(all, SIX * i + k) + (added[k] ?? 0);
    }
  }
  return { all, originMinute, originCelsius };
}

/** Squared distance, in standard errors, of points[from..end) from the line through them. */
function leftOver({ all }: Sums, from: number, end: number): number {
  if (end - from <= 2) return 0;
  const a = SIX * from;
  const b = SIX * end;
  const w = at(all, b) - at(all, a);
  const t = at(all, b + 1) - at(all, a + 1);
  const y = at(all, b + 2) - at(all, a + 2);
  const tt = at(all, b + 3) - at(all, a + 3) - (t * t) / w;
  const ty = at(all, b + 4) - at(all, a + 4) - (t * y) / w;
  const yy = at(all, b + 5) - at(all, a + 5) - (y * y) / w;
  const left = tt > 0 ? yy - (ty * ty) / tt : yy;
  return left > 0 ? left : 0;
}

function lineThrough({ all, originMinute, originCelsius }: Sums, from: number, end: number): Line {
  const a = SIX * from;
  const b = SIX * end;
  const w = at(all, b) - at(all, a);
  const t = (at(all, b + 1) - at(all, a + 1)) / w;
  const y = (at(all, b + 2) - at(all, a + 2)) / w;
  const tt = at(all, b + 3) - at(all, a + 3) - w * t * t;
  const ty = at(all, b + 4) - at(all, a + 4) - w * t * y;
  return {
    from,
    to: end - 1,
    level: y + originCelsius,
    originMinute: t + originMinute,
    slope: end - from > 1 && tt > 0 ? ty / tt : 0,
  };
}

const valueOn = (line: Line, minute: number): number =>
  line.level + line.slope * (minute - line.originMinute);

/** Where the lines meet, or both sides of a gap across which they do not. */
function joined({ minutes, errors }: Points, lines: readonly Line[]): RoughCorners {
  const outMinutes: number[] = [];
  const outCelsius: number[] = [];
  const mayMove: boolean[] = [];
  const add = (minute: number, celsius: number, moves = false): void => {
    if (minute <= (outMinutes[outMinutes.length - 1] ?? -Infinity)) return;
    outMinutes.push(minute);
    outCelsius.push(celsius);
    mayMove.push(moves);
  };
  for (const [i, line] of lines.entries()) {
    const before = lines[i - 1];
    const begin = at(minutes, line.from);
    if (before === undefined) add(begin, valueOn(line, begin));
    else {
      const end = at(minutes, before.to);
      const areSure = isSure(before) && isSure(line);
      const meet =
        areSure && !turnsUnseen(before, line, begin - end) ? meetingOf(before, line) : null;
      const slack = MEETS_WITHIN * (begin - end);
      const isNear = meet !== null && meet >= end - slack && meet <= begin + slack;
      const middle = (end + begin) / 2;
      const jump = valueOn(line, middle) - valueOn(before, middle);
      if (isNear) add(meet, valueOn(line, meet), true);
      else if (areSure && Math.abs(jump) <= SCATTER_JUMP * at(errors, line.from)) {
        add(middle, valueOn(line, middle) - jump / 2, true);
      } else {
        add(end, valueOn(before, end));
        add(begin, valueOn(line, begin));
      }
    }
  }
  const last = lines[lines.length - 1];
  const end = at(minutes, minutes.length - 1);
  if (last !== undefined) add(end, valueOn(last, end));
  return {
    minutes: Float64Array.from(outMinutes),
    celsius: Float64Array.from(outCelsius),
    mayMove,
  };
}

/** Two points make any line: only of three on it can be said where it goes on. */
const isSure = (line: Line): boolean => line.to - line.from >= 2;

/** Where a climb turns to a fall, or back, between readings far apart, nobody saw how far it went. */
function turnsUnseen(a: Line, b: Line, gapMinutes: number): boolean {
  const turns = a.slope * b.slope < 0;
  const slower = Math.min(Math.abs(a.slope), Math.abs(b.slope));
  return turns && slower > TURN_RATE && gapMinutes > UNSEEN_MINUTES;
}

function meetingOf(a: Line, b: Line): number | null {
  const turn = a.slope - b.slope;
  if (Math.abs(turn) < 1e-9) return null;
  const meet = b.originMinute + (b.level - valueOn(a, b.originMinute)) / turn;
  return Number.isFinite(meet) ? meet : null;
}

function at(values: Float64Array | Int32Array, i: number): number {
  return values[i] ?? 0;
}
