import { describe, expect } from 'vitest';
import { meSchema, sessionAnswerSchema } from '#shared/api/accounts.ts';
import { listTables } from '../../server/database/schema-picture.ts';
import type { Deps } from '../../server/deps.ts';
import { type Api, type ApiAnswer, startApi, test } from '../support/api.ts';
import { aMember, PASSWORD } from '../support/builders.ts';
import { takeMails, tokenIn } from '../support/mails.ts';

const NEW_PASSWORD = 'thimble quarry ostrich 41';
const joining = (traits: Record<string, unknown> = {}) => ({
  name: 'Wilda Brook',
  email: 'wilda@example.org',
  password: NEW_PASSWORD,
  agreed: true,
  ...traits,
});

async function visitor(api: Api) {
  const client = api.client();
  await client.fetchToken();
  return client;
}

async function signInStatus(api: Api, email: string, password: string): Promise<number> {
  const client = await visitor(api);
  return (await client.post('/api/session', { email, password })).status;
}

/** Everything of an answer that a person could compare, without what is new every time. */
const shape = (answer: ApiAnswer) => ({
  status: answer.status,
  text: answer.text.replace(/[0-9a-f-]{36}/, 'ID'),
  headers: [...answer.headers.keys()].filter((name) => name !== 'keep-alive').sort(),
});

const allowFreely = (api: { deps: Deps }) => api.deps.db('throttles').delete();

describe('POST /api/members', () => {
  test('makes an unverified account that can sign in, and mails one link', async ({ api }) => {
    const client = await visitor(api);
    const answer = await client.post('/api/members', joining({ email: 'Wilda@Example.org' }));
    expect(answer.status).toBe(200);
    const mails = await takeMails(api);
    expect(mails).toHaveLength(1);
    expect(mails[0]?.to).toBe('wilda@example.org');
    expect(mails[0]?.text).toContain(`${api.baseUrl}/confirm-address#`);
    const signedIn = await client.post('/api/session', {
      email: 'wilda@example.org',
      password: NEW_PASSWORD,
    });
    expect(signedIn.as(sessionAnswerSchema)).toMatchObject({
      me: { name: 'Wilda Brook', emailVerified: false, role: 'member' },
      abilities: { write: true, handIn: false },
    });
    expect(await api.db('audit_log').where({ act: 'joined' })).toHaveLength(1);
  });

  test('answers the same for an address that has an account, and writes to its owner', async ({
    api,
  }) => {
    const owner = await aMember(api.db);
    const client = await visitor(api);
    const fresh = await client.post('/api/members', joining());
    const known = await client.post(
      '/api/members',
      joining({ name: 'Other Name', email: owner.email }),
    );
    expect(shape(known)).toEqual(shape(fresh));
    const mails = await takeMails(api);
    const toOwner = mails.filter(({ to }) => to === owner.email);
    expect(toOwner.map(({ subject }) => subject)).toEqual(['You already have an account']);
    expect(toOwner[0]?.text).not.toContain('#');
    const rows = await api.db('members').where({ email: owner.email });
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({ name: owner.name });
  });

  test('asked twice with the same name and address answers twice the same', async ({ api }) => {
    const client = await visitor(api);
    const first = await client.post('/api/members', joining());
    expect(shape(await client.post('/api/members', joining()))).toEqual(shape(first));
  });

  test('refuses 14 characters and takes 15, counted as people count them', async ({ api }) => {
    const client = await visitor(api);
    const withPassword = (password: string, email: string) =>
      client.post('/api/members', joining({ password, email, name: `Name of ${email}` }));
    const short = await withPassword('zqvkwpxmjtrnyb', 'a@example.org');
    expect(short.status).toBe(422);
    expect(short.problem.errors).toEqual([
      { pointer: '/password', detail: 'At least 15 characters.' },
    ]);
    const emoji = '🔥🏺🌋🪨💨🌙⭐🍂🐝🦊🐢🌻🍋🎈';
    expect((await withPassword(emoji, 'a@example.org')).status).toBe(422);
    expect((await withPassword('zqvkwpxmjtrnybd', 'a@example.org')).status).toBe(200);
    expect((await withPassword(`${emoji}🪵`, 'b@example.org')).status).toBe(200);
    expect((await withPassword('ember '.repeat(42) + 'last', 'c@example.org')).status).toBe(200);
    expect((await withPassword('ember '.repeat(42) + 'last!', 'd@example.org')).status).toBe(422);
    expect(await signInStatus(api, 'a@example.org', 'zqvkwpxmjtrnybd')).toBe(200);
    expect(await signInStatus(api, 'a@example.org', 'zqvkwpxmjtrnybe')).toBe(401);
  });

  test('refuses common and personal passwords and says why', async ({ api }) => {
    const client = await visitor(api);
    for (const password of ['passwordpassword1', 'Wilda Brook 1984', 'spyhole raku kiln']) {
      await allowFreely(api);
      const answer = await client.post('/api/members', joining({ password }));
      expect(answer.status).toBe(422);
      expect(answer.problem.errors?.[0]?.pointer).toBe('/password');
      expect(answer.problem.errors?.[0]?.detail).toMatch(/tried first|name|think of/);
    }
    expect(await api.db('members').where({ email: 'wilda@example.org' })).toEqual([]);
  });

  test('refuses a name that looks like another member’s', async ({ api }) => {
    await aMember(api.db, { name: 'Wilda Brook' });
    const client = await visitor(api);
    for (const name of [
      'wilda brook',
      'Wilda  Brook ',
      'Wıldа Brook',
      'Ｗilda Brook',
      'Wil\u200bda Brook',
    ]) {
      await allowFreely(api);
      const answer = await client.post('/api/members', joining({ name }));
      expect(answer.problem.code).toBe('same-name');
      expect(answer.problem.errors?.[0]?.pointer).toBe('/name');
    }
  });

  test('takes no role, confirmation or anything else that was not asked for', async ({ api }) => {
    const client = await visitor(api);
    for (const extra of [{ role: 'admin' }, { emailVerified: true }, { id: 1 }, { settings: {} }]) {
      const answer = await client.post('/api/members', joining(extra));
      expect(answer.status).toBe(422);
    }
    expect((await client.post('/api/members', joining({ agreed: false }))).status).toBe(422);
    for (const email of [{ a: 1 }, ['a@example.org'], null, true, 'no address']) {
      expect((await client.post('/api/members', joining({ email }))).status).toBe(422);
    }
  });

  test('keeps a name on one line and lets no line break into a mail', async ({ api }) => {
    const client = await visitor(api);
    const withReturn = joining({ name: 'Wilda\r\nBcc: many@example.org' });
    expect((await client.post('/api/members', withReturn)).status).toBe(422);
    const answer = await client.post(
      '/api/members',
      joining({ name: 'Wilda\nBcc: many@example.org' }),
    );
    expect(answer.status).toBe(200);
    const [mail] = await takeMails(api);
    expect(mail?.text.split('\n')[0]).toBe('Hello Wilda Bcc: many@example.org,');
    expect(mail?.subject).not.toContain('\n');
  });

  test('is throttled after five tries in half an hour, and the count is in the database', async ({
    api,
  }) => {
    const client = await visitor(api);
    for (let index = 0; index < 5; index += 1) {
      const body = joining({
        email: `w${String(index)}@example.org`,
        name: `Wilda ${String(index)}`,
      });
      expect((await client.post('/api/members', body)).status).toBe(200);
    }
    expect((await client.post('/api/members', joining())).status).toBe(429);
    const again = await startApi(api.db);
    try {
      const other = await visitor(again);
      expect((await other.post('/api/members', joining())).status).toBe(429);
    } finally {
      await again.stop();
    }
  });
});

describe('POST /api/email-verifications', () => {
  test('confirms an address once; a newer link replaces an older one', async ({ api }) => {
    const client = await api.signedIn({ emailVerified: false });
    await client.post('/api/email-verifications/again');
    const old = tokenIn((await takeMails(api))[0]);
    await client.post('/api/email-verifications/again');
    const token = tokenIn((await takeMails(api))[0]);
    const confirm = (given: string) => client.post('/api/email-verifications', { token: given });
    expect((await confirm(old)).problem.code).toBe('link-used');
    expect((await confirm(token)).status).toBe(200);
    const me = (await client.get('/api/session')).as(sessionAnswerSchema);
    expect(me.me?.emailVerified).toBe(true);
    expect(me.abilities.handIn).toBe(true);
    expect((await confirm(token)).problem.code).toBe('link-used');
    // Nothing is left to confirm: no mail.
    await client.post('/api/email-verifications/again');
    expect(await takeMails(api)).toEqual([]);
  });

  test('refuses a link after 24 hours', async ({ api }) => {
    const client = await api.signedIn({ emailVerified: false });
    await client.post('/api/email-verifications/again');
    const token = tokenIn((await takeMails(api))[0]);
    const row = await api
      .db('mail_tokens')
      .where({ member_id: client.member.id })
      .first<{ minutes: number }>(
        api.db.raw('TIMESTAMPDIFF(MINUTE, created_at, expires_at) AS minutes'),
      );
    expect(row.minutes).toBe(24 * 60);
    await api.db('mail_tokens').update({ expires_at: api.db.raw('NOW(3) - INTERVAL 1 SECOND') });
    const answer = await client.post('/api/email-verifications', { token });
    expect(answer.problem.code).toBe('link-used');
  });

  test('changes nothing when the link is only opened', async ({ api }) => {
    const client = await api.signedIn({ emailVerified: false });
    await client.post('/api/email-verifications/again');
    const token = tokenIn((await takeMails(api))[0]);
    await client.get('/confirm-address');
    await client.send('HEAD', '/confirm-address');
    const answer = await client.post('/api/email-verifications', { token });
    expect(answer.status).toBe(200);
  });
});

describe('POST /api/password-resets', () => {
  test('answers the same for known and unknown addresses and mails only the known one', async ({
    api,
  }) => {
    const member = await aMember(api.db);
    const client = await visitor(api);
    const known = await client.post('/api/password-resets', { email: member.email });
    const unknown = await client.post('/api/password-resets', { email: 'nobody@example.org' });
    const lookAlike = await client.post('/api/password-resets', {
      email: member.email.replace('e', 'е'),
    });
    expect(shape(unknown)).toEqual(shape(known));
    expect(shape(lookAlike)).toEqual(shape(known));
    const mails = await takeMails(api);
    expect(mails.map(({ to }) => to)).toEqual([member.email]);
  });

  test('gives a link that works once for 30 minutes, ends all sessions and signs nobody in', async ({
    api,
  }) => {
    const owner = await api.signedIn({ emailVerified: false });
    const client = await visitor(api);
    await client.post('/api/password-resets', { email: owner.member.email });
    const old = tokenIn((await takeMails(api))[0]);
    await client.post('/api/password-resets', { email: owner.member.email });
    const token = tokenIn((await takeMails(api))[0]);
    const row = await api
      .db('mail_tokens')
      .first<{ minutes: number }>(
        api.db.raw('TIMESTAMPDIFF(MINUTE, created_at, expires_at) AS minutes'),
      );
    expect(row.minutes).toBe(30);
    const reset = (given: string, password = NEW_PASSWORD) =>
      client.post('/api/password-resets/use', { token: given, password });
    expect((await reset(old)).problem.code).toBe('link-used');
    // A common password is refused, and the link stays good.
    expect((await reset(token, 'passwordpassword')).problem.code).toBe('bad-input');
    expect((await reset(token)).status).toBe(200);
    expect((await reset(token)).problem.code).toBe('link-used');
    expect((await owner.get('/api/sessions')).status).toBe(401);
    expect((await client.get('/api/session')).as(sessionAnswerSchema).me).toBeNull();
    expect(await signInStatus(api, owner.member.email, PASSWORD)).toBe(401);
    expect(await signInStatus(api, owner.member.email, NEW_PASSWORD)).toBe(200);
    const mails = await takeMails(api);
    expect(mails.map(({ to, subject }) => [to, subject])).toEqual([
      [owner.member.email, 'Your password was changed'],
    ]);
  });

  test('refuses a link that is too old, and one of another kind', async ({ api }) => {
    const member = await aMember(api.db, { emailVerified: false });
    const client = await visitor(api);
    await client.post('/api/password-resets', { email: member.email });
    const token = tokenIn((await takeMails(api))[0]);
    expect((await client.post('/api/email-verifications', { token })).problem.code).toBe(
      'link-used',
    );
    await api.db('mail_tokens').update({ expires_at: api.db.raw('NOW(3) - INTERVAL 1 SECOND') });
    const answer = await client.post('/api/password-resets/use', { token, password: NEW_PASSWORD });
    expect(answer.problem.code).toBe('link-used');
  });

  test('mails no link when it has waited longer than the link would be valid', async ({ api }) => {
    const member = await aMember(api.db);
    const client = await visitor(api);
    await client.post('/api/password-resets', { email: member.email });
    await api.db('outbox').update({ created_at: api.db.raw('NOW(3) - INTERVAL 31 MINUTE') });
    expect(await takeMails(api)).toEqual([]);
  });

  test('leaves no usable token in any table nor in the log, and sends the same link whatever Host says', async ({
    api,
  }) => {
    const member = await aMember(api.db);
    const client = await visitor(api);
    await client.post(
      '/api/password-resets',
      { email: member.email },
      { headers: { 'X-Forwarded-Host': 'evil.example', Forwarded: 'host=evil.example' } },
    );
    const [mail] = await takeMails(api);
    const token = tokenIn(mail);
    expect(mail?.text).toContain(`\n${api.deps.config.publicUrl}/new-password#${token}\n`);
    expect(mail?.text).not.toContain('evil.example');
    expect(await inAnyTable(api, token)).toBe(false);
    await client.post('/api/password-resets/use', { token, password: NEW_PASSWORD });
    expect(await inAnyTable(api, token)).toBe(false);
    const log = api.logLines.join('');
    for (const secret of [token, NEW_PASSWORD, member.email]) expect(log).not.toContain(secret);
    // The search finds what is there.
    expect(await inAnyTable(api, member.email)).toBe(true);
  });

  test('is throttled after five tries for one address, known or not', async ({ api }) => {
    const client = await visitor(api);
    for (let index = 0; index < 5; index += 1) {
      const answer = await client.post('/api/password-resets', { email: 'nobody@example.org' });
      expect(answer.status).toBe(200);
    }
    const answer = await client.post('/api/password-resets', { email: 'nobody@example.org' });
    expect(answer.status).toBe(429);
    expect(Number(answer.headers.get('Retry-After'))).toBeGreaterThan(1700);
  });
});

async function inAnyTable({ db }: Api, needle: string): Promise<boolean> {
  for (const name of await listTables(db)) {
    const rows: unknown[] = await db(name).select();
    if (JSON.stringify(rows).includes(needle)) return true;
  }
  return false;
}

describe('PUT /api/me/password', () => {
  test('needs the present password, and wrong ones count as wrong sign-ins', async ({ api }) => {
    const client = await api.signedIn();
    const change = (current: string) =>
      client.put('/api/me/password', { current, next: NEW_PASSWORD, endOtherSessions: false });
    const missing = await client.put('/api/me/password', {
      next: NEW_PASSWORD,
      endOtherSessions: false,
    });
    expect(missing.status).toBe(422);
    for (let index = 0; index < 10; index += 1) {
      const answer = await change(`wrong ${String(index)}`);
      expect(answer.problem.errors?.[0]).toEqual({
        pointer: '/current',
        detail: 'This is not your password.',
      });
    }
    expect((await change(PASSWORD)).status).toBe(429);
    expect(await signInStatus(api, client.member.email, PASSWORD)).toBe(429);
  });

  test('gives the session a new identifier, leaves the others or ends them, and tells the owner', async ({
    api,
  }) => {
    for (const endOtherSessions of [false, true]) {
      const client = await api.signedIn();
      const other = await api.signedIn(client.member.id);
      const oldCookie = client.cookies.get('spyhole') ?? '';
      const answer = await client.put('/api/me/password', {
        current: PASSWORD,
        next: NEW_PASSWORD,
        endOtherSessions,
      });
      expect(answer.status).toBe(200);
      expect((await client.get('/api/sessions')).status).toBe(200);
      expect((await other.get('/api/sessions')).status).toBe(endOtherSessions ? 401 : 200);
      const old = api.client();
      old.cookies.set('spyhole', oldCookie);
      expect((await old.get('/api/sessions')).status).toBe(401);
      expect(await signInStatus(api, client.member.email, NEW_PASSWORD)).toBe(200);
      expect((await takeMails(api)).map(({ to }) => to)).toEqual([client.member.email]);
    }
  });

  test('refuses a common one', async ({ api }) => {
    const client = await api.signedIn();
    const answer = await client.put('/api/me/password', {
      current: PASSWORD,
      next: 'qwertyuiopasdfgh',
      endOtherSessions: false,
    });
    expect(answer.problem.errors?.[0]?.pointer).toBe('/next');
  });
});

describe('PUT /api/me/email', () => {
  test('changes nothing without the password, nor until the new address consents', async ({
    api,
  }) => {
    const client = await api.signedIn();
    const emailOf = async () =>
      (await client.get('/api/session')).as(sessionAnswerSchema).me?.email;
    const ask = (current: string) =>
      client.put('/api/me/email', { current, email: 'New.Place@example.org' });
    expect((await ask('not the password at all')).problem.errors?.[0]?.pointer).toBe('/current');
    expect(await takeMails(api)).toEqual([]);
    expect((await ask(PASSWORD)).status).toBe(200);
    const mails = await takeMails(api);
    expect(mails.map(({ to }) => to)).toEqual(['new.place@example.org']);
    expect(await emailOf()).toBe(client.member.email);
    const token = tokenIn(mails[0]);
    expect((await client.post('/api/email-verifications', { token })).status).toBe(200);
    expect(await emailOf()).toBe('new.place@example.org');
    const notices = await takeMails(api);
    expect(notices.map(({ to, subject }) => [to, subject])).toEqual([
      [client.member.email, 'Your address was changed'],
    ]);
  });

  test('does not tell whether somebody has the new address, and never gives it twice', async ({
    api,
  }) => {
    const other = await aMember(api.db);
    const client = await api.signedIn();
    const ask = (email: string) => client.put('/api/me/email', { current: PASSWORD, email });
    const taken = await ask(other.email);
    expect(await takeMails(api)).toEqual([]);
    const free = await ask('free@example.org');
    expect(shape(taken)).toEqual(shape(free));
    const token = tokenIn((await takeMails(api))[0]);
    await aMember(api.db, { email: 'free@example.org' });
    const answer = await client.post('/api/email-verifications', { token });
    expect(answer.problem.code).toBe('link-used');
  });
});

describe('PUT /api/me/profile and /api/me/settings', () => {
  test('keep what was sent and answer with all of it', async ({ api }) => {
    const client = await api.signedIn();
    const profile = { name: 'Ines  Quarry', place: 'By the river', about: 'Two lines.\nOf text.' };
    const me = (await client.put('/api/me/profile', profile)).as(meSchema);
    expect(me).toMatchObject({ name: 'Ines Quarry', place: 'By the river', about: profile.about });
    const settings = {
      ...me.settings,
      temperature: 'F',
      mails: { ...me.settings.mails, desk: true },
    };
    const changed = (await client.put('/api/me/settings', settings)).as(meSchema);
    expect(changed.settings).toEqual(settings);
    expect((await client.get('/api/session')).as(sessionAnswerSchema).me).toEqual(changed);
  });

  test('refuse another member’s name, but let a member change the spelling of their own', async ({
    api,
  }) => {
    await aMember(api.db, { name: 'Taken Name' });
    const client = await api.signedIn({ name: 'ines quarry' });
    const rename = (name: string) => client.put('/api/me/profile', { name, place: '', about: '' });
    expect((await rename('Tаken Name')).problem.code).toBe('same-name');
    expect((await rename('Ines Quarry')).status).toBe(200);
  });

  test('take no field that is not the member’s to set', async ({ api }) => {
    const client = await api.signedIn();
    const answer = await client.put('/api/me/profile', {
      name: 'Ines Quarry',
      place: '',
      about: '',
      role: 'admin',
    });
    expect(answer.status).toBe(422);
  });
});
