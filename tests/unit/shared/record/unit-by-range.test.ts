import { describe, expect, it } from 'vitest';
import { guessUnit } from '#shared/record/guess-unit.ts';
import { readAnyRecord } from '#shared/record/read-any-record.ts';
import { loggerFile, writtenIn } from '../../../support/logger-files.ts';

const UNITS = ['C', 'F', 'K'] as const;

describe('the unit of temperatures that name none', () => {
  it('is found for every kiln that starts at 10 to 40 °C or hot at 200 °C and peaks from 400 to 1100 °C', () => {
    const wrong: string[] = [];
    const starts = [200, ...Array.from({ length: 31 }, (_, i) => 10 + i)];
    for (const unit of UNITS) {
      for (const start of starts) {
        for (let peak = 400; peak <= 1100; peak += 5) {
          const low = writtenIn(start, unit);
          const guess = guessUnit(low, low, writtenIn(peak, unit));
          if (guess.unit !== unit) wrong.push(`${start} to ${peak} °C in ${unit}: ${guess.unit}`);
        }
      }
    }
    expect(wrong).toEqual([]);
  });

  it.each(UNITS)('is found in whole files, and said: %s', (unit) => {
    for (const startCelsius of [10, 22, 35, 200]) {
      for (const peakCelsius of [400, 650, 950, 1100]) {
        const { text, points } = loggerFile({
          head: ['Minutes,Temp'],
          unit,
          startCelsius,
          peakCelsius,
        });
        const record = readAnyRecord(new TextEncoder().encode(text));
        expect(`${startCelsius} ${peakCelsius} ${record.unit}`).toBe(
          `${startCelsius} ${peakCelsius} ${unit}`,
        );
        expect(record.readings[50]?.celsius).toBeCloseTo(points[50]?.celsius ?? NaN, 0);
        expect(record.assumed.join(' ')).toContain('names no unit');
      }
    }
  });

  it('is doubted aloud where two units are likely', () => {
    // 80 to 950: a warm kiln in °C, or a cold one in °F that reaches 510 °C.
    expect(guessUnit(80, 80, 950).odds).toBeLessThan(20);
    const { text } = loggerFile({
      head: ['Minutes,Temp'],
      startCelsius: 80,
      peakCelsius: 950,
      mend: (lines) => lines.slice(0, 90),
    });
    const record = readAnyRecord(new TextEncoder().encode(text));
    expect(record.assumed.join(' ')).toContain('It could also be');
  });

  it('is never one in which the readings would be colder than any shed', () => {
    expect(guessUnit(18, 18, 400).unit).toBe('C');
    expect(guessUnit(-5, -5, 900).unit).toBe('C');
  });

  it('is told by a known target where the range leaves two: a warm kiln’s 905 is no 485 °C then', () => {
    expect(guessUnit(59, 59, 905).unit).toBe('F');
    expect(guessUnit(59, 59, 905, 905).unit).toBe('C');
    expect(guessUnit(383, 383, 885, 885).unit).toBe('C');
    const { text } = loggerFile({ head: ['Minutes,Temp'], startCelsius: 60, peakCelsius: 905 });
    expect(readAnyRecord(new TextEncoder().encode(text), 905).unit).toBe('C');
  });

  it('is found, °C from °F, beside a target that was not reached: every stall from 60 % of it up', () => {
    const wrong: string[] = [];
    for (const unit of ['C', 'F'] as const) {
      for (const target of [900, 960, 1010]) {
        for (const start of [12, 20, 30, 38]) {
          for (let peak = 0.6 * target; peak <= target + 15; peak += 5) {
            const low = writtenIn(start, unit);
            const guess = guessUnit(low, low, writtenIn(peak, unit), target);
            if (guess.unit !== unit) wrong.push(`${start} to ${peak} of ${target} in ${unit}`);
          }
        }
      }
    }
    expect(wrong).toEqual([]);
  });
});

describe('a bare K above the table', () => {
  const unitOf = (line: string, unit: 'C' | 'K', startCelsius = 180) => {
    const { text } = loggerFile({ head: [line, 'Minutes,Temp'], unit, startCelsius });
    return readAnyRecord(new TextEncoder().encode(text)).unit;
  };

  it('is kelvin behind the word unit, if the numbers allow it', () => {
    expect(unitOf('Unit,K', 'K')).toBe('K');
    expect(unitOf('Unit: K', 'K', 420)).toBe('K');
    expect(unitOf('Unit: K', 'C', 20)).toBe('C');
  });

  it('is the thermocouple’s type behind the word type', () => {
    expect(unitOf('Unit type,K', 'C', 210)).toBe('C');
  });
});
