import { letter, quoted, type Letter } from '../letter.ts';

/** Tells an asker what was answered. */
export function questionAnsweredMail(
  name: string,
  by: string | null,
  about: {
    readonly title: string;
    readonly link: string;
    readonly question: string;
    readonly answer: string;
  },
): Letter {
  return letter(`An answer: ${about.title}`, name, [
    `${by ?? 'a former member'} has answered what you asked about "${about.title}":`,
    quoted(about.question),
    'The answer:',
    quoted(about.answer),
    about.link,
  ]);
}
