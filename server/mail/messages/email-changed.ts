import { letter, type Letter } from '../letter.ts';

/** Goes to the old address. */
export function emailChangedMail(name: string, siteLink: string): Letter {
  return letter('Your address was changed', name, [
    'your account at Spyhole now has another address; this is the last mail to this one.',
    'If it was not you, somebody knows your password. Write to the people who run the site:',
    siteLink,
  ]);
}
