import { newNoteBodySchema, saveDraftBodySchema } from '#shared/api/notes.ts';
import { z } from 'zod';
import { lastDecision, remarksForAuthor } from '../desk/remark-repository.ts';
import { defineRoute, memberOf, reply, type Context, type Route } from '../http/define-route.ts';
import { versionFromIfMatch, versionTag } from '../http/entity-version.ts';
import { idParams, idSchema } from '../http/ids.ts';
import { RATES } from '../http/rates.ts';
import { markMended } from '../desk/remark-service.ts';
import { picturesOfNote } from '../pictures/picture-repository.ts';
import { findKiln } from '../kilns/kiln-repository.ts';
import {
  ownNote,
  removeNote,
  restoreNote,
  reviseNote,
  saveNote,
  startNote,
  takeBack,
} from './draft-service.ts';
import { handInNote } from './hand-in-note.ts';
import { presentDraft } from './note-presenter.ts';
import { previewNote } from './preview-note.ts';
import { readDraft } from './read-draft.ts';

/** The working copy as it stands, with its ETag. */
async function answerDraft(context: Context<unknown, unknown, unknown>, id: number, status = 200) {
  const { db, actor } = context;
  const note = await ownNote(db, actor, id);
  const [read, pictures, remarks, decision] = await Promise.all([
    readDraft(db, { id, authorId: memberOf(actor).id, fields: note.draft }, false),
    picturesOfNote(db, id),
    remarksForAuthor(db, id),
    lastDecision(db, id, note.status),
  ]);
  return reply(status, presentDraft(actor, note, read, pictures, remarks, decision), {
    ETag: versionTag(note.version),
  });
}

export const draftRoutes: readonly Route[] = [
  defineRoute({
    method: 'post',
    path: '/api/notes',
    access: 'member',
    body: newNoteBodySchema,
    idempotent: true,
    rate: RATES.newNotes,
    async handle(context) {
      const { db, actor, body } = context;
      const kiln = body.kilnId === null ? null : await findKiln(db, body.kilnId);
      const id = await startNote(db, memberOf(actor), {
        ...body,
        timeZone: kiln?.fields.timeZone ?? '',
      });
      return answerDraft(context, id, 201);
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/notes/:id/draft',
    access: 'member',
    params: idParams,
    handle: (context) => answerDraft(context, context.params.id),
  }),
  defineRoute({
    method: 'put',
    path: '/api/notes/:id/draft',
    access: 'member',
    params: idParams,
    body: saveDraftBodySchema,
    async handle(context) {
      const { db, actor, params, body, request } = context;
      await saveNote(db, actor, params.id, versionFromIfMatch(request), body.fields);
      return answerDraft(context, params.id);
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/notes/:id/preview',
    access: 'member',
    params: idParams,
    handle: ({ db, actor, params }) => previewNote(db, memberOf(actor), params.id),
  }),
  defineRoute({
    method: 'post',
    path: '/api/notes/:id/hand-in',
    access: 'member',
    params: idParams,
    async handle(context) {
      const { db, actor, params, request } = context;
      await handInNote(db, memberOf(actor), params.id, versionFromIfMatch(request));
      return answerDraft(context, params.id);
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/notes/:id/take-back',
    access: 'member',
    params: idParams,
    async handle(context) {
      await takeBack(context.db, memberOf(context.actor), context.params.id);
      return answerDraft(context, context.params.id);
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/notes/:id/revise',
    access: 'member',
    params: idParams,
    async handle(context) {
      await reviseNote(context.db, memberOf(context.actor), context.params.id);
      return answerDraft(context, context.params.id);
    },
  }),
  defineRoute({
    method: 'put',
    path: '/api/notes/:id/remarks/:remarkId/mended',
    access: 'member',
    params: z.object({ id: idSchema, remarkId: idSchema }),
    body: z.strictObject({ mended: z.boolean() }),
    async handle(context) {
      const { db, actor, params, body } = context;
      await ownNote(db, actor, params.id);
      await markMended(db, params.id, params.remarkId, body.mended);
      return answerDraft(context, params.id);
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/notes/:id',
    access: 'member',
    params: idParams,
    async handle({ db, actor, params }) {
      await removeNote(db, memberOf(actor), params.id);
      return { message: 'The note is removed.' };
    },
  }),
  defineRoute({
    method: 'post',
    path: '/api/notes/:id/restore',
    access: 'member',
    params: idParams,
    async handle(context) {
      await restoreNote(context.db, memberOf(context.actor), context.params.id);
      return answerDraft(context, context.params.id);
    },
  }),
];
