import type { FindingDispute } from '#shared/api/disputes.ts';
import type { Finding } from '#shared/firing/findings.ts';
import {
  disputeAbout,
  findingMeant,
  reasonedDisputes,
  type DisputeState,
} from '#shared/note/finding-disputes.ts';
import type { Revision } from '../notes/revision-repository.ts';
import { presentDispute, type Dispute } from './dispute-repository.ts';

type Standing = Dispute & { readonly state: DisputeState };
const isStanding = (dispute: Dispute): dispute is Standing => dispute.state !== 'withdrawn';

/** The disputes in force about the findings of a published revision, each about one that is there. */
export function standingDisputes(
  findings: readonly Finding[],
  rows: readonly Dispute[],
): (FindingDispute & { id: number })[] {
  const standing = rows.filter(isStanding);
  return findings.flatMap((finding) => {
    const dispute = disputeAbout(finding, findings, standing);
    return dispute ? [presentDispute(dispute)] : [];
  });
}

/** What publishing a revision does to the note's disputes. */
export type Taking =
  | { readonly act: 'add'; readonly finding: Finding; readonly sentence: string }
  | {
      readonly act: 'say';
      readonly finding: Finding;
      readonly row: Dispute;
      readonly sentence: string;
    }
  | { readonly act: 'keep'; readonly finding: Finding; readonly row: Standing }
  | { readonly act: 'withdraw'; readonly row: Dispute };

type Stated = Pick<Revision, 'fields' | 'findings' | 'createdAt'>;

/**
 * A revision says what its author disputed when it was handed in; that is what holds once it is
 * published. Later than the handing in, and so stronger, is what the author said or took back on
 * the published page since; and what a moderator restored stays restored. A dispute whose finding
 * is no longer made ends.
 */
export function disputesAtPublishing(revision: Stated, rows: readonly Dispute[]): Taking[] {
  const { findings, fields, createdAt } = revision;
  const stated = new Map(
    reasonedDisputes(findings, fields.findingDisputes).map((each) => [each.finding, each.sentence]),
  );
  const takings = findings.flatMap((finding): Taking[] => {
    const row = disputeAbout(finding, findings, rows);
    const sentence = stated.get(finding);
    if (!row) return sentence === undefined ? [] : [{ act: 'add', finding, sentence }];
    const saidSince = row.saidAt.getTime() > createdAt.getTime();
    if (!isStanding(row)) {
      return sentence === undefined || saidSince ? [] : [{ act: 'say', finding, row, sentence }];
    }
    if (row.state === 'restored' || saidSince || sentence === row.sentence) {
      return [{ act: 'keep', finding, row }];
    }
    return sentence === undefined
      ? [{ act: 'withdraw', row }]
      : [{ act: 'say', finding, row, sentence }];
  });
  const ended = rows.filter(
    (row) => isStanding(row) && row.state !== 'restored' && findingMeant(findings, row) === null,
  );
  return [...takings, ...ended.map((row): Taking => ({ act: 'withdraw', row }))];
}

/** The disputes as they will stand once this revision is published: for preview and desk. */
export function disputesWhenPublished(
  revision: Stated,
  rows: readonly Dispute[],
): FindingDispute[] {
  return disputesAtPublishing(revision, rows).flatMap((taking): FindingDispute[] => {
    switch (taking.act) {
      case 'keep':
        return [presentDispute(taking.row)];
      case 'add':
      case 'say':
        return [
          {
            id: null,
            version: 0,
            code: taking.finding.code,
            minute: taking.finding.fromMinute,
            sentence: taking.sentence,
            state: 'disputed',
            at: revision.createdAt.toISOString(),
            answer: null,
          },
        ];
      case 'withdraw':
        return [];
    }
  });
}
