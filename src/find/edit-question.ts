import { readQuestion } from '#shared/question/read-question.ts';
import type { QuestionPart, TemperatureWindow } from '#shared/question/reading-types.ts';
import { formatNumber } from '#shared/units/number.ts';
import { fromCelsius } from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';

/** A part of the question as it stands there. */
export function partOf(q: string, key: string, units: Units): QuestionPart | null {
  const { parts } = readQuestion(q, { preferredUnit: units.temperature });
  return parts.find((part) => part.key === key) ?? null;
}

/** The words a part was read from. */
export const typedWords = (q: string, { span }: QuestionPart): string => q.slice(...span);

/** The question with other words where a part stood. */
export function withWords(q: string, { span }: QuestionPart, words: string): string {
  return `${q.slice(0, span[0])}${words}${q.slice(span[1])}`.replace(/\s+/g, ' ').trim();
}

/** °C, from and to; null leaves an end open. */
export interface Window {
  readonly min: number | null;
  readonly max: number | null;
}

export function windowOf({ tempC, toleranceC, tempMinC, tempMaxC }: TemperatureWindow): Window {
  if (tempC === null) return { min: tempMinC, max: tempMaxC };
  return { min: tempC - (toleranceC ?? 0), max: tempC + (toleranceC ?? 0) };
}

/** Rounding to whole degrees on the way there and back. */
const NEAR_CELSIUS = 1.2;
const isNear = (a: number | null, b: number | null): boolean =>
  a === null || b === null ? a === b : Math.abs(a - b) <= NEAR_CELSIUS;

function saysSo(q: string, wanted: Window, units: Units): boolean {
  const part = partOf(q, 'temperature', units);
  if (part?.kind !== 'temperature') return false;
  const read = windowOf(part.value);
  return isNear(read.min, wanted.min) && isNear(read.max, wanted.max);
}

/**
 * The question asking for another temperature, in words that read as exactly this window: the whole
 * search stays in its words and its address. Null where no way of saying it is understood.
 */
export function withTemperature(
  q: string,
  part: QuestionPart,
  wanted: Window,
  units: Units,
): string | null {
  const unit = units.temperature;
  const said = (celsius: number): string =>
    formatNumber(Math.round(fromCelsius(celsius, unit))).replace(/[^\d.-]/g, '');
  const { min, max } = wanted;
  const phrases: string[] = [];
  if (min !== null && max !== null) {
    const middle = said((min + max) / 2);
    phrases.push(`${middle} °${unit}`, `${said(min)} to ${said(max)} °${unit}`);
  } else if (min !== null) {
    phrases.push(`${said(min)} °${unit}`, `above ${said(min)} °${unit}`);
  } else if (max !== null) {
    phrases.push(`${said(max)} °${unit}`, `below ${said(max)} °${unit}`);
  }
  const [from, to] = part.span;
  // A unit that was not taken as part of the number ("700 ± 30 °C") goes with it.
  const after = q
    .slice(to)
    .replace(/^\s*(±|\+\/-)\s*\d+/, '')
    .replace(/^\s*°?\s*[CFcf]\b/, '');
  const before = q.slice(0, from);
  // Words such as "above" may stand before the number and belong to it.
  const befores = [before, before.replace(/\S+\s*$/, ''), before.replace(/\S+\s+\S+\s*$/, '')];
  const tries = befores.flatMap((start) => phrases.map((words) => `${start} ${words} ${after}`));
  return (
    tries
      .map((text) => text.replace(/\s+/g, ' ').trim())
      .find((text) => saysSo(text, wanted, units)) ?? null
  );
}
