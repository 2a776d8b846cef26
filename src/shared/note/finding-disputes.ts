import { z } from 'zod';
import { ANSWER_MINUTES } from '../firing/constants.ts';
import { FINDING_CODES, type Finding } from '../firing/findings.ts';
import { optionalText, text } from './field-types.ts';

/** How long the sentence is with which somebody disagrees, in characters, ends trimmed. */
export const DISPUTE_SENTENCE = { fewest: 10, most: 300 } as const;
/** More than a record gives findings. */
export const MAX_DISPUTES = 40;

/** What says which finding is meant: its code, and where it begins, minutes of the record. */
export const findingKeySchema = z.strictObject({
  code: z.enum(FINDING_CODES),
  minute: z.number().min(-1440).max(20_160),
});
export type FindingKey = z.infer<typeof findingKeySchema>;

/** A sentence long enough to be a reason. */
export const reasonSchema = text(DISPUTE_SENTENCE.most)
  .transform((value) => value.trim())
  .refine(isReason, `Say why, in ${String(DISPUTE_SENTENCE.fewest)} characters or more.`);

/** Whether a sentence says enough to count. */
export function isReason(sentence: string): boolean {
  return [...sentence.trim()].length >= DISPUTE_SENTENCE.fewest;
}

/**
 * A disagreement as the draft keeps it: also while its sentence is still being typed, so that
 * nothing is lost. It counts once the sentence is a reason.
 */
export const draftDisputeSchema = findingKeySchema.extend({
  sentence: optionalText(DISPUTE_SENTENCE.most),
});
export type DraftDispute = z.infer<typeof draftDisputeSchema>;

/** *disputed*: no moderator has looked; *left*: one has, and leaves it out; *restored*: it counts again. */
export const DISPUTE_STATES = ['disputed', 'left', 'restored'] as const;
export type DisputeState = (typeof DISPUTE_STATES)[number];
export interface StandingDispute extends FindingKey {
  readonly state: DisputeState;
}

const ofCode = (findings: readonly Finding[], code: Finding['code']): Finding[] =>
  findings.filter((finding) => finding.code === code);

/**
 * The finding that a disagreement is about. A record may be read again, with other readings or by
 * better rules, and its findings then begin a little elsewhere: the one meant is that of the same
 * code which begins nearest, within the minutes that an answer to a level stretch has too. Null
 * when there is none any more.
 */
export function findingMeant(findings: readonly Finding[], key: FindingKey): Finding | null {
  let best: Finding | null = null;
  for (const finding of ofCode(findings, key.code)) {
    const distance = Math.abs(finding.fromMinute - key.minute);
    if (distance > ANSWER_MINUTES) continue;
    if (best === null || distance < Math.abs(best.fromMinute - key.minute)) best = finding;
  }
  return best;
}

/** The disagreement about one of these findings, the last where there are several; null for none. */
export function disputeAbout<Dispute extends FindingKey>(
  finding: Finding,
  findings: readonly Finding[],
  disputes: readonly Dispute[],
): Dispute | null {
  return disputes.findLast((dispute) => findingMeant(findings, dispute) === finding) ?? null;
}

/** What the author answered about a level stretch: meant, or stuck. Null for none. */
export function levelAnswerAbout<Answer extends { readonly fromMinute: number }>(
  finding: Finding,
  answers: readonly Answer[],
): Answer | null {
  if (finding.code !== 'stall' && finding.code !== 'pause') return null;
  return (
    answers.findLast(
      ({ fromMinute }) => Math.abs(fromMinute - finding.fromMinute) <= ANSWER_MINUTES,
    ) ?? null
  );
}

/** A disputed finding leaves the figures until a moderator restores it. */
export const leavesFigures = ({ state }: StandingDispute): boolean => state !== 'restored';

/** The draft's disagreements that say enough, about findings there are; the last of each. */
export function reasonedDisputes(
  findings: readonly Finding[],
  disputes: readonly DraftDispute[],
): { readonly finding: Finding; readonly sentence: string }[] {
  const reasoned = disputes.filter(({ sentence }) => isReason(sentence));
  return findings.flatMap((finding) => {
    const dispute = disputeAbout(finding, findings, reasoned);
    return dispute ? [{ finding, sentence: dispute.sentence.trim() }] : [];
  });
}

/** The draft's disagreements with one about a finding put in, worded anew, or (null) taken out. */
export function withDispute(
  findings: readonly Finding[],
  disputes: readonly DraftDispute[],
  finding: Finding,
  sentence: string | null,
): DraftDispute[] {
  const key: FindingKey = { code: finding.code, minute: finding.fromMinute };
  const isMeant = (dispute: FindingKey) => findingMeant(findings, dispute) === finding;
  if (sentence === null) return disputes.filter((dispute) => !isMeant(dispute));
  const at = disputes.findLastIndex(isMeant);
  if (at < 0) return [...disputes, { ...key, sentence }];
  return disputes.map((dispute, index) => (index === at ? { ...dispute, sentence } : dispute));
}
