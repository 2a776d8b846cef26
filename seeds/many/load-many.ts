import type { Knex } from 'knex';
import { memberSettingsSchema } from '#shared/api/settings.ts';
import { stripSignature } from '#shared/firing/strip.ts';
import { stripWords } from '#shared/firing/strip-words.ts';
import { countedFacts, type CountedFacts } from '#shared/note/counted-facts.ts';
import { firingFacts } from '#shared/note/facts.ts';
import { insideVolumeLitres, type KilnFields } from '#shared/note/kiln-fields.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { readNote } from '#shared/note/read-note.ts';
import { METRIC_UNITS } from '#shared/units/units.ts';
import { followOnOf, projectedRows, storedRow } from '../../server/notes/projection.ts';
import type { StoredRow } from '../../server/notes/published-repository.ts';
import { storeContent } from '../../server/records/record-content.ts';
import { storyHtml } from '../../server/story/story-html.ts';
import { seededRandom } from '../simulation/seeded-random.ts';
import { createLot, drawKiln, drawNote, manyCourses, type Course } from './many-firings.ts';
import { createTextMaker } from './told-text.ts';

/** Firings of one kiln: enough that one follows the other. */
const FIRINGS_PER_KILN = 12;
/** Kilns whose notes go to the database together. */
const KILNS_AT_ONCE = 20;
const KILNS_PER_MEMBER = 2;
const DAY = 86_400_000;
const STRIP_POINTS = 240;
/** Nobody signs in as a made-up member: no password has this hash. */
const NO_PASSWORD = '!';

interface Drawn {
  readonly noteId: number;
  readonly revisionId: number;
  readonly fields: NoteFields;
  readonly facts: CountedFacts;
  readonly row: StoredRow;
  readonly publishedAt: Date;
  readonly kilnId: number;
  readonly authorId: number;
  readonly revision: Record<string, unknown>;
}

type Rows = Record<string, unknown>[];

const nextId = async (db: Knex, table: string): Promise<number> => {
  const row = await db(table).max<{ last: number | null }>({ last: 'id' }).first();
  return (row?.last ?? 0) + 1;
};

async function readFirings(
  kilnId: number,
  kiln: KilnFields,
  authorId: number,
  drawn: readonly {
    fields: NoteFields;
    course: Course;
    contentId: number;
    ids: [number, number];
  }[],
): Promise<Drawn[]> {
  const firings: Drawn[] = [];
  for (const { fields, course, contentId, ids } of drawn) {
    const [noteId, revisionId] = ids;
    const stored = { readings: course.readings, secondProbe: null };
    const today = fields.when.date ?? '2026-01-01';
    const { reading, findings, checks } = readNote({ fields, kiln, stored, earlier: null, today });
    const facts = countedFacts(
      firingFacts({ fields, kiln, reading, readings: [...course.readings], hasSecondProbe: false }),
      findings,
      [],
    );
    const strip = stripSignature(course.readings, STRIP_POINTS);
    const words = reading ? stripWords(reading, METRIC_UNITS) : '';
    const { disputed: _, ...plainFacts } = facts;
    firings.push({
      noteId,
      revisionId,
      fields,
      facts,
      kilnId,
      authorId,
      row: storedRow({ noteId, fields, facts, strip, stripWords: words }),
      publishedAt: new Date(Date.parse(`${today}T18:00:00Z`) + 3 * DAY),
      revision: {
        id: revisionId,
        note_id: noteId,
        number: 1,
        fields: JSON.stringify(fields),
        story_html: await storyHtml(fields.story, []),
        kiln_id: kilnId,
        kiln_version: 1,
        record_content_id: contentId,
        findings: JSON.stringify(findings),
        checks: JSON.stringify(checks),
        facts: JSON.stringify(plainFacts),
        strip: JSON.stringify(strip),
        strip_words: words.slice(0, 400),
      },
    });
  }
  return firings;
}

/** A kiln's published firings, each told of the next one, as rows of the tables. */
function rowsOf(
  firings: readonly Drawn[],
): Record<'notes' | 'firings' | 'troubles' | 'figures', Rows> {
  const rows: Record<'notes' | 'firings' | 'troubles' | 'figures', Rows> = {
    notes: [],
    firings: [],
    troubles: [],
    figures: [],
  };
  for (const [at, drawn] of firings.entries()) {
    const { noteId, revisionId, fields, facts, kilnId, authorId, publishedAt } = drawn;
    const next = firings[at + 1];
    const followOn = next
      ? followOnOf(facts, {
          noteId: next.noteId,
          title: next.fields.title,
          firedOn: next.fields.when.date ?? '',
          row: next.row,
          facts: next.facts,
        })
      : null;
    const projected = projectedRows(
      { id: revisionId, noteId, kilnId, fields, facts },
      { ...drawn.row, followOn },
      authorId,
      publishedAt,
    );
    rows.firings.push(projected.firing);
    rows.troubles.push(...projected.troubles);
    rows.figures.push(projected.figures);
    rows.notes.push({
      id: noteId,
      author_id: authorId,
      status: 'published',
      draft: JSON.stringify(fields),
      draft_saved_at: publishedAt,
      handed_in_at: publishedAt,
      published_at: publishedAt,
      kiln_id: kilnId,
      fired_on: fields.when.date,
      fired_at_time: fields.when.startTime,
    });
  }
  return rows;
}

/**
 * Fills the database with made-up published notes of made-up kilns and members, for trying how the
 * product bears many: read and told like those of people, written straight into the tables in
 * batches. The same seed gives the same notes. The index is not told: rebuild it afterwards.
 */
export async function loadManyNotes(
  db: Knex,
  count: number,
  onProgress: (done: number, of: number) => void = () => undefined,
  seed = 1,
): Promise<void> {
  const lot = createLot(seededRandom(seed));
  const text = createTextMaker(lot.random);
  const courses = manyCourses();
  const contentIds: number[] = [];
  for (const { readings } of courses) {
    contentIds.push(await storeContent(db, { readings, secondProbe: null }));
  }
  let noteId = await nextId(db, 'notes');
  let revisionId = await nextId(db, 'note_revisions');
  let memberId = await nextId(db, 'members');
  let kilnId = await nextId(db, 'kilns');
  const settings = JSON.stringify(memberSettingsSchema.parse({}));
  for (let done = 0; done < count;) {
    const rows: Record<string, Rows> = {
      members: [],
      kilns: [],
      kiln_versions: [],
      notes: [],
      note_revisions: [],
      published_firings: [],
      firing_troubles: [],
      published_figures: [],
    };
    const add = (table: string, more: Rows): void => {
      rows[table]?.push(...more);
    };
    const published: { note: number; revision: number }[] = [];
    for (let kilns = 0; kilns < KILNS_AT_ONCE && done < count; kilns += 1) {
      if (kilns % KILNS_PER_MEMBER === 0) {
        memberId += 1;
        const name = `Potter ${text.word()} ${String(memberId)}`;
        add('members', [
          {
            id: memberId,
            email: `potter-${String(memberId)}@example.org`,
            email_verified_at: new Date(),
            name,
            name_key: name.toLowerCase(),
            password_hash: NO_PASSWORD,
            settings,
          },
        ]);
      }
      kilnId += 1;
      const kiln = drawKiln(lot, text, kilnId);
      add('kilns', [{ id: kilnId, keeper_id: memberId, name: kiln.name }]);
      add('kiln_versions', [
        {
          kiln_id: kilnId,
          version: 1,
          fields: JSON.stringify(kiln),
          volume_litres: insideVolumeLitres(kiln),
        },
      ]);
      let day = Date.parse('2019-03-01') + lot.whole(0, 1800) * DAY;
      const drawn = Array.from({ length: Math.min(FIRINGS_PER_KILN, count - done) }, () => {
        day += lot.whole(3, 40) * DAY;
        const which = lot.whole(0, courses.length - 1);
        const course = lot.oneOf(courses.slice(which, which + 1));
        const date = new Date(day).toISOString().slice(0, 10);
        const fields = drawNote(lot, text, course, { kilnId, date });
        const ids: [number, number] = [noteId, revisionId];
        noteId += 1;
        revisionId += 1;
        return { fields, course, contentId: contentIds[which] ?? 0, ids };
      });
      const firings = await readFirings(kilnId, kiln, memberId, drawn);
      const made = rowsOf(firings);
      add('notes', made.notes);
      add(
        'note_revisions',
        firings.map(({ revision }) => revision),
      );
      add('published_firings', made.firings);
      add('firing_troubles', made.troubles);
      add('published_figures', made.figures);
      published.push(...firings.map((each) => ({ note: each.noteId, revision: each.revisionId })));
      done += drawn.length;
    }
    await db.transaction(async (trx) => {
      for (const [table, list] of Object.entries(rows)) {
        if (list.length > 0) await trx.batchInsert(table, list, 100);
      }
      // Notes and revisions name each other: the notes are told of theirs once both are there.
      await trx('notes')
        .join('note_revisions', 'note_revisions.note_id', 'notes.id')
        .whereIn(
          'notes.id',
          published.map(({ note }) => note),
        )
        .update({
          'notes.handed_in_revision_id': trx.ref('note_revisions.id'),
          'notes.published_revision_id': trx.ref('note_revisions.id'),
        });
    });
    onProgress(done, count);
  }
}
