import { letter, quoted, type Letter } from '../letter.ts';

export function noteDeclinedMail(
  name: string,
  title: string,
  link: string,
  reason: string,
): Letter {
  return letter(`Not published: ${title}`, name, [
    `a moderator has read your note "${title}" and decided not to publish it.`,
    ...(reason === '' ? [] : [quoted(reason)]),
    'The note is still yours, and you may write it anew:',
    link,
  ]);
}
