import type { Knex } from 'knex';
import {
  ALIKE_WITHIN_CELSIUS,
  MOST_ASKED_READINGS,
  MOST_LOOK_ALIKES,
  type LookAlike,
  type LookAlikes,
} from '#shared/api/look-alikes.ts';
import type { NoteRow } from '#shared/api/note-rows.ts';
import { chartPoints } from '#shared/firing/strip.ts';
import type { FiringInput } from '#shared/firing/types.ts';
import type { ClimbTraits } from '#shared/look-alike/climb-traits.ts';
import { readClimb, type ReadClimb } from '#shared/look-alike/read-climb.ts';
import { firingInputOf } from '#shared/note/read-note.ts';
import type { Actor } from '../authorization/actor.ts';
import { canOnNote } from '../authorization/rules.ts';
import type { Deps } from '../deps.ts';
import { AppError } from '../http/problem.ts';
import { findNote } from '../notes/note-repository.ts';
import { noteSubject } from '../notes/note-subject.ts';
import { publishedRows } from '../notes/published-repository.ts';
import { loadContent } from '../records/record-content.ts';
import { findRecord } from '../records/record-repository.ts';
import { publishedTraits } from './climb-repository.ts';
import { withClimbs, type ClimbMemory } from './climbs-in-memory.ts';

/** What is asked about, and what is not to be told of. */
interface Asked {
  readonly climb: ReadClimb | null;
  readonly noteId: number | null;
  readonly kilnId: number | null;
}

/** The published notes whose climb is most like that of a record of no note. */
export function lookAlikesOfRecord(deps: Deps, input: FiringInput): Promise<LookAlikes> {
  const climb = readClimb(input);
  return withClimbs(deps, (climbs) => answer(deps, climbs, { climb, noteId: null, kilnId: null }));
}

/** The same for a published note, as everybody may read it. */
export async function lookAlikesOfNote(deps: Deps, noteId: number): Promise<LookAlikes> {
  const [row] = await publishedRows(deps.db, [noteId]);
  if (!row) throw new AppError('not-found');
  return withClimbs(deps, async (climbs) => {
    const kept = climbs.climbOf(noteId);
    const read = (await publishedTraits(deps.db, [noteId])).get(noteId);
    const climb =
      kept && read && read.revisionId === kept.revisionId
        ? { signature: kept.signature, traits: undisputed(read.traits, row) }
        : null;
    return answer(deps, climbs, { climb, noteId, kilnId: row.kiln.id });
  });
}

/** The same for the working copy of one's own note; to everybody else it is not there. */
export async function lookAlikesOfDraft(
  deps: Deps,
  actor: Actor,
  noteId: number,
): Promise<LookAlikes> {
  const note = await findNote(deps.db, noteId);
  if (!note || !canOnNote(actor, 'read-draft', noteSubject(note))) throw new AppError('not-found');
  const { recordId } = note.draft.record;
  const record = recordId === null ? null : await findRecord(deps.db, noteId, recordId);
  const isReady = record?.status === 'ready' && record.contentId !== null;
  const climb =
    recordId !== null && !isReady
      ? null
      : readClimb(await inputOf(deps.db, note.draft, record?.contentId ?? null));
  return withClimbs(deps, (climbs) => answer(deps, climbs, { climb, noteId, kilnId: note.kilnId }));
}

/** As a draft is read everywhere: a long record from some thousands of its points. */
async function inputOf(
  db: Knex,
  fields: Parameters<typeof firingInputOf>[0],
  contentId: number | null,
): Promise<FiringInput> {
  const content = contentId === null ? null : await loadContent(db, contentId);
  return firingInputOf(
    fields,
    null,
    content && {
      readings: chartPoints(content.readings, MOST_ASKED_READINGS),
      secondProbe: null,
    },
  );
}

async function answer(
  { db }: Deps,
  climbs: ClimbMemory,
  { climb, noteId, kilnId }: Asked,
): Promise<LookAlikes> {
  const without = new Set(noteId === null ? [] : [noteId]);
  const compared = (): number =>
    climbs.size - (noteId !== null && climbs.climbOf(noteId) !== null ? 1 : 0);
  if (climb === null) return { climb: null, compared: compared(), hits: [] };
  for (;;) {
    const near = await climbs.nearest(climb.signature, {
      count: MOST_LOOK_ALIKES,
      withinCelsius: ALIKE_WITHIN_CELSIUS,
      without,
    });
    const ids = near.map((one) => one.noteId);
    const [rows, traits] = await Promise.all([publishedRows(db, ids), publishedTraits(db, ids)]);
    const rowOf = new Map(rows.map((row) => [row.id, row]));
    const hits: LookAlike[] = [];
    for (const one of near) {
      const row = rowOf.get(one.noteId);
      const read = traits.get(one.noteId);
      const kept = climbs.climbOf(one.noteId);
      // Taken down, or published anew, since: what is told is only what is published now.
      if (!row || !read || !kept || kept.revisionId !== read.revisionId) {
        climbs.forget(one.noteId);
        continue;
      }
      hits.push({
        note: row,
        apartCelsius: one.apartCelsius,
        celsius: [...kept.signature],
        traits: undisputed(read.traits, row),
        sameKiln: kilnId !== null && row.kiln.id === kilnId,
      });
    }
    if (hits.length < near.length) continue;
    return {
      climb: { celsius: [...climb.signature], traits: climb.traits },
      compared: compared(),
      hits,
    };
  }
}

/** What the author disputes is not said of a note outside its own page. */
function undisputed(traits: ClimbTraits, row: NoteRow): ClimbTraits {
  const disputed = row.disputedTroubles ?? [];
  return {
    ...traits,
    levels: disputed.includes('stall')
      ? traits.levels.filter(({ kind }) => kind !== 'stall')
      : traits.levels,
    sags: disputed.includes('sag') ? [] : traits.sags,
  };
}
