import type { Knex } from 'knex';
import type { NotePageData } from '#shared/api/notes.ts';
import { firingFacts } from '#shared/note/facts.ts';
import { readingsOf } from '#shared/note/read-note.ts';
import { stripSignature } from '#shared/firing/strip.ts';
import { stripWords } from '#shared/firing/strip-words.ts';
import { METRIC_UNITS } from '#shared/units/units.ts';
import type { SignedIn } from '../authorization/actor.ts';
import { AppError } from '../http/problem.ts';
import { picturesOfNote } from '../pictures/picture-repository.ts';
import { storyHtml } from '../story/story-html.ts';
import { ownNote } from './draft-service.ts';
import { presentNotePage } from './note-presenter.ts';
import { toShow } from './note-service.ts';
import { readDraft } from './read-draft.ts';

/** The working copy as readers would see it: read and sanitised the same way, and not stored. */
export async function previewNote(
  db: Knex,
  actor: SignedIn,
  noteId: number,
): Promise<NotePageData> {
  const note = await ownNote(db, actor, noteId);
  const fields = note.draft;
  const read = await readDraft(db, { id: noteId, authorId: actor.id, fields }, false);
  if (!read.kiln) {
    throw new AppError('wrong-status', 'Choose the kiln first; then the page can be shown.');
  }
  const readings = readingsOf(fields, read.stored);
  const revision = {
    id: 0,
    noteId,
    number: 0,
    fields,
    storyHtml: await storyHtml(fields.story, await picturesOfNote(db, noteId)),
    kilnId: read.kiln.id,
    kilnVersion: read.kiln.version,
    recordContentId: read.record?.contentId ?? null,
    findings: [...read.findings],
    checks: [],
    facts: firingFacts({ fields, kiln: read.kiln.fields, reading: read.reading }),
    strip: readings.length > 0 ? stripSignature(readings) : null,
    stripWords: read.reading ? stripWords(read.reading, METRIC_UNITS) : '',
    createdAt: new Date(),
  };
  return presentNotePage(db, actor, await toShow(db, note, revision));
}
