import type { FindAnswer } from '#shared/api/search.ts';
import { labelOf } from '#shared/question/part-labels.ts';
import { readQuestion } from '#shared/question/read-question.ts';
import type { Units } from '#shared/units/units.ts';

export type ReadAsPart = FindAnswer['parts'][number];

/** How a question is understood, at once and in the reader's units: no server is asked. */
export function readAs(q: string, off: readonly string[], units: Units): ReadAsPart[] {
  return readQuestion(q, { preferredUnit: units.temperature }).parts.map((part) => ({
    key: part.key,
    kind: part.kind,
    label: labelOf(part, units),
    off: off.includes(part.key),
  }));
}

const KIND_WORDS: Readonly<Partial<Record<string, string>>> = {
  cause: 'cause: ',
  change: 'change: ',
};

/** A part as its chip says it: a cause and a trouble may bear the same words. */
export function chipWords({ kind, label }: ReadAsPart): string {
  return `${KIND_WORDS[kind] ?? ''}${label}`;
}

/** True when a stall is among the troubles asked about and not switched off. */
export function asksAboutStall(parts: readonly ReadAsPart[]): boolean {
  return parts.some(({ key, off }) => key === 'trouble:stall' && !off);
}
