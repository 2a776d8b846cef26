import type { Me } from '#shared/api/accounts.ts';
import type { allUnsent } from '../write/unsent-work.ts';

/** A member's unsent notes as a file of their own: every field, in the units they are stored in. */
export function unsentFileText(
  { name }: Pick<Me, 'name'>,
  unsent: ReturnType<typeof allUnsent>,
): string {
  const notes = unsent.map(({ noteId, work }) => ({
    noteId,
    writtenAt: work.at,
    onTopOfVersion: work.fromVersion,
    fields: work.fields,
  }));
  return `${JSON.stringify({ what: 'Unsent notes from Spyhole', member: name, notes }, null, 2)}\n`;
}

export function unsentFileName(now: Date): string {
  return `spyhole-unsent-${now.toISOString().slice(0, 10)}.json`;
}
