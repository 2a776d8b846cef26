import { lookAlikesBodySchema, lookAlikesOfQuerySchema } from '#shared/api/look-alikes.ts';
import { defineRoute, type Route } from '../http/define-route.ts';
import { idParams } from '../http/ids.ts';
import { RATES } from '../http/rates.ts';
import { lookAlikesOfDraft, lookAlikesOfNote, lookAlikesOfRecord } from './look-alike-service.ts';

export const lookAlikeRoutes: readonly Route[] = [
  defineRoute({
    method: 'post',
    path: '/api/look-alikes',
    access: 'anyone',
    rate: RATES.lookAlikes,
    body: lookAlikesBodySchema,
    handle: ({ deps, body: { readings, targetCelsius } }) =>
      lookAlikesOfRecord(deps, {
        readings: readings.map(([minute, celsius]) => ({ minute, celsius })),
        targetCelsius,
      }),
  }),
  defineRoute({
    method: 'get',
    path: '/api/notes/:id/look-alikes',
    access: 'anyone',
    rate: RATES.lookAlikesOfNotes,
    params: idParams,
    query: lookAlikesOfQuerySchema,
    handle: ({ deps, actor, params, query }) =>
      query.of === 'draft'
        ? lookAlikesOfDraft(deps, actor, params.id)
        : lookAlikesOfNote(deps, params.id),
  }),
];
