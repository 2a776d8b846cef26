import type { Course } from './course.ts';
import type { FiringInput } from './types.ts';
import { formatDuration } from '../units/duration.ts';

/** What had to be assumed to read a record, in plain words for the author to see. */
export function assumptionsOf(course: Course, input: FiringInput, aim: number | null): string[] {
  const { record, start, shutOff } = course;
  const said: string[] = [];
  const readings = (count: number) => (count === 1 ? '1 reading was' : `${count} readings were`);
  if (record.outsideCount > 0) {
    said.push(`${readings(record.outsideCount)} set aside: outside −40 to 1400 °C.`);
  }
  if (record.wildCount > 0) {
    said.push(`${readings(record.wildCount)} set aside: a jump no kiln makes, and straight back.`);
  }
  if (record.repeatedCount > 0) {
    said.push(
      `${readings(record.repeatedCount)} at the same moment as another: their mean is used.`,
    );
  }
  if (record.wasUnordered)
    said.push('The readings were not in order of time; they were put in order.');
  const first = record.minutes[0] ?? 0;
  const last = record.minutes[record.minutes.length - 1] ?? 0;
  if (start.inferred) {
    said.push(
      start.minute <= first
        ? 'No mark says when the burner was lit: the start is taken as the first reading.'
        : `No mark says when the burner was lit: the start is taken as the beginning of the climb, at ${formatDuration(start.minute)}.`,
    );
  }
  if (shutOff.inferred) {
    said.push(
      shutOff.minute >= last
        ? 'No mark says when the burner was shut off: the end of the firing is taken as the last reading.'
        : `No mark says when the burner was shut off: the end of the firing is taken as the last reading before the lasting fall, at ${formatDuration(shutOff.minute)}.`,
    );
  }
  if (aim === null) {
    said.push(
      'No target is known: nothing is said of reaching it, and level stretches at the top are taken as meant.',
    );
  } else if (input.targetCelsius == null) {
    said.push(
      'No target is known: the firing was drawn by its melt or cone, so the peak is taken as the aim.',
    );
  }
  if (course.swingMinutes !== null) {
    said.push(
      `The record swings about every ${formatDuration(course.swingMinutes)}, so the curve is taken over a wider time.`,
    );
  }
  return said;
}
