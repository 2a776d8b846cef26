import { letter, quoted, type Letter } from '../letter.ts';

/** Tells an author what was asked about their note. */
export function questionAskedMail(
  name: string,
  asker: string | null,
  about: { readonly title: string; readonly link: string; readonly question: string },
): Letter {
  return letter(`A question: ${about.title}`, name, [
    `${asker ?? 'a former member'} asks about your note "${about.title}":`,
    quoted(about.question),
    'Answer it on the page of the note, where everybody can read it:',
    about.link,
  ]);
}
