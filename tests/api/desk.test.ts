import { describe, expect, vi } from 'vitest';
import { DESK_QUESTIONS, deskNoteSchema, deskQueueSchema } from '#shared/api/desk.ts';
import { draftSchema, notePageSchema } from '#shared/api/notes.ts';
import { kilnPageSchema } from '#shared/api/kilns.ts';
import { test, type Api, type Client } from '../support/api.ts';
import {
  addKiln,
  completeFields,
  decideOn,
  handIn,
  publishedNote,
  startNote,
} from '../support/notes.ts';

// Seconds alone, more where the machine is shared.
vi.setConfig({ testTimeout: 90_000 });

const deskPath = (noteId: number) => `/api/desk/notes/${String(noteId)}`;
const decision = (revisionId: number, traits: object = {}) => ({
  decision: 'publish',
  revisionId,
  reason: '',
  checklist: DESK_QUESTIONS,
  ...traits,
});

/** A note that waits at the desk, with everybody who has to do with it. */
async function waitingNote(api: Api) {
  const author = await api.signedIn();
  const kiln = await addKiln(author);
  const draft = await startNote(author, kiln.id);
  await handIn(author, draft, completeFields(kiln.id));
  const ada = await api.signedIn({ role: 'moderator', name: 'Ada Weir' });
  const ben = await api.signedIn({ role: 'moderator', name: 'Ben Oakes' });
  return { author, kiln, draft, id: draft.id, ada, ben, path: deskPath(draft.id) };
}

const claim = async (moderator: Client, noteId: number) =>
  (await moderator.put(`${deskPath(noteId)}/claim`)).as(deskNoteSchema);

describe('a claim', () => {
  test('is for twenty minutes, renewed by its holder, and told to whoever comes second', async ({
    api,
  }) => {
    const { ada, ben, id, path } = await waitingNote(api);
    const first = await claim(ada, id);
    const minutes = (Date.parse(first.claim?.until ?? '') - Date.now()) / 60_000;
    expect(minutes).toBeGreaterThan(19);
    expect(minutes).toBeLessThan(21);
    expect(first.claim?.mine).toBe(true);
    const second = await ben.put(`${path}/claim`);
    expect(second.status).toBe(409);
    expect(second.problem.code).toBe('already-claimed');
    expect(second.problem.detail).toContain('Ada Weir');
    expect(second.problem.current).toMatchObject({ by: 'Ada Weir' });
    // Seen by the others, who may read but not decide.
    const seen = (await ben.get(path)).as(deskNoteSchema);
    expect([seen.claim?.by.name, seen.claim?.mine, seen.abilities.decide]).toEqual([
      'Ada Weir',
      false,
      false,
    ]);
    const decided = await ben.post(`${path}/decision`, decision(seen.revisionId));
    expect([decided.status, decided.problem.code]).toEqual([409, 'already-claimed']);

    await api
      .db('notes')
      .where({ id })
      .update({ claimed_until: api.db.raw('NOW(3) + INTERVAL 1 MINUTE') });
    const renewed = await claim(ada, id);
    expect(Date.parse(renewed.claim?.until ?? '') - Date.now()).toBeGreaterThan(19 * 60_000);
    // Renewing is not worth a second entry.
    const entries = await api.db('audit_log').where({ act: 'claimed' }).select('id');
    expect(entries).toHaveLength(1);
  });

  test('lapses: then another may take the note, and the first is told so', async ({ api }) => {
    const { ada, ben, id, path } = await waitingNote(api);
    const { revisionId } = await claim(ada, id);
    await api
      .db('notes')
      .where({ id })
      .update({ claimed_until: api.db.raw('NOW(3) - INTERVAL 1 SECOND') });
    const queue = (await ben.get('/api/desk')).as(deskQueueSchema);
    expect(queue.waiting.find(({ noteId }) => noteId === id)?.claim).toBeNull();
    const late = await ada.post(`${path}/decision`, decision(revisionId));
    expect([late.status, late.problem.detail]).toEqual([409, expect.stringContaining('lapsed')]);
    expect((await claim(ben, id)).claim?.by.name).toBe('Ben Oakes');
    const taken = await ada.post(`${path}/decision`, decision(revisionId));
    expect([taken.status, taken.problem.detail]).toEqual([
      409,
      expect.stringContaining('Ben Oakes'),
    ]);
  });

  test('given up puts the note back, and only its holder may', async ({ api }) => {
    const { ada, ben, id, path } = await waitingNote(api);
    const early = await ada.delete(`${path}/claim`);
    expect([early.status, early.problem.detail]).toEqual([409, expect.stringContaining('first')]);
    await claim(ada, id);
    expect((await ben.delete(`${path}/claim`)).status).toBe(409);
    expect((await ada.delete(`${path}/claim`)).status).toBe(200);
    expect((await claim(ben, id)).claim?.mine).toBe(true);
  });
});

describe('a decision', () => {
  test('to refuse needs its reason; remarks reach the author with it and can be ticked off', async ({
    api,
  }) => {
    const { author, ada, ben, id, path } = await waitingNote(api);
    const { revisionId } = await claim(ada, id);
    for (const refusal of ['send-back', 'decline']) {
      const answer = await ada.post(
        `${path}/decision`,
        decision(revisionId, { decision: refusal, reason: '  ' }),
      );
      expect([refusal, answer.status]).toEqual([refusal, 422]);
      expect(answer.problem.errors?.[0]?.pointer).toBe('/reason');
    }
    const remark = (who: Client, text: string) =>
      who.post(`${path}/remarks`, { pointer: '/pieces/0/wallMm', text });
    expect((await remark(ben, 'Not mine to say.')).status).toBe(409);
    await remark(ada, 'Measured where?');
    const two = (await remark(ada, 'A slip.')).as(deskNoteSchema);
    const slip = two.remarks.at(-1)?.id ?? 0;
    expect((await ada.delete(`${path}/remarks/${String(slip)}`)).status).toBe(200);
    const draftPath = `/api/notes/${String(id)}/draft`;
    expect((await author.get(draftPath)).as(draftSchema).remarks).toEqual([]);

    const sent = await ada.post(
      `${path}/decision`,
      decision(revisionId, { decision: 'send-back', reason: 'Almost.' }),
    );
    expect(sent.status).toBe(200);
    const back = (await author.get(draftPath)).as(draftSchema);
    expect(back.status).toBe('sent-back');
    expect(back.decision).toMatchObject({ reason: 'Almost.', by: { name: 'Ada Weir' } });
    expect(back.remarks.map(({ text, pointer, mended }) => [text, pointer, mended])).toEqual([
      ['Measured where?', '/pieces/0/wallMm', false],
    ]);
    const remarkPath = `/api/notes/${String(id)}/remarks/${String(back.remarks[0]?.id ?? 0)}/mended`;
    const ticked = (await author.put(remarkPath, { mended: true })).as(draftSchema);
    expect(ticked.remarks[0]?.mended).toBe(true);
    // Sent, it stays said.
    expect((await ada.delete(`${path}/remarks/${String(back.remarks[0]?.id ?? 0)}`)).status).toBe(
      409,
    );
  });

  test('to publish needs every question of the checklist, whatever asks for it', async ({
    api,
  }) => {
    const { author, ada, id, path } = await waitingNote(api);
    const { revisionId } = await claim(ada, id);
    const crossed = {
      some: DESK_QUESTIONS.slice(1),
      none: [],
      oneFiveTimes: Array(5).fill('kind'),
    };
    for (const [which, checklist] of Object.entries(crossed)) {
      const answer = await ada.post(`${path}/decision`, decision(revisionId, { checklist }));
      expect([which, answer.status, answer.problem.code]).toEqual([which, 422, 'bad-input']);
      expect(answer.problem.errors).toEqual([
        {
          pointer: '/checklist',
          detail: 'Cross every question of the checklist to publish.',
        },
      ]);
    }
    const unasked = { decision: 'publish', revisionId, reason: '' };
    expect((await ada.post(`${path}/decision`, unasked)).problem.errors?.[0]?.pointer).toBe(
      '/checklist',
    );
    expect((await claim(ada, id)).status).toBe('on-the-desk');
    // What was asked is kept with the decision.
    expect((await ada.post(`${path}/decision`, decision(revisionId))).status).toBe(200);
    const kept = await api.db('audit_log').where({ act: 'published' }).select('after_value');
    expect(JSON.stringify(kept)).toContain('theirs');
    // To send back or to decline asks for a reason, and for nothing to be crossed.
    expect((await author.post(`/api/notes/${String(id)}/revise`)).status).toBe(200);
    const draft = (await author.get(`/api/notes/${String(id)}/draft`)).as(draftSchema);
    await handIn(author, draft, draft.fields);
    const again = await claim(ada, id);
    const back = decision(again.revisionId, {
      decision: 'send-back',
      reason: 'Almost.',
      checklist: [],
    });
    expect((await ada.post(`${path}/decision`, back)).status).toBe(200);
  });

  test('is made on the revision that was read, never on a newer one', async ({ api }) => {
    const { author, ada, kiln, id, path } = await waitingNote(api);
    const read = await claim(ada, id);
    expect((await author.post(`/api/notes/${String(id)}/take-back`)).status).toBe(200);
    const gone = await ada.post(`${path}/decision`, decision(read.revisionId));
    expect([gone.status, gone.problem.detail]).toEqual([
      409,
      expect.stringContaining('taken this note back'),
    ]);
    const draft = (await author.get(`/api/notes/${String(id)}/draft`)).as(draftSchema);
    await handIn(author, draft, completeFields(kiln.id, { title: 'Quite another text' }));
    const newer = await claim(ada, id);
    expect(newer.revisionId).not.toBe(read.revisionId);
    const stale = await ada.post(`${path}/decision`, decision(read.revisionId));
    expect([stale.status, stale.problem.code]).toEqual([409, 'stale-revision']);
    expect((await ada.post(`${path}/decision`, decision(newer.revisionId))).status).toBe(200);
    const late = await ada.post(`${path}/decision`, decision(newer.revisionId));
    expect(late.problem).toMatchObject({
      status: 409,
      detail: 'Ada Weir has decided on this note already: published.',
      current: { act: 'published', by: { name: 'Ada Weir' } },
    });
  });

  test('on a published note’s revision leaves the old one up until it is made', async ({ api }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const id = await publishedNote(author, moderator, kiln.id, { title: 'The first telling' });
    const page = async () =>
      (await api.client().get(`/api/notes/${String(id)}`)).as(notePageSchema);
    expect((await author.post(`/api/notes/${String(id)}/revise`)).status).toBe(200);
    const draft = (await author.get(`/api/notes/${String(id)}/draft`)).as(draftSchema);
    expect((await page()).row.title).toBe('The first telling');
    await handIn(author, draft, completeFields(kiln.id, { title: 'Told better' }));
    expect((await page()).row.title).toBe('The first telling');
    const desk = await claim(moderator, id);
    expect(desk.differences).toContainEqual(
      expect.objectContaining({
        pointer: '/title',
        before: 'The first telling',
        after: 'Told better',
      }),
    );
    await decideOn(moderator, id, 'publish');
    const now = await page();
    expect([now.row.title, now.revision]).toEqual(['Told better', 2]);
    expect(now.revisedAt).not.toBeNull();
    // And a declined revision changes nothing for readers.
    await author.post(`/api/notes/${String(id)}/revise`);
    const third = (await author.get(`/api/notes/${String(id)}/draft`)).as(draftSchema);
    await handIn(author, third, completeFields(kiln.id, { title: 'Told worse' }));
    await decideOn(moderator, id, 'decline', 'The first was better.');
    expect((await page()).row.title).toBe('Told better');
  });
});

describe('taking down', () => {
  test('takes a note from page, list, kiln, figures, search rows and preview at once', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const first = await publishedNote(author, moderator, kiln.id, {
      stalledAt: 700,
      date: '2026-04-01',
      title: 'Canary stall',
    });
    const next = await publishedNote(author, moderator, kiln.id, {
      date: '2026-04-08',
      title: 'Canary cure',
      changes: [{ change: 'floor-insulated', purpose: 'heat' }],
    });
    const visitor = api.client();
    const seen = async () => {
      const paths = [
        '/api/notes',
        `/api/kilns/${String(kiln.id)}`,
        '/api/front',
        `/api/notes/${String(first)}`,
      ];
      const texts = await Promise.all(paths.map(async (path) => (await visitor.get(path)).text));
      return texts.map((text) => text.includes('Canary cure'));
    };
    expect(await seen()).toEqual([true, true, true, true]);
    const helped = async () => (await visitor.get('/api/what-helped/stall')).text;
    const before = await helped();
    const path = `/api/notes/${String(next)}/take-down`;
    expect((await moderator.post(path, { reason: ' ' })).status).toBe(422);
    await api.db('outbox').delete();
    expect((await moderator.post(path, { reason: 'Asked for.' })).status).toBe(200);
    expect(await seen()).toEqual([false, false, false, false]);
    expect(await helped()).not.toBe(before);
    expect((await visitor.get(`/api/notes/${String(next)}`)).status).toBe(404);
    expect((await visitor.get(`/api/notes/${String(next)}/record.csv`)).status).toBe(404);
    const page = (await visitor.get(`/api/kilns/${String(kiln.id)}`)).as(kilnPageSchema);
    expect(page.firings.map(({ id, followOn }) => [id, followOn])).toEqual([[first, null]]);
    expect((await moderator.post(path, { reason: 'Again.' })).status).toBe(404);
    const own = (await author.get(`/api/notes/${String(next)}/draft`)).as(draftSchema);
    expect([own.status, own.decision?.reason]).toEqual(['taken-down', 'Asked for.']);
    // The index is told of the note that is gone, and of the one it followed.
    const jobs = await api.db('outbox').where({ topic: 'index-note' }).select('payload');
    for (const id of [first, next]) {
      expect(JSON.stringify(jobs).replace(/\\/g, '')).toContain(`{"noteId":${String(id)}}`);
    }
  });

  test('is not for one’s own note, nor for one that is not up', async ({ api }) => {
    const staff = await api.signedIn('moderator');
    const other = await api.signedIn('moderator');
    const kiln = await addKiln(staff);
    const id = await publishedNote(staff, other, kiln.id);
    const answer = await staff.post(`/api/notes/${String(id)}/take-down`, { reason: 'Mine.' });
    expect(answer.status).toBe(403);
    const draft = await startNote(staff, kiln.id);
    const unseen = await other.post(`/api/notes/${String(draft.id)}/take-down`, { reason: 'x' });
    expect(unseen.status).toBe(404);
  });
});
