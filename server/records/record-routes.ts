import { z } from 'zod';
import { recordChoiceSchema } from '#shared/record/record-choice.ts';
import { defineRoute, pointersOf, reply, type Route } from '../http/define-route.ts';
import { idParams, idSchema } from '../http/ids.ts';
import { AppError } from '../http/problem.ts';
import { RATES } from '../http/rates.ts';
import { readSingleUpload, uploadOf } from '../http/single-upload.ts';
import { ownNote } from '../notes/draft-service.ts';
import { requireEditableNote } from '../pictures/picture-service.ts';
import { presentRecord } from './record-presenter.ts';
import {
  addRecord,
  presentPoints,
  readAgain,
  readingsFor,
  recordCsvFor,
  requireRecord,
} from './record-service.ts';

const recordParams = z.object({ id: idSchema, recordId: idSchema });
const ofQuery = z.strictObject({
  of: z.enum(['published', 'handed-in', 'draft']).default('published'),
});

/** A part of the record, minutes: both ends or neither. */
const minute = z.coerce.number().min(-100_000).max(100_000);
const pointsQuery = ofQuery
  .extend({ from: minute.optional(), to: minute.optional() })
  .refine(({ from, to }) => (from === undefined) === (to === undefined), {
    message: 'Give both ends of the part or neither.',
  })
  .refine(({ from, to }) => from === undefined || to === undefined || from < to, {
    message: 'The part ends before it begins.',
  });

/** The choice of columns arrives as a JSON field beside the file. */
function choiceOf(field: string | undefined) {
  let value: unknown;
  try {
    value = JSON.parse(field ?? '');
  } catch {
    throw new AppError('bad-request', 'Say which columns hold the time and the temperature.');
  }
  const choice = recordChoiceSchema.safeParse(value);
  if (!choice.success) throw new AppError('bad-input', { errors: pointersOf(choice.error) });
  return choice.data;
}

export const recordRoutes: readonly Route[] = [
  defineRoute({
    method: 'post',
    path: '/api/notes/:id/records',
    access: 'member',
    params: idParams,
    rate: RATES.uploads,
    before: (deps) => [
      async (request, _response, next) => {
        const params = idParams.safeParse(request.params);
        if (!params.success) throw new AppError('not-found');
        await requireEditableNote(deps.db, request.actor, params.data.id);
        next();
      },
      readSingleUpload('record'),
    ],
    async handle({ db, deps, params, request }) {
      const { bytes, fileName, fields } = uploadOf(request);
      const id = await addRecord(
        db,
        deps.store,
        params.id,
        { bytes, fileName, source: fields['source'] === 'pasted' ? 'pasted' : 'file' },
        choiceOf(fields['choice']),
      );
      return reply(201, presentRecord(await requireRecord(db, params.id, id)));
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/notes/:id/records/:recordId',
    access: 'member',
    params: recordParams,
    async handle({ db, actor, params }) {
      await ownNote(db, actor, params.id);
      return presentRecord(await requireRecord(db, params.id, params.recordId));
    },
  }),
  defineRoute({
    method: 'put',
    path: '/api/notes/:id/records/:recordId',
    access: 'member',
    params: recordParams,
    body: z.strictObject({ choice: recordChoiceSchema }),
    async handle({ db, actor, params, body }) {
      await requireEditableNote(db, actor, params.id);
      await readAgain(db, params.id, params.recordId, body.choice);
      return presentRecord(await requireRecord(db, params.id, params.recordId));
    },
  }),
  // The table as it was sent, so that its columns can be chosen again in another visit.
  defineRoute({
    method: 'get',
    path: '/api/notes/:id/records/:recordId/file',
    access: 'member',
    params: recordParams,
    rate: RATES.recordFiles,
    async handle({ db, deps, actor, params, response }) {
      await ownNote(db, actor, params.id);
      const { storageKey } = await requireRecord(db, params.id, params.recordId);
      const file = storageKey === null ? null : await deps.store.read(storageKey);
      if (!file) throw new AppError('not-found', 'The table of this record is not kept.');
      response.attachment(`record-${String(params.recordId)}.txt`);
      // Bytes, whatever they say: they are decoded by whoever asked, and shown by nobody.
      response.type('application/octet-stream');
      response.set('Content-Security-Policy', "default-src 'none'; sandbox");
      response.set('Content-Length', String(file.size));
      file.stream.on('error', (error) => response.destroy(error)).pipe(response);
      return undefined;
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/notes/:id/record',
    access: 'anyone',
    params: idParams,
    query: pointsQuery,
    async handle({ db, actor, params, query: { of, from, to } }) {
      const content = await readingsFor(db, actor, params.id, of);
      return presentPoints(content, from === undefined || to === undefined ? null : { from, to });
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/notes/:id/record.csv',
    access: 'anyone',
    rate: RATES.exports,
    params: idParams,
    query: ofQuery,
    async handle({ db, actor, params, query, response }) {
      const csv = await recordCsvFor(db, actor, params.id, query.of);
      response
        .attachment(`firing-${String(params.id)}.csv`)
        .type('text/csv; charset=utf-8')
        .send(csv);
      return undefined;
    },
  }),
];
