import { letter, type Letter } from '../letter.ts';

export function notePublishedMail(name: string, title: string, link: string): Letter {
  return letter(`Published: ${title}`, name, [
    `your note "${title}" has been read and published:`,
    link,
    'Published means read, not tested: others fire their own kilns by their own judgement.',
  ]);
}
