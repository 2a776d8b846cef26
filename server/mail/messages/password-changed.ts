import { letter, type Letter } from '../letter.ts';

export function passwordChangedMail(name: string, forgot: string): Letter {
  return letter('Your password was changed', name, [
    'the password of your account was changed just now. If it was you, there is nothing to do.',
    'If it was not you, set a new one at once; that also signs everybody out:',
    forgot,
  ]);
}
