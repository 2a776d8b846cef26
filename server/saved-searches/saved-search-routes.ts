import { z } from 'zod';
import { mailTokenSchema } from '#shared/api/accounts.ts';
import { changeSavedSearchBodySchema, saveSearchBodySchema } from '#shared/api/saved-searches.ts';
import { paths } from '#shared/paths.ts';
import { defineRoute, memberOf, reply, type Route } from '../http/define-route.ts';
import { idParams } from '../http/ids.ts';
import { RATES } from '../http/rates.ts';
import {
  changeSavedSearch,
  readSavedSearches,
  removeSavedSearch,
  saveSearch,
} from './saved-search-service.ts';
import { unsubscribe } from './unsubscribe.ts';

const unsubscribeQuery = z.object({ token: mailTokenSchema });

/** Each change is answered with all of a member's searches as they are then. */
export const savedSearchRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/saved-searches',
    access: 'member',
    handle: ({ db, actor }) => readSavedSearches(db, memberOf(actor)),
  }),
  defineRoute({
    method: 'post',
    path: '/api/saved-searches',
    access: 'member',
    body: saveSearchBodySchema,
    idempotent: true,
    rate: RATES.savedSearches,
    async handle({ db, actor, body }) {
      await saveSearch(db, memberOf(actor), body);
      return reply(201, await readSavedSearches(db, memberOf(actor)));
    },
  }),
  defineRoute({
    method: 'put',
    path: '/api/saved-searches/:id',
    access: 'member',
    params: idParams,
    body: changeSavedSearchBodySchema,
    async handle({ db, actor, params, body }) {
      await changeSavedSearch(db, memberOf(actor), params.id, body);
      return readSavedSearches(db, memberOf(actor));
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/saved-searches/:id',
    access: 'member',
    params: idParams,
    async handle({ db, actor, params }) {
      await removeSavedSearch(db, memberOf(actor), params.id);
      return readSavedSearches(db, memberOf(actor));
    },
  }),
  // The address in List-Unsubscribe. A mail program posts to it by itself (RFC 8058): without a
  // cookie, an own origin or a token of a session, in a form. What is signed in it is the whole right.
  defineRoute({
    method: 'post',
    path: '/api/unsubscribe',
    access: 'anyone',
    fromAnywhere: true,
    query: unsubscribeQuery,
    rate: RATES.unsubscribes,
    handle: ({ db, deps, query }) => unsubscribe(db, deps.config, query.token),
  }),
  // Where a program only opens the address, a person decides: looking ends nothing, since mail
  // filters open links too.
  defineRoute({
    method: 'get',
    path: '/api/unsubscribe',
    access: 'anyone',
    query: unsubscribeQuery,
    handle: ({ query }) => reply(303, null, { Location: `${paths.unsubscribe}#${query.token}` }),
  }),
];
