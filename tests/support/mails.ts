import type { Deps } from '../../server/deps.ts';
import { mailHandler } from '../../server/mail/mail-handler.ts';
import type { Mail } from '../../server/mail/mailer.ts';
import { workOnce } from '../../server/outbox/worker.ts';

/** Does the mail jobs that are due and gives what would have been sent. */
export async function takeMails({ deps }: { deps: Deps }): Promise<Mail[]> {
  const mails: Mail[] = [];
  const handler = mailHandler(deps, {
    send: (mail) => {
      mails.push(mail);
      return Promise.resolve(true);
    },
  });
  while ((await workOnce(deps, 'mail', handler)) > 0);
  return mails;
}

/** The token in a mail's link; the test fails when there is none. */
export function tokenIn(mail: Mail | undefined): string {
  const token = /#([A-Za-z0-9_-]{43})\b/.exec(mail?.text ?? '')?.[1];
  if (token === undefined) throw new Error(`No link with a token in: ${mail?.text ?? 'no mail'}`);
  return token;
}
