import { mkdtemp, readdir, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { describe, expect, vi } from 'vitest';
import { MOST_SAVED_SEARCHES, savedSearchesSchema } from '#shared/api/saved-searches.ts';
import { startMailCatcher } from '../../server/mail/catcher.ts';
import { mailHandler } from '../../server/mail/mail-handler.ts';
import { listCaughtMails } from '../../server/mail/read-caught.ts';
import { workOnce } from '../../server/outbox/worker.ts';
import {
  memberOfUnsubscribeToken,
  unsubscribeToken,
} from '../../server/saved-searches/unsubscribe-token.ts';
import { watchSearches } from '../../server/saved-searches/watch-searches.ts';
import { findAccountById } from '../../server/accounts/account-repository.ts';
import { test as apiTest, type Client } from '../support/api.ts';
import { aMember } from '../support/builders.ts';
import { takeMails } from '../support/mails.ts';
import {
  addKiln,
  decideOn,
  handIn,
  completeFields,
  publishedNote,
  startNote,
} from '../support/notes.ts';
import { test, type SearchApi } from '../support/search.ts';

vi.setConfig({ testTimeout: 90_000 });

const PATH = '/api/saved-searches';
const save = (client: Client, name: string, search: object = { q: 'stalled at 700 °C' }) =>
  client.post(PATH, { name, search });
const listOf = async (client: Client) => (await client.get(PATH)).as(savedSearchesSchema).searches;

describe('saved searches', () => {
  apiTest(
    'are kept with their filters, renamed, switched and removed by their member',
    async ({ api }) => {
      const member = await api.signedIn();
      const search = {
        q: ' stalled at 700 °C ',
        off: 'temperature',
        fuel: 'propane',
        peak: '650..750',
      };
      const saved = await save(member, '  Stalls\u0000 on\npropane ', search);
      expect(saved.status).toBe(201);
      const [kept] = saved.as(savedSearchesSchema).searches;
      expect(kept).toMatchObject({
        name: 'Stalls on propane',
        search: { ...search, q: 'stalled at 700 °C' },
        mails: true,
        mailedAt: null,
      });
      // The same search in another order is the same.
      const again = await save(member, 'Twice', {
        peak: search.peak,
        fuel: search.fuel,
        off: search.off,
        q: search.q,
      });
      expect(again.problem.detail).toContain('Stalls on propane');
      const one = `${PATH}/${String(kept?.id)}`;
      const changed = await member.put(one, { name: 'Cold floor', mails: false });
      expect(changed.as(savedSearchesSchema).searches).toMatchObject([
        { name: 'Cold floor', mails: false },
      ]);
      expect((await member.delete(one)).as(savedSearchesSchema).searches).toEqual([]);
      expect((await member.delete(one)).status).toBe(404);
    },
  );

  apiTest(
    'ask for something, in a form the find page has, and are not without number',
    async ({ api }) => {
      const member = await api.signedIn();
      const bad = [
        {},
        { off: 'temperature' },
        { q: '   ' },
        { q: 'stall', memberId: 1 },
        { q: 'stall', peak: '700' },
        { q: 'stall', peak: '700 OR noteId > 0..' },
        { q: 'x'.repeat(301) },
      ];
      for (const search of bad) {
        expect((await save(member, 'Bad', search)).status, JSON.stringify(search)).toBe(422);
      }
      expect((await save(member, ' ', { q: 'stall' })).status).toBe(422);
      for (let number = 0; number < MOST_SAVED_SEARCHES; number += 1) {
        expect((await save(member, 'One', { q: `stall ${String(number)}` })).status).toBe(201);
      }
      expect((await save(member, 'One more', { q: 'sag' })).status).toBe(422);
    },
  );

  apiTest('are nothing to visitors, other members, moderators and admins', async ({ api }) => {
    const owner = await api.signedIn();
    await save(owner, 'Mine');
    const [mine] = await listOf(owner);
    const one = `${PATH}/${String(mine?.id)}`;
    const others = [
      await api.signedIn(),
      await api.signedIn('moderator'),
      await api.signedIn('admin'),
    ];
    for (const other of others) {
      expect(await listOf(other)).toEqual([]);
      expect((await other.put(one, { name: 'Yours', mails: false })).status).toBe(404);
      expect((await other.delete(one)).status).toBe(404);
    }
    const visitor = api.client();
    await visitor.fetchToken();
    expect((await visitor.get(PATH)).status).toBe(401);
    expect((await save(visitor, 'Nobody')).status).toBe(401);
    expect(await listOf(owner)).toMatchObject([{ name: 'Mine', mails: true }]);
  });
});

/** Publishes a stalled firing of another member, and brings it into the index. */
async function publishStall(api: SearchApi, celsius: number, title: string): Promise<number> {
  const author = await api.signedIn();
  const kiln = await addKiln(author, { name: `Kiln of ${title}` });
  const id = await publishedNote(author, await api.signedIn('moderator'), kiln.id, {
    title,
    stalledAt: celsius,
  });
  await api.catchUp();
  await api
    .db('outbox')
    .where({ topic: 'index-note' })
    .update({ done_at: api.db.fn.now(3) });
  await api.db('outbox').where({ topic: 'mail' }).whereNull('done_at').delete();
  // One full tick of the clock, or "until now" could be before it.
  await sleep(5);
  return id;
}
const look = (api: SearchApi) => watchSearches(api.deps, { lagSeconds: 0 });
const aDayLater = (api: SearchApi) =>
  api.db('saved_searches').update({ mailed_at: api.db.raw('NOW(3) - INTERVAL 25 HOUR') });

describe('mails about saved searches', () => {
  test('tell of each new note that fits once, at most once a day, and of nothing older', async ({
    searchApi: api,
  }) => {
    await publishStall(api, 704, 'Old news');
    const reader = await api.signedIn();
    await save(reader, 'Near seven hundred');
    await save(reader, 'Far higher', { q: 'stall', stall: '880..920' });
    expect(await look(api)).toBe(0);
    await publishStall(api, 702, 'Stuck again');
    await publishStall(api, 800, 'Stuck elsewhere');
    expect(await look(api)).toBe(1);
    expect(await look(api)).toBe(0);
    const [mail, ...more] = await takeMails(api);
    expect(more).toEqual([]);
    expect(mail).toMatchObject({
      to: reader.member.email,
      subject: '1 new note: “Near seven hundred”',
    });
    expect(mail?.text).toContain('Stuck again');
    expect(mail?.text).not.toMatch(/Old news|Stuck elsewhere|Far higher/);
    // The day is not over: what comes now waits.
    await publishStall(api, 905, 'Far up');
    await publishStall(api, 698, 'Once more');
    expect(await look(api)).toBe(0);
    await aDayLater(api);
    expect(await look(api)).toBe(1);
    const [next] = await takeMails(api);
    expect(next?.subject).toBe('2 new notes: your saved searches');
    expect(next?.text).toMatch(/“Near seven hundred”\n- Once more/);
    expect(next?.text).toMatch(/“Far higher”\n- Far up/);
    expect(next?.text).not.toContain('Stuck again');
  });

  test('leave out one’s own notes, searches and members that want none, and notes taken down', async ({
    searchApi: api,
  }) => {
    const author = await api.signedIn();
    const quiet = await api.signedIn();
    const unverified = await api.signedIn({ emailVerified: false });
    const suspended = await aMember(api.db, { suspended: true });
    for (const client of [author, quiet, unverified, await api.signedIn(suspended.id)]) {
      await save(client, 'Near seven hundred');
    }
    const [quietOne] = await listOf(quiet);
    await quiet.put(`${PATH}/${String(quietOne?.id)}`, { name: 'Quiet', mails: false });
    const kiln = await addKiln(author);
    const moderator = await api.signedIn('moderator');
    await publishedNote(author, moderator, kiln.id, { title: 'My own', stalledAt: 700 });
    await api.catchUp();
    await sleep(5);
    expect(await look(api)).toBe(0);
    // Switched on again, a search tells of what comes from then on.
    await quiet.put(`${PATH}/${String(quietOne?.id)}`, { name: 'Loud', mails: true });
    expect(await look(api)).toBe(0);
    const gone = await publishStall(api, 701, 'Soon gone');
    expect(await look(api)).toBe(2);
    await moderator.post(`/api/notes/${String(gone)}/take-down`, {
      reason: 'Not a firing at all.',
    });
    expect(
      (await takeMails(api)).filter(({ text }) => text.includes('“Near seven hundred”')),
    ).toEqual([]);
  });

  test('miss nothing while the index is behind or the engine is away', async ({
    searchApi: api,
  }) => {
    const reader = await api.signedIn();
    await save(reader, 'Near seven hundred');
    const author = await api.signedIn();
    const kiln = await addKiln(author);
    const draft = await startNote(author, kiln.id);
    await handIn(author, draft, completeFields(kiln.id, { title: 'Late', stalledAt: 700 }));
    await decideOn(await api.signedIn('moderator'), draft.id, 'publish');
    // Published, and its document is still to be written.
    expect(await look(api)).toBe(0);
    await api.catchUp();
    await sleep(5);
    await api.engine.stop();
    await expect(look(api)).rejects.toThrow();
    await api.engine.start();
    expect(await look(api)).toBe(1);
  });

  test('reach the catcher with both header fields, whose address ends them in one click', async ({
    searchApi: api,
  }) => {
    const folder = await mkdtemp(path.join(tmpdir(), 'spyhole-test-news-'));
    const catcher = await startMailCatcher(folder);
    const deps = {
      ...api.deps,
      config: {
        ...api.deps.config,
        mail: { ...api.deps.config.mail, smtpUrl: catcher.smtpUrl },
      },
    };
    try {
      const reader = await api.signedIn();
      await save(reader, 'Near seven hundred', { q: 'stalled at 700 °C', fuel: 'propane' });
      const id = await publishStall(api, 703, 'Stuck again');
      expect(await look(api)).toBe(1);
      await workOnce(deps, 'mail', mailHandler(deps));
      const [mail] = await listCaughtMails(folder);
      const token = unsubscribeToken(api.deps.config, reader.member.id);
      const { baseUrl } = api;
      expect(mail?.text).toContain(`${baseUrl}/notes/${String(id)}/stuck-again`);
      expect(mail?.text).toContain(`${baseUrl}/unsubscribe#${token}`);
      expect(mail?.text).toContain(`${baseUrl}/saved-searches`);
      const shown = /All it finds:\n\s+(\S+)/.exec(mail?.text ?? '')?.[1] ?? '';
      expect(new URL(shown).searchParams.get('fuel')).toBe('propane');
      const [name = ''] = (await readdir(folder)).filter((file) => file.endsWith('.eml'));
      const source = (await readFile(path.join(folder, name), 'utf8')).replace(/\r?\n[ \t]+/g, ' ');
      expect(source).toMatch(/^List-Unsubscribe-Post: List-Unsubscribe=One-Click\r?$/m);
      const address = /^List-Unsubscribe: <(\S+)>\r?$/m.exec(source)?.[1] ?? '';
      expect(address).toBe(`${baseUrl}/api/unsubscribe?token=${token}`);
      // As a mail program posts it: a form, no cookie, no origin.
      const answer = await fetch(address, {
        method: 'POST',
        body: new URLSearchParams({ 'List-Unsubscribe': 'One-Click' }),
        redirect: 'manual',
      });
      expect(answer.status).toBe(200);
      expect(answer.headers.getSetCookie()).toEqual([]);
      const account = await findAccountById(api.db, reader.member.id);
      expect(account?.settings.mails).toMatchObject({ savedSearches: false, decisions: true });
      await publishStall(api, 699, 'And again');
      await aDayLater(api);
      expect(await look(api)).toBe(0);
    } finally {
      await catcher.stop();
      await rm(folder, { recursive: true, force: true });
    }
  });
});

describe('the address in List-Unsubscribe', () => {
  apiTest(
    'ends the mails of the member it was signed for, as often as it is used',
    async ({ api }) => {
      const owner = await api.signedIn();
      const other = await api.signedIn();
      const url = `/api/unsubscribe?token=${unsubscribeToken(api.deps.config, owner.member.id)}`;
      const form = (boundary: string) =>
        `--${boundary}\r\nContent-Disposition: form-data; name="List-Unsubscribe"\r\n\r\nOne-Click\r\n--${boundary}--\r\n`;
      for (let time = 0; time < 2; time += 1) {
        const answer = await api.client().send('POST', url, {
          foreign: true,
          rawBody: form('b'),
          headers: { 'Content-Type': 'multipart/form-data; boundary=b' },
        });
        expect(answer.status).toBe(200);
      }
      const wants = async (id: number) =>
        (await findAccountById(api.db, id))?.settings.mails.savedSearches;
      expect(await wants(owner.member.id)).toBe(false);
      expect(await wants(other.member.id)).toBe(true);
    },
  );

  apiTest(
    'is worth nothing with another id, another signature or none, and tells of no account',
    async ({ api }) => {
      const owner = await api.signedIn();
      const token = unsubscribeToken(api.deps.config, owner.member.id);
      const bytes = Buffer.from(token, 'base64url');
      const changed = (at: number): string => {
        const copy = Buffer.from(bytes);
        copy[at] = (copy[at] ?? 0) ^ 1;
        return copy.toString('base64url');
      };
      const post = (signed: string) =>
        api.client().send('POST', `/api/unsubscribe?token=${signed}`, { foreign: true });
      const foreignSecret: [string] = ['another secret of 32 characters or more'];
      const forged = [
        changed(7),
        changed(8),
        changed(31),
        unsubscribeToken({ sessionSecrets: foreignSecret }, owner.member.id),
      ];
      for (const signed of forged) expect((await post(signed)).problem.code).toBe('link-used');
      expect((await post('short')).status).toBe(400);
      expect((await api.client().send('POST', '/api/unsubscribe', { foreign: true })).status).toBe(
        400,
      );
      expect((await findAccountById(api.db, owner.member.id))?.settings.mails.savedSearches).toBe(
        true,
      );
      // Signed for an account that is gone: the same answer as for one that is there.
      expect((await post(unsubscribeToken(api.deps.config, 999_999_999))).status).toBe(200);
    },
  );

  apiTest(
    'still holds after the secret was replaced, and only shows a page when it is opened',
    async ({ api }) => {
      const owner = await api.signedIn();
      const token = unsubscribeToken(api.deps.config, owner.member.id);
      const opened = await api.client().get(`/api/unsubscribe?token=${token}`);
      expect([opened.status, opened.headers.get('Location')]).toEqual([
        303,
        `/unsubscribe#${token}`,
      ]);
      expect((await findAccountById(api.db, owner.member.id))?.settings.mails.savedSearches).toBe(
        true,
      );
      const [secret] = api.deps.config.sessionSecrets;
      const replaced: [string, string] = ['a new secret of 32 characters or more!', secret];
      expect(memberOfUnsubscribeToken({ sessionSecrets: replaced }, token)).toBe(owner.member.id);
    },
  );

  apiTest(
    'opens nothing else: other changes still ask for own origin and token',
    async ({ api }) => {
      const owner = await api.signedIn();
      const refused = await owner.send('POST', PATH, {
        foreign: true,
        body: { name: 'Planted', search: { q: 'stall' } },
      });
      expect(refused.problem.code).toBe('foreign-origin');
    },
  );
});
