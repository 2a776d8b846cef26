import type { NotePageData } from '#shared/api/notes.ts';
import type { Finding } from '#shared/firing/findings.ts';
import { formatDuration } from '#shared/units/duration.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';
import { MARKS } from '#shared/vocabulary/marks.ts';

/** Stretches that are shaded on the chart, with their word and figure. */
export function stretchesOf(findings: readonly Finding[], units: Units) {
  return findings
    .filter(({ code }) => ['stall', 'sag', 'pause', 'just-short'].includes(code))
    .map(({ code, fromMinute, toMinute, numbers }) => {
      const celsius = numbers[code === 'sag' ? 'topCelsius' : 'levelCelsius'] ?? 0;
      const word = code === 'just-short' ? 'just short' : code;
      return {
        fromMinute,
        toMinute,
        label: `${word} ${formatTemperature(celsius, units.temperature)}, ${formatDuration(toMinute - fromMinute)}`,
      };
    });
}

/** The hold found in a record, as the chart and the strip draw it. */
export function holdOf(findings: readonly Finding[]) {
  const hold = findings.find(({ code }) => code === 'hold');
  return hold ? { fromMinute: hold.fromMinute, toMinute: hold.toMinute } : null;
}

/** Marks with their words and figures. */
export function drawnMarks(marks: NotePageData['marks']) {
  return marks.map((mark) => ({
    minute: mark.minute,
    kind: mark.kind,
    label: [
      MARKS[mark.kind].toLowerCase(),
      mark.percent === null ? '' : `${String(mark.percent)}\u00a0%`,
      mark.detail,
    ]
      .filter((part) => part !== '')
      .join(' '),
  }));
}
