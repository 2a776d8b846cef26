import { describe, expect, vi } from 'vitest';
import { noteQuestionsSchema } from '#shared/api/questions.ts';
import { test, withoutId, type Api, type Client } from '../support/api.ts';
import { takeMails } from '../support/mails.ts';
import { addKiln, completeFields, handIn, publishedNote, startNote } from '../support/notes.ts';

// Seconds alone, more where the machine is shared.
vi.setConfig({ testTimeout: 90_000 });

const QUESTION = 'What stood the kiln on, and was it dry?';
const pathOf = (noteId: number, tail = '') => `/api/notes/${String(noteId)}/questions${tail}`;
const answerPath = (noteId: number, questionId: number) =>
  pathOf(noteId, `/${String(questionId)}/answer`);

/** A published note of Nell's, a moderator, and a member who may ask. */
async function aPublishedNote(api: Api) {
  const author = await api.signedIn({ name: 'Nell Ashby' });
  const moderator = await api.signedIn({ role: 'moderator', name: 'Ada Weir' });
  const asker = await api.signedIn({ name: 'Wren Halloran' });
  const kiln = await addKiln(author);
  const noteId = await publishedNote(author, moderator, kiln.id, { title: 'A plain afternoon' });
  await api.db('outbox').delete();
  return { author, moderator, asker, kiln, noteId };
}

async function ask(client: Client, noteId: number, text = QUESTION): Promise<number> {
  const answer = await client.post(pathOf(noteId), { text });
  const { questions } = answer.as(noteQuestionsSchema);
  return questions.at(-1)?.id ?? 0;
}

const read = async (client: Client, noteId: number) =>
  (await client.get(pathOf(noteId))).as(noteQuestionsSchema);

describe('a question about a published note', () => {
  test('is asked by a confirmed member other than the author, and read by everybody', async ({
    api,
  }) => {
    const { author, moderator, asker, noteId } = await aPublishedNote(api);
    const visitor = api.client();
    await visitor.fetchToken();
    expect((await visitor.post(pathOf(noteId), { text: QUESTION })).status).toBe(401);
    const unconfirmed = await api.signedIn({ emailVerified: false });
    const early = await unconfirmed.post(pathOf(noteId), { text: QUESTION });
    expect([early.status, early.problem.code]).toEqual([403, 'verify-email-first']);
    const own = await author.post(pathOf(noteId), { text: QUESTION });
    expect([own.status, own.problem.code]).toEqual([403, 'not-allowed']);
    const asked = await asker.post(pathOf(noteId), { text: `  ${QUESTION}\n` });
    expect(asked.status).toBe(201);

    const may = async (client: Client) => {
      const { questions, abilities } = await read(client, noteId);
      expect(questions.map(({ text, by }) => [text, by?.name])).toEqual([
        [QUESTION, 'Wren Halloran'],
      ]);
      return { ...abilities, ...questions[0]?.abilities };
    };
    expect(await may(visitor)).toEqual({ ask: false, answer: false, remove: false });
    expect(await may(unconfirmed)).toEqual({ ask: false, answer: false, remove: false });
    expect(await may(author)).toEqual({ ask: false, answer: true, remove: false });
    expect(await may(asker)).toEqual({ ask: true, answer: false, remove: true });
    expect(await may(moderator)).toEqual({ ask: true, answer: true, remove: true });
  });

  test('has 10 to 500 characters without blanks around it, and none that cannot be kept', async ({
    api,
  }) => {
    const { asker, noteId } = await aPublishedNote(api);
    const status = async (text: unknown) => (await asker.post(pathOf(noteId), { text })).status;
    expect(await status('Too short')).toBe(422);
    expect(await status(`   ${'x'.repeat(9)}   `)).toBe(422);
    expect(await status('x'.repeat(501))).toBe(422);
    expect(await status('Does it ring\u0007 the bell?')).toBe(422);
    expect(await status(['Was it cold enough?'])).toBe(422);
    expect(await status('x'.repeat(10))).toBe(201);
    // Counted in code points: what is one character to a reader is one.
    expect(await status('🔥'.repeat(500))).toBe(201);
    const extra = await asker.post(pathOf(noteId), { text: QUESTION, askerId: 1 });
    expect(extra.status).toBe(422);
  });

  test('is kept and given as the text it is, markup and all', async ({ api }) => {
    const { author, asker, noteId } = await aPublishedNote(api);
    const text = '<img src=x onerror=alert(1)> </script> & "quotes"; DROP TABLE notes';
    const id = await ask(asker, noteId, text);
    await author.put(answerPath(noteId, id), { text });
    const { questions } = await read(api.client(), noteId);
    expect(questions.map((one) => [one.text, one.answers[0]?.text])).toEqual([[text, text]]);
    const answer = await api.client().get(pathOf(noteId));
    expect(answer.headers.get('content-type')).toContain('application/json');
  });

  test('sent twice is asked once, and ten an hour are enough', async ({ api }) => {
    const { asker, noteId } = await aPublishedNote(api);
    const headers = { 'Idempotency-Key': crypto.randomUUID() };
    const first = await asker.post(pathOf(noteId), { text: QUESTION }, { headers });
    const again = await asker.post(pathOf(noteId), { text: QUESTION }, { headers });
    expect(again.headers.get('idempotent-replay')).toBe('true');
    expect(again.json).toEqual(first.json);
    expect((await read(asker, noteId)).questions).toHaveLength(1);
    for (let count = 2; count <= 10; count += 1) await ask(asker, noteId);
    const refused = await asker.post(pathOf(noteId), { text: QUESTION });
    expect([refused.status, refused.problem.code]).toEqual([429, 'too-many']);
    expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(60);
    expect((await read(asker, noteId)).questions).toHaveLength(10);
  });

  test('does not touch the search index', async ({ api }) => {
    const { author, asker, noteId } = await aPublishedNote(api);
    await author.put(answerPath(noteId, await ask(asker, noteId)), { text: 'A dry slab.' });
    const topics = await api.db('outbox').distinct('topic').pluck('topic');
    expect(topics).toEqual(['mail']);
  });
});

describe('an answer', () => {
  test('is given once by the author and once by each moderator, and can be changed by its writer', async ({
    api,
  }) => {
    const { author, moderator, asker, noteId } = await aPublishedNote(api);
    const id = await ask(asker, noteId);
    const path = answerPath(noteId, id);
    await author.put(path, { text: 'A dry slab.' });
    await author.put(path, { text: 'A dry slab of concrete.' });
    await moderator.put(path, { text: 'See the cautions about wet ground.' });
    const { questions } = await read(author, noteId);
    const shown = questions[0]?.answers.map(({ text, by, byAuthor, changed, mine }) => ({
      text,
      by: by?.name,
      byAuthor,
      changed,
      mine,
    }));
    expect(shown).toEqual([
      {
        text: 'A dry slab of concrete.',
        by: 'Nell Ashby',
        byAuthor: true,
        changed: true,
        mine: true,
      },
      {
        text: 'See the cautions about wet ground.',
        by: 'Ada Weir',
        byAuthor: false,
        changed: false,
        mine: false,
      },
    ]);
    expect((await author.put(path, { text: ' ' })).status).toBe(422);
  });

  test('is no other member’s to give, nor anybody’s for a question of another note', async ({
    api,
  }) => {
    const { author, moderator, asker, kiln, noteId } = await aPublishedNote(api);
    const id = await ask(asker, noteId);
    const other = await api.signedIn();
    for (const client of [asker, other]) {
      expect((await client.put(answerPath(noteId, id), { text: 'Me!' })).status).toBe(403);
    }
    const second = await publishedNote(author, moderator, kiln.id, { date: '2026-05-09' });
    expect((await author.put(answerPath(second, id), { text: 'Here?' })).status).toBe(404);
    expect((await moderator.delete(pathOf(second, `/${String(id)}`))).status).toBe(404);
    const unknown = await author.put(answerPath(noteId, 999_999_999), { text: 'Who?' });
    expect(unknown.status).toBe(404);
  });
});

describe('removing a question', () => {
  test('is for whoever asked and for moderators, whose removal is written down', async ({
    api,
  }) => {
    const { author, moderator, asker, noteId } = await aPublishedNote(api);
    const mine = await ask(asker, noteId);
    const theirs = await ask(asker, noteId, 'And how wide was its flue, please?');
    await author.put(answerPath(noteId, theirs), { text: 'A hand wide.' });
    const other = await api.signedIn();
    for (const client of [author, other]) {
      expect((await client.delete(pathOf(noteId, `/${String(mine)}`))).status).toBe(403);
    }
    const left = await asker.delete(pathOf(noteId, `/${String(mine)}`));
    expect(left.as(noteQuestionsSchema).questions.map(({ id }) => id)).toEqual([theirs]);
    expect((await moderator.delete(pathOf(noteId, `/${String(theirs)}`))).status).toBe(200);
    expect((await read(author, noteId)).questions).toEqual([]);
    const acts = await api
      .db('audit_log')
      .where({ act: 'question-removed' })
      .select<{ actor_id: number }[]>('actor_id');
    expect(acts).toEqual([{ actor_id: moderator.member.id }]);
    expect((await asker.delete(pathOf(noteId, `/${String(mine)}`))).status).toBe(404);
  });
});

describe('questions', () => {
  test('go with the note when it is taken down, and nobody can ask on', async ({ api }) => {
    const { author, moderator, asker, noteId } = await aPublishedNote(api);
    const id = await ask(asker, noteId);
    await moderator.post(`/api/notes/${String(noteId)}/take-down`, { reason: 'A stove in a tent' });
    const gone = await asker.get(pathOf(noteId));
    const unknown = await asker.get(pathOf(999_999_999));
    expect(gone.status).toBe(404);
    expect(withoutId(gone.problem)).toEqual(withoutId(unknown.problem));
    expect((await asker.post(pathOf(noteId), { text: QUESTION })).status).toBe(404);
    // Its author still sees the note, without them.
    expect((await read(author, noteId)).questions).toEqual([]);
    const answer = await author.put(answerPath(noteId, id), { text: 'Too late.' });
    expect([answer.status, answer.problem.code]).toEqual([409, 'wrong-status']);
  });

  test('do not stand on a note that waits, not even for moderators', async ({ api }) => {
    const author = await api.signedIn();
    const moderator = await api.signedIn('moderator');
    const kiln = await addKiln(author);
    const draft = await startNote(author, kiln.id);
    await handIn(author, draft, completeFields(kiln.id));
    expect(await read(moderator, draft.id)).toEqual({ questions: [], abilities: { ask: false } });
    const asked = await moderator.post(pathOf(draft.id), { text: QUESTION });
    expect(asked.status).toBe(409);
    expect((await api.client().get(pathOf(draft.id))).status).toBe(404);
  });

  test('stay without a name when the account is gone', async ({ api }) => {
    const { moderator, asker, noteId } = await aPublishedNote(api);
    const id = await ask(asker, noteId);
    await moderator.put(answerPath(noteId, id), { text: 'On dry brick, it says.' });
    await api.db('members').whereIn('id', [asker.member.id]).delete();
    const [question] = (await read(api.client(), noteId)).questions;
    expect([question?.text, question?.by]).toEqual([QUESTION, null]);
    expect(JSON.stringify(question)).not.toContain('Wren');
  });
});

describe('the mails about questions', () => {
  test('tell the author of a question and the asker of an answer, once each', async ({ api }) => {
    const { author, asker, noteId } = await aPublishedNote(api);
    const id = await ask(asker, noteId);
    const [asked, ...more] = await takeMails(api);
    expect(more).toEqual([]);
    expect(asked?.to).toBe(author.member.email);
    expect(asked?.subject).toBe('A question: A plain afternoon');
    expect(asked?.text).toContain(`> ${QUESTION}`);
    expect(asked?.text).toContain('Wren Halloran');
    expect(asked?.text).toContain(`${api.deps.config.publicUrl}/notes/${String(noteId)}`);
    await author.put(answerPath(noteId, id), { text: 'A dry slab.' });
    const [answered, ...others] = await takeMails(api);
    expect(others).toEqual([]);
    expect(answered?.to).toBe(asker.member.email);
    expect(answered?.text).toContain('> A dry slab.');
    await author.put(answerPath(noteId, id), { text: 'A dry slab of concrete.' });
    expect(await takeMails(api)).toEqual([]);
  });

  test('stay away from who does not want them, and of what is gone by then', async ({ api }) => {
    const { author, moderator, asker, noteId } = await aPublishedNote(api);
    const mails = { decisions: true, triedIt: true, questions: false, desk: false };
    for (const { member } of [author, asker]) {
      await api
        .db('members')
        .where({ id: member.id })
        .update({ settings: JSON.stringify({ mails }) });
    }
    await author.put(answerPath(noteId, await ask(asker, noteId)), { text: 'A dry slab.' });
    expect(await takeMails(api)).toEqual([]);

    const kept = await api.signedIn();
    const id = await ask(kept, noteId, 'And how thick was its lining?');
    await moderator.put(answerPath(noteId, id), { text: 'As thick as a thumb.' });
    await kept.delete(pathOf(noteId, `/${String(id)}`));
    expect(await takeMails(api)).toEqual([]);
  });
});
