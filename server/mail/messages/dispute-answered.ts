import { letter, quoted, type Letter } from '../letter.ts';

export interface AnsweredDispute {
  readonly title: string;
  readonly link: string;
  /** The server's sentence, the author's, and the moderator's, which may be blank. */
  readonly finding: string;
  readonly sentence: string;
  readonly answer: string;
  readonly restored: boolean;
}

/** Tells the author what a moderator made of a finding they disagree with. */
export function disputeAnsweredMail(name: string, dispute: AnsweredDispute): Letter {
  const { title, link, finding, sentence, answer, restored } = dispute;
  return letter(
    restored ? `A finding is kept: ${title}` : `A finding stays out of the figures: ${title}`,
    name,
    [
      `you disagree with a finding about your note "${title}":`,
      quoted(finding),
      'You said:',
      quoted(sentence),
      restored
        ? 'A moderator has looked, and keeps the finding: it counts in the figures again.'
        : 'A moderator has looked, and leaves the finding out of the figures.',
      ...(answer === '' ? [] : [quoted(answer)]),
      'Your sentence stays beside the finding, for everybody to read:',
      link,
    ],
  );
}
