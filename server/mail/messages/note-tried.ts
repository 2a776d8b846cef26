import { letter, type Letter } from '../letter.ts';

export function noteTriedMail(
  name: string,
  own: { title: string },
  follow: { title: string; link: string },
): Letter {
  return letter(`Somebody tried it: ${own.title}`, name, [
    `another member has tried a change from your note "${own.title}" and written down what came of it in "${follow.title}":`,
    follow.link,
  ]);
}
