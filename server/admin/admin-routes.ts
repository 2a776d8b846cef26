import { z } from 'zod';
import { roleBodySchema, suspendBodySchema } from '#shared/api/admin.ts';
import type { Done } from '#shared/api/accounts.ts';
import { requireConfirmed, signedIn } from '../accounts/signed-in.ts';
import { defineRoute, reply, type Route } from '../http/define-route.ts';
import { idParams, pageQuery } from '../http/ids.ts';
import { listCaughtMails } from '../mail/read-caught.ts';
import { listAuditLog } from './audit-list.ts';
import { listMembers } from './member-list.ts';
import { changeRole, setSuspended } from './member-rights.ts';
import { readOutboxState, retryJob } from './outbox-state.ts';
import { cancelReindex, readReindex, startReindex } from './reindexing.ts';

const done = (message: string): Done => ({ message });
const CAUGHT_MAILS_SHOWN = 100;

export const adminRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/admin/members',
    access: 'admin',
    query: pageQuery.extend({ q: z.string().max(254).default('') }),
    handle: ({ db, query }) => listMembers(db, query),
  }),
  defineRoute({
    method: 'put',
    path: '/api/admin/members/:id/role',
    access: 'admin',
    params: idParams,
    body: roleBodySchema,
    handle: async ({ db, deps, actor, params, body, request }) => {
      const admin = signedIn(actor);
      requireConfirmed(admin);
      await changeRole(db, admin, params.id, body);
      deps.log.info(
        {
          requestId: request.requestId,
          event: 'role-changed',
          memberId: admin.id,
          targetId: params.id,
          role: body.role,
        },
        'role changed',
      );
      return done('The role is changed; the member has to sign in again.');
    },
  }),
  defineRoute({
    method: 'put',
    path: '/api/admin/members/:id/suspended',
    access: 'admin',
    params: idParams,
    body: suspendBodySchema,
    handle: async ({ db, deps, actor, params, body, request }) => {
      const admin = signedIn(actor);
      requireConfirmed(admin);
      await setSuspended(db, admin, params.id, body);
      deps.log.info(
        {
          requestId: request.requestId,
          event: body.suspended ? 'suspended' : 'reinstated',
          memberId: admin.id,
          targetId: params.id,
        },
        'suspension changed',
      );
      return done(body.suspended ? 'The member is suspended.' : 'The member may come in again.');
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/admin/outbox',
    access: 'admin',
    handle: ({ deps }) => readOutboxState(deps),
  }),
  defineRoute({
    method: 'post',
    path: '/api/admin/outbox/:id/retry',
    access: 'admin',
    params: idParams,
    handle: async ({ db, params }) => {
      await retryJob(db, params.id);
      return done('It is tried again now.');
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/admin/reindex',
    access: 'admin',
    handle: ({ deps }) => readReindex(deps),
  }),
  defineRoute({
    method: 'post',
    path: '/api/admin/reindex',
    access: 'admin',
    handle: ({ deps, actor, request }) => {
      const state = startReindex(deps);
      deps.log.info(
        { requestId: request.requestId, event: 'reindex', memberId: signedIn(actor).id },
        'reindex started',
      );
      return reply(202, state);
    },
  }),
  defineRoute({
    method: 'delete',
    path: '/api/admin/reindex',
    access: 'admin',
    handle: ({ deps }) => cancelReindex(deps),
  }),
  defineRoute({
    method: 'get',
    path: '/api/admin/mail',
    access: 'admin',
    handle: async ({ deps }) => {
      const { caughtFolder } = deps.config.mail;
      if (caughtFolder === null) return { catching: false, mails: [] };
      const mails = await listCaughtMails(caughtFolder, CAUGHT_MAILS_SHOWN);
      return {
        catching: true,
        mails: mails.map(({ id, date, to, subject, text }) => ({
          id,
          at: (date ?? new Date(0)).toISOString(),
          to,
          subject,
          text,
        })),
      };
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/admin/audit',
    access: 'admin',
    query: pageQuery,
    handle: ({ db, query }) => listAuditLog(db, query.page),
  }),
];
