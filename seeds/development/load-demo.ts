import { randomInt } from 'node:crypto';
import type { Knex } from 'knex';
import type { Deps } from '../../server/deps.ts';
import { addDemoPeople, type DemoAccount } from './load/demo-people.ts';
import { addDemoKilns } from './load/demo-kilns.ts';
import { demoEvents } from './load/demo-events.ts';
import { demo, type Demo } from './demo.ts';

/** Mails about what happened before this day would only tell people what they know. */
const MAILS_FROM = '2026-11-20';

/**
 * Loads the demo into an empty database as it would have come about: each thing done by the same
 * services that serve the pages, in the order in which it was done and dated so. All in one
 * transaction, because only one connection can be told what time it is.
 *
 * @returns who can sign in, with passwords drawn at random just now
 */
export async function loadDemo(deps: Deps, source: Demo = demo): Promise<DemoAccount[]> {
  const { log, db } = deps;
  return db.transaction(async (trx) => {
    try {
      await setClock(trx, new Date('2025-01-06T19:00:00Z'));
      const { accounts, actors } = await addDemoPeople(trx, source.people, drawPassword);
      const kilnIds = await addDemoKilns(trx, deps.store, actors, source);
      const events = demoEvents({ ...deps, db: trx }, source.firings, actors, kilnIds);
      for (const [done, { at, run }] of events.entries()) {
        await setClock(trx, at);
        await run(trx);
        if (done % 50 === 0) log.info({ done, of: events.length }, 'loading the demo');
      }
      await trx('outbox').where({ topic: 'mail' }).where('created_at', '<', MAILS_FROM).delete();
      return accounts;
    } finally {
      await trx.raw('SET SESSION timestamp = DEFAULT');
    }
  });
}

/** What CURRENT_TIMESTAMP says on this connection until it is set again. */
async function setClock(trx: Knex.Transaction, at: Date): Promise<void> {
  await trx.raw('SET SESSION timestamp = ?', [at.getTime() / 1000]);
}

/** Letters and digits that nobody mistakes for one another. */
const LETTERS = 'abcdefghjkmnpqrstuvwxyz23456789';

/** Four groups of five: 99 bits, and still typed without a mistake. */
function drawPassword(): string {
  const group = () =>
    Array.from({ length: 5 }, () => LETTERS.charAt(randomInt(LETTERS.length))).join('');
  return [group(), group(), group(), group()].join('-');
}
