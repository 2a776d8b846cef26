import { useQuery } from '@tanstack/react-query';
import { useDeferredValue, useMemo } from 'react';
import type { Draft } from '#shared/api/notes.ts';
import type { StripPoints } from '#shared/api/note-rows.ts';
import type { Check } from '#shared/note/checks/check.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { readNote, type NoteReading, type StoredReadings } from '#shared/note/read-note.ts';
import { noteQueries } from '../notes/note-queries.ts';
import type { FormKiln } from './form-context.ts';

/** Today where the kiln stands, `YYYY-MM-DD`; an unknown zone counts as this browser's. */
export function todayIn(timeZone: string): string {
  const day = (zone: string | undefined) =>
    new Intl.DateTimeFormat('en-CA', {
      ...(zone === undefined ? {} : { timeZone: zone }),
      year: 'numeric',
      month: '2-digit',
      day: '2-digit',
    }).format(new Date());
  try {
    return day(timeZone || undefined);
  } catch {
    return day(undefined);
  }
}

/** The server's checks as plain checks. */
function checksOf(draft: Draft): Check[] {
  return draft.checks.map(({ code, kind, pointer, text, offer }) => ({
    code,
    kind,
    pointer,
    text,
    ...(offer ? { offer } : {}),
  }));
}

/**
 * What can be read off the note as it stands on the screen, a moment after it was typed. While the
 * stored readings are not here, what the server last said stands in for it.
 */
export function useNoteReading(
  fields: NoteFields,
  draft: Draft,
  kiln: FormKiln | null,
): { readonly reading: NoteReading; readonly stored: StoredReadings | null } {
  const settled = useDeferredValue(fields);
  const { recordId } = settled.record;
  const isThere =
    recordId !== null && draft.record?.id === recordId && draft.record.status === 'ready';
  const points = useQuery({
    ...noteQueries.record(draft.id, 'draft', recordId ?? 0),
    enabled: isThere,
  });
  const sent = isThere ? points.data : undefined;
  const stored = useMemo((): StoredReadings | null => {
    if (!sent) return null;
    const readings = (list: StripPoints) => list.map(([minute, celsius]) => ({ minute, celsius }));
    return {
      readings: readings(sent.points),
      secondProbe: sent.secondProbe && readings(sent.secondProbe),
    };
  }, [sent]);

  const reading = useMemo((): NoteReading => {
    const { proposedChanges } = draft;
    if (recordId !== null && stored === null) {
      return { reading: null, findings: draft.findings, checks: checksOf(draft), proposedChanges };
    }
    const kilnFields = kiln?.fields ?? null;
    const read = readNote({
      fields: settled,
      kiln: kilnFields,
      stored,
      // The checks ask only whether there was an earlier firing; its differences the server tells.
      earlier: draft.earlier && kilnFields ? { fields: settled, kiln: kilnFields } : null,
      today: todayIn(settled.when.timeZone),
    });
    return {
      ...read,
      checks: read.checks.filter((check) => check.forModerators !== true),
      proposedChanges,
    };
  }, [settled, stored, recordId, kiln, draft]);
  return { reading, stored };
}
