import { letter, type Letter } from '../letter.ts';

export function alreadyJoinedMail(name: string, links: { signIn: string; forgot: string }): Letter {
  return letter('You already have an account', name, [
    'somebody has tried to join Spyhole with this address, which has an account already. If it was you, sign in:',
    links.signIn,
    'If you no longer know your password, ask for a new one:',
    links.forgot,
    'If it was not you, there is nothing to do: your account has not changed.',
  ]);
}
