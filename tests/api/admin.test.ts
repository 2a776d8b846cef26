import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { describe, expect } from 'vitest';
import { sessionAnswerSchema } from '#shared/api/accounts.ts';
import {
  adminMembersSchema,
  auditSchema,
  caughtMailsSchema,
  outboxStateSchema,
} from '#shared/api/admin.ts';
import { changeRole } from '../../server/admin/member-rights.ts';
import type { SignedIn } from '../../server/authorization/actor.ts';
import { readJson } from '../../server/database/read-json.ts';
import { enqueue } from '../../server/outbox/outbox.ts';
import { type Client, startApi, test } from '../support/api.ts';
import { aMember, PASSWORD } from '../support/builders.ts';
import { workerDatabaseUrl } from '../support/database.ts';

const setRole = (client: Client, id: number, role: string, reason = 'Asked for at the meeting') =>
  client.put(`/api/admin/members/${String(id)}/role`, { role, reason });
const suspend = (client: Client, id: number, suspended: boolean, reason = 'Sells cars here') =>
  client.put(`/api/admin/members/${String(id)}/suspended`, { suspended, reason });

test('every page of the admins is closed to visitors, members and moderators', async ({ api }) => {
  const visitor = api.client();
  await visitor.fetchToken();
  const [member, moderator] = [await api.signedIn('member'), await api.signedIn('moderator')];
  const requests: [string, string, object?][] = [
    ['GET', '/api/admin/members'],
    ['GET', '/api/admin/outbox'],
    ['GET', '/api/admin/mail'],
    ['GET', '/api/admin/audit'],
    ['POST', '/api/admin/outbox/1/retry'],
    ['PUT', '/api/admin/members/1/role', { role: 'admin', reason: 'x' }],
    ['PUT', '/api/admin/members/1/suspended', { suspended: true, reason: 'x' }],
  ];
  for (const [method, url, body] of requests) {
    const options = body ? { body } : {};
    expect((await visitor.send(method, url, options)).status).toBe(401);
    for (const client of [member, moderator]) {
      expect((await client.send(method, url, options)).problem.code).toBe('not-allowed');
    }
  }
});

describe('GET /api/admin/members', () => {
  test('finds members by name or whole address and shows only a hint of addresses', async ({
    api,
  }) => {
    const admin = await api.signedIn('admin');
    const wanted = await aMember(api.db, { name: 'Ines_Quarry 100%', email: 'ines@example.org' });
    await aMember(api.db, { name: 'Somebody Else' });
    const find = async (q: string) => {
      const answer = await admin.get(`/api/admin/members?q=${encodeURIComponent(q)}`);
      expect(answer.text).not.toContain('ines@example.org');
      return answer.as(adminMembersSchema);
    };
    for (const q of ['quarry', 'INES@example.org', 's_q', '100%', 'ìnes']) {
      const { members, total } = await find(q);
      expect(total).toBe(1);
      expect(members[0]).toMatchObject({
        id: wanted.id,
        emailHint: 'i…@example.org',
        emailVerified: true,
        suspended: false,
        publishedNotes: 0,
      });
    }
    expect((await find('%')).total).toBe(1);
    expect((await find("' OR 1=1 --")).total).toBe(0);
    expect((await find('')).total).toBe(3);
  });

  test('gives pages, and refuses what is no page', async ({ api }) => {
    const admin = await api.signedIn('admin');
    for (let index = 0; index < 60; index += 1) await aMember(api.db);
    const page = async (n: string) =>
      (await admin.get(`/api/admin/members?page=${n}`)).as(adminMembersSchema);
    const [first, second] = [await page('1'), await page('2')];
    expect([first.members.length, second.members.length, first.total]).toEqual([50, 11, 61]);
    for (const query of ['page=0', 'page=1e9', 'page=x', 'q=a&q=b', 'sort=email']) {
      expect((await admin.get(`/api/admin/members?${query}`)).status).toBe(400);
    }
  });
});

describe('PUT /api/admin/members/:id/role', () => {
  test('gives rights that hold after the next sign-in, and ends sessions of the old ones', async ({
    api,
  }) => {
    const admin = await api.signedIn('admin');
    const member = await api.signedIn('member');
    expect((await setRole(admin, member.member.id, 'moderator')).status).toBe(200);
    expect((await member.get('/api/sessions')).status).toBe(401);
    const again = api.client();
    await again.fetchToken();
    const session = (
      await again.post('/api/session', { email: member.member.email, password: PASSWORD })
    ).as(sessionAnswerSchema);
    expect(session.abilities.moderate).toBe(true);
    const { entries } = (await admin.get('/api/admin/audit')).as(auditSchema);
    expect(entries[0]).toMatchObject({
      actor: { id: admin.member.id, name: admin.member.name },
      act: 'role-changed',
      target: { kind: 'member', id: member.member.id, label: member.member.name },
      reason: 'Asked for at the meeting',
    });
    const row = await api
      .db('audit_log')
      .orderBy('id', 'desc')
      .first<{ before_value: unknown; after_value: unknown }>();
    expect([row.before_value, row.after_value].map(readJson)).toEqual([
      { role: 'member' },
      { role: 'moderator' },
    ]);
  });

  test('takes rights away from the next request on', async ({ api }) => {
    const admin = await api.signedIn('admin');
    const other = await api.signedIn('admin');
    expect((await other.get('/api/admin/outbox')).status).toBe(200);
    expect((await setRole(admin, other.member.id, 'member')).status).toBe(200);
    expect((await other.get('/api/admin/outbox')).status).toBe(401);
    // Even where a session is left: rights are read with every request.
    const later = await api.signedIn(other.member.id);
    expect((await later.get('/api/admin/outbox')).status).toBe(403);
  });

  test('asks for the password again after ten minutes', async ({ api }) => {
    const admin = await api.signedIn('admin');
    const member = await aMember(api.db);
    const sessions = api.db('sessions').where({ member_id: admin.member.id });
    const data = { token: admin.token, role: 'admin', confirmedAt: Date.now() - 601_000 };
    await sessions.clone().update({ data: JSON.stringify(data) });
    expect((await setRole(admin, member.id, 'moderator')).problem.code).toBe('confirm-password');
    expect((await suspend(admin, member.id, true)).problem.code).toBe('confirm-password');
    const wrong = await admin.post('/api/session/confirm', { password: 'not the password' });
    expect(wrong.problem.errors?.[0]?.pointer).toBe('/password');
    expect((await setRole(admin, member.id, 'moderator')).status).toBe(403);
    expect((await admin.post('/api/session/confirm', { password: PASSWORD })).status).toBe(200);
    expect((await setRole(admin, member.id, 'moderator')).status).toBe(200);
  });

  test('is refused for oneself, for unknown members, without a change and without a reason', async ({
    api,
  }) => {
    const admin = await api.signedIn('admin');
    await aMember(api.db, { role: 'admin' });
    const member = await aMember(api.db);
    expect((await setRole(admin, admin.member.id, 'member')).problem.code).toBe('not-allowed');
    expect((await setRole(admin, 99_999_999, 'member')).status).toBe(404);
    expect((await setRole(admin, member.id, 'member')).problem.code).toBe('wrong-status');
    expect((await setRole(admin, member.id, 'owner')).status).toBe(422);
    expect((await setRole(admin, member.id, 'moderator', '  ')).problem.errors?.[0]?.pointer).toBe(
      '/reason',
    );
    expect(await api.db('audit_log')).toEqual([]);
  });

  test('needs the rights still to be there when it is done, not only when it was asked', async ({
    api,
  }) => {
    const [asker, other] = [
      await aMember(api.db, { role: 'admin' }),
      await aMember(api.db, { role: 'admin' }),
    ];
    await aMember(api.db, { role: 'admin' });
    const actor: SignedIn = {
      ...asker,
      kind: 'member',
      emailVerified: true,
      confirmedAt: Date.now(),
    };
    await api.db('members').where({ id: asker.id }).update({ role: 'member' });
    const late = changeRole(api.db, actor, other.id, { role: 'member', reason: 'Too late' });
    await expect(late).rejects.toMatchObject({ code: 'not-allowed' });
    expect(await api.db('audit_log')).toEqual([]);
  });

  test('leaves one admin when two demote each other at once', async ({ committedApi: api }) => {
    const [first, second] = [await api.signedIn('admin'), await api.signedIn('admin')];
    const answers = await Promise.all([
      setRole(first, second.member.id, 'member'),
      setRole(second, first.member.id, 'member'),
    ]);
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
    expect(await api.db('members').where({ role: 'admin' })).toHaveLength(1);
    expect(await api.db('audit_log')).toHaveLength(1);
  });
});

describe('PUT /api/admin/members/:id/suspended', () => {
  test('shuts a member out from the next request on, and lets them in again', async ({ api }) => {
    const admin = await api.signedIn('admin');
    const member = await api.signedIn();
    expect((await suspend(admin, member.member.id, true)).status).toBe(200);
    expect((await member.get('/api/sessions')).status).toBe(401);
    const signIn = async () => {
      const client = api.client();
      await client.fetchToken();
      return client.post('/api/session', { email: member.member.email, password: PASSWORD });
    };
    expect((await signIn()).problem.code).toBe('suspended');
    const { members } = (await admin.get('/api/admin/members?q=' + member.member.email)).as(
      adminMembersSchema,
    );
    expect(members[0]?.suspended).toBe(true);
    expect((await suspend(admin, member.member.id, true)).problem.code).toBe('wrong-status');
    expect((await suspend(admin, member.member.id, false)).status).toBe(200);
    expect((await signIn()).status).toBe(200);
    const { entries } = (await admin.get('/api/admin/audit')).as(auditSchema);
    expect(entries.slice(0, 2).map(({ act }) => act)).toEqual(['reinstated', 'suspended']);
  });

  test('is refused for oneself', async ({ api }) => {
    const admin = await api.signedIn('admin');
    await aMember(api.db, { role: 'admin' });
    expect((await suspend(admin, admin.member.id, true)).problem.code).toBe('not-allowed');
  });
});

describe('GET /api/admin/outbox', () => {
  test('tells what waits, since when, what failed, and how the index stands', async ({ api }) => {
    const admin = await api.signedIn('admin');
    const { id: memberId } = admin.member;
    for (const key of ['waiting', 'failed', 'given-up', 'done']) {
      await enqueue(api.db, 'mail', key, { kind: 'password-changed', memberId });
    }
    await enqueue(api.db, 'index-note', 'index', { noteId: 1 });
    const job = (key: string) => api.db('outbox').where({ dedupe_key: key });
    await job('waiting').update({ created_at: api.db.raw('NOW(3) - INTERVAL 90 SECOND') });
    await job('failed').update({ attempts: 2, last_error: 'away' });
    await job('given-up').update({
      attempts: 9,
      last_error: 'no',
      given_up_at: api.db.raw('NOW(3)'),
    });
    await job('done').update({ attempts: 3, last_error: 'away', done_at: api.db.raw('NOW(3)') });
    const state = (await admin.get('/api/admin/outbox')).as(outboxStateSchema);
    expect(state.waiting).toBe(3);
    expect(state.oldestWaitingSeconds).toBeGreaterThanOrEqual(90);
    expect(state.failed.map(({ key }) => key)).toEqual(['failed', 'given-up']);
    // The engine of these tests is away.
    expect(state.index).toEqual({ available: false, inDatabase: 0, inIndex: null, behind: null });
    const givenUp = state.failed[1]?.id ?? 0;
    expect((await admin.post(`/api/admin/outbox/${String(givenUp)}/retry`)).status).toBe(200);
    expect(await job('given-up').whereNull('given_up_at').where('attempts', 0)).toHaveLength(1);
    const done = await job('done').first<{ id: number }>();
    const refused = await admin.post(`/api/admin/outbox/${String(done.id)}/retry`);
    expect(refused.problem.code).toBe('wrong-status');
    expect((await admin.post('/api/admin/outbox/99999999/retry')).status).toBe(404);
  });
});

describe('GET /api/admin/mail', () => {
  test('shows caught mails, and says so when none are caught', async ({ db }) => {
    const folder = await mkdtemp(path.join(tmpdir(), 'spyhole-test-mails-'));
    await writeFile(
      path.join(folder, '20260502T101500000Z-0123abcd.eml'),
      'From: a@example.org\r\nTo: b@example.org\r\nSubject: Hello\r\nDate: Sat, 02 May 2026 10:15:00 +0000\r\n\r\nText\r\n',
    );
    const mail = { smtpUrl: 'smtp://127.0.0.1:1', from: 'a@example.org' };
    const catching = await startApi(db, { config: { mail: { ...mail, caughtFolder: folder } } });
    const sending = await startApi(db, { config: { mail: { ...mail, caughtFolder: null } } });
    try {
      const read = async (api: typeof catching) => {
        const admin = await api.signedIn('admin');
        return (await admin.get('/api/admin/mail')).as(caughtMailsSchema);
      };
      expect(await read(catching)).toMatchObject({
        catching: true,
        mails: [{ to: 'b@example.org', subject: 'Hello', at: '2026-05-02T10:15:00.000Z' }],
      });
      expect(await read(sending)).toEqual({ catching: false, mails: [] });
    } finally {
      await catching.stop();
      await sending.stop();
      await rm(folder, { recursive: true, force: true });
    }
  });
});

describe('npm run make-admin', () => {
  async function makeAdmin(...args: string[]): Promise<{ code: number; out: string; err: string }> {
    const child = spawn('node_modules/.bin/tsx', ['server/commands/make-admin.ts', ...args], {
      env: { ...process.env, DATABASE_URL: await workerDatabaseUrl() },
    });
    let [out, err] = ['', ''];
    child.stdout.on('data', (chunk: Buffer) => (out += chunk.toString()));
    child.stderr.on('data', (chunk: Buffer) => (err += chunk.toString()));
    const [code] = (await once(child, 'close')) as [number];
    return { code, out, err };
  }

  test('makes a member an admin, writes it down, and says clearly what is wrong', async ({
    committedApi: api,
  }) => {
    const member = await api.signedIn();
    const made = await makeAdmin(member.member.email.toUpperCase());
    expect(made).toMatchObject({ code: 0, err: '' });
    expect(made.out).toContain(`${member.member.name} is an admin now`);
    expect(await api.db('members').where({ id: member.member.id, role: 'admin' })).toHaveLength(1);
    expect(await api.db('audit_log').select('act', 'actor_id', 'target_id', 'reason')).toEqual([
      {
        act: 'role-changed',
        actor_id: null,
        target_id: member.member.id,
        reason: 'Made on the command line.',
      },
    ]);
    expect((await member.get('/api/sessions')).status).toBe(401);
    expect((await makeAdmin(member.member.email)).out).toContain('an admin already');
    const unknown = await makeAdmin('nobody@example.org');
    expect(unknown).toMatchObject({ code: 1, out: '' });
    expect(unknown.err.trim()).toBe(
      'Nobody has joined with nobody@example.org. Join on the site first.',
    );
    expect((await makeAdmin()).err.trim()).toBe('Say whom: npm run make-admin -- EMAIL');
    expect((await makeAdmin('not an address')).code).toBe(1);
  });
});
