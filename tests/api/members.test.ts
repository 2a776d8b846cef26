import { describe, expect } from 'vitest';
import { memberPageSchema } from '#shared/api/accounts.ts';
import { test, withoutId } from '../support/api.ts';
import { aMember } from '../support/builders.ts';

describe('GET /api/members/:id', () => {
  test('shows what everybody may see of a member, and nothing else', async ({ api }) => {
    const member = await aMember(api.db, { name: 'Ines Quarry', role: 'moderator' });
    await api
      .db('members')
      .where({ id: member.id })
      .update({ place: 'By the river', about: 'Fires on Sundays.' });
    const answer = await api.client().get(`/api/members/${String(member.id)}`);
    expect(answer.as(memberPageSchema)).toMatchObject({
      id: member.id,
      name: 'Ines Quarry',
      place: 'By the river',
      about: 'Fires on Sundays.',
      role: 'moderator',
      kilns: [],
      notes: [],
    });
    expect(Object.keys(answer.json as object).sort()).toEqual(
      ['about', 'id', 'joinedOn', 'kilns', 'name', 'notes', 'place', 'role'].sort(),
    );
    expect(answer.text).not.toContain(member.email);
  });

  test('lists a member’s kilns only once a firing in them is published', async ({ api }) => {
    const member = await aMember(api.db);
    await api.db('kilns').insert({ keeper_id: member.id, name: 'The barrel' });
    const page = await api.client().get(`/api/members/${String(member.id)}`);
    expect(page.as(memberPageSchema).kilns).toEqual([]);
    const [kilnId] = await api.db('kilns').insert({ keeper_id: member.id, name: 'The drum' });
    const id = Number(kilnId);
    await api
      .db('kiln_versions')
      .insert({ kiln_id: id, version: 1, fields: '{}', volume_litres: 61.5 });
    const [note] = await api.db('notes').insert({ author_id: member.id, draft: '{}' });
    const [revision] = await api.db('note_revisions').insert({
      note_id: note,
      number: 1,
      fields: '{}',
      story_html: '',
      kiln_id: id,
      kiln_version: 1,
      findings: '[]',
      checks: '[]',
      facts: '{}',
    });
    const row = {
      id: Number(note),
      slug: 'plates-on-a-wet-day',
      title: 'Plates on a wet day',
      author: { id: member.id, name: member.name },
      kiln: { id, name: 'The drum', volumeLitres: 61.5 },
      firedOn: '2026-05-02',
      publishedAt: '2026-05-03T09:00:00.000Z',
      strip: null,
      stripWords: '',
      troubles: [],
      measuredTroubles: [],
      targetCelsius: 1000,
      peakCelsius: 1004,
      timeToTemperatureMinutes: 41,
      holdMinutes: 0,
      stallCelsius: [],
      crackedPieces: 0,
      pieces: 3,
      changes: [],
      followOn: null,
    };
    // The projection keeps a row without what may change beside it: names, days and moments.
    const { author: _author, kiln, firedOn: _firedOn, publishedAt: _publishedAt, ...kept } = row;
    await api.db('published_firings').insert({
      note_id: note,
      revision_id: revision,
      kiln_id: id,
      author_id: member.id,
      fired_on: '2026-05-02',
      slug: row.slug,
      title: row.title,
      facts: '{}',
      note_row: JSON.stringify({ ...kept, volumeLitres: kiln.volumeLitres }),
      story_text: '',
      published_at: new Date(row.publishedAt),
    });
    const shown = (await api.client().get(`/api/members/${String(member.id)}`)).as(
      memberPageSchema,
    );
    expect(shown.kilns).toEqual([{ id, name: 'The drum', volumeLitres: 61.5 }]);
    expect(shown.notes).toEqual([row]);
  });

  test('does not exist for unknown and unconfirmed members, with the same answer', async ({
    api,
  }) => {
    const unverified = await aMember(api.db, { emailVerified: false });
    const client = api.client();
    const answers = await Promise.all(
      [String(unverified.id), '999999999', 'abc', '0', '1e3'].map((id) =>
        client.get(`/api/members/${id}`),
      ),
    );
    for (const answer of answers) {
      const problem = withoutId(answer.problem);
      expect(answer.status).toBe(404);
      expect(problem).toEqual({
        type: `${api.baseUrl}/problems/not-found`,
        code: 'not-found',
        title: 'There is nothing here',
        status: 404,
        detail: 'There is nothing here',
      });
    }
  });

  test('shows nothing a suspended member has written about themselves', async ({ api }) => {
    const member = await aMember(api.db, { suspended: true });
    await api.db('members').where({ id: member.id }).update({ about: 'Buy my things' });
    const page = await api.client().get(`/api/members/${String(member.id)}`);
    expect(page.as(memberPageSchema)).toMatchObject({ name: member.name, about: '', place: '' });
  });
});
