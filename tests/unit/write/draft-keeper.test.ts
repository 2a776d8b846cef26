import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { Draft } from '#shared/api/notes.ts';
import { emptyNoteFields, type NoteFields } from '#shared/note/note-fields.ts';
import { rememberToken } from '../../../src/http/client.ts';
import { DraftKeeper } from '../../../src/write/draft-keeper.ts';
import { allUnsent, keepUnsent, unsentFor } from '../../../src/write/unsent-work.ts';

const MEMBER = 7;
const NOTE = 31;
const NOTHING = {
  edit: true,
  handIn: true,
  takeBack: false,
  revise: false,
  remove: true,
  claim: false,
  takeDown: false,
  dispute: false,
  tryIt: false,
};

function draftOf(version: number, fields: NoteFields): Draft {
  return {
    id: NOTE,
    version,
    status: 'draft',
    publishedRevision: null,
    savedAt: `2026-05-02T10:00:0${String(version)}.000Z`,
    fields,
    record: null,
    pictures: [],
    findings: [],
    checks: [],
    proposedChanges: [],
    earlier: null,
    remarks: [],
    decision: null,
    abilities: NOTHING,
  };
}
const titled = (title: string): NoteFields => ({ ...emptyNoteFields(), title });

/** A server of one note: keeps what it is sent on top of the right version, else says 412. */
class NoteServer {
  version = 1;
  fields: NoteFields = titled('');
  saves: string[] = [];
  /** What befalls the next request. */
  next: 'answer' | 'unreachable' | 'answer-lost' = 'answer';
  inFlight = 0;
  mostInFlight = 0;

  readonly fetch = async (_path: string, init: RequestInit): Promise<Response> => {
    this.inFlight += 1;
    this.mostInFlight = Math.max(this.mostInFlight, this.inFlight);
    await new Promise((resolve) => setTimeout(resolve, 50));
    this.inFlight -= 1;
    const fate = this.next;
    this.next = 'answer';
    if (fate === 'unreachable') throw new TypeError('no network');
    const from = new Headers(init.headers).get('If-Match');
    const { fields } = JSON.parse(init.body as string) as { fields: NoteFields };
    if (from !== `"v${String(this.version)}"`) {
      const body = {
        type: 'about:blank',
        code: 'stale',
        title: 'Saved elsewhere',
        status: 412,
        detail: 'This note was saved elsewhere.',
        current: {
          version: this.version,
          savedAt: '2026-05-02T11:00:00.000Z',
          fields: this.fields,
        },
      };
      return Response.json(body, { status: 412 });
    }
    this.version += 1;
    this.fields = fields;
    this.saves.push(fields.title);
    if (fate === 'answer-lost') throw new TypeError('connection reset');
    return Response.json(draftOf(this.version, fields));
  };
}

let server: NoteServer;
beforeEach(() => {
  const kept = new Map<string, string>();
  vi.useFakeTimers();
  vi.stubGlobal('localStorage', {
    getItem: (key: string) => kept.get(key) ?? null,
    setItem: (key: string, value: string) => kept.set(key, value),
    removeItem: (key: string) => kept.delete(key),
    key: (index: number) => [...kept.keys()][index] ?? null,
    get length() {
      return kept.size;
    },
  });
  server = new NoteServer();
  vi.stubGlobal('fetch', server.fetch);
  rememberToken('a-token');
});
afterEach(() => {
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

const opened = (): DraftKeeper => new DraftKeeper(MEMBER, draftOf(server.version, server.fields));
const type = (keeper: DraftKeeper, title: string): void =>
  keeper.change((fields) => ({ ...fields, title }));
const pass = (milliseconds: number) => vi.advanceTimersByTimeAsync(milliseconds);

describe('keeping a draft', () => {
  it('sends what was typed once, after the typing has paused, and then forgets its copy here', async () => {
    const keeper = opened();
    type(keeper, 'A');
    await pass(500);
    type(keeper, 'A windy day');
    expect(unsentFor(MEMBER, NOTE)[0]?.work.fields.title).toBe('A windy day');
    expect(server.saves).toEqual([]);
    await pass(1300);
    expect(server.saves).toEqual(['A windy day']);
    expect(keeper.current().state).toEqual({ kind: 'saved', at: '2026-05-02T10:00:02.000Z' });
    expect(keeper.hasUnsent).toBe(false);
    expect(unsentFor(MEMBER, NOTE)).toEqual([]);
  });

  it('has one save under way at a time, each on top of the version before', async () => {
    const keeper = opened();
    type(keeper, 'one');
    void keeper.flush();
    type(keeper, 'two');
    void keeper.flush();
    void keeper.flush();
    await pass(5000);
    expect(server.mostInFlight).toBe(1);
    expect(server.saves).toEqual(['one', 'two']);
    expect(server.version).toBe(3);
    expect(keeper.current().state.kind).toBe('saved');
  });

  it('keeps what was typed here when the network is gone, says so, and sends it when it is back', async () => {
    const keeper = opened();
    server.next = 'unreachable';
    type(keeper, 'in the field');
    await pass(1300);
    expect(keeper.current().state).toMatchObject({ kind: 'unsent', keptHere: true });
    expect(allUnsent(MEMBER).map(({ noteId }) => noteId)).toEqual([NOTE]);
    await pass(8100);
    expect(server.saves).toEqual(['in the field']);
    expect(keeper.current().state.kind).toBe('saved');
  });

  it('shows both versions when the note was saved elsewhere, and sends nothing until one is chosen', async () => {
    const keeper = opened();
    server.version = 4;
    server.fields = titled('from the phone');
    type(keeper, 'from the desk');
    await pass(1300);
    expect(keeper.current().state).toMatchObject({
      kind: 'conflict',
      theirVersion: 4,
      theirs: { title: 'from the phone' },
    });
    type(keeper, 'from the desk, longer');
    await pass(20_000);
    expect(server.saves).toEqual([]);
    keeper.settle('mine');
    await pass(1300);
    expect(server.saves).toEqual(['from the desk, longer']);
    expect(keeper.current().state.kind).toBe('saved');
  });

  it('drops its own version only when the other one is chosen', async () => {
    const keeper = opened();
    server.version = 4;
    server.fields = titled('from the phone');
    type(keeper, 'from the desk');
    await pass(1300);
    keeper.settle('theirs');
    expect(keeper.current().fields.title).toBe('from the phone');
    expect(keeper.hasUnsent).toBe(false);
    expect(unsentFor(MEMBER, NOTE)).toEqual([]);
    type(keeper, 'and on');
    await pass(1300);
    expect(server.saves).toEqual(['and on']);
  });

  it('takes a save whose answer was lost for its own, not for somebody else’s', async () => {
    const keeper = opened();
    server.next = 'answer-lost';
    type(keeper, 'arrived unheard');
    await pass(1300);
    expect(keeper.current().state.kind).toBe('unsent');
    type(keeper, 'arrived unheard, and more');
    await pass(3000);
    expect(keeper.current().state.kind).toBe('saved');
    expect(server.saves).toEqual(['arrived unheard', 'arrived unheard, and more']);
  });

  it('brings back what a closed tab left unsent, and sends it', async () => {
    keepUnsent(MEMBER, NOTE, {
      fromVersion: 1,
      at: '2026-05-02T09:00:00Z',
      fields: titled('left'),
    });
    const keeper = opened();
    expect(keeper.current().fields.title).toBe('left');
    keeper.start();
    await pass(1300);
    expect(server.saves).toEqual(['left']);
  });

  it('shows both when a closed tab left work on top of a version that is no longer the last', () => {
    keepUnsent(MEMBER, NOTE, {
      fromVersion: 1,
      at: '2026-05-02T09:00:00Z',
      fields: titled('left'),
    });
    server.version = 2;
    server.fields = titled('newer');
    const keeper = opened();
    expect(keeper.current().fields.title).toBe('left');
    expect(keeper.current().state).toMatchObject({ kind: 'conflict', theirs: { title: 'newer' } });
  });

  it('keeps two tabs’ copies apart: one tab’s save does not drop what the other has not sent', async () => {
    const one = opened();
    const other = opened();
    type(one, 'first tab');
    await pass(1300);
    type(other, 'second tab');
    await pass(1300);
    expect(other.current().state.kind).toBe('conflict');
    type(one, 'first tab again');
    await pass(1300);
    expect(server.saves).toEqual(['first tab', 'first tab again']);
    expect(unsentFor(MEMBER, NOTE).map(({ work }) => work.fields.title)).toEqual(['second tab']);
    const reopened = opened();
    expect(reopened.current()).toMatchObject({
      fields: { title: 'second tab' },
      state: { kind: 'conflict', theirs: { title: 'first tab again' } },
    });
    reopened.settle('theirs');
    expect(unsentFor(MEMBER, NOTE)).toEqual([]);
  });

  it('does not bring one member’s unsent work to another', () => {
    keepUnsent(MEMBER + 1, NOTE, { fromVersion: 1, at: '', fields: titled('not mine') });
    expect(opened().current().fields.title).toBe('');
  });

  it('asks, when an answer to something else tells of another’s save while its own is unsent', () => {
    const keeper = opened();
    type(keeper, 'mine');
    keeper.accept(draftOf(5, titled('theirs')));
    expect(keeper.current()).toMatchObject({
      fields: { title: 'mine' },
      state: { kind: 'conflict', theirs: { title: 'theirs' } },
    });
  });

  it('says why the server refused, and does not try the same again by itself', async () => {
    const refused = {
      type: 'about:blank',
      code: 'wrong-status',
      title: 'Not now',
      status: 409,
      detail: 'This note is handed in now.',
    };
    const fetchRefusing = vi.fn(() => Promise.resolve(Response.json(refused, { status: 409 })));
    vi.stubGlobal('fetch', fetchRefusing);
    const keeper = opened();
    type(keeper, 'too late');
    await pass(30_000);
    expect(keeper.current().state).toEqual({
      kind: 'refused',
      reason: 'This note is handed in now.',
    });
    expect(fetchRefusing).toHaveBeenCalledTimes(1);
    expect(unsentFor(MEMBER, NOTE)[0]?.work.fields.title).toBe('too late');
  });
});
