import type { Knex } from 'knex';
import { findingText } from '#shared/firing/findings.ts';
import { findingMeant } from '#shared/note/finding-disputes.ts';
import type { Units } from '#shared/units/units.ts';
import { findDispute } from '../disputes/dispute-repository.ts';
import { publishedFindings } from '../notes/revision-repository.ts';
import type { Letter } from './letter.ts';
import { disputeAnsweredMail } from './messages/dispute-answered.ts';

/**
 * The letter about a disputed finding as things are now, in the author's units; null when there is
 * no answer to tell of any more.
 */
export async function disputeLetter(
  db: Knex,
  disputeId: number,
  to: { readonly name: string; readonly units: Units },
  note: { readonly title: string; readonly link: string },
): Promise<Letter | null> {
  const dispute = await findDispute(db, disputeId);
  if (!dispute || (dispute.state !== 'restored' && dispute.state !== 'left')) return null;
  const findings = (await publishedFindings(db, [dispute.noteId])).get(dispute.noteId) ?? [];
  const finding = findingMeant(findings, dispute);
  if (!finding) return null;
  return disputeAnsweredMail(to.name, {
    ...note,
    finding: findingText(finding, to.units),
    sentence: dispute.sentence,
    answer: dispute.answer,
    restored: dispute.state === 'restored',
  });
}
