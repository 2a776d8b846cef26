import { letter, quoted, type Letter } from '../letter.ts';

export function noteTakenDownMail(
  name: string,
  title: string,
  link: string,
  reason: string,
): Letter {
  return letter(`Taken down: ${title}`, name, [
    `a moderator has taken down your note "${title}": readers no longer see it, and it no longer counts in the figures.`,
    ...(reason === '' ? [] : [quoted(reason)]),
    'The note is still yours, and you may mend it and hand it in again:',
    link,
  ]);
}
