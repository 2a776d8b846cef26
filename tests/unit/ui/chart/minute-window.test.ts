import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  clampWindow,
  holds,
  isWhole,
  LEAST_MINUTES,
  moveWindow,
  partFor,
  readingStep,
  windowAround,
  windowWith,
  zoomWindow,
  type MinuteWindow,
} from '../../../../src/ui/chart/minute-window.ts';

const WHOLE: MinuteWindow = { from: -5, to: 95 };
const minute = fc.double({ min: -300, max: 300, noNaN: true });
const anyWindow = fc
  .tuple(minute, fc.double({ min: 0, max: 300, noNaN: true }))
  .map(([from, span]): MinuteWindow => ({ from, to: from + span }));
const wholes = fc
  .tuple(minute, fc.double({ min: 0.5, max: 900, noNaN: true }))
  .map(([from, span]): MinuteWindow => ({ from, to: from + span }));

function expectWithin(window: MinuteWindow, whole: MinuteWindow): void {
  expect(window.from).toBeGreaterThanOrEqual(whole.from - 1e-9);
  expect(window.to).toBeLessThanOrEqual(whole.to + 1e-9);
  const least = Math.min(LEAST_MINUTES, whole.to - whole.from);
  expect(window.to - window.from).toBeGreaterThanOrEqual(least - 1e-6);
}

describe('a window on a record', () => {
  it('never leaves the record and never gets narrower than can be read, whatever is done to it', () => {
    fc.assert(
      fc.property(
        wholes,
        anyWindow,
        fc.double({ min: 0.01, max: 100, noNaN: true }),
        minute,
        (whole, wish, factor, at) => {
          const window = clampWindow(wish, whole);
          expectWithin(window, whole);
          expectWithin(zoomWindow(window, whole, factor, at), whole);
          expectWithin(moveWindow(window, whole, factor - 50), whole);
          expectWithin(windowWith(window, whole, at), whole);
          expectWithin(windowAround({ fromMinute: wish.from, toMinute: wish.to }, whole), whole);
        },
      ),
    );
  });

  it('keeps the minute in its place about which it is zoomed', () => {
    const window = zoomWindow({ from: 20, to: 60 }, WHOLE, 2, 30);
    expect(window).toEqual({ from: 25, to: 45 });
    expect((30 - window.from) / 20).toBe((30 - 20) / 40);
  });

  it('zoomed in and out again is what it was', () => {
    const window = { from: 20, to: 60 };
    expect(zoomWindow(zoomWindow(window, WHOLE, 2), WHOLE, 1 / 2)).toEqual(window);
    expect(zoomWindow(window, WHOLE, 1 / 64)).toBe(WHOLE);
    expect(isWhole(WHOLE, WHOLE)).toBe(true);
    expect(isWhole(window, WHOLE)).toBe(false);
  });

  it('moves by a share of itself and stops at the ends', () => {
    expect(moveWindow({ from: 20, to: 40 }, WHOLE, 0.5)).toEqual({ from: 30, to: 50 });
    expect(moveWindow({ from: 0, to: 20 }, WHOLE, -3)).toEqual({ from: -5, to: 15 });
  });

  it('follows a minute only as far as it must', () => {
    const window = { from: 20, to: 40 };
    expect(windowWith(window, WHOLE, 33)).toBe(window);
    expect(windowWith(window, WHOLE, 41)).toEqual({ from: 21, to: 41 });
    expect(windowWith(window, WHOLE, 18)).toEqual({ from: 18, to: 38 });
  });

  it('shows a stretch with room on both sides', () => {
    expect(windowAround({ fromMinute: 30, toMinute: 50 }, WHOLE)).toEqual({ from: 23, to: 57 });
    expect(windowAround({ fromMinute: 90, toMinute: 95 }, WHOLE).to).toBe(95);
  });

  it('reads on in round steps, finer the closer it is looked at', () => {
    expect(readingStep({ from: 0, to: 60 })).toBe(0.5);
    expect(readingStep({ from: 0, to: 2 })).toBe(1 / 60);
    expect(readingStep({ from: 0, to: 900 })).toBe(10);
  });
});

describe('partFor', () => {
  it('always holds what is shown, and at most four times as much, or asks for nothing', () => {
    fc.assert(
      fc.property(wholes, anyWindow, (whole, wish) => {
        const window = clampWindow(wish, whole);
        const part = partFor(window, whole);
        if (part === null) {
          expect(window.to - window.from).toBeGreaterThan((whole.to - whole.from) / 2 - 1e-6);
          return;
        }
        expect(holds(part, window)).toBe(true);
        expect(part.to - part.from).toBeLessThanOrEqual((window.to - window.from) * 3 + 1e-6);
      }),
    );
  });

  it('asks for the same part while one looks about in it', () => {
    const part = partFor({ from: 20, to: 40 }, { from: 0, to: 100 });
    expect(part).toEqual({ from: 12.5, to: 50 });
    expect(partFor({ from: 24, to: 44 }, { from: 0, to: 100 })).toEqual(part);
  });
});
