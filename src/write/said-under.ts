import { findingText } from '#shared/firing/findings.ts';
import { disputeAbout } from '#shared/note/finding-disputes.ts';
import { placeOfFinding } from './finding-places.ts';
import type { WriteForm } from './form-context.ts';

/** Everything said in the margin beside fields under these pointers, as one text to compare. */
export function saidUnder(form: WriteForm, prefixes: readonly string[]): string {
  const isUnder = (pointer: string) =>
    prefixes.some((prefix) => pointer === prefix || pointer.startsWith(`${prefix}/`));
  const pointers = [...new Set(form.checks.map(({ pointer }) => pointer))].filter(isUnder);
  return JSON.stringify([
    pointers.map((pointer) => [
      pointer,
      form
        .issuesAt(pointer)
        .map(({ kind, text, settled }) => [kind, text, settled === true ? 'settled' : '']),
    ]),
    form.fields.checkAnswers.filter(({ pointer }) => isUnder(pointer)),
    form.checks.flatMap(({ pointer, offer }) => (offer && isUnder(pointer) ? [offer] : [])),
    form.reading.findings
      .filter((finding) => isUnder(placeOfFinding(finding) ?? ''))
      .map((finding) => [
        findingText(finding, form.units),
        disputeAbout(finding, form.reading.findings, form.fields.findingDisputes) !== null,
      ]),
  ]);
}
