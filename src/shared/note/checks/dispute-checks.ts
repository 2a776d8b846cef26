import { findingsOf } from '../../firing/findings.ts';
import { TROUBLES } from '../../vocabulary/troubles.ts';
import type { Trouble } from '../../vocabulary/troubles.ts';
import { DISPUTE_SENTENCE, disputeAbout, isReason, reasonedDisputes } from '../finding-disputes.ts';
import { lookAgain, mustMend, type Check, type CheckContext } from './check.ts';

/** Troubles all of whose findings the author disputes in this draft. */
export function disputedTroubles({ fields, reading }: CheckContext): Trouble[] {
  if (!reading || fields.findingDisputes.length === 0) return [];
  const findings = findingsOf(reading);
  const out = reasonedDisputes(findings, fields.findingDisputes).map(({ finding }) => finding);
  const troubles = new Set(out.flatMap(({ trouble }) => trouble ?? []));
  return [...troubles].filter((trouble) =>
    findings.every((finding) => finding.trouble !== trouble || out.includes(finding)),
  );
}

/** A disagreement without its sentence, and a trouble that is both named and disputed. */
export function disputeChecks(context: CheckContext): Check[] {
  const { fields, reading } = context;
  if (!reading || fields.findingDisputes.length === 0) return [];
  const findings = findingsOf(reading);
  const unsaid = findings.filter((finding) => {
    const dispute = disputeAbout(finding, findings, fields.findingDisputes);
    return dispute !== null && !isReason(dispute.sentence);
  });
  const named = fields.result.troubles;
  return [
    ...(unsaid.length > 0
      ? [
          mustMend(
            'dispute-without-reason',
            '/findingDisputes',
            `Say in a sentence of at least ${String(DISPUTE_SENTENCE.fewest)} characters why you disagree, or take it back.`,
          ),
        ]
      : []),
    ...disputedTroubles(context)
      .filter((trouble) => named.includes(trouble))
      .map((trouble) => {
        const words = TROUBLES[trouble].toLowerCase();
        return lookAgain(
          `${trouble}-named-and-disputed`,
          '/result/troubles',
          `You name “${words}”, and disagree that the record shows it. While you disagree it counts nowhere. Take it out, or say what you saw.`,
          {
            pointer: '/result/troubles',
            value: named.filter((other) => other !== trouble),
            label: `Take out “${words}”`,
          },
        );
      }),
  ];
}
