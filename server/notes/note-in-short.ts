import { inShort } from '#shared/note/in-short.ts';
import { noteSummary } from '#shared/note/note-summary.ts';
import { METRIC_UNITS } from '#shared/units/units.ts';
import type { Revision } from './revision-repository.ts';

/** The three sentences of a revision in °C and metric, for previews, the index and mails. */
export function noteInShort(revision: Pick<Revision, 'fields' | 'facts'>): string[] {
  return inShort(noteSummary(revision.fields, revision.facts, false), METRIC_UNITS);
}
