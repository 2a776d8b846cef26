import type { Knex } from 'knex';
import { countedFacts, type CountedFacts } from '#shared/note/counted-facts.ts';
import type { Revision } from '../notes/revision-repository.ts';
import { disputesOfNote } from './dispute-repository.ts';
import { standingDisputes } from './standing-disputes.ts';

/** A published revision with the facts that count: without what its author disputes. */
export type CountedRevision = Revision & { readonly facts: CountedFacts };

/** Everything said of a published note outside its own page is made from this. */
export async function countedRevision(db: Knex, revision: Revision): Promise<CountedRevision> {
  const { facts, findings } = revision;
  const disputes = standingDisputes(findings, await disputesOfNote(db, revision.noteId));
  return { ...revision, facts: countedFacts(facts, findings, disputes) };
}
