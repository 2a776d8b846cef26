import { describe, expect, vi } from 'vitest';
import { draftSchema } from '#shared/api/notes.ts';
import { purgeIdempotencyKeys } from '../../server/housekeeping.ts';
import { test } from '../support/api.ts';
import { ifMatch, kilnFields, saveDraft, startNote } from '../support/notes.ts';

// Hundreds of requests each: seconds alone, more where the machine is shared.
vi.setConfig({ testTimeout: 90_000 });

const draftPath = (noteId: number) => `/api/notes/${String(noteId)}/draft`;

describe('saving a draft', () => {
  test('of 16 writers with one tag one wins, its text is stored, and the others see it', async ({
    committedApi: api,
  }) => {
    const author = await api.signedIn();
    let draft = await startNote(author, null);
    for (let round = 1; round <= 20; round += 1) {
      const { version, fields, id } = draft;
      const answers = await Promise.all(
        Array.from({ length: 16 }, (_, writer) =>
          author.put(
            draftPath(id),
            { fields: { ...fields, title: `Round ${String(round)}, writer ${String(writer)}` } },
            ifMatch(version),
          ),
        ),
      );
      const statuses = answers.map(({ status }) => status).sort();
      expect(statuses).toEqual([200, ...Array<number>(15).fill(412)]);
      const won = answers.find(({ status }) => status === 200)?.as(draftSchema);
      draft = (await author.get(draftPath(id))).as(draftSchema);
      expect(draft.fields.title).toBe(won?.fields.title);
      expect(draft.version).toBe(version + 1);
      for (const answer of answers.filter(({ status }) => status === 412)) {
        expect(answer.problem.current).toMatchObject({
          version: draft.version,
          fields: { title: draft.fields.title },
        });
      }
    }
  });

  test('needs the version it started from, told as a strong tag and nothing else', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const body = { fields: { ...draft.fields, title: 'Lost?' } };
    for (const tag of ['*', 'W/"v1"', '"v1", "v2"', 'v1', '"1"', '"v01e1"', '"v-1"', '']) {
      const answer = await author.put(draftPath(draft.id), body, {
        headers: { 'If-Match': tag },
      });
      expect(answer.status, tag).toBe(428);
    }
    expect((await author.put(draftPath(draft.id), body)).status).toBe(428);
    const read = await author.get(draftPath(draft.id));
    expect(read.headers.get('etag')).toBe(`"v${String(draft.version)}"`);
    expect(read.as(draftSchema).fields.title).toBe('');
    expect((await author.put(draftPath(draft.id), body, ifMatch(999_999))).status).toBe(412);
  });

  test('is over once it is handed in, taken back or not', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    await api.db('notes').where({ id: draft.id }).update({ status: 'handed-in' });
    const answer = await author.put(
      draftPath(draft.id),
      { fields: draft.fields },
      ifMatch(draft.version),
    );
    expect(answer.status).toBe(409);
    expect(answer.problem.detail).toContain('handed in');
  });
});

describe('a create sent twice', () => {
  const start = { kilnId: null, triedNoteId: null };

  test('8 times at once makes one note, and all are told the same', async ({
    committedApi: api,
  }) => {
    const author = await api.signedIn();
    for (let round = 1; round <= 5; round += 1) {
      const headers = { 'Idempotency-Key': `round-${String(round)}-of-this` };
      const answers = await Promise.all(
        Array.from({ length: 8 }, () => author.post('/api/notes', start, { headers })),
      );
      expect(answers.map(({ status, text }) => (status === 201 ? 201 : text))).toEqual(
        Array<number>(8).fill(201),
      );
      expect(new Set(answers.map(({ text }) => text)).size).toBe(1);
      const notes = await api.db('notes').where({ author_id: author.member.id }).select('id');
      expect(notes).toHaveLength(round);
    }
  });

  test('with another body or another address is refused, by another member it is another', async ({
    api,
  }) => {
    const author = await api.signedIn();
    const headers = { 'Idempotency-Key': 'the-same-key' };
    const first = await author.post('/api/notes', start, { headers });
    const again = await author.post('/api/notes', start, { headers });
    expect(again.text).toBe(first.text);
    expect(again.headers.get('idempotent-replay')).toBe('true');
    const other = await author.post('/api/notes', { ...start, kilnId: 1 }, { headers });
    expect(other.status).toBe(422);
    expect(other.problem.code).toBe('key-reused');
    const kiln = await author.post('/api/kilns', { fields: kilnFields() }, { headers });
    expect(kiln.problem.code).toBe('key-reused');
    const stranger = await api.signedIn();
    const own = await stranger.post('/api/notes', start, { headers });
    expect(own.status).toBe(201);
    expect(own.text).not.toBe(first.text);
  });

  test('needs a key, and remembers it for a day', async ({ api }) => {
    const author = await api.signedIn();
    for (const key of ['', 'short', 'x'.repeat(65), 'with spaces in it', 'ümlaut-key'.slice(1)]) {
      const answer = await author.post('/api/notes', start, {
        headers: { 'Idempotency-Key': key },
      });
      expect([key, answer.status]).toEqual([key, key === 'mlaut-key' ? 201 : 400]);
    }
    const age = (hours: number) =>
      api
        .db('idempotency_keys')
        .update({ created_at: api.db.raw('NOW(3) - INTERVAL ? HOUR', [hours]) });
    const kept = () => api.db('idempotency_keys').pluck<string[]>('idempotency_key');
    await age(23);
    await purgeIdempotencyKeys(api.db);
    expect(await kept()).toHaveLength(1);
    await age(25);
    await purgeIdempotencyKeys(api.db);
    expect(await kept()).toEqual([]);
  });

  test('that failed is forgotten: the same key may try again', async ({ api }) => {
    const author = await api.signedIn();
    const headers = { 'Idempotency-Key': 'a-second-chance' };
    const refused = await author.post('/api/notes', { ...start, kilnId: 4711 }, { headers });
    expect(refused.status).toBe(422);
    expect((await author.post('/api/notes', start, { headers })).status).toBe(201);
  });

  test('of many new notes the 31st in an hour is told to wait', async ({ api }) => {
    const author = await api.signedIn();
    for (let count = 1; count <= 30; count += 1) {
      expect((await author.post('/api/notes', start)).status).toBe(201);
    }
    const more = await author.post('/api/notes', start);
    expect(more.status).toBe(429);
    const wait = Number(more.headers.get('retry-after'));
    expect(wait).toBeGreaterThan(3500);
    expect(wait).toBeLessThanOrEqual(3600);
    expect((await (await api.signedIn()).post('/api/notes', start)).status).toBe(201);
  });
});

describe('text', () => {
  const texts = [
    'plain words',
    'Füße, naïve, Smørrebrød, Łódź, Ελληνικά, Кириллица, עברית, العربية, 日本語, 한국어, ไทย',
    '🔥🏺👩‍🎨🏳️‍🌈 and 👨‍👩‍👧‍👦',
    '𝔊𝔩𝔞𝔷𝔢 𠜎 𠜱',
    'left \u202eright\u202c and \u2066isolated\u2069',
    'zero\u200bwidth\u200djoiner\ufeffmark',
    'tab\there, line\nthere',
    ' leading and trailing ',
    'quotes " \' ` “ ” « »',
    '<b>not bold</b> &amp; &lt; &#x41;',
    "'; DROP TABLE notes; -- ",
    '" OR 1=1 /*',
    '\\n \\u0000 \\x00 \\',
    '%s %d {0} ${x} {{x}} #{x}',
    '=1+1 +1 -1 @x',
    '../../etc/passwd',
    'null',
    'undefined',
    'NaN',
    'true',
    '0',
    '__proto__',
    'constructor',
    '1e309',
    '-0',
    '\u00a0no-break\u00a0',
    '\u3000ideographic\u3000',
    'ﬁ ligature ½ ² Å',
    'i̇ İ ı ſ ß',
    'Z͑ͫ̓ͪ̂ͫ̽͏̴̙̤̞͉͚̯̞̠͍A̴̵̜̰͔ͫ͗͢L̠ͨͧͩ͘G̴̻͈͍͔̹̑͗̎̅͛́Ǫ̵̹̻̝̳͂̌̌͘',
    'o\u0308 composed',
    'a'.repeat(120),
    '🔥'.repeat(120),
    '\u{10ffff}\u{e000}',
    'مرحبا\u200f!',
    'a\u2028b\u2029c',
    '\u061c\u180e',
    'Ω ≈ ç √ ∫ ˜ µ ≤ ≥ ÷',
    '1,5 °C 1 000',
    '٣٤٥',
    'x\u0301\u0301\u0301',
  ];

  test('comes back as it was sent, composed', async ({ api }) => {
    expect(texts.length).toBeGreaterThanOrEqual(40);
    const author = await api.signedIn();
    let draft = await startNote(author, null);
    for (const text of texts) {
      draft = await saveDraft(author, draft, {
        ...draft.fields,
        title: text,
        result: { ...draft.fields.result, nextTime: `${text}\n${text}` },
      });
      const read = (await author.get(draftPath(draft.id))).as(draftSchema);
      expect(read.fields.title).toBe(text.normalize('NFC'));
      expect(read.fields.result.nextTime).toBe(`${text}\n${text}`.normalize('NFC'));
    }
  });

  test('that cannot be kept whole is refused with its field, never cut', async ({ api }) => {
    const author = await api.signedIn();
    const draft = await startNote(author, null);
    const refused = [
      'a\u0000b',
      '\u001b[2J',
      'a\rb',
      '\u007f',
      '\ud83d',
      '\ude00x',
      'a'.repeat(121),
    ];
    for (const title of [...refused, '🔥'.repeat(121)]) {
      const answer = await author.put(
        draftPath(draft.id),
        { fields: { ...draft.fields, title } },
        ifMatch(draft.version),
      );
      expect(answer.status, JSON.stringify(title)).toBe(422);
      expect(answer.problem.errors?.[0]?.pointer).toBe('/fields/title');
    }
  });
});
