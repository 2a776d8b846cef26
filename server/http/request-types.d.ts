import type { Actor } from '../authorization/actor.ts';

declare global {
  namespace Express {
    interface Request {
      /** Who asks: set by `identify`, a visitor until then. */
      actor: Actor;
      /** Also in the log and in `instance` of a problem. */
      requestId: string;
    }
  }
}

declare module 'express-session' {
  interface SessionData {
    /** Sent back with every change; renewed with the session. */
    token: string;
    memberId: number;
    /** When the password was last typed, epoch ms. */
    confirmedAt: number;
    browser: string;
  }
}
