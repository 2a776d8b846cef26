import type { Knex } from 'knex';
import { pictureSchema, type Picture } from '#shared/api/pictures.ts';
import type { Draft, NotePageData, Remark } from '#shared/api/notes.ts';
import type { KilnFields } from '#shared/note/kiln-fields.ts';
import { countedFacts } from '#shared/note/counted-facts.ts';
import { noteSummary } from '#shared/note/note-summary.ts';
import { insideVolumeLitres } from '#shared/note/kiln-fields.ts';
import type { Actor } from '../authorization/actor.ts';
import { noteAbilities } from '../authorization/rules.ts';
import { disputesOfNote } from '../disputes/dispute-repository.ts';
import { disputesWhenPublished, standingDisputes } from '../disputes/standing-disputes.ts';
import { picturesByNames } from '../pictures/picture-repository.ts';
import { picturesIn } from '#shared/note/story.ts';
import { presentRecord } from '../records/record-presenter.ts';
import { neighbourOf } from './neighbour-repository.ts';
import type { NoteRecord } from './note-repository.ts';
import { noteSubject } from './note-subject.ts';
import { publishedRows, rowsThatTried } from './published-repository.ts';
import { storedRow } from './projection.ts';
import type { DraftReading } from './read-draft.ts';
import type { Revision } from './revision-repository.ts';
import { slugOf } from './slug.ts';

export interface NoteToShow {
  readonly note: NoteRecord;
  readonly revision: Revision;
  readonly author: { id: number; name: string } | null;
  readonly kiln: { name: string; removed: boolean; fields: KilnFields };
}

/**
 * A revision as its page: fields, findings, sanitised story, and its place in the kiln's series.
 * The same for readers (the published revision), the desk (the one handed in) and the author's
 * preview.
 */
export async function presentNotePage(
  db: Knex,
  actor: Actor,
  { note, revision, author, kiln }: NoteToShow,
): Promise<NotePageData> {
  const { fields } = revision;
  const readerId = actor.kind === 'member' && actor.id === note.authorId ? actor.id : null;
  const place = {
    noteId: note.id,
    kilnId: revision.kilnId,
    firedOn: fields.when.date ?? '9999-12-31',
    startTime: fields.when.startTime,
  };
  const [pictures, earlier, next, ownRows, tried, triedBy, disputeRows] = await Promise.all([
    picturesByNames(db, note.id, picturesIn(fields.story)),
    neighbourOf(db, place, 'earlier', readerId),
    neighbourOf(db, place, 'next', readerId),
    publishedRows(db, [note.id]),
    fields.triedNoteId === null ? [] : publishedRows(db, [fields.triedNoteId]),
    rowsThatTried(db, note.id),
    disputesOfNote(db, note.id),
  ]);
  const disputes =
    revision.id === note.publishedRevisionId
      ? standingDisputes(revision.findings, disputeRows)
      : disputesWhenPublished(revision, disputeRows);
  const facts = countedFacts(revision.facts, revision.findings, disputes);
  const { volumeLitres, ...row } = storedRow({ ...revision, facts });
  const {
    story: _story,
    checkAnswers: _answers,
    findingDisputes: _disputes,
    record,
    ...shown
  } = fields;
  const volume = volumeLitres ?? insideVolumeLitres(kiln.fields);
  return {
    id: note.id,
    slug: slugOf(fields.title),
    status: note.status,
    revision: revision.number,
    author,
    kiln: {
      id: revision.kilnId,
      version: revision.kilnVersion,
      removed: kiln.removed,
      fields: kiln.fields,
      volumeLitres: volume,
    },
    fields: shown,
    marks: record.marks,
    row: {
      ...row,
      author,
      kiln: { id: revision.kilnId, name: kiln.name, volumeLitres: volume },
      firedOn: fields.when.date ?? '',
      publishedAt: (note.publishedAt ?? revision.createdAt).toISOString(),
      followOn: ownRows[0]?.followOn ?? null,
    },
    findings: revision.findings,
    disputes,
    levelAnswers: record.levelAnswers,
    summary: noteSummary(fields, facts, earlier !== null),
    storyHtml: revision.storyHtml,
    pictures,
    hasRecord: revision.recordContentId !== null,
    publishedAt: note.publishedAt?.toISOString() ?? null,
    revisedAt: note.revisedAt?.toISOString() ?? null,
    revisionWaiting:
      (readerId !== null || actor.kind === 'member') &&
      note.publishedRevisionId !== null &&
      note.status !== 'published' &&
      (readerId !== null || (actor.kind === 'member' && actor.role !== 'member')),
    earlier,
    next,
    followOn: ownRows[0]?.followOn ?? null,
    triedNote: tried[0] ? { id: tried[0].id, slug: tried[0].slug, title: tried[0].title } : null,
    triedBy,
    abilities: noteAbilities(actor, noteSubject(note)),
  };
}

/** The author's working copy with everything the Write page shows beside the fields. */
export function presentDraft(
  actor: Actor,
  note: NoteRecord,
  read: DraftReading,
  pictures: readonly Picture[],
  remarks: readonly Remark[],
  decision: Draft['decision'],
): Draft {
  return {
    id: note.id,
    version: note.version,
    status: note.status,
    publishedRevision: note.publishedRevisionId,
    savedAt: note.draftSavedAt.toISOString(),
    fields: note.draft,
    record: read.record ? presentRecord(read.record) : null,
    pictures: pictures.map((picture) => pictureSchema.parse(picture)),
    findings: [...read.findings],
    // What is for the desk only is not told to the author.
    checks: read.checks
      .filter((check) => check.forModerators !== true)
      .map((check) => ({ ...check })),
    proposedChanges: [...read.proposedChanges],
    earlier: read.earlier,
    remarks: [...remarks],
    decision,
    abilities: noteAbilities(actor, noteSubject(note)),
  };
}
