import type { Knex } from 'knex';
import type { z } from 'zod';
import type { checkSchema } from '#shared/api/findings.ts';
import type { Finding } from '#shared/firing/findings.ts';
import type { StripPoints } from '#shared/api/note-rows.ts';
import type { FiringFacts } from '#shared/note/facts.ts';
import { emptyNoteFields, type NoteFields } from '#shared/note/note-fields.ts';
import { readJson } from '../database/read-json.ts';

/** What was handed in, as it was read at that time. Revisions are only ever inserted. */
export interface Revision {
  readonly id: number;
  readonly noteId: number;
  readonly number: number;
  readonly fields: NoteFields;
  readonly storyHtml: string;
  readonly kilnId: number;
  readonly kilnVersion: number;
  readonly recordContentId: number | null;
  readonly findings: Finding[];
  readonly checks: z.infer<typeof checkSchema>[];
  readonly facts: FiringFacts;
  readonly strip: StripPoints | null;
  readonly stripWords: string;
  readonly createdAt: Date;
}
export type NewRevision = Omit<Revision, 'id' | 'number' | 'createdAt'> & {
  /** Pictures placed in the story. */
  readonly pictureNames: readonly string[];
};

interface RawRevision {
  id: number;
  note_id: number;
  number: number;
  fields: unknown;
  story_html: string;
  kiln_id: number;
  kiln_version: number;
  record_content_id: number | null;
  findings: unknown;
  checks: unknown;
  facts: unknown;
  strip: unknown;
  strip_words: string;
  created_at: Date;
}

const COLUMNS = [
  'note_revisions.id',
  'note_revisions.note_id',
  'note_revisions.number',
  'note_revisions.fields',
  'note_revisions.story_html',
  'note_revisions.kiln_id',
  'note_revisions.kiln_version',
  'note_revisions.record_content_id',
  'note_revisions.findings',
  'note_revisions.checks',
  'note_revisions.facts',
  'note_revisions.strip',
  'note_revisions.strip_words',
  'note_revisions.created_at',
];

const toRevision = (row: RawRevision): Revision => ({
  id: row.id,
  noteId: row.note_id,
  number: row.number,
  fields: { ...emptyNoteFields(), ...(readJson(row.fields) as NoteFields) },
  storyHtml: row.story_html,
  kilnId: row.kiln_id,
  kilnVersion: row.kiln_version,
  recordContentId: row.record_content_id,
  findings: readJson(row.findings) as Revision['findings'],
  checks: readJson(row.checks) as Revision['checks'],
  facts: readJson(row.facts) as FiringFacts,
  strip: readJson(row.strip) as StripPoints | null,
  stripWords: row.strip_words,
  createdAt: row.created_at,
});

export async function findRevision(db: Knex, revisionId: number): Promise<Revision | null> {
  const row = await db('note_revisions')
    .where('note_revisions.id', revisionId)
    .first<RawRevision | undefined>(COLUMNS);
  return row ? toRevision(row) : null;
}

/** The findings of published revisions, by note. */
export async function publishedFindings(
  db: Knex,
  noteIds: readonly number[],
): Promise<Map<number, Finding[]>> {
  if (noteIds.length === 0) return new Map();
  const rows = await db('published_firings')
    .join('note_revisions', 'note_revisions.id', 'published_firings.revision_id')
    .whereIn('published_firings.note_id', [...noteIds])
    .select<{ note_id: number; findings: unknown }[]>(
      'published_firings.note_id',
      'note_revisions.findings',
    );
  return new Map(rows.map((row) => [row.note_id, readJson(row.findings) as Finding[]]));
}

/** Whether the note has ever been handed in. */
export async function wasHandedIn(db: Knex, noteId: number): Promise<boolean> {
  const row = await db('note_revisions')
    .where('note_revisions.note_id', noteId)
    .first<{ id: number } | undefined>('note_revisions.id');
  return row !== undefined;
}

/** Adds the note's next revision. The caller holds the note's row locked, so numbers do not race. */
export async function insertRevision(trx: Knex, revision: NewRevision): Promise<number> {
  const last = await trx('note_revisions')
    .where('note_revisions.note_id', revision.noteId)
    .max<{ last: number | null }[]>('note_revisions.number as last');
  const [id] = await trx('note_revisions').insert({
    note_id: revision.noteId,
    number: (last[0]?.last ?? 0) + 1,
    fields: JSON.stringify(revision.fields),
    story_html: revision.storyHtml,
    kiln_id: revision.kilnId,
    kiln_version: revision.kilnVersion,
    record_content_id: revision.recordContentId,
    findings: JSON.stringify(revision.findings),
    checks: JSON.stringify(revision.checks),
    facts: JSON.stringify(revision.facts),
    strip: revision.strip ? JSON.stringify(revision.strip) : null,
    strip_words: revision.stripWords.slice(0, 400),
  });
  if (id === undefined) throw new Error('MariaDB gave no id.');
  if (revision.pictureNames.length > 0) {
    const pictures = await trx('pictures')
      .where('pictures.note_id', revision.noteId)
      .whereIn('pictures.name', [...revision.pictureNames])
      .select<{ id: number }[]>('pictures.id');
    if (pictures.length > 0) {
      await trx('revision_pictures').insert(
        pictures.map((picture) => ({ revision_id: id, picture_id: picture.id })),
      );
    }
  }
  return id;
}
