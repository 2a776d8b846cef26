import { describe, expect } from 'vitest';
import { DESK_QUESTIONS } from '#shared/api/desk.ts';
import { ROUTES } from '../../server/routes.ts';
import type { Access } from '../../server/http/define-route.ts';
import { test, type Api, type Client } from '../support/api.ts';
import { addKiln, completeFields, handIn, publishedNote, startNote } from '../support/notes.ts';

/**
 * Who may even try, for every route of the API. A route that is missing here, or declared with
 * another level, fails the first test; the second walks every cell with real accounts.
 */
const RIGHTS: Readonly<Record<string, Access>> = {
  'post /api/csp-reports': 'anyone',
  'get /api/session': 'anyone',
  'post /api/session': 'anyone',
  'post /api/session/token': 'anyone',
  'delete /api/session': 'anyone',
  'post /api/session/confirm': 'member',
  'get /api/sessions': 'member',
  'delete /api/sessions': 'member',
  'delete /api/sessions/:id': 'member',
  'post /api/members': 'anyone',
  'get /api/members/:id': 'anyone',
  'post /api/email-verifications': 'anyone',
  'post /api/email-verifications/again': 'member',
  'post /api/password-resets': 'anyone',
  'post /api/password-resets/use': 'anyone',
  'put /api/me/password': 'member',
  'put /api/me/email': 'member',
  'put /api/me/profile': 'member',
  'put /api/me/settings': 'member',
  'get /api/kilns': 'member',
  'post /api/kilns': 'member',
  'get /api/kilns/:id': 'anyone',
  'put /api/kilns/:id': 'member',
  'put /api/kilns/:id/loans': 'member',
  'delete /api/kilns/:id': 'member',
  'post /api/kilns/:id/picture': 'member',
  'delete /api/kilns/:id/picture': 'member',
  'get /api/notes': 'anyone',
  'post /api/notes': 'member',
  'get /api/notes/:id': 'anyone',
  'delete /api/notes/:id': 'member',
  'post /api/notes/:id/restore': 'member',
  'get /api/notebook': 'member',
  'get /api/notes/:id/draft': 'member',
  'put /api/notes/:id/draft': 'member',
  'get /api/notes/:id/preview': 'member',
  'post /api/notes/:id/hand-in': 'member',
  'post /api/notes/:id/take-back': 'member',
  'post /api/notes/:id/revise': 'member',
  'get /api/notes/:id/questions': 'anyone',
  'post /api/notes/:id/questions': 'member',
  'put /api/notes/:id/questions/:questionId/answer': 'member',
  'delete /api/notes/:id/questions/:questionId': 'member',
  'put /api/notes/:id/remarks/:remarkId/mended': 'member',
  'put /api/notes/:id/disputes': 'member',
  'delete /api/notes/:id/disputes/:disputeId': 'member',
  'post /api/notes/:id/records': 'member',
  'get /api/notes/:id/records/:recordId': 'member',
  'put /api/notes/:id/records/:recordId': 'member',
  'get /api/notes/:id/records/:recordId/file': 'member',
  'get /api/notes/:id/record': 'anyone',
  'get /api/notes/:id/record.csv': 'anyone',
  'post /api/notes/:id/pictures': 'member',
  'delete /api/notes/:id/pictures/:name': 'member',
  'get /media/pictures/:name/:file': 'anyone',
  'get /api/desk': 'moderator',
  'get /api/desk/notes/:id': 'moderator',
  'put /api/desk/notes/:id/claim': 'moderator',
  'delete /api/desk/notes/:id/claim': 'moderator',
  'post /api/desk/notes/:id/remarks': 'moderator',
  'delete /api/desk/notes/:id/remarks/:remarkId': 'moderator',
  'post /api/desk/notes/:id/decision': 'moderator',
  'get /api/desk/disputes': 'moderator',
  'put /api/desk/disputes/:id': 'moderator',
  'post /api/notes/:id/take-down': 'moderator',
  'get /api/search': 'anyone',
  'get /api/suggestions': 'anyone',
  'get /api/saved-searches': 'member',
  'post /api/saved-searches': 'member',
  'put /api/saved-searches/:id': 'member',
  'delete /api/saved-searches/:id': 'member',
  'get /api/unsubscribe': 'anyone',
  'post /api/unsubscribe': 'anyone',
  'post /api/look-alikes': 'anyone',
  'get /api/notes/:id/look-alikes': 'anyone',
  'get /api/front': 'anyone',
  'get /api/what-helped': 'anyone',
  'get /api/what-helped/:trouble': 'anyone',
  'get /api/figures/:topic': 'anyone',
  'get /api/figures/:topic/rows.csv': 'anyone',
  'get /api/admin/members': 'admin',
  'put /api/admin/members/:id/role': 'admin',
  'put /api/admin/members/:id/suspended': 'admin',
  'get /api/admin/outbox': 'admin',
  'post /api/admin/outbox/:id/retry': 'admin',
  'get /api/admin/mail': 'admin',
  'get /api/admin/audit': 'admin',
  'get /api/admin/reindex': 'admin',
  'post /api/admin/reindex': 'admin',
  'delete /api/admin/reindex': 'admin',
};

const RANK: Record<Access, number> = { anyone: 0, member: 1, moderator: 2, admin: 3 };
const nameOf = (route: { method: string; path: string }): string => `${route.method} ${route.path}`;

/** The path with ids that nothing has. */
const withUnknownIds = (path: string): string =>
  path
    .replace(':remarkId', '999999999')
    .replace(':recordId', '999999999')
    .replace(':questionId', '999999999')
    .replace(':disputeId', '999999999')
    .replace(':name', '0'.repeat(32))
    .replace(':file', '480.webp')
    .replace(':trouble', 'stall')
    .replace(':id', '999999999');

describe('the table of rights', () => {
  test('lists every route of the running application with its level', () => {
    const declared = Object.fromEntries(ROUTES.map((route) => [nameOf(route), route.access]));
    expect(declared).toEqual(RIGHTS);
  });

  test('a path that no route declares is nothing, for everybody', async ({ api }) => {
    const admin = await api.signedIn('admin');
    for (const client of [api.client(), admin]) {
      expect((await client.get('/api/undeclared')).status).toBe(404);
      await client.fetchToken();
      expect((await client.post('/api/undeclared', {})).status).toBe(404);
    }
  });

  test('every role below a route’s level is refused, and no one at or above it for rank', async ({
    api,
  }) => {
    const clients: [Access, Client][] = [
      ['anyone', api.client()],
      ['member', await api.signedIn('member')],
      ['moderator', await api.signedIn('moderator')],
      ['admin', await api.signedIn('admin')],
    ];
    // Signing out and ending sessions would end the walk.
    const last = ['delete /api/session', 'delete /api/sessions'];
    const walked = Object.entries(RIGHTS).sort(
      ([a], [b]) => Number(last.includes(a)) - Number(last.includes(b)),
    );
    for (const [rank, client] of clients) {
      await client.fetchToken();
      for (const [name, access] of walked) {
        if (last.includes(name)) continue;
        const [method = 'get', path = ''] = name.split(' ');
        const answer = await client.send(method.toUpperCase(), withUnknownIds(path), {
          ...(method === 'get' ? {} : { body: {} }),
        });
        const cell = `${name} as ${rank}`;
        if (RANK[rank] < RANK[access]) {
          expect(answer.status, cell).toBe(rank === 'anyone' ? 401 : 403);
          expect(answer.problem.code, cell).toBe(
            rank === 'anyone' ? 'sign-in-needed' : 'not-allowed',
          );
        } else {
          expect([401, 500], cell).not.toContain(answer.status);
          if (answer.status === 403) expect(answer.problem.code, cell).not.toBe('not-allowed');
        }
      }
    }
  });
});

const CHOICE = {
  delimiter: ',',
  decimal: '.',
  headerLine: 1,
  timeColumn: 0,
  timeFormat: 'minutes',
  temperatureColumn: 1,
  secondColumn: null,
  unit: 'C',
};

/** Two members, each with a kiln; the first with a draft, a waiting and a published note. */
async function twoMembers(api: Api) {
  const owner = await api.signedIn();
  const other = await api.signedIn();
  const moderator = await api.signedIn('moderator');
  const kiln = await addKiln(owner);
  const draft = await startNote(owner, kiln.id);
  const waiting = await startNote(owner, kiln.id);
  await handIn(owner, waiting, completeFields(kiln.id, { date: '2026-05-03' }));
  const published = await publishedNote(owner, moderator, kiln.id, { date: '2026-05-01' });
  return { owner, other, moderator, kiln, draft, waiting, published };
}

describe('rights on one thing', () => {
  test('another member finds nothing where a draft is, on every route, as for an unknown id', async ({
    api,
  }) => {
    const { other, draft } = await twoMembers(api);
    const shared = { headers: { 'If-Match': '"v1"', 'Idempotency-Key': crypto.randomUUID() } };
    const routes = Object.keys(RIGHTS).filter(
      (name) => name.includes('/api/notes/:id') && RIGHTS[name] !== 'moderator',
    );
    expect(routes.length).toBeGreaterThan(12);
    for (const name of routes) {
      const [method = 'get', path = ''] = name.split(' ');
      const body = name.endsWith('/draft')
        ? { fields: draft.fields }
        : name.endsWith('/mended')
          ? { mended: true }
          : /\/(questions|answer)$/.test(name)
            ? { text: 'What stood the kiln on?' }
            : name === 'put /api/notes/:id/records/:recordId'
              ? { choice: CHOICE }
              : name.endsWith('/disputes')
                ? { code: 'stall', minute: 20, sentence: 'The probe had slipped out.' }
                : {};
      const ask = (id: number | string) =>
        other.send(
          method.toUpperCase(),
          path.replace(':id', String(id)).replace(/:\w+/, '999999999'),
          method === 'get' ? {} : { body, ...shared },
        );
      const real = await ask(draft.id);
      const unknown = await ask(999_999_999);
      expect(real.status, name).toBe(404);
      const { instance: _one, ...problem } = real.problem;
      const { instance: _two, ...unknownProblem } = unknown.problem;
      expect(problem, name).toEqual(unknownProblem);
    }
  });

  test('drafts are read by their author only, waiting notes by staff too, published ones by all', async ({
    api,
  }) => {
    const { owner, other, moderator, draft, waiting, published } = await twoMembers(api);
    const readers = { visitor: api.client(), other, moderator, owner };
    const page = (id: number) => `/api/notes/${String(id)}`;
    const expected = {
      visitor: [404, 404, 200],
      other: [404, 404, 200],
      moderator: [404, 200, 200],
      owner: [404, 200, 200],
    } as const;
    for (const [who, client] of Object.entries(readers)) {
      const statuses = [];
      for (const id of [draft.id, waiting.id, published]) {
        statuses.push((await client.get(page(id))).status);
      }
      expect(statuses, who).toEqual(expected[who as keyof typeof expected]);
    }
    expect((await owner.get(`/api/notes/${String(draft.id)}/draft`)).status).toBe(200);
  });

  test('a decision cannot be made on a draft, nor by a member, nor on one’s own note', async ({
    api,
  }) => {
    const { owner, moderator, draft } = await twoMembers(api);
    const decision = {
      decision: 'publish',
      revisionId: 1,
      reason: '',
      checklist: DESK_QUESTIONS,
    };
    const path = `/api/desk/notes/${String(draft.id)}/decision`;
    expect((await moderator.post(path, decision)).status).toBe(404);
    expect((await owner.post(path, decision)).status).toBe(403);
    const staff = await api.signedIn('moderator');
    const kiln = await addKiln(staff);
    const own = await startNote(staff, kiln.id);
    await handIn(staff, own, completeFields(kiln.id));
    const claim = await staff.put(`/api/desk/notes/${String(own.id)}/claim`);
    expect(claim.status).toBe(403);
    expect(claim.problem.detail).toContain('own');
  });

  test('a kiln is its keeper’s and its borrowers’ until it has a published firing', async ({
    api,
  }) => {
    const keeper = await api.signedIn();
    const borrower = await api.signedIn({ name: 'Wren Halloran' });
    const stranger = await api.signedIn();
    const kiln = await addKiln(keeper);
    const path = `/api/kilns/${String(kiln.id)}`;
    expect((await stranger.get(path)).status).toBe(404);
    expect((await borrower.get(path)).status).toBe(404);
    await keeper.put(`${path}/loans`, { members: ['Wren Halloran'] });
    expect((await borrower.get(path)).status).toBe(200);
    expect((await api.client().get(path)).status).toBe(404);
    // Lent to fire, not to alter.
    const altered = await borrower.put(
      path,
      { fields: kiln.fields },
      { headers: { 'If-Match': '"v1"' } },
    );
    expect(altered.status).toBe(403);
    expect((await startNote(borrower, kiln.id)).fields.kilnId).toBe(kiln.id);
  });

  test('role, owner, status and version are never taken from a body', async ({ api }) => {
    const member = await api.signedIn();
    const kiln = await addKiln(member);
    const draft = await startNote(member, kiln.id);
    for (const extra of ['role', 'status', 'authorId', 'version', 'publishedAt']) {
      const answer = await member.put(
        `/api/notes/${String(draft.id)}/draft`,
        { fields: { ...draft.fields, [extra]: 'admin' } },
        { headers: { 'If-Match': `"v${String(draft.version)}"` } },
      );
      expect(answer.status, extra).toBe(422);
    }
    const profile = await member.put('/api/me/profile', {
      name: 'Somebody',
      place: '',
      about: '',
      role: 'admin',
    });
    expect(profile.status).toBe(422);
  });
});
