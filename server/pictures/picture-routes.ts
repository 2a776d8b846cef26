import type { RequestHandler } from 'express';
import { z } from 'zod';
import { pictureNameSchema } from '#shared/note/story.ts';
import type { Deps } from '../deps.ts';
import { defineRoute, memberOf, reply, type Route } from '../http/define-route.ts';
import { idParams } from '../http/ids.ts';
import { AppError } from '../http/problem.ts';
import { RATES } from '../http/rates.ts';
import { readSingleUpload, uploadOf } from '../http/single-upload.ts';
import { removeKilnPicture, removeNotePicture } from './remove-picture.ts';
import {
  addNotePicture,
  mayFetch,
  requireEditableKiln,
  requireEditableNote,
  setKilnPicture,
} from './picture-service.ts';

type Check = (db: Deps['db'], actor: Express.Request['actor'], id: number) => Promise<void>;

/** Rights are asked before the body is read, so that nobody pays for a refused upload. */
const uploadAfter =
  (check: Check) =>
  (deps: Deps): RequestHandler[] => [
    async (request, _response, next) => {
      const params = idParams.safeParse(request.params);
      if (!params.success) throw new AppError('not-found');
      await check(deps.db, request.actor, params.data.id);
      next();
    },
    readSingleUpload('picture'),
  ];

/** If-None-Match by its weak comparison (RFC 9110 section 13.1.2). */
const isKnown = (given: string | undefined, tag: string): boolean =>
  given !== undefined &&
  given.split(',').some((one) => ['*', tag, `W/${tag}`].includes(one.trim()));

const TYPES = { webp: 'image/webp', jpg: 'image/jpeg' } as const;

export const pictureRoutes: readonly Route[] = [
  defineRoute({
    method: 'post',
    path: '/api/notes/:id/pictures',
    access: 'member',
    params: idParams,
    rate: RATES.uploads,
    before: uploadAfter(requireEditableNote),
    async handle({ db, deps, actor, params, request }) {
      const { bytes } = uploadOf(request);
      return reply(201, await addNotePicture(db, deps.store, memberOf(actor), params.id, bytes));
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/kilns/:id/picture',
    access: 'member',
    params: idParams,
    rate: RATES.uploads,
    before: uploadAfter(requireEditableKiln),
    async handle({ db, deps, actor, params, request }) {
      const { bytes } = uploadOf(request);
      return reply(201, await setKilnPicture(db, deps.store, memberOf(actor), params.id, bytes));
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/notes/:id/pictures/:name',
    access: 'member',
    params: idParams.extend({ name: pictureNameSchema }),
    async handle({ db, deps, actor, params }) {
      await removeNotePicture(db, deps.store, actor, params.id, params.name);
      return { message: 'The picture is deleted.' };
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/kilns/:id/picture',
    access: 'member',
    params: idParams,
    async handle({ db, deps, actor, params }) {
      await removeKilnPicture(db, deps.store, actor, params.id);
      return { message: 'The picture is deleted.' };
    },
  }),
  defineRoute({
    method: 'get',
    path: '/media/pictures/:name/:file',
    access: 'anyone',
    params: z.object({
      name: pictureNameSchema,
      file: z.string().regex(/^(\d{1,5}\.webp|preview\.jpg)$/),
    }),
    async handle({ db, deps, actor, params, request, response }) {
      const { allowed, isPublic } = await mayFetch(db, actor, params.name);
      if (!allowed) throw new AppError('not-found');
      const tag = `"${params.name.slice(0, 16)}-${params.file}"`;
      // Files never change under their name. Public ones are asked about again after an hour, so
      // that a picture taken down is gone from caches soon; others stay with their one reader.
      const headers = {
        ETag: tag,
        'Cache-Control': isPublic
          ? 'public, max-age=3600, stale-while-revalidate=86400'
          : 'private, max-age=300',
        'Content-Security-Policy': "default-src 'none'; sandbox",
        'Accept-Ranges': 'none',
        ...(isPublic ? {} : { Vary: 'Cookie' }),
      };
      if (isKnown(request.get('If-None-Match'), tag)) return reply(304, null, headers);
      const file = await deps.store.read(`pictures/${params.name}/${params.file}`);
      if (!file) throw new AppError('not-found');
      response.set(headers);
      response.type(params.file.endsWith('.webp') ? TYPES.webp : TYPES.jpg);
      response.set('Content-Length', String(file.size));
      file.stream.on('error', (error) => response.destroy(error)).pipe(response);
      return undefined;
    },
  }),
];
