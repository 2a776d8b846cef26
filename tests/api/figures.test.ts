import { describe, expect, vi } from 'vitest';
import { demo } from '../../seeds/development/demo.ts';
import { loadDemo } from '../../seeds/development/load-demo.ts';
import { rebuildFigures } from '../../server/figures/catch-up-figures.ts';
import { topicFiguresSchema, topicFiguresUrl, topicRowsUrl } from '#shared/api/figure-topics.ts';
import type { TopicQuery } from '#shared/api/figure-topics.ts';
import { DIMENSIONS_OF_TOPIC, FIGURE_TOPIC_IDS } from '#shared/vocabulary/figures.ts';
import type { FigureTopic } from '#shared/vocabulary/figures.ts';
import { test, type Client } from '../support/api.ts';
import { addKiln, completeFields, publishedNote } from '../support/notes.ts';
import { plainFigures, plainFirings } from '../support/plain-figures.ts';

// Pictures are encoded and files read, on a machine that may be busy.
vi.setConfig({ testTimeout: 300_000 });

const figures = async (client: Client, topic: FigureTopic, query: TopicQuery = {}) =>
  (await client.get(topicFiguresUrl(topic, query))).as(topicFiguresSchema);

describe('figures', () => {
  test('of the demo are those a plain slow program makes of the notes, in every number', async ({
    api,
  }) => {
    await loadDemo(api.deps, demo);
    const firings = await plainFirings(api.db);
    expect(firings.length).toBeGreaterThan(50);
    const visitor = api.client();
    const kiln = firings[0]?.kilnId ?? 0;
    let shares = 0;
    let medians = 0;
    let differences = 0;
    for (const topic of FIGURE_TOPIC_IDS) {
      for (const by of DIMENSIONS_OF_TOPIC[topic]) {
        const whole = await figures(visitor, topic, { by });
        const [a, b] = whole.tables.flatMap(({ groups }) =>
          groups.filter(({ enough }) => enough).map(({ id }) => id),
        );
        const pairs = a !== undefined && b !== undefined && a !== b ? [{ a, b }] : [];
        const filters: Omit<TopicQuery, 'by'>[] = [{}, { ware: 'plate' }, { kiln }, ...pairs];
        for (const filter of filters) {
          const query = { by, ...filter };
          const got = await figures(visitor, topic, query);
          const where = `${topic} by ${by} ${JSON.stringify(filter)}`;
          const pair = got.tables[0]?.comparison ?? null;
          const plain = plainFigures(topic, by, firings, filter, pair);
          expect(
            got.tables.map(({ startClass, cases, firings: n, members }) => ({
              startClass,
              cases,
              firings: n,
              members,
            })),
            where,
          ).toEqual(plain.map(({ groups: _g, difference: _d, ...totals }) => totals));
          for (const [at, table] of got.tables.entries()) {
            const wanted = plain[at];
            if (!wanted) throw new Error(`${where}: a table too many`);
            for (const group of table.groups) {
              const own = wanted.groups.get(group.id);
              if (!own) {
                expect(group.cases, `${where} ${group.id}`).toBe(0);
                continue;
              }
              expect(group, `${where} ${group.id}`).toMatchObject({
                cases: own.cases,
                firings: own.firings,
                members: own.members,
                enough: own.enough,
              });
              if (group.share) {
                shares += group.share.share === null ? 0 : 1;
                expect(group.share.count).toBe(own.yes);
                expect(group.share.effective).toBeCloseTo(own.effective, 10);
                near(group.share.share, own.share);
                near(group.share.interval?.low ?? null, own.low);
                near(group.share.interval?.high ?? null, own.high);
                expect(group.share.byMember.reduce((sum, { of }) => sum + of, 0)).toBe(own.cases);
              }
              if (group.numbers) {
                medians += group.numbers.median === null ? 0 : 1;
                near(group.numbers.q1, own.q1);
                near(group.numbers.median, own.median);
                near(group.numbers.q3, own.q3);
                expect(group.numbers.spread).toEqual({ kind: 'points', values: own.values });
              }
            }
            const difference = table.comparison?.difference ?? null;
            differences += difference === null ? 0 : 1;
            near(difference?.share ?? null, wanted.difference?.share ?? null);
            near(difference?.low ?? null, wanted.difference?.low ?? null);
            near(difference?.high ?? null, wanted.difference?.high ?? null);
          }
        }
      }
    }
    // The demo is rich enough that each sort of number was really compared.
    expect(shares).toBeGreaterThan(5);
    expect(medians).toBeGreaterThan(5);
    expect(differences).toBeGreaterThan(0);

    // Read anew from the revisions they are the same.
    const before = await api.db('published_figures').orderBy('note_id').select();
    expect(await rebuildFigures(api.db)).toBe(firings.length);
    expect(await api.db('published_figures').orderBy('note_id').select()).toEqual(before);
  });

  test('change at once with a note that is published, disputed or taken down', async ({ api }) => {
    const author = await api.signedIn({ name: 'Nell Ashby' });
    const moderator = await api.signedIn({ role: 'moderator', name: 'Ada Weir' });
    const visitor = api.client();
    const kiln = await addKiln(author);
    const levels = async () => {
      const [table] = (await figures(visitor, 'stalls')).tables;
      return table?.groups.flatMap(({ numbers }) =>
        numbers?.spread.kind === 'points' ? numbers.spread.values : [],
      );
    };
    expect((await figures(visitor, 'cracks', { by: 'form' })).tables).toEqual([]);
    const id = await publishedNote(author, moderator, kiln.id, { stalledAt: 700 });
    expect(await levels()).toEqual([expect.closeTo(700, -1)]);
    const cracks = await figures(visitor, 'cracks', { by: 'form' });
    expect(cracks.tables[0]?.groups).toMatchObject([
      { id: 'bowl', cases: 2, firings: 1, members: 1, enough: false, share: { share: null } },
    ]);
    expect(cracks.kilns).toEqual([{ id: kiln.id, name: kiln.fields.name, firings: 1 }]);

    const stall = {
      code: 'stall',
      minute: 28,
      sentence: 'I turned the gas down myself to look inside.',
    };
    expect((await author.put(`/api/notes/${String(id)}/disputes`, stall)).status).toBe(200);
    expect(await levels()).toBeUndefined();
    expect((await figures(visitor, 'stalls')).leftOut).toEqual([
      { reason: 'the stall is disputed', count: 1 },
    ]);

    const page = await moderator.get(`/api/notes/${String(id)}`);
    const taken = await moderator.post(
      `/api/notes/${String(id)}/take-down`,
      { reason: 'The story names somebody who did not agree to it.' },
      { headers: { 'If-Match': page.headers.get('etag') ?? '' } },
    );
    expect(taken.status).toBe(200);
    expect((await figures(visitor, 'cracks', { by: 'form' })).tables).toEqual([]);
    expect(await api.db('published_figures').select()).toEqual([]);
  });

  test('come as rows, in which no cell is a formula', async ({ api }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const fields = completeFields(kiln.id);
    const [piece] = fields.pieces;
    if (!piece) throw new Error('A complete note has a piece.');
    const id = await publishedNote(author, moderator, kiln.id, {
      overrides: { pieces: [{ ...piece, clay: '=HYPERLINK("x"), grogged' }] },
    });
    const answer = await api.client().get(topicRowsUrl('cracks', { by: 'clay' }));
    expect(answer.headers.get('content-type')).toBe('text/csv; charset=utf-8');
    expect(answer.headers.get('content-disposition')).toBe(
      'attachment; filename=spyhole-cracks.csv',
    );
    expect(answer.text).toBe(
      'note,fired on,kiln,start,clay,clay number,cracked,pieces\r\n' +
        `/notes/${String(id)},2026-05-02,${String(kiln.id)},cold,"'=hyperlink(""x""), grogged",,no,2\r\n`,
    );
  });

  test('refuse what is no topic and what nothing is told apart by', async ({ api }) => {
    const visitor = api.client();
    expect((await visitor.get('/api/figures/luck')).problem.status).toBe(404);
    expect((await visitor.get('/api/figures/cracks?by=luck')).problem.status).toBe(400);
    expect((await visitor.get('/api/figures/cracks?kiln=0')).problem.status).toBe(400);
    // What a topic is not told apart by is told apart by what it is first.
    expect((await figures(visitor, 'gas', { by: 'form' })).by).toBe('volume');
  });
});

function near(got: number | null, wanted: number | null): void {
  if (got === null || wanted === null) expect(got).toBe(wanted);
  else expect(got).toBeCloseTo(wanted, 9);
}
