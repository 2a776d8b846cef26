import type { Notebook } from '#shared/api/notes.ts';

export type NotebookNote = Notebook['notes'][number];

/** One kiln's notes along its time line, newest first; drafts without a day stand before all. */
export interface KilnNotes {
  readonly kiln: NotebookNote['kiln'];
  readonly notes: readonly NotebookNote[];
}

/** What asks something of its author: in work, sent back, or refused with a reason to read. */
export function isInWork({ status, openRemarks }: NotebookNote): boolean {
  return status === 'draft' || status === 'sent-back' || openRemarks > 0;
}

const newestFirst = (one: NotebookNote, other: NotebookNote): number => {
  if (one.firedOn === other.firedOn) return other.id - one.id;
  if (one.firedOn === null) return -1;
  if (other.firedOn === null) return 1;
  return one.firedOn < other.firedOn ? 1 : -1;
};

/** The notes by kiln, the kiln fired last first; notes without a kiln come at the end. */
export function notesByKiln(notes: readonly NotebookNote[]): KilnNotes[] {
  const groups = new Map<number | null, NotebookNote[]>();
  for (const note of [...notes].sort(newestFirst)) {
    const key = note.kiln?.id ?? null;
    groups.set(key, [...(groups.get(key) ?? []), note]);
  }
  return [...groups.values()]
    .map((group) => ({ kiln: group[0]?.kiln ?? null, notes: group }))
    .sort((one, other) => Number(one.kiln === null) - Number(other.kiln === null));
}

const DAY_MILLISECONDS = 86_400_000;

/** The time from one firing to the next in words: "19 days later", "the same day". */
export function gapWords(earlier: string | null, later: string | null): string | null {
  if (earlier === null || later === null) return null;
  const days = Math.round((Date.parse(later) - Date.parse(earlier)) / DAY_MILLISECONDS);
  if (!Number.isFinite(days) || days < 0) return null;
  if (days === 0) return 'the same day';
  if (days === 1) return 'a day later';
  if (days < 60) return `${String(days)} days later`;
  const months = Math.round(days / 30.44);
  return months < 24
    ? `${String(months)} months later`
    : `${String(Math.round(days / 365.25))} years later`;
}
