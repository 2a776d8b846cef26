import { describe, expect } from 'vitest';
import { deskNoteSchema } from '#shared/api/desk.ts';
import { draftSchema, notePageSchema } from '#shared/api/notes.ts';
import { test } from '../support/api.ts';
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

describe('the way of a note', () => {
  test('a note goes from a draft over the desk, once sent back, to its readers', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const draft = await startNote(author, kiln.id);
    const handedIn = await handIn(author, draft, completeFields(kiln.id, { stalledAt: 702 }));
    expect(handedIn.status).toBe('handed-in');
    expect(handedIn.findings.map((finding) => finding.code)).toContain('stall');

    const desk = `/api/desk/notes/${String(draft.id)}`;
    const claimed = (await moderator.put(`${desk}/claim`)).as(deskNoteSchema);
    expect(claimed.abilities.decide).toBe(true);
    const remark = await moderator.post(
      `${desk}/remarks`,
      { pointer: '/plan/targetCelsius', text: 'Was this the glaze’s own target?' },
      { headers: { 'Idempotency-Key': crypto.randomUUID() } },
    );
    expect(remark.status).toBe(200);
    await moderator.post(`${desk}/decision`, {
      decision: 'send-back',
      revisionId: claimed.revisionId,
      reason: 'One question, then it can go out.',
      checklist: [],
    });
    const back = (await author.get(`/api/notes/${String(draft.id)}/draft`)).as(draftSchema);
    expect(back.status).toBe('sent-back');
    expect(back.remarks).toHaveLength(1);
    expect(back.decision?.reason).toBe('One question, then it can go out.');

    await handIn(author, back, { ...back.fields, title: 'Seven hundred and no further' });
    await decideOn(moderator, draft.id, 'publish');

    const visitor = api.client();
    const page = (await visitor.get(`/api/notes/${String(draft.id)}`)).as(notePageSchema);
    expect(page.row.title).toBe('Seven hundred and no further');
    expect(page.row.stallCelsius[0]).toBeCloseTo(702, -1);
    expect(page.storyHtml).toContain('The flame was steady');
  });

  test('the next firing of the kiln is told on the earlier note, with its changes', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const first = await publishedNote(author, moderator, kiln.id, {
      stalledAt: 705,
      date: '2026-04-04',
    });
    const second = await publishedNote(author, moderator, kiln.id, {
      date: '2026-04-18',
      title: 'Up on bricks',
      changes: [{ change: 'floor-insulated', purpose: 'the slab drank the heat' }],
    });
    const page = (await api.client().get(`/api/notes/${String(first)}`)).as(notePageSchema);
    expect(page.next).toMatchObject({ noteId: second, changes: ['floor-insulated'] });
    expect(page.followOn?.outcomes).toContainEqual({ trouble: 'stall', outcome: 'gone' });
    const later = (await api.client().get(`/api/notes/${String(second)}`)).as(notePageSchema);
    expect(later.earlier?.noteId).toBe(first);
  });
});

describe('PUT /api/notes/:id/draft', () => {
  test('of two tabs the second is refused and shown what the server holds', async ({ api }) => {
    const author = await api.signedIn();
    const kiln = await addKiln(author);
    const draft = await startNote(author, kiln.id);
    const path = `/api/notes/${String(draft.id)}/draft`;
    await saveDraft(author, draft, { ...draft.fields, title: 'From the first tab' });
    const second = await author.put(
      path,
      { fields: { ...draft.fields, title: 'From the second tab' } },
      ifMatch(draft.version),
    );
    expect(second.status).toBe(412);
    expect(second.problem.current).toMatchObject({ fields: { title: 'From the first tab' } });
  });

  test('a save without the version it started from is refused', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const answer = await author.put(`/api/notes/${String(draft.id)}/draft`, {
      fields: draft.fields,
    });
    expect(answer.status).toBe(428);
  });
});
