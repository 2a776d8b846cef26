import { createHash } from 'node:crypto';
import { type SessionData, Store } from 'express-session';
import type { Knex } from 'knex';
import type { Role } from '#shared/vocabulary/statuses.ts';
import { readJson } from '../database/read-json.ts';
import { AppError } from '../http/problem.ts';

declare module 'express-session' {
  interface SessionData {
    /** Fixed at sign-in: how long the session lasts. A change of role ends it. */
    role: Role;
    /** Who it is, joined in when the session is read; never stored with it. */
    reader: SessionReader;
    seenSecondsAgo: number;
    /** Read from or written to the table: from then on it is only updated, never made again. */
    stored: true;
  }
}

export interface SessionReader {
  readonly id: number;
  readonly name: string;
  readonly role: Role;
  readonly emailVerified: boolean;
  readonly suspended: boolean;
}

const MINUTE = 60;
const HOUR = 60 * MINUTE;
const DAY = 24 * HOUR;
interface Ends {
  readonly idleSeconds: number;
  readonly absoluteSeconds: number;
}
/** When a session ends: unused, and at the latest. Staff can do more harm, so theirs end sooner. */
const STAFF_ENDS: Ends = { idleSeconds: 2 * HOUR, absoluteSeconds: 12 * HOUR };
const MEMBER_ENDS: Ends = { idleSeconds: 14 * DAY, absoluteSeconds: 30 * DAY };
/** Only holds the token of somebody who is about to join or sign in. */
const VISITOR_ENDS: Ends = { idleSeconds: 2 * HOUR, absoluteSeconds: DAY };

export function sessionEnds(role: Role | undefined): Ends {
  if (role === undefined) return VISITOR_ENDS;
  return role === 'member' ? MEMBER_ENDS : STAFF_ENDS;
}

/** A session's last use is written down at most this often: a page of requests is one write. */
const TOUCH_EVERY_SECONDS = 5 * MINUTE;

/** The table is keyed by this, so whoever reads it cannot take over a session. */
export function sessionHash(id: string): string {
  return createHash('sha256').update(id).digest('hex');
}

interface SessionRow {
  data: unknown;
  browser: string;
  memberId: number | null;
  seenSecondsAgo: number;
  name: string | null;
  role: Role | null;
  verifiedAt: Date | null;
  suspendedAt: Date | null;
}

type Done = (error?: unknown) => void;

/** Sessions in MariaDB, timed by its clock. When it cannot be reached nobody counts as signed in. */
export class DatabaseSessionStore extends Store {
  readonly #db: Knex;

  constructor(db: Knex) {
    super();
    this.#db = db;
  }

  override get(id: string, done: (error: unknown, session?: SessionData | null) => void): void {
    settle(
      this.#read(id),
      (session) => done(null, session),
      (error) => done(error),
    );
  }

  override set(id: string, session: SessionData, done: Done = () => undefined): void {
    settle(this.#write(id, session), () => done(), done);
  }

  override touch(id: string, session: SessionData, done: Done = () => undefined): void {
    if ((session.seenSecondsAgo ?? 0) < TOUCH_EVERY_SECONDS) {
      done();
      return;
    }
    const { idleSeconds } = sessionEnds(session.reader?.role);
    settle(
      this.#db('sessions')
        .where({ id_hash: sessionHash(id) })
        .update({ seen_at: this.#db.raw('NOW(3)'), expires_at: this.#idleEnd(idleSeconds) }),
      () => done(),
      done,
    );
  }

  override destroy(id: string, done: Done = () => undefined): void {
    settle(
      this.#db('sessions')
        .where({ id_hash: sessionHash(id) })
        .delete(),
      () => done(),
      done,
    );
  }

  async #read(id: string): Promise<SessionData | null> {
    const row = await this.#db('sessions')
      .leftJoin('members', 'members.id', 'sessions.member_id')
      .where('sessions.id_hash', sessionHash(id))
      .whereRaw('sessions.expires_at > NOW(3) AND sessions.ends_at > NOW(3)')
      .first<SessionRow | undefined>(
        'sessions.data',
        'sessions.browser',
        'sessions.member_id AS memberId',
        this.#db.raw('TIMESTAMPDIFF(SECOND, sessions.seen_at, NOW(3)) AS seenSecondsAgo'),
        'members.name',
        'members.role',
        'members.email_verified_at AS verifiedAt',
        'members.suspended_at AS suspendedAt',
      );
    if (!row) return null;
    const kept = readJson(row.data) as Pick<SessionData, 'token' | 'confirmedAt' | 'role'>;
    const member =
      row.memberId === null || row.name === null || row.role === null
        ? {}
        : {
            memberId: row.memberId,
            reader: {
              id: row.memberId,
              name: row.name,
              role: row.role,
              emailVerified: row.verifiedAt !== null,
              suspended: row.suspendedAt !== null,
            },
          };
    return {
      ...kept,
      ...member,
      browser: row.browser,
      seenSecondsAgo: row.seenSecondsAgo,
      stored: true,
      // Set when the session began; the cookie is not sent again.
      cookie: { originalMaxAge: null },
    } as SessionData;
  }

  async #write(id: string, session: SessionData): Promise<void> {
    const idHash = sessionHash(id);
    const kept = {
      member_id: session.memberId ?? null,
      data: JSON.stringify({
        token: session.token,
        confirmedAt: session.confirmedAt,
        role: session.role,
      }),
      browser: session.browser ?? '',
    };
    const { idleSeconds, absoluteSeconds } = sessionEnds(session.role);
    if ('stored' in session) {
      // Ended meanwhile by somebody else: it stays ended.
      await this.#db('sessions')
        .where({ id_hash: idHash })
        .update({
          ...kept,
          seen_at: this.#db.raw('NOW(3)'),
          expires_at: this.#idleEnd(idleSeconds),
        });
      return;
    }
    await this.#db('sessions').insert({
      ...kept,
      id_hash: idHash,
      expires_at: this.#db.raw('NOW(3) + INTERVAL ? SECOND', [idleSeconds]),
      ends_at: this.#db.raw('NOW(3) + INTERVAL ? SECOND', [absoluteSeconds]),
    });
    // Not enumerable: the middleware compares what can be enumerated to see a change.
    Object.defineProperty(session, 'stored', { value: true, enumerable: false });
  }

  #idleEnd(idleSeconds: number): Knex.Raw {
    return this.#db.raw('LEAST(sessions.ends_at, NOW(3) + INTERVAL ? SECOND)', [idleSeconds]);
  }
}

/** Answers the middleware outside the promise, so an error thrown there is not taken for ours. */
function settle<T>(
  work: PromiseLike<T>,
  onDone: (value: T) => void,
  onError: (error: unknown) => void,
): void {
  work.then(
    (value) => process.nextTick(onDone, value),
    (error: unknown) => {
      const away = new AppError('away', 'Sessions cannot be read just now. Try again shortly.');
      away.cause = error;
      process.nextTick(onError, away);
    },
  );
}
