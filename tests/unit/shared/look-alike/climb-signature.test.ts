import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { signatureBytes, signatureFromBytes } from '#shared/look-alike/climb-signature.ts';
import { FEWEST_MINUTES, MOST_MINUTES } from '#shared/look-alike/constants.ts';
import { readClimb } from '#shared/look-alike/read-climb.ts';
import { signatureDistance } from '#shared/look-alike/signature-distance.ts';

/** 30 °C/min from 20 °C, read every `everyMinutes` until shut off, then cooling. */
function straightClimb(minutes: number, everyMinutes = 1, zero = 0) {
  const readings = [];
  for (let at = 0; at <= minutes + 10; at += everyMinutes) {
    const celsius = at <= minutes ? 20 + 30 * at : 20 + 30 * minutes - 40 * (at - minutes);
    readings.push({ minute: zero + at, celsius });
  }
  const marks = [
    { minute: zero, kind: 'lit' as const },
    { minute: zero + minutes, kind: 'shut-off' as const },
  ];
  return { readings, marks };
}

describe('the signature of a climb', () => {
  test('is the level at each whole minute from the start to the end, without the cooling', () => {
    const signature = readClimb(straightClimb(30))?.signature;
    expect(signature).toHaveLength(31);
    signature?.forEach((celsius, minute) => {
      expect(Math.abs(celsius - (20 + 30 * minute))).toBeLessThanOrEqual(3);
    });
  });

  test('does not depend on the record’s own zero, nor on how often the logger read', () => {
    const signatures = [straightClimb(30), straightClimb(30, 1, 300), straightClimb(30, 0.25)].map(
      (input) => readClimb(input)?.signature ?? new Int16Array(0),
    );
    const [first = new Int16Array(0), shifted, finer] = signatures;
    expect(signatureDistance(first, shifted ?? first)).toBeLessThan(1);
    expect(signatureDistance(first, finer ?? first)).toBeLessThan(3);
    expect(finer).toHaveLength(31);
  });

  test('ends after three hours, and is none for a record without a climb', () => {
    const long = {
      readings: Array.from({ length: 400 }, (_, i) => ({ minute: i, celsius: 20 + 2 * i })),
    };
    expect(readClimb(long)?.signature).toHaveLength(MOST_MINUTES);
    expect(readClimb(straightClimb(FEWEST_MINUTES - 1))).toBeNull();
    expect(readClimb({ readings: [] })).toBeNull();
  });

  test('comes back from its bytes as it was, two bytes a minute at any place in a buffer', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: -300, max: 2000 }), { maxLength: MOST_MINUTES }),
        (values) => {
          const signature = Int16Array.from(values);
          const bytes = signatureBytes(signature);
          expect(bytes).toHaveLength(2 * values.length);
          const odd = new Uint8Array(bytes.length + 1);
          odd.set(bytes, 1);
          expect(signatureFromBytes(odd.subarray(1))).toEqual(signature);
        },
      ),
    );
  });
});
