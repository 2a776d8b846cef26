import {
  kilnBodySchema,
  kilnLoansBodySchema,
  type Kiln,
  type KilnPage,
} from '#shared/api/kilns.ts';
import { defineRoute, memberOf, reply, type Context, type Route } from '../http/define-route.ts';
import { versionFromIfMatch, versionTag } from '../http/entity-version.ts';
import { idParams } from '../http/ids.ts';
import { firingsOfKiln } from '../notes/published-repository.ts';
import { findPictures } from '../pictures/picture-repository.ts';
import { findKiln, type KilnRow, kilnsOf, kilnVersions } from './kiln-repository.ts';
import { presentKiln, presentVersions } from './kiln-presenter.ts';
import { addKiln, alterKiln, lendKiln, readKiln, removeKiln } from './kiln-service.ts';
import { AppError } from '../http/problem.ts';
import type { Knex } from 'knex';
import type { Actor } from '../authorization/actor.ts';

async function present(db: Knex, kilns: readonly KilnRow[], actor: Actor): Promise<Kiln[]> {
  const pictures = await findPictures(
    db,
    kilns.flatMap((kiln) => (kiln.pictureId === null ? [] : [kiln.pictureId])),
  );
  return kilns.map((kiln) =>
    presentKiln(
      kiln,
      actor,
      kiln.pictureId === null ? null : (pictures.get(kiln.pictureId) ?? null),
    ),
  );
}

/** The kiln after a change, with its ETag. */
async function answerKiln(context: Context<unknown, unknown, unknown>, id: number, status = 200) {
  const row = await findKiln(context.db, id);
  if (!row) throw new AppError('not-found');
  const [kiln] = await present(context.db, [row], context.actor);
  return reply(status, kiln ?? null, { ETag: versionTag(row.version) });
}

export const kilnRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/kilns',
    access: 'member',
    async handle({ db, actor }) {
      return { kilns: await present(db, await kilnsOf(db, memberOf(actor).id), actor) };
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/kilns',
    access: 'member',
    body: kilnBodySchema,
    idempotent: true,
    async handle(context) {
      const id = await addKiln(context.db, memberOf(context.actor), context.body.fields);
      return answerKiln(context, id, 201);
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/kilns/:id',
    access: 'anyone',
    params: idParams,
    async handle({ db, actor, params }) {
      const row = await readKiln(db, actor, params.id);
      const [[kiln], versions, firings] = await Promise.all([
        present(db, [row], actor),
        kilnVersions(db, row.id),
        firingsOfKiln(db, row.id),
      ]);
      if (!kiln) throw new AppError('not-found');
      const page: KilnPage = { ...kiln, versions: presentVersions(versions), firings };
      return reply(200, page, { ETag: versionTag(row.version) });
    },
  }),
  defineRoute({
    method: 'put',
    path: '/api/kilns/:id',
    access: 'member',
    params: idParams,
    body: kilnBodySchema,
    async handle(context) {
      const { db, actor, params, body, request } = context;
      await alterKiln(db, actor, params.id, versionFromIfMatch(request), body.fields);
      return answerKiln(context, params.id);
    },
  }),
  defineRoute({
    method: 'put',
    path: '/api/kilns/:id/loans',
    access: 'member',
    params: idParams,
    body: kilnLoansBodySchema,
    async handle(context) {
      await lendKiln(context.db, context.actor, context.params.id, context.body.members);
      return answerKiln(context, context.params.id);
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/kilns/:id',
    access: 'member',
    params: idParams,
    async handle({ db, actor, params }) {
      await removeKiln(db, memberOf(actor), params.id);
      return { message: 'The kiln is out of use. What was fired in it stays.' };
    },
  }),
];
