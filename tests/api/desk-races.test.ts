import { describe, expect, vi } from 'vitest';
import { DESK_QUESTIONS, deskNoteSchema } from '#shared/api/desk.ts';
import type { NoteStatus } from '#shared/vocabulary/statuses.ts';
import { test, type Api } from '../support/api.ts';
import { addKiln, completeFields, handIn, ifMatch, startNote } from '../support/notes.ts';

vi.setConfig({ testTimeout: 90_000 });

/** A note handed in and claimed, and a way to put it back there after each round. */
async function claimedNote(api: Api) {
  const author = await api.signedIn();
  const moderator = await api.signedIn('moderator');
  const kiln = await addKiln(author);
  const draft = await startNote(author, kiln.id);
  await handIn(author, draft, completeFields(kiln.id));
  const path = `/api/desk/notes/${String(draft.id)}`;
  const { revisionId } = (await moderator.put(`${path}/claim`)).as(deskNoteSchema);
  const put = (status: NoteStatus, published = false) => {
    const waiting = status === 'handed-in' || status === 'on-the-desk';
    const now = api.db.raw('NOW(3)');
    return api
      .db('notes')
      .where({ id: draft.id })
      .update({
        status,
        removed_at: null,
        handed_in_revision_id: waiting ? revisionId : null,
        handed_in_at: waiting ? now : null,
        claimed_by: status === 'on-the-desk' ? moderator.member.id : null,
        claimed_until: status === 'on-the-desk' ? api.db.raw('NOW(3) + INTERVAL 20 MINUTE') : null,
        published_revision_id: published ? revisionId : null,
        published_at: published ? now : null,
        revised_at: null,
      });
  };
  const noteRow = () =>
    api
      .db('notes')
      .where({ id: draft.id })
      .first<{ status: NoteStatus; version: number; published_revision_id: number | null }>();
  return { author, moderator, id: draft.id, path, revisionId, put, noteRow };
}

const DECISIONS = ['published', 'sent-back', 'declined'];

describe('two at once', () => {
  test('of two opposite decisions one is made: one audit entry, one mail', async ({
    committedApi: api,
  }) => {
    const { moderator, path, revisionId, put, noteRow } = await claimedNote(api);
    const decide = (kind: string) =>
      moderator.post(`${path}/decision`, {
        decision: kind,
        revisionId,
        reason: 'Because.',
        checklist: DESK_QUESTIONS,
      });
    const seen = new Set<string>();
    for (let round = 0; round < 20; round += 1) {
      await put('on-the-desk');
      await api.db('outbox').delete();
      await api.db('published_firings').delete();
      const last = await api.db('audit_log').max<{ id: number }[]>('id as id');
      const kinds = round % 2 === 0 ? ['publish', 'decline'] : ['send-back', 'publish'];
      const answers = await Promise.all(kinds.map(decide));
      expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
      const { status } = (await noteRow()) ?? {};
      const entries = await api
        .db('audit_log')
        .where('id', '>', last[0]?.id ?? 0)
        .pluck<string[]>('act');
      expect(entries).toEqual([status]);
      expect(DECISIONS).toContain(status);
      const mails = await api.db('outbox').where({ topic: 'mail' }).pluck<unknown[]>('payload');
      expect(mails).toHaveLength(1);
      expect(JSON.stringify(mails)).toContain(`note-${status ?? ''}`);
      const projected = await api.db('published_firings').select('note_id');
      expect(projected).toHaveLength(status === 'published' ? 1 : 0);
      seen.add(status ?? '');
    }
    expect(seen.size).toBeGreaterThan(0);
  });

  test('the author takes back while a moderator decides: what is public was decided on', async ({
    committedApi: api,
  }) => {
    const { author, moderator, id, path, revisionId, put, noteRow } = await claimedNote(api);
    for (let round = 0; round < 20; round += 1) {
      await put('on-the-desk');
      const acts = [
        () => author.post(`/api/notes/${String(id)}/take-back`),
        () =>
          moderator.post(`${path}/decision`, {
            decision: 'publish',
            revisionId,
            reason: '',
            checklist: DESK_QUESTIONS,
          }),
      ];
      if (round % 2 === 0) acts.reverse();
      const answers = await Promise.all(acts.map((act) => act()));
      expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
      const row = await noteRow();
      const isPublic = (await api.client().get(`/api/notes/${String(id)}`)).status === 200;
      expect([row?.status, row?.published_revision_id !== null, isPublic]).toEqual(
        isPublic ? ['published', true, true] : ['draft', false, false],
      );
    }
  });

  test('two moderators take the same note: one has it, the other is told who', async ({
    committedApi: api,
  }) => {
    const { path, put } = await claimedNote(api);
    const pair = [await api.signedIn('moderator'), await api.signedIn('moderator')] as const;
    for (let round = 0; round < 10; round += 1) {
      await put('handed-in');
      const answers = await Promise.all(pair.map((client) => client.put(`${path}/claim`)));
      expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
      const winner = answers.findIndex(({ status }) => status === 200);
      const lost = answers[1 - winner];
      expect(lost?.problem.code).toBe('already-claimed');
      expect(lost?.problem.detail).toContain(pair[winner === 0 ? 0 : 1].member.name);
    }
  });
});

describe('the table of what may follow what', () => {
  type State = NoteStatus | 'revised draft' | 'revised waiting' | 'revised on the desk';
  const STATES: Record<State, [NoteStatus, boolean]> = {
    draft: ['draft', false],
    'handed-in': ['handed-in', false],
    'on-the-desk': ['on-the-desk', false],
    'sent-back': ['sent-back', false],
    published: ['published', true],
    declined: ['declined', false],
    'taken-down': ['taken-down', false],
    'revised draft': ['draft', true],
    'revised waiting': ['handed-in', true],
    'revised on the desk': ['on-the-desk', true],
  };
  /** Act → state → where it leads; everything not listed is refused with 409 (404 for `no`). */
  const TABLE: Record<string, { to: Partial<Record<State, string>>; refused?: number }> = {
    'hand-in': {
      to: { draft: 'handed-in', 'sent-back': 'handed-in', 'revised draft': 'handed-in' },
    },
    'take-back': {
      to: {
        'handed-in': 'draft',
        'on-the-desk': 'draft',
        'revised waiting': 'draft',
        'revised on the desk': 'draft',
      },
    },
    revise: { to: { published: 'draft', declined: 'draft', 'taken-down': 'draft' } },
    remove: {
      to: {
        draft: 'removed',
        'sent-back': 'removed',
        declined: 'removed',
        'taken-down': 'removed',
      },
    },
    claim: {
      to: {
        'handed-in': 'on-the-desk',
        'on-the-desk': 'on-the-desk',
        'revised waiting': 'on-the-desk',
        'revised on the desk': 'on-the-desk',
      },
    },
    'give-up-claim': { to: { 'on-the-desk': 'handed-in', 'revised on the desk': 'handed-in' } },
    publish: { to: { 'on-the-desk': 'published', 'revised on the desk': 'published' } },
    'send-back': { to: { 'on-the-desk': 'sent-back', 'revised on the desk': 'sent-back' } },
    decline: { to: { 'on-the-desk': 'declined', 'revised on the desk': 'declined' } },
    'take-down': {
      to: {
        published: 'taken-down',
        'revised draft': 'taken-down',
        'revised waiting': 'handed-in',
        'revised on the desk': 'on-the-desk',
      },
      refused: 404,
    },
  };

  test('holds for every act from every state', async ({ api }) => {
    const { author, moderator, id, path, revisionId, put, noteRow } = await claimedNote(api);
    const note = `/api/notes/${String(id)}`;
    const act = async (name: string) => {
      const version = (await noteRow())?.version ?? 0;
      switch (name) {
        case 'hand-in':
          return author.post(`${note}/hand-in`, undefined, ifMatch(version));
        case 'take-back':
        case 'revise':
          return author.post(`${note}/${name}`);
        case 'remove':
          return author.delete(note);
        case 'claim':
          return moderator.put(`${path}/claim`);
        case 'give-up-claim':
          return moderator.delete(`${path}/claim`);
        case 'take-down':
          return moderator.post(`${note}/take-down`, { reason: 'Because.' });
        default:
          return moderator.post(`${path}/decision`, {
            decision: name,
            revisionId,
            reason: 'Because.',
            checklist: DESK_QUESTIONS,
          });
      }
    };
    for (const [name, { to, refused = 409 }] of Object.entries(TABLE)) {
      for (const [state, [status, published]] of Object.entries(STATES)) {
        await put(status, published);
        const before = await noteRow();
        const answer = await act(name);
        const after = await api.db('notes').where({ id }).first<{
          status: string;
          removed_at: Date | null;
          published_revision_id: number | null;
        }>();
        const now = after?.removed_at ? 'removed' : after?.status;
        const wanted = to[state as State];
        expect([name, state, answer.status, now]).toEqual(
          wanted === undefined ? [name, state, refused, status] : [name, state, 200, wanted],
        );
        // What is up stays up, unless it is taken down.
        const stays = name !== 'take-down' || wanted === undefined;
        if (stays && published)
          expect(after?.published_revision_id).toBe(before?.published_revision_id);
        if (!stays) expect(after?.published_revision_id).toBeNull();
      }
    }
  });
});
