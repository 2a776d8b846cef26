import { letter, quoted, type Letter } from '../letter.ts';

export function noteSentBackMail(
  name: string,
  title: string,
  link: string,
  reason: string,
): Letter {
  return letter(`Sent back: ${title}`, name, [
    `a moderator has read your note "${title}" and asks you to mend something before it can be published.`,
    ...(reason === '' ? [] : [quoted(reason)]),
    'The remarks stand beside the fields they are about:',
    link,
  ]);
}
