import { describe, expect } from 'vitest';
import { notePageSchema } from '#shared/api/notes.ts';
import { demo, type Demo } from '../../seeds/development/demo.ts';
import { loadDemo } from '../../seeds/development/load-demo.ts';
import { selectRows } from '../../server/database/select-rows.ts';
import { test } from '../support/api.ts';

/** A few firings of each sort: the whole demo is read by its unit test. */
const KEYS = [
  'dustbin-2025-03-30',
  'dustbin-2025-05-03',
  'school-2025-10-10',
  'henhouse-2026-11-08',
  'bucket-2026-11-15',
  'drum-2026-11-22',
  'dustbin-2026-11-29',
];
const firings = demo.firings.filter(({ key }) => KEYS.includes(key));
const isFired = (kilnKey: string) => firings.some((firing) => firing.kilnKey === kilnKey);
const few: Demo = {
  ...demo,
  firings,
  kilns: demo.kilns.filter(({ key }) => isFired(key)),
  loans: demo.loans.filter(({ kilnKey }) => isFired(kilnKey)),
};
/** Pictures are encoded and files read, on a machine that may be busy. */
const PATIENCE = { timeout: 120_000 };

describe('loading the demo', PATIENCE, () => {
  test('every note comes to where it is by the same services as any other, dated as it was', async ({
    api,
  }) => {
    const accounts = await loadDemo(api.deps, few);
    expect(accounts.map(({ role }) => role).sort()).toEqual([
      'admin',
      'member',
      'member',
      'moderator',
    ]);
    expect(new Set(accounts.map(({ password }) => password)).size).toBe(4);
    expect(accounts.every(({ password }) => password.length >= 15)).toBe(true);

    const notes = await api
      .db('notes')
      .select<{ id: number; status: string; published_at: Date | null }[]>(
        'id',
        'status',
        'published_at',
      );
    const statuses = notes.map(({ status }) => status).sort();
    expect(statuses).toEqual([
      'declined',
      'draft',
      'handed-in',
      'published',
      'published',
      'published',
      'sent-back',
    ]);
    const published = await api
      .db('published_firings')
      .orderBy('published_firings.fired_on')
      .select<{ note_id: number; title: string }[]>('note_id', 'title');
    const id = published[0]?.note_id ?? 0;
    const publishedAt = notes.find((note) => note.id === id)?.published_at;
    expect(publishedAt?.toISOString().slice(0, 10)).toBe('2025-04-01');

    const page = (await api.client().get(`/api/notes/${String(id)}`)).as(notePageSchema);
    expect(page.row.stallCelsius[0]).toBeCloseTo(712, -1);
    expect(page.row.title).toBe('A survey of a plateau at 712 °C');

    const [now] = await selectRows<{ year: number }>(
      api.db,
      'SELECT YEAR(CURRENT_TIMESTAMP) AS year',
    );
    expect(now?.year).toBe(new Date().getUTCFullYear());
  });

  test('both probes, the pictures, the desk’s remarks and the next firing are kept', async ({
    api,
  }) => {
    await loadDemo(api.deps, few);
    const find = async (title: string) => {
      const note = await api
        .db('published_firings')
        .where({ title })
        .first<{ note_id: number } | undefined>('note_id');
      return (await api.client().get(`/api/notes/${String(note?.note_id ?? 0)}`)).as(
        notePageSchema,
      );
    };
    const uneven = await find('Top hotter than the bottom by a hundred degrees');
    expect(uneven.row.troubles).toContain('uneven-heat');
    expect(uneven.storyHtml).toContain('<img');
    const stalled = await find('A survey of a plateau at 712 °C');
    expect(stalled.next?.title).toContain('Base insulated');
    expect(stalled.next?.changes).toContain('floor-insulated');

    const remarks = await api.db('remarks').count<{ n: number }[]>('id as n');
    expect(remarks[0]?.n).toBe(2);
    const mails = await api.db('outbox').where({ topic: 'mail' }).count<{ n: number }[]>('id as n');
    expect(mails[0]?.n).toBeLessThan(6);
  });
});
