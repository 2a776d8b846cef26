import { letter, type Letter } from '../letter.ts';

export function verifyEmailMail(name: string, link: string): Letter {
  return letter('Confirm your address', name, [
    'somebody has joined Spyhole with this address. If it was you, open this link and confirm it there; until then you can write notes, but not hand them in:',
    link,
    'It works once, and for 24 hours. If it was not you, do nothing: without the link the address stays unconfirmed.',
  ]);
}
