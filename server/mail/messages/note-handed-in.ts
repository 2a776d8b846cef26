import { letter, type Letter } from '../letter.ts';

/** For moderators who want to be told. */
export function noteHandedInMail(name: string, title: string, link: string): Letter {
  return letter(`Handed in: ${title}`, name, [
    `the note "${title}" has been handed in and waits on the desk:`,
    link,
  ]);
}
