import type { Knex } from 'knex';
import { findQuerySchema, suggestQuerySchema } from '#shared/api/search.ts';
import { METRIC_UNITS, type Units } from '#shared/units/units.ts';
import type { Actor } from '../authorization/actor.ts';
import { findAccountById } from '../accounts/account-repository.ts';
import { defineRoute, type Route } from '../http/define-route.ts';
import { RATES } from '../http/rates.ts';
import { find } from './find-service.ts';
import { suggest } from './suggest-service.ts';

async function unitsOf(db: Knex, actor: Actor): Promise<Units> {
  if (actor.kind === 'visitor') return METRIC_UNITS;
  const account = await findAccountById(db, actor.id);
  return account
    ? { temperature: account.settings.temperature, system: account.settings.system }
    : METRIC_UNITS;
}

export const searchRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/search',
    access: 'anyone',
    rate: RATES.searches,
    query: findQuerySchema,
    handle: async ({ db, deps, actor, query }) => find(db, deps, query, await unitsOf(db, actor)),
  }),
  defineRoute({
    method: 'get',
    path: '/api/suggestions',
    access: 'anyone',
    query: suggestQuerySchema,
    handle: ({ deps, query }) => suggest(deps, query.q),
  }),
];
