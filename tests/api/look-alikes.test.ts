import { describe, expect, vi } from 'vitest';
import { lookAlikesSchema } from '#shared/api/look-alikes.ts';
import { deskNoteSchema } from '#shared/api/desk.ts';
import { draftSchema } from '#shared/api/notes.ts';
import { catchUpClimbs, rebuildClimbs } from '../../server/look-alikes/catch-up-climbs.ts';
import { RATES } from '../../server/http/rates.ts';
import { test, type Api, type Client } from '../support/api.ts';
import {
  addKiln,
  completeFields,
  decideOn,
  handIn,
  publishedNote,
  saveDraft,
  stalledRows,
  startNote,
  steadyRows,
} from '../support/notes.ts';

// Seconds alone, more where the machine is shared.
vi.setConfig({ testTimeout: 120_000 });

type Rows = ReturnType<typeof steadyRows>;
const pairs = (rows: Rows) => rows.map(({ minute, celsius }) => [minute, celsius]);
/** A visitor as the page has them: with the token that every change and question carries. */
async function visitorOf(api: Api): Promise<Client> {
  const client = api.client();
  await client.fetchToken();
  return client;
}
const ask = (client: Client, rows: Rows, targetCelsius: number | null = 1000) =>
  client.post('/api/look-alikes', { readings: pairs(rows), targetCelsius });
const like = async (client: Client, rows: Rows) => (await ask(client, rows)).as(lookAlikesSchema);
const ofNote = (client: Client, id: number, of: 'published' | 'draft' = 'published') =>
  client.get(`/api/notes/${String(id)}/look-alikes?of=${of}`);
const hitIds = (answer: { hits: readonly { note: { id: number } }[] }) =>
  answer.hits.map(({ note }) => note.id);

/** Two kilns of two members: a plain firing and a stall in one, a stall in the other. */
async function threeNotes(api: Api) {
  const author = await api.signedIn({ name: 'Nell Ashby' });
  const other = await api.signedIn({ name: 'Owen Hale' });
  const moderator = await api.signedIn({ role: 'moderator', name: 'Ada Weir' });
  const kiln = await addKiln(author);
  const otherKiln = await addKiln(other, { name: 'Bin on three bricks' });
  const plain = await publishedNote(author, moderator, kiln.id, { date: '2026-05-01' });
  const stall = await publishedNote(author, moderator, kiln.id, {
    date: '2026-05-08',
    stalledAt: 700,
  });
  const otherStall = await publishedNote(other, moderator, otherKiln.id, {
    date: '2026-05-09',
    stalledAt: 715,
  });
  return { author, other, moderator, kiln, otherKiln, plain, stall, otherStall };
}

describe('a record that belongs to no note', () => {
  test('is answered to a visitor with the climbs like it, the nearest first, and what makes them alike', async ({
    api,
  }) => {
    const { stall, otherStall, plain } = await threeNotes(api);
    const visitor = await visitorOf(api);
    const answer = await like(visitor, stalledRows(705, 29, 20));

    expect(answer.compared).toBe(3);
    expect(hitIds(answer)).toEqual([stall, otherStall]);
    const [nearest, next] = answer.hits;
    expect(nearest?.apartCelsius).toBeLessThan(next?.apartCelsius ?? 0);
    expect(nearest?.apartCelsius).toBeGreaterThan(0);
    expect(nearest?.traits.levels).toMatchObject([{ kind: 'stall' }]);
    expect(answer.climb?.traits.levels).toMatchObject([{ kind: 'stall' }]);
    expect(nearest?.sameKiln).toBe(false);
    expect(nearest?.note.followOn).toBeNull();
    // What is drawn is what was compared: a value a minute from the start.
    expect(nearest?.celsius).toHaveLength(47);

    expect(hitIds(await like(visitor, steadyRows(990, 31, 5)))).toEqual([plain]);
  });

  test('that climbs like none is answered with none, and with how many there are', async ({
    api,
  }) => {
    await threeNotes(api);
    const sinking = Array.from({ length: 40 }, (_, minute) => ({
      minute,
      celsius: 900 - 5 * minute,
    }));
    expect(await like(await visitorOf(api), sinking)).toMatchObject({ compared: 3, hits: [] });
    const short = steadyRows(60, 2, 1);
    expect(await like(await visitorOf(api), short)).toMatchObject({ climb: null, hits: [] });
  });

  test('is refused when it is too long, too short or no record, and asked for too often', async ({
    api,
  }) => {
    const visitor = await visitorOf(api);
    const send = (body: unknown) => visitor.post('/api/look-alikes', body);
    expect(
      (
        await send({
          readings: [
            [0, 20],
            [1, 30],
          ],
        })
      ).status,
    ).toBe(422);
    expect(
      (
        await send({
          readings: [
            [0, 20],
            [1, 'hot'],
            [2, 50],
          ],
        })
      ).status,
    ).toBe(422);
    const many = Array.from({ length: 5001 }, (_, i) => [i / 60, 20 + i / 10]);
    expect((await send({ readings: many })).status).toBe(422);
    expect((await send({ readings: pairs(steadyRows()), of: 'all' })).status).toBe(422);

    let refused = null;
    for (let i = 0; i <= RATES.lookAlikes.limit && refused === null; i += 1) {
      const answer = await ask(visitor, steadyRows());
      if (answer.status === 429) refused = answer.problem.code;
    }
    expect(refused).toBe('too-many');
  });
});

describe('the look-alikes of a note', () => {
  test('leave the note itself out and say which are of the same kiln, to everybody alike', async ({
    api,
  }) => {
    const { author, moderator, stall, otherStall, otherKiln, other } = await threeNotes(api);
    const twin = await publishedNote(other, moderator, otherKiln.id, {
      date: '2026-05-20',
      stalledAt: 712,
    });
    for (const client of [api.client(), author, moderator]) {
      const answer = (await ofNote(client, otherStall)).as(lookAlikesSchema);
      expect(answer.compared).toBe(3);
      expect(answer.hits.map(({ note, sameKiln }) => [note.id, sameKiln])).toEqual([
        [twin, true],
        [stall, false],
      ]);
    }
  });

  test('of a working copy are there for its author only, before it is ever handed in', async ({
    api,
  }) => {
    const { author, moderator, kiln, stall, otherStall } = await threeNotes(api);
    const draft = await startNote(author, kiln.id);
    const empty = (await ofNote(author, draft.id, 'draft')).as(lookAlikesSchema);
    expect(empty).toMatchObject({ climb: null, hits: [] });

    await saveDraft(author, draft, completeFields(kiln.id, { stalledAt: 703 }));
    const answer = (await ofNote(author, draft.id, 'draft')).as(lookAlikesSchema);
    expect(answer.hits.map(({ note, sameKiln }) => [note.id, sameKiln])).toEqual([
      [stall, true],
      [otherStall, false],
    ]);
    const strangers = [api.client(), moderator, await api.signedIn('admin'), await api.signedIn()];
    for (const client of strangers) {
      expect((await ofNote(client, draft.id, 'draft')).status).toBe(404);
      expect((await ofNote(client, draft.id)).status).toBe(404);
    }
    // Nor has it become one that others are told of.
    const told = await like(await visitorOf(api), stalledRows(703));
    expect(hitIds(told)).not.toContain(draft.id);
    expect(told.compared).toBe(3);
  });

  test('are there at once when a note is published, and gone at once when it is taken down', async ({
    api,
  }) => {
    const { author, moderator, kiln, plain } = await threeNotes(api);
    const visitor = await visitorOf(api);
    const gentle = steadyRows(1000, 70, 4);
    expect(hitIds(await like(visitor, gentle))).toEqual([]);

    const draft = await startNote(author, kiln.id);
    const fields = completeFields(kiln.id, { date: '2026-06-01' });
    const slow = {
      ...fields,
      plan: { ...fields.plan, timeToTemperatureMinutes: 70 },
      record: {
        ...fields.record,
        typedRows: gentle,
        marks: fields.record.marks.map((mark) =>
          mark.kind === 'shut-off' ? { ...mark, minute: 74 } : mark,
        ),
      },
    };
    await handIn(author, draft, slow);
    expect(hitIds(await like(visitor, gentle))).toEqual([]);
    await decideOn(moderator, draft.id, 'publish');
    expect(hitIds(await like(visitor, gentle))).toEqual([draft.id]);

    // A revision with another climb takes the place of the one before.
    const again = (await author.post(`/api/notes/${String(draft.id)}/revise`, undefined)).as(
      draftSchema,
    );
    await handIn(author, again, { ...fields, title: 'Read again' });
    expect(hitIds(await like(visitor, gentle))).toEqual([draft.id]);
    await decideOn(moderator, draft.id, 'publish');
    expect(hitIds(await like(visitor, gentle))).toEqual([]);
    expect(hitIds(await like(visitor, steadyRows())).sort()).toEqual([plain, draft.id].sort());

    const down = await moderator.post(`/api/notes/${String(draft.id)}/take-down`, {
      reason: 'Asked for by its author.',
    });
    expect(down.status).toBe(200);
    const after = await like(visitor, steadyRows());
    expect(hitIds(after)).toEqual([plain]);
    expect(after.compared).toBe(3);
    expect((await ofNote(visitor, draft.id)).status).toBe(404);
    const rows = await api.db('published_climbs').where({ note_id: draft.id });
    expect(rows).toEqual([]);
  });

  test('never tell of a stall that its author disputes', async ({ api }) => {
    const { author, stall } = await threeNotes(api);
    const disputed = await author.put(`/api/notes/${String(stall)}/disputes`, {
      code: 'stall',
      minute: 28,
      sentence: 'I turned the gas down myself to look inside.',
    });
    expect(disputed.status).toBe(200);
    const answer = await like(await visitorOf(api), stalledRows(702));
    const hit = answer.hits.find(({ note }) => note.id === stall);
    expect(hit?.traits.levels).toEqual([]);
    expect((await ofNote(api.client(), stall)).as(lookAlikesSchema).climb?.traits.levels).toEqual(
      [],
    );
  });

  test('are made anew for notes that lack their climb, the same as when they were published', async ({
    api,
  }) => {
    const { stall, otherStall, plain } = await threeNotes(api);
    const kept = () =>
      api
        .db('published_climbs')
        .orderBy('note_id')
        .select<{ note_id: number; kept_at: Date }[]>('*');
    const before = await kept();
    expect(before.map((row) => row.note_id)).toEqual([plain, stall, otherStall]);
    await api.db('published_climbs').where({ note_id: stall }).delete();
    expect(await catchUpClimbs(api.db)).toBe(1);
    expect(await catchUpClimbs(api.db)).toBe(0);
    expect(await rebuildClimbs(api.db)).toBe(3);
    const strip = (rows: { kept_at: Date }[]) => rows.map(({ kept_at: _at, ...row }) => row);
    expect(strip(await kept())).toEqual(strip(before));
    expect(hitIds(await like(await visitorOf(api), stalledRows(701)))).toEqual([stall, otherStall]);
  });
});

test('the desk’s claim and the wait for it show a visitor nothing of a climb', async ({ api }) => {
  const { author, moderator, kiln } = await threeNotes(api);
  const draft = await startNote(author, kiln.id);
  const handed = await handIn(author, draft, completeFields(kiln.id, { stalledAt: 707 }));
  expect(handed.status).toBe('handed-in');
  (await moderator.put(`/api/desk/notes/${String(draft.id)}/claim`)).as(deskNoteSchema);
  expect((await ofNote(api.client(), draft.id)).status).toBe(404);
  expect((await ofNote(moderator, draft.id, 'draft')).status).toBe(404);
  expect(hitIds(await like(await visitorOf(api), stalledRows(707)))).not.toContain(draft.id);
});
