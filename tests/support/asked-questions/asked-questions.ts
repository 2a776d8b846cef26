import { readFileSync } from 'node:fs';
import path from 'node:path';
import type { QuestionReading } from '#shared/question/reading-types.ts';

/** A question and what is to be read from it, both as short text: `trouble=stall temp=700~20`. */
export interface AskedQuestion {
  readonly question: string;
  readonly expected: string;
}

/** The table `NAME.txt` beside this file: `question => expected`, `#` before a remark. */
export function askedQuestions(name: string): AskedQuestion[] {
  return readFileSync(path.join(import.meta.dirname, `${name}.txt`), 'utf8')
    .split('\n')
    .flatMap((line) => {
      const [question, expected] = line.split(' =>');
      if (line.startsWith('#') || question === undefined || expected === undefined) return [];
      return [{ question: question.trim(), expected: sortWords(expected) }];
    });
}

/** Troubles keep their order, surest first; what is ruled out, causes and changes have none. */
const WITHOUT_ORDER = /^(not|cause|change)=(.*)$/;
function sortWords(text: string): string {
  const words = text.split(' ').filter(Boolean);
  const sorted = words.map((word) => {
    const [, key, values] = WITHOUT_ORDER.exec(word) ?? [];
    return key === undefined ? word : `${key}=${(values ?? '').split(',').sort().join(',')}`;
  });
  return sorted.sort().join(' ');
}
const whole = (value: number | null): string => (value === null ? '' : String(Math.round(value)));

/** A reading in the same short text. Changes are told only where the table asks for them. */
export function shortReading(reading: QuestionReading, expected: string): string {
  const said: (string | false)[] = [
    reading.trouble.length > 0 && `trouble=${reading.trouble.join(',')}`,
    reading.notTrouble.length > 0 && `not=${reading.notTrouble.join(',')}`,
    reading.tempC !== null && `temp=${whole(reading.tempC)}~${whole(reading.toleranceC)}`,
    (reading.tempMinC ?? reading.tempMaxC) !== null &&
      `range=${whole(reading.tempMinC)}..${whole(reading.tempMaxC)}`,
    reading.tempUnit !== null && `unit=${reading.tempUnit}`,
    reading.cone !== null && `cone=${reading.cone}`,
    reading.minutes !== null && `min=${reading.minutesOp ?? ''}${whole(reading.minutes)}`,
    reading.ratePerMin !== null && `rate=${whole(reading.ratePerMin)}`,
    reading.diffC !== null && `diff=${whole(reading.diffC)}`,
    reading.form !== null && `form=${reading.form}`,
    reading.sizeCm !== null && `size=${whole(reading.sizeCm)}`,
    reading.glaze !== null && `glaze=${reading.glaze}`,
    reading.causes.length > 0 && `cause=${reading.causes.join(',')}`,
    expected.includes('change=') && `change=${reading.changes.join(',')}`,
    reading.fuel !== null && `fuel=${reading.fuel}`,
    reading.clay !== null && `clay=${reading.clay}`,
  ];
  return sortWords(said.filter((part) => part !== false).join(' '));
}
