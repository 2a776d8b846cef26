import { describe, expect, it } from 'vitest';
import { readAnyRecord } from '#shared/record/read-any-record.ts';
import { encoded, loggerFile } from '../../../support/logger-files.ts';
import { ALL_SHAPES } from './shapes/all-shapes.ts';

// The files are written by common practice and from memory; none is copied from a real logger.
describe('a logger’s file that nobody has said anything about', () => {
  it.each(ALL_SHAPES)(
    'gives its readings and says what was assumed: $name',
    ({ shape, encoding = 'utf-8', expected = {} }) => {
      const { text, points } = loggerFile(shape);
      const record = readAnyRecord(encoded(text, encoding));
      const left = expected.kept ? points.filter((_, i) => expected.kept?.(i)) : points;
      const zero = left[0]?.minute ?? 0;
      expect(record.unit).toBe(shape.unit ?? 'C');
      expect(record.readings.length).toBe(left.length);
      record.readings.forEach((reading, i) => {
        const truth = left[i];
        expect(Math.abs(reading.celsius - (truth?.celsius ?? NaN))).toBeLessThan(
          expected.within ?? 0.11,
        );
        const late = Math.abs(reading.minute - ((truth?.minute ?? NaN) - zero));
        expect(late).toBeLessThan(expected.late ?? 0.02);
      });
      const said = record.assumed.join('\n');
      for (const words of expected.says ?? []) expect(said).toContain(words);
      for (const words of expected.saysNot ?? []) expect(said).not.toContain(words);
      if (expected.second !== undefined) {
        expect(record.choice.secondColumn).toBe(expected.second);
      }
      if (expected.silent) expect(record.assumed).toEqual([]);
    },
  );
});
