import { describe, expect, vi } from 'vitest';
import { draftSchema, type Draft } from '#shared/api/notes.ts';
import { test, type Client } from '../support/api.ts';
import {
  addKiln,
  completeFields,
  decideOn,
  handIn,
  publishedNote,
  saveDraft,
  startNote,
} from '../support/notes.ts';

// Seconds alone, more where the machine is shared.
vi.setConfig({ testTimeout: 90_000 });

/** A draft of the day as its author sees it, saved anew so that its neighbours are asked for. */
async function draftOf(author: Client, kilnId: number, date: string, time?: string) {
  const draft = await startNote(author, kilnId);
  const fields = completeFields(kilnId, { date });
  return saveDraft(author, draft, {
    ...fields,
    when: { ...fields.when, ...(time === undefined ? {} : { startTime: time }) },
    setUp: { ...fields.setUp, burnerAngleDegrees: 45 },
  });
}
const seenAgain = async (author: Client, draft: Draft): Promise<Draft> =>
  (await author.get(`/api/notes/${String(draft.id)}/draft`)).as(draftSchema);

describe('the earlier firing of a draft', () => {
  test('is the author’s own while it lives, and never one that was declined', async ({ api }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const first = await publishedNote(author, moderator, kiln.id, { date: '2026-04-01' });
    const middle = await startNote(author, kiln.id);
    const fields = completeFields(kiln.id, { date: '2026-04-08' });
    const straight = { ...fields, setUp: { ...fields.setUp, burnerAngleDegrees: 90 } };
    await saveDraft(author, middle, straight);
    const later = await draftOf(author, kiln.id, '2026-04-15');
    // A draft counts, and so does one that waits: the firing was, whoever has read of it.
    expect((await seenAgain(author, later)).earlier?.noteId).toBe(middle.id);
    await handIn(author, await seenAgain(author, middle), straight);
    const against = await seenAgain(author, later);
    expect(against.earlier).toMatchObject({ noteId: middle.id, status: 'handed-in' });
    expect(against.proposedChanges.map(({ change }) => change)).toContain('burner-more-sweeping');

    await decideOn(moderator, middle.id, 'decline', 'An advertisement.');
    const now = await seenAgain(author, later);
    expect(now.earlier).toMatchObject({ noteId: first, status: 'published' });
    expect(now.proposedChanges.map(({ change }) => change)).not.toContain('burner-more-sweeping');
    // Opened again by its author it lives again.
    expect((await author.post(`/api/notes/${String(middle.id)}/revise`)).status).toBe(200);
    expect((await seenAgain(author, later)).earlier?.noteId).toBe(middle.id);
  });

  test('is never one that was taken down, its author’s own or not', async ({ api }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const taken = await publishedNote(author, moderator, kiln.id, { date: '2026-04-01' });
    const later = await draftOf(author, kiln.id, '2026-04-15');
    expect(later.earlier?.noteId).toBe(taken);
    const down = await moderator.post(`/api/notes/${String(taken)}/take-down`, {
      reason: 'Copied from a book.',
    });
    expect(down.status).toBe(200);
    expect((await seenAgain(author, later)).earlier).toBeNull();
  });

  test('of one day is the one lit last before it, whichever note was begun first', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const noon = await draftOf(author, kiln.id, '2026-04-01', '12:00');
    const morning = await startNote(author, kiln.id);
    const fields = completeFields(kiln.id, { date: '2026-04-01' });
    await handIn(author, morning, { ...fields, when: { ...fields.when, startTime: '08:00' } });
    await decideOn(moderator, morning.id, 'publish');
    const evening = await draftOf(author, kiln.id, '2026-04-01', '18:00');
    expect(evening.earlier?.noteId).toBe(noon.id);
    expect((await seenAgain(author, noon)).earlier?.noteId).toBe(morning.id);
  });
});
