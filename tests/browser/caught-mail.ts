import { readdir, readFile } from 'node:fs/promises';
import path from 'node:path';
import { expect } from 'vitest';

/** The text of a caught mail with its soft line ends undone (quoted-printable, RFC 2045). */
const plain = (mail: string): string =>
  mail
    .replaceAll(/=\r?\n/g, '')
    .replaceAll(/=([0-9A-F]{2})/g, (_whole, hex: string) => String.fromCharCode(parseInt(hex, 16)));

/** Waits for a mail to this address and gives the link in it, as one would click it. */
export async function linkMailedTo(dataFolder: string, email: string): Promise<string> {
  const folder = path.join(dataFolder, 'mail');
  let link: string | undefined;
  await expect
    .poll(
      async () => {
        const names = (await readdir(folder)).filter((name) => name.endsWith('.eml')).sort();
        for (const name of names.reverse()) {
          const mail = plain(await readFile(path.join(folder, name), 'utf8'));
          if (!mail.includes(email)) continue;
          link = /http:\/\/localhost\S+#[\w-]+/.exec(mail)?.[0];
          if (link !== undefined) return link;
        }
        return undefined;
      },
      { timeout: 20_000, message: `a mail with a link to ${email}` },
    )
    .toBeDefined();
  if (link === undefined) throw new Error('No link was mailed.');
  return link;
}
