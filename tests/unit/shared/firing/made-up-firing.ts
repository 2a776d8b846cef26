import { expect } from 'vitest';
import { readFiring } from '#shared/firing/read-firing.ts';
import type { FiringInput, FiringReading, Reading } from '#shared/firing/types.ts';

/** A course of straight lines through [minute, °C] corners, read every so many minutes. */
export function straightLines(
  corners: readonly (readonly [number, number])[],
  stepMinutes = 0.5,
): Reading[] {
  const readings: Reading[] = [];
  const last = corners[corners.length - 1]![0];
  const first = corners[0]![0];
  for (let i = 0; first + i * stepMinutes <= last + 1e-9; i += 1) {
    const minute = first + i * stepMinutes;
    const next = corners.findIndex(([at]) => at >= minute - 1e-9);
    const [t1, y1] = corners[next]!;
    const [t0, y0] = corners[Math.max(0, next - 1)]!;
    readings.push({
      minute,
      celsius: t1 === t0 ? y1 : y0 + ((y1 - y0) * (minute - t0)) / (t1 - t0),
    });
  }
  return readings;
}

/** The reading of a made-up firing, to 1010 °C by gas from cold unless said otherwise. */
export function read(
  corners: readonly (readonly [number, number])[],
  more: Partial<FiringInput> & { stepMinutes?: number } = {},
): FiringReading {
  const { stepMinutes, ...input } = more;
  const reading = readFiring({
    readings: straightLines(corners, stepMinutes),
    targetCelsius: 1010,
    fuel: 'propane',
    startClass: 'cold',
    drawnBecause: 'temperature',
    probe: 'K',
    ...input,
  });
  expect(reading).not.toBeNull();
  return reading!;
}
