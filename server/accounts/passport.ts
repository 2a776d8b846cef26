import type { Request, Response } from 'express';
import { Passport } from 'passport';
import { Strategy as LocalStrategy } from 'passport-local';
import type { Deps } from '../deps.ts';
import { AppError } from '../http/problem.ts';
import type { Account } from './account-repository.ts';
import { verifyCredentials } from './verify-credentials.ts';

/**
 * Runs passport's local strategy on the body of a sign-in. It only says who it is: the session is
 * begun by `beginSession`, which takes a new identifier.
 *
 * @throws AppError wrong-credentials, suspended, too-many or busy
 */
export function authenticate(deps: Deps, request: Request, response: Response): Promise<Account> {
  const passport = new Passport();
  passport.use(
    new LocalStrategy({ usernameField: 'email' }, (email, password, done) => {
      verifyCredentials(deps, request, email, password).then(
        (account) => done(null, account),
        (error: unknown) => done(error),
      );
    }),
  );
  return new Promise((resolve, reject) => {
    const answer = (error: unknown, account?: unknown): void => {
      if (error) reject(error instanceof Error ? error : new Error('Sign-in failed.'));
      // Passport leaves out the account when the address or the password is empty.
      else if (!account) reject(new AppError('wrong-credentials'));
      else resolve(account as Account);
    };
    const handler = passport.authenticate('local', { session: false }, answer) as (
      request: Request,
      response: Response,
      next: (error?: unknown) => void,
    ) => void;
    handler(request, response, answer);
  });
}
