import type { Knex } from 'knex';
import { noteFieldsSchema, type NoteFields } from '#shared/note/note-fields.ts';
import type { StoryBlock } from '#shared/note/story.ts';
import type { SignedIn } from '../../../server/authorization/actor.ts';
import type { Deps } from '../../../server/deps.ts';
import { claimNote, decide } from '../../../server/desk/desk-service.ts';
import { addRemark } from '../../../server/desk/remark-service.ts';
import { saveNote, startNote } from '../../../server/notes/draft-service.ts';
import { handInNote } from '../../../server/notes/hand-in-note.ts';
import { findNote, type NoteRecord } from '../../../server/notes/note-repository.ts';
import { addNotePicture } from '../../../server/pictures/picture-service.ts';
import { readBytes } from '../../../server/records/read-bytes.ts';
import { readRecord } from '../../../server/records/read-record.ts';
import { addRecord } from '../../../server/records/record-service.ts';
import type { DemoFiring } from '../demo.ts';
import { drawnPicture } from '../pictures/drawn-pictures.ts';
import { actorOf, type DemoActors } from './demo-people.ts';

/** One thing that happened on the way, and when. */
export interface DemoEvent {
  readonly at: Date;
  readonly run: (db: Knex) => Promise<void>;
}

const HOUR = 3_600_000;
const DAY = 24 * HOUR;

/** Everything done to the demo's notes, in the order in which it was done. */
export function demoEvents(
  deps: Deps,
  firings: readonly DemoFiring[],
  actors: DemoActors,
  kilnIds: ReadonlyMap<string, number>,
): DemoEvent[] {
  const noteIds = new Map<string, number>();
  const events = firings.flatMap((firing, index): DemoEvent[] => {
    const fired = Date.parse(`${firing.fields.when?.date ?? ''}T20:00:00Z`) + (index % 50) * 60_000;
    const author = actorOf(actors, firing.authorKey);
    const moderator = moderatorFor(firing, index, actors);
    const noteId = () => idOf(noteIds, firing.key);
    const at = (afterFiring: number, run: (db: Knex) => Promise<void>): DemoEvent => ({
      at: new Date(fired + afterFiring),
      run,
    });
    const writing = at(0, async (db) => {
      noteIds.set(firing.key, await writeDraft({ ...deps, db }, firing, author, kilnIds, noteIds));
    });
    if (firing.status === 'draft') return [writing];
    const handingIn = at(12 * HOUR, async (db) => {
      await handInNote(db, author, noteId(), (await noteOf(db, noteId())).version);
    });
    if (firing.status === 'handed-in') return [writing, handingIn];
    const decided = firing.publishedOn
      ? Date.parse(`${firing.publishedOn}T17:30:00Z`) - fired + (index % 30) * 60_000
      : 3 * DAY;
    return [writing, handingIn, at(decided, (db) => settle(db, firing, moderator, noteId()))];
  });
  return events.sort((a, b) => a.at.getTime() - b.at.getTime());
}

function idOf(noteIds: ReadonlyMap<string, number>, key: string): number {
  const id = noteIds.get(key);
  if (id === undefined) throw new Error(`${key} has not been written yet.`);
  return id;
}

async function noteOf(db: Knex, noteId: number): Promise<NoteRecord> {
  const note = await findNote(db, noteId);
  if (!note) throw new Error('A note of the demo is gone.');
  return note;
}

/** The two moderators by turns, and never on a note of one's own. */
function moderatorFor({ authorKey }: DemoFiring, index: number, actors: DemoActors): SignedIn {
  const staff = ['tunde', 'mina'].filter((key) => key !== authorKey);
  return actorOf(actors, staff[index % staff.length] ?? 'imke');
}

/** The note as its author wrote it: pictures dropped in, the logger's file read, all saved. */
async function writeDraft(
  deps: Deps,
  firing: DemoFiring,
  author: SignedIn,
  kilnIds: ReadonlyMap<string, number>,
  noteIds: ReadonlyMap<string, number>,
): Promise<number> {
  const { db, store } = deps;
  const kilnId = idOf(kilnIds, firing.kilnKey);
  const triedNoteId = firing.triedKey === null ? null : idOf(noteIds, firing.triedKey);
  const start = { kilnId, triedNoteId, timeZone: 'Europe/London' };
  const noteId = await startNote(db, author, start);
  const names = new Map<string, string>();
  for (const { key, name } of firing.pictures) {
    const picture = await addNotePicture(db, store, author, noteId, drawnPicture(key));
    names.set(name, picture.name);
  }
  const told = noteFieldsSchema.parse(firing.fields);
  const recordId = firing.record ? await uploadRecord(deps, noteId, firing.record) : null;
  const fields: NoteFields = {
    ...told,
    kilnId,
    triedNoteId,
    record: { ...told.record, recordId },
    story: { ...told.story, content: told.story.content.map((block) => renamed(block, names)) },
  };
  await saveNote(db, author, noteId, (await noteOf(db, noteId)).version, fields);
  return noteId;
}

async function uploadRecord(
  deps: Deps,
  noteId: number,
  record: NonNullable<DemoFiring['record']>,
): Promise<number> {
  const upload = {
    bytes: Buffer.from(record.csv),
    fileName: record.fileName,
    source: 'file',
  } as const;
  const recordId = await addRecord(deps.db, deps.store, noteId, upload, {
    delimiter: ',',
    decimal: '.',
    headerLine: 1,
    timeColumn: 0,
    timeFormat: 'minutes',
    temperatureColumn: 1,
    secondColumn: record.secondProbe ? 2 : null,
    unit: 'C',
  });
  // The demo's own files need no thread of their own, and there are a hundred of them.
  await readRecord(deps, recordId, readBytes);
  return recordId;
}

/** Pictures stand at the story's top level; each gets the name it was stored under. */
function renamed(block: StoryBlock, names: ReadonlyMap<string, string>): StoryBlock {
  const name = block.type === 'picture' ? names.get(String(block.attrs?.['name'])) : undefined;
  return name === undefined ? block : { ...block, attrs: { ...block.attrs, name } };
}

/** The desk's part: taken, remarked on, decided. */
async function settle(
  db: Knex,
  firing: DemoFiring,
  moderator: SignedIn,
  noteId: number,
): Promise<void> {
  await claimNote(db, moderator, noteId);
  for (const remark of firing.remarks) await addRemark(db, moderator, noteId, remark);
  const { handedInRevisionId } = await noteOf(db, noteId);
  if (handedInRevisionId === null) throw new Error(`${firing.key} was not handed in.`);
  const decision =
    firing.status === 'published'
      ? 'publish'
      : firing.status === 'sent-back'
        ? 'send-back'
        : 'decline';
  await decide(db, moderator, noteId, {
    decision,
    revisionId: handedInRevisionId,
    reason: firing.reason ?? '',
    checklist:
      decision === 'publish'
        ? ['complete', 'consistent', 'kind', 'safe', 'theirs']
        : ['kind', 'safe'],
  });
}
