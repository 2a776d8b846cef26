import { letter, type Letter } from '../letter.ts';

export function changeEmailMail(name: string, link: string): Letter {
  return letter('Confirm your new address', name, [
    'you have asked for your mail from Spyhole to come to this address. Open this link and confirm it there:',
    link,
    'It works once, and for 24 hours. Until then everything goes to the old address. If you do not know what this is about, do nothing.',
  ]);
}
