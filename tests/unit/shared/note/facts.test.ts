import { describe, expect, it } from 'vitest';
import type { Reading } from '#shared/firing/types.ts';
import { firingFacts } from '#shared/note/facts.ts';
import { aKiln, aNote, aPiece, aReading, aStall } from './a-note.ts';

describe('the facts of a firing', () => {
  it('take the record’s word before the author’s', () => {
    const facts = firingFacts({
      fields: aNote(),
      kiln: aKiln(),
      reading: aReading({ timeToTemperatureMinutes: 42, peak: { celsius: 1008, minute: 44 } }),
    });
    expect(facts).toMatchObject({
      hasRecord: true,
      peakCelsius: 1008,
      timeToTemperatureMinutes: 42,
      holdMinutes: 3,
      aimCelsius: 1000,
    });
  });

  it('take the author’s word without a record', () => {
    const facts = firingFacts({ fields: aNote(), kiln: aKiln(), reading: null });
    expect(facts).toMatchObject({
      hasRecord: false,
      peakCelsius: 1005,
      timeToTemperatureMinutes: 40,
      holdMinutes: 3,
      measuredTroubles: [],
      rate400To700: null,
    });
  });

  it('aim at the lower of target and peak when drawn by the melt', () => {
    const fields = aNote((note) => (note.plan.peakCelsius = 960));
    expect(firingFacts({ fields, kiln: null, reading: null }).aimCelsius).toBe(960);
    fields.plan.drawnBecause = 'temperature';
    expect(firingFacts({ fields, kiln: null, reading: null }).aimCelsius).toBe(1000);
  });

  it('tell an answered “no hold” from a blank', () => {
    const fields = aNote((note) => {
      note.plan.noHold = true;
      note.plan.holdKeptMinutes = null;
    });
    expect(firingFacts({ fields, kiln: null, reading: null }).holdMinutes).toBe(0);
    fields.plan.noHold = false;
    expect(firingFacts({ fields, kiln: null, reading: null }).holdMinutes).toBeNull();
  });

  it('compute the kiln’s volume, and a piece’s own recipe over the shared one', () => {
    const fields = aNote((note) => {
      note.pieces = [
        aPiece({ recipe: { ...note.reduction, then: 'quenched', containerLitres: 20 } }),
        aPiece(),
      ];
    });
    const kiln = aKiln({
      shape: 'square',
      insideWidthMm: 400,
      insideDepthMm: 500,
      insideHeightMm: 500,
    });
    const facts = firingFacts({ fields, kiln, reading: null });
    expect(facts.volumeLitres).toBe(100);
    expect(facts.pieces.map((piece) => [piece.containerLitres, piece.quenched])).toEqual([
      [20, true],
      [50, null],
    ]);
  });

  it('keep measured and named troubles apart', () => {
    const fields = aNote((note) => (note.result.troubles = ['weak-reduction']));
    const facts = firingFacts({ fields, kiln: null, reading: aReading({ levels: [aStall()] }) });
    expect(facts.measuredTroubles).toEqual(['stall']);
    expect(facts.namedTroubles).toEqual(['weak-reduction']);
  });

  it('are plain data', () => {
    const facts = firingFacts({ fields: aNote(), kiln: aKiln(), reading: aReading() });
    expect(JSON.parse(JSON.stringify(facts))).toEqual(facts);
  });
});

describe('whether a stall went on', () => {
  const stall = aStall({ fromMinute: 30, toMinute: 45, levelCelsius: 708, then: 'climbed' });
  const reading = aReading({ levels: [stall] });
  /** Level to minute 45, then at so many degrees a minute. */
  const climbingAt = (rate: number): Reading[] =>
    Array.from({ length: 81 }, (_, minute) => ({
      minute,
      celsius: minute < 30 ? 23.6 * minute : 708 + Math.max(0, minute - 45) * rate,
    }));
  const wentOn = (readings: Reading[] | null) =>
    firingFacts({ fields: aNote(), kiln: null, reading, readings }).stalls[0]?.wentOn;

  it('is known from the readings: 50 °C within 20 min', () => {
    expect(wentOn(climbingAt(3))).toBe(true);
    expect(wentOn(climbingAt(2.4))).toBe(false);
  });

  it('is not known without them, unless it never climbed', () => {
    expect(wentOn(null)).toBeNull();
    const ended = aReading({ levels: [aStall()] });
    const facts = firingFacts({ fields: aNote(), kiln: null, reading: ended });
    expect(facts.stalls[0]?.wentOn).toBe(false);
  });
});
