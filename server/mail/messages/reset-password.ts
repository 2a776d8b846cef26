import { letter, type Letter } from '../letter.ts';

export function resetPasswordMail(name: string, link: string): Letter {
  return letter('Set a new password', name, [
    'somebody has asked for a new password for your account. If it was you, set one here:',
    link,
    'The link works once, and for 30 minutes. Setting a new password signs you out everywhere.',
    'If it was not you, do nothing: your password stays as it is.',
  ]);
}
