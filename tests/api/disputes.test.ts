import { describe, expect, vi } from 'vitest';
import { disputedFindingsSchema } from '#shared/api/disputes.ts';
import { frontSchema, troubleSharesSchema, whatHelpedSchema } from '#shared/api/figures.ts';
import { deskNoteSchema } from '#shared/api/desk.ts';
import { draftSchema, notePageSchema } from '#shared/api/notes.ts';
import { currentDocument } from '../../server/search/index-note.ts';
import { test, type Api, type Client } from '../support/api.ts';
import { takeMails } from '../support/mails.ts';
import {
  addKiln,
  completeFields,
  decideOn,
  handIn,
  ifMatch,
  publishedNote,
  saveDraft,
  startNote,
} from '../support/notes.ts';

// Seconds alone, more where the machine is shared.
vi.setConfig({ testTimeout: 120_000 });

const REASON = 'I turned the gas down myself to look inside.';
const KEEP = 'The marks show that the gas was not touched.';
const notePath = (id: number) => `/api/notes/${String(id)}`;
const disputePath = (id: number) => `${notePath(id)}/disputes`;
const answerPath = (id: number) => `/api/desk/disputes/${String(id)}`;
/** The stall of `stalledRows` begins near minute 28; by how much less or more is the reader’s matter. */
const STALL = { code: 'stall', minute: 28, sentence: REASON };

const page = async (client: Client, id: number) =>
  (await client.get(notePath(id))).as(notePageSchema);
/** Where the note’s stall begins as read off it. */
const stallMinute = async (client: Client, id: number): Promise<number> =>
  (await page(client, id)).findings.find(({ code }) => code === 'stall')?.fromMinute ?? Number.NaN;
const shares = async (client: Client) =>
  (await client.get('/api/what-helped')).as(troubleSharesSchema);
const stallsIn = async (client: Client) =>
  (await shares(client)).troubles.find(({ trouble }) => trouble === 'stall') ?? null;
const helped = async (client: Client) =>
  (await client.get('/api/what-helped/stall')).as(whatHelpedSchema);
const deskList = async (client: Client) =>
  (await client.get('/api/desk/disputes')).as(disputedFindingsSchema).disputes;

/** A published stall, and the kiln's next firing without one, by one author. */
async function aPublishedStall(api: Api) {
  const author = await api.signedIn({ name: 'Nell Ashby' });
  const moderator = await api.signedIn({ role: 'moderator', name: 'Ada Weir' });
  const kiln = await addKiln(author);
  const id = await publishedNote(author, moderator, kiln.id, {
    date: '2026-05-01',
    stalledAt: 700,
  });
  const next = await publishedNote(author, moderator, kiln.id, {
    date: '2026-05-08',
    changes: [{ change: 'floor-insulated', purpose: '' }],
  });
  return { author, moderator, kiln, id, next, visitor: api.client() };
}

describe('disagreeing with a finding of a published note', () => {
  test('takes it out of figures, lists, search and in short at once, and is read beside it', async ({
    api,
  }) => {
    const { author, visitor, id } = await aPublishedStall(api);
    const before = await page(visitor, id);
    expect(before.row.troubles).toContain('stall');
    expect(before.summary.levels).toHaveLength(1);
    expect(await stallsIn(visitor)).toMatchObject({ notes: 1, disputed: 0 });
    const measured = (await helped(visitor)).tables.find(({ source }) => source === 'measured');
    expect(measured?.pairs).toBe(1);

    expect((await author.put(disputePath(id), STALL)).status).toBe(200);

    const after = await page(visitor, id);
    // The server's sentence stays; what it was read from does not change.
    expect(after.findings).toEqual(before.findings);
    expect(after.disputes).toMatchObject([
      { ...STALL, minute: await stallMinute(visitor, id), state: 'disputed', answer: null },
    ]);
    expect(after.row.troubles).not.toContain('stall');
    expect(after.row.disputedTroubles).toEqual(['stall']);
    expect(after.row.stallCelsius).toEqual([]);
    expect(after.summary.levels).toEqual([]);
    expect(await stallsIn(visitor)).toMatchObject({ notes: 0, disputed: 1 });
    const now = await helped(visitor);
    expect(now.disputed).toBe(1);
    expect(now.tables.find(({ source }) => source === 'measured')).toMatchObject({
      pairs: 0,
      leftOut: [{ reason: 'the finding is disputed', count: 1 }],
    });
    expect(now.duringTheFiring).toEqual([]);
    const front = (await visitor.get('/api/front')).as(frontSchema);
    const row = front.newest.find((each) => each.id === id);
    expect(row?.troubles).not.toContain('stall');
    expect(row?.followOn?.outcomes.map(({ trouble }) => trouble)).not.toContain('stall');
    const document = await currentDocument(api.deps, id);
    expect(document).toMatchObject({ measuredTroubles: [], stallC: [] });
    expect(document?.troubles).not.toContain('stall');
    expect(document?.inShort).not.toContain('stayed there');
    const promised = await api
      .db('outbox')
      .where({ topic: 'index-note', done_at: null })
      .whereRaw("JSON_VALUE(payload, '$.noteId') = ?", [id])
      .select('id');
    expect(promised.length).toBeGreaterThan(0);
  });

  test('is audited, done once however often it is sent, and finds its finding a little off', async ({
    api,
  }) => {
    const { author, id } = await aPublishedStall(api);
    const at = await stallMinute(author, id);
    const answers = await Promise.all(
      [0, 0, 1.5, -2.5].map((off) => author.put(disputePath(id), { ...STALL, minute: at + off })),
    );
    expect(answers.map(({ status }) => status)).toEqual([200, 200, 200, 200]);
    expect(await api.db('finding_disputes').select('note_id', 'minute', 'version')).toEqual([
      { note_id: id, minute: at, version: 1 },
    ]);
    const entries = await api.db('audit_log').where({ act: 'finding-disputed' }).select('reason');
    expect(entries).toEqual([{ reason: REASON }]);
    const other = await author.put(disputePath(id), {
      ...STALL,
      sentence: 'Quite another reason.',
    });
    expect([other.status, other.problem.code]).toEqual([409, 'conflict']);
    expect(other.problem.current).toEqual({ sentence: REASON });
  });

  test('needs a finding that is there and a sentence that says something', async ({ api }) => {
    const { author, id } = await aPublishedStall(api);
    const minute = (await stallMinute(author, id)) + 3.1;
    const gone = await author.put(disputePath(id), { ...STALL, minute });
    expect([gone.status, gone.problem.code]).toEqual([409, 'stale-revision']);
    const sag = await author.put(disputePath(id), { ...STALL, code: 'sag' });
    expect(sag.status).toBe(409);
    for (const body of [
      { ...STALL, sentence: '  too short  ' },
      { ...STALL, sentence: 'x'.repeat(301) },
      { ...STALL, code: 'nonsense' },
      { ...STALL, state: 'restored' },
    ]) {
      expect((await author.put(disputePath(id), body)).status).toBe(422);
    }
    expect(await api.db('finding_disputes').select('id')).toEqual([]);
  });

  test('is the author’s alone, and only of what is published', async ({ api }) => {
    const { author, moderator, visitor, kiln, id } = await aPublishedStall(api);
    await visitor.fetchToken();
    expect((await visitor.put(disputePath(id), STALL)).status).toBe(401);
    const other = await api.signedIn();
    const admin = await api.signedIn('admin');
    for (const client of [other, moderator, admin]) {
      const answer = await client.put(disputePath(id), STALL);
      expect([answer.status, answer.problem.code]).toEqual([403, 'not-allowed']);
    }
    const draft = await startNote(author, kiln.id);
    const unpublished = await author.put(disputePath(draft.id), STALL);
    expect([unpublished.status, unpublished.problem.code]).toEqual([409, 'wrong-status']);
    expect((await other.put(disputePath(draft.id), STALL)).status).toBe(404);
    await handIn(author, draft, completeFields(kiln.id, { date: '2026-05-20', stalledAt: 700 }));
    expect((await author.put(disputePath(draft.id), STALL)).status).toBe(409);
    expect((await moderator.put(disputePath(draft.id), STALL)).status).toBe(403);
    const abilities = async (client: Client) => (await page(client, id)).abilities.dispute;
    expect(await abilities(author)).toBe(true);
    expect(await abilities(moderator)).toBe(false);
    expect(await abilities(visitor)).toBe(false);
    await moderator.post(`${notePath(id)}/take-down`, { reason: 'It tells of another kiln.' });
    expect((await author.put(disputePath(id), STALL)).status).toBe(409);
  });

  test('can be taken back, and every number is as it was', async ({ api }) => {
    const { author, visitor, id } = await aPublishedStall(api);
    const before = await helped(visitor);
    await author.put(disputePath(id), STALL);
    const [dispute] = (await page(author, id)).disputes;
    const path = `${disputePath(id)}/${String(dispute?.id)}`;
    const unversioned = await author.send('DELETE', path, {});
    expect(unversioned.status).toBe(428);
    const other = await api.signedIn();
    expect((await other.send('DELETE', path, ifMatch(1))).status).toBe(403);
    const taken = await author.send('DELETE', path, ifMatch(1));
    expect(taken.as(notePageSchema).disputes).toEqual([]);
    expect((await author.send('DELETE', path, ifMatch(1))).status).toBe(409);
    expect(await helped(visitor)).toEqual(before);
    expect(await stallsIn(visitor)).toMatchObject({ notes: 1, disputed: 0 });
    expect((await page(visitor, id)).row.troubles).toContain('stall');
    // And said again.
    expect((await author.put(disputePath(id), STALL)).status).toBe(200);
    expect(await stallsIn(visitor)).toMatchObject({ notes: 0, disputed: 1 });
    const acts = await api.db('audit_log').where({ target_id: id }).orderBy('id').pluck('act');
    expect(acts.slice(-3)).toEqual(['finding-disputed', 'dispute-withdrawn', 'finding-disputed']);
  });
});

describe('a moderator’s answer', () => {
  test('restores the finding to the figures at once, is read beside it, and is told by mail', async ({
    api,
  }) => {
    const { author, moderator, visitor, id } = await aPublishedStall(api);
    const before = await helped(visitor);
    await author.put(disputePath(id), STALL);
    const [listed] = await deskList(moderator);
    expect(listed).toMatchObject({
      note: { id },
      author: { name: 'Nell Ashby' },
      finding: { code: 'stall', numbers: { levelCelsius: 700 } },
      dispute: { sentence: REASON, state: 'disputed' },
      own: false,
    });
    await takeMails(api);
    const path = answerPath(listed?.dispute.id ?? 0);
    const restored = await moderator.put(
      path,
      { decision: 'restore', sentence: KEEP },
      ifMatch(listed?.dispute.version ?? 0),
    );
    expect(restored.as(disputedFindingsSchema).disputes[0]?.dispute).toMatchObject({
      state: 'restored',
      answer: { sentence: KEEP, by: { name: 'Ada Weir' } },
    });
    expect(await helped(visitor)).toEqual(before);
    const shown = await page(visitor, id);
    expect(shown.row.troubles).toContain('stall');
    expect(shown.disputes).toMatchObject([
      { sentence: REASON, state: 'restored', answer: { sentence: KEEP } },
    ]);
    const [mail] = await takeMails(api);
    expect(mail?.subject).toContain('A finding is kept');
    for (const said of ['Levelled off at 700', REASON, KEEP, notePath(id).slice(4)]) {
      expect(mail?.text).toContain(said);
    }
    expect(await takeMails(api)).toEqual([]);
    // Then it is settled for the author.
    const again = await author.put(disputePath(id), STALL);
    expect([again.status, again.problem.code]).toEqual([409, 'wrong-status']);
    const back = `${disputePath(id)}/${String(listed?.dispute.id)}`;
    expect((await author.send('DELETE', back, ifMatch(2))).status).toBe(409);
  });

  test('may also leave it out, with or without a sentence, and be another one later', async ({
    api,
  }) => {
    const { author, moderator, visitor, id } = await aPublishedStall(api);
    await author.put(disputePath(id), STALL);
    const disputeId = (await page(author, id)).disputes[0]?.id ?? 0;
    const put = (body: object, version: number) =>
      moderator.put(answerPath(disputeId), body, ifMatch(version));
    expect((await put({ decision: 'restore', sentence: 'No.' }, 1)).status).toBe(422);
    expect((await put({ decision: 'leave', sentence: '' }, 1)).status).toBe(200);
    expect(await stallsIn(visitor)).toMatchObject({ notes: 0, disputed: 1 });
    expect((await page(visitor, id)).disputes[0]).toMatchObject({ state: 'left' });
    expect((await put({ decision: 'restore', sentence: KEEP }, 2)).status).toBe(200);
    expect(await stallsIn(visitor)).toMatchObject({ notes: 1, disputed: 0 });
    const acts = await api.db('audit_log').where({ target_id: id }).orderBy('id').pluck('act');
    expect(acts.slice(-2)).toEqual(['dispute-left', 'finding-restored']);
    const mails = await takeMails(api);
    expect(mails.filter(({ subject }) => subject.includes('finding'))).toHaveLength(2);
  });

  test('is given by moderators and admins, never on a note of their own', async ({ api }) => {
    const { author, visitor, id } = await aPublishedStall(api);
    await author.put(disputePath(id), STALL);
    const disputeId = (await page(author, id)).disputes[0]?.id ?? 0;
    const body = { decision: 'leave', sentence: '' };
    await visitor.fetchToken();
    expect((await visitor.put(answerPath(disputeId), body, ifMatch(1))).status).toBe(401);
    expect((await author.put(answerPath(disputeId), body, ifMatch(1))).status).toBe(403);
    const admin = await api.signedIn('admin');
    expect((await admin.put(answerPath(disputeId), body)).status).toBe(428);
    expect((await admin.put(answerPath(disputeId), body, ifMatch(1))).status).toBe(200);
    expect((await admin.put(answerPath(999_999_999), body, ifMatch(1))).status).toBe(404);

    const staff = await api.signedIn({ role: 'moderator', name: 'Ben Oakes' });
    const second = await api.signedIn('moderator');
    const kiln = await addKiln(staff);
    const own = await publishedNote(staff, second, kiln.id, { stalledAt: 700 });
    await staff.put(disputePath(own), STALL);
    const listed = (await deskList(staff)).find(({ note }) => note.id === own);
    expect(listed?.own).toBe(true);
    const refused = await staff.put(answerPath(listed?.dispute.id ?? 0), body, ifMatch(1));
    expect([refused.status, refused.problem.code]).toEqual([403, 'not-allowed']);
  });

  test('of two at once is one: the second is told, and nothing is sent twice', async ({ api }) => {
    const { author, moderator, id } = await aPublishedStall(api);
    await author.put(disputePath(id), STALL);
    const disputeId = (await page(author, id)).disputes[0]?.id ?? 0;
    const second = await api.signedIn({ role: 'moderator', name: 'Ben Oakes' });
    const answers = await Promise.all([
      moderator.put(answerPath(disputeId), { decision: 'restore', sentence: KEEP }, ifMatch(1)),
      second.put(answerPath(disputeId), { decision: 'leave', sentence: '' }, ifMatch(1)),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 412]);
    const entries = await api
      .db('audit_log')
      .whereIn('act', ['finding-restored', 'dispute-left'])
      .select('id');
    expect(entries).toHaveLength(1);
    const mails = await takeMails(api);
    expect(mails.filter(({ subject }) => subject.includes('finding'))).toHaveLength(1);
  });

  test('against the author taking it back at the same moment: one of the two, never both', async ({
    api,
  }) => {
    const { author, moderator, visitor, id } = await aPublishedStall(api);
    await author.put(disputePath(id), STALL);
    const disputeId = (await page(author, id)).disputes[0]?.id ?? 0;
    const [taken, restored] = await Promise.all([
      author.send('DELETE', `${disputePath(id)}/${String(disputeId)}`, ifMatch(1)),
      moderator.put(answerPath(disputeId), { decision: 'restore', sentence: KEEP }, ifMatch(1)),
    ]);
    expect([taken.status, restored.status].filter((status) => status === 200)).toHaveLength(1);
    const standing = (await page(visitor, id)).disputes;
    expect(standing.map(({ state }) => state)).toEqual(restored.status === 200 ? ['restored'] : []);
    // Either way the stall counts.
    expect(await stallsIn(visitor)).toMatchObject({ notes: 1, disputed: 0 });
  });
});

describe('disagreeing while writing', () => {
  const disputed = (kilnId: number, sentence = REASON) => {
    const fields = completeFields(kilnId, { stalledAt: 700 });
    return {
      ...fields,
      result: { ...fields.result, troubles: ['dull-glaze' as const] },
      findingDisputes: [{ code: 'stall' as const, minute: 28, sentence }],
    };
  };

  test('is read at the desk, and in force once the note is published', async ({ api }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const visitor = api.client();
    const kiln = await addKiln(author);
    const draft = await startNote(author, kiln.id);
    const handedIn = await handIn(author, draft, disputed(kiln.id));
    expect(handedIn.status).toBe('handed-in');
    const desk = (await moderator.get(`/api/desk/notes/${String(draft.id)}`)).as(deskNoteSchema);
    expect(desk.page.disputes).toMatchObject([{ id: null, sentence: REASON, state: 'disputed' }]);
    expect(desk.page.row.troubles).not.toContain('stall');
    expect(await stallsIn(visitor)).toBeNull();
    await decideOn(moderator, draft.id, 'publish');
    expect(await stallsIn(visitor)).toMatchObject({ notes: 0, disputed: 1 });
    expect((await page(visitor, draft.id)).disputes).toMatchObject([{ sentence: REASON }]);
    expect(await deskList(moderator)).toHaveLength(1);
  });

  test('needs its sentence before the note can be handed in, and asks no more for the trouble', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const kiln = await addKiln(author);
    const draft = await startNote(author, kiln.id);
    const unsaid = await saveDraft(author, draft, disputed(kiln.id, 'It'));
    const codes = unsaid.checks.map(({ code }) => code);
    expect(codes).toContain('dispute-without-reason');
    expect(codes).toContain('stall-not-named');
    expect(unsaid.fields.findingDisputes[0]?.sentence).toBe('It');
    const said = await saveDraft(author, unsaid, disputed(kiln.id));
    const now = said.checks.map(({ code }) => code);
    expect(now).not.toContain('dispute-without-reason');
    expect(now).not.toContain('stall-not-named');
    const both = await saveDraft(author, said, {
      ...disputed(kiln.id),
      result: { ...disputed(kiln.id).result, troubles: ['stall'] },
    });
    expect(both.checks.map(({ code }) => code)).toContain('stall-named-and-disputed');
  });

  test('goes on in the next revision, and ends with one that no longer says it', async ({
    api,
  }) => {
    const { author, moderator, visitor, id } = await aPublishedStall(api);
    await author.put(disputePath(id), STALL);
    const revise = async () => (await author.post(`${notePath(id)}/revise`)).as(draftSchema);
    const draft = await revise();
    const said = { ...STALL, minute: await stallMinute(author, id) };
    expect(draft.fields.findingDisputes).toEqual([said]);
    await handIn(author, draft, draft.fields);
    await decideOn(moderator, id, 'publish');
    expect((await page(visitor, id)).disputes).toMatchObject([{ version: 1, sentence: REASON }]);
    const second = await revise();
    await handIn(author, second, { ...second.fields, findingDisputes: [] });
    await decideOn(moderator, id, 'publish');
    expect((await page(visitor, id)).disputes).toEqual([]);
    expect(await stallsIn(visitor)).toMatchObject({ notes: 1, disputed: 0 });
  });

  test('a tab that writes a revision is told when the page was used to disagree meanwhile', async ({
    api,
  }) => {
    const { author, id } = await aPublishedStall(api);
    const draft = (await author.post(`${notePath(id)}/revise`)).as(draftSchema);
    await author.put(disputePath(id), STALL);
    const late = await author.put(
      `${notePath(id)}/draft`,
      { fields: { ...draft.fields, title: 'Anew' } },
      ifMatch(draft.version),
    );
    expect([late.status, late.problem.code]).toEqual([412, 'stale']);
    const now = (await author.get(`${notePath(id)}/draft`)).as(draftSchema);
    const said = { ...STALL, minute: await stallMinute(author, id) };
    expect(now.fields.findingDisputes).toEqual([said]);
  });

  test('an answer to a level stretch is read by moderators and readers', async ({ api }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const fields = completeFields(kiln.id, { stalledAt: 700 });
    const levelAnswers = [{ fromMinute: 28, answer: 'stuck' as const }];
    const id = await publishedNote(author, moderator, kiln.id, {
      stalledAt: 700,
      overrides: { record: { ...fields.record, levelAnswers } },
    });
    expect((await page(api.client(), id)).levelAnswers).toEqual(levelAnswers);
  });
});
