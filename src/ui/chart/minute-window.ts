/** A part of a record's minutes: what a chart shows of it. */
export interface MinuteWindow {
  readonly from: number;
  readonly to: number;
}

/** Nothing narrower is shown, minutes: readings seconds apart still have some pixels between them. */
export const LEAST_MINUTES = 2;
/** One press of "in" or "out". */
export const ZOOM_STEP = 2;
/** A stretch is shown with this share of its own length on either side. */
const ROOM_AROUND = 0.35;

const spanOf = (window: MinuteWindow): number => window.to - window.from;

/** The window moved, and if need be narrowed or widened, so that it lies within the whole. */
export function clampWindow(window: MinuteWindow, whole: MinuteWindow): MinuteWindow {
  const all = spanOf(whole);
  const span = Math.min(all, Math.max(Math.min(LEAST_MINUTES, all), spanOf(window)));
  if (span >= all) return whole;
  const middle = (window.from + window.to) / 2;
  const from = Math.min(whole.to - span, Math.max(whole.from, middle - span / 2));
  return { from, to: Math.min(whole.to, from + span) };
}

/** Shows `factor` times as closely (less than 1: further out); the minute `at` stays in its place. */
export function zoomWindow(
  window: MinuteWindow,
  whole: MinuteWindow,
  factor: number,
  at = (window.from + window.to) / 2,
): MinuteWindow {
  const all = spanOf(whole);
  const wanted = spanOf(window) / factor;
  const span = Math.min(all, Math.max(Math.min(LEAST_MINUTES, all), wanted));
  const share = spanOf(window) === 0 ? 0.5 : (at - window.from) / spanOf(window);
  const from = at - Math.min(1, Math.max(0, share)) * span;
  return clampWindow({ from, to: from + span }, whole);
}

/** Moves along by a share of what is shown; less than 0: earlier. */
export function moveWindow(window: MinuteWindow, whole: MinuteWindow, share: number): MinuteWindow {
  const by = share * spanOf(window);
  return clampWindow({ from: window.from + by, to: window.to + by }, whole);
}

/** Moves just so far that a minute is in sight. */
export function windowWith(
  window: MinuteWindow,
  whole: MinuteWindow,
  minute: number,
): MinuteWindow {
  if (minute >= window.from && minute <= window.to) return window;
  const by = minute < window.from ? minute - window.from : minute - window.to;
  return clampWindow({ from: window.from + by, to: window.to + by }, whole);
}

/** A stretch of the record with some room around it. */
export function windowAround(
  stretch: { readonly fromMinute: number; readonly toMinute: number },
  whole: MinuteWindow,
): MinuteWindow {
  const room = Math.max(1, (stretch.toMinute - stretch.fromMinute) * ROOM_AROUND);
  return clampWindow({ from: stretch.fromMinute - room, to: stretch.toMinute + room }, whole);
}

export function isWhole(window: MinuteWindow, whole: MinuteWindow): boolean {
  return spanOf(window) >= spanOf(whole) - 1e-9;
}

/**
 * The part of a record to fetch for a window: from a fixed set of overlapping parts, so that moving
 * about asks for few of them, and never less than what is shown. Null where that would be all of it.
 */
export function partFor(window: MinuteWindow, whole: MinuteWindow): MinuteWindow | null {
  const all = spanOf(whole);
  const span = spanOf(window);
  if (!(span > 0) || !(all > 0)) return null;
  const halvings = Math.floor(Math.log2(all / span) + 1e-9);
  if (halvings < 1) return null;
  const tile = all / 2 ** halvings;
  const half = tile / 2;
  const index = Math.floor((window.from - whole.from) / half + 1e-9);
  const from = whole.from + index * half;
  return { from, to: Math.min(whole.to, from + tile + half) };
}

/** Does the one window hold the other, give or take a hundredth of a second? */
export function holds(outer: MinuteWindow, inner: MinuteWindow): boolean {
  return outer.from <= inner.from + 2e-4 && outer.to >= inner.to - 2e-4;
}

/** How far an arrow key reads on, minutes: a hundredth of what is shown, in a round figure. */
export function readingStep(window: MinuteWindow): number {
  const wanted = spanOf(window) / 120;
  const steps = [1 / 60, 0.05, 0.1, 0.25, 0.5, 1, 2, 5, 10, 30];
  return steps.find((step) => step >= wanted) ?? 60;
}
