import { useQuery } from '@tanstack/react-query';
import { useDeferredValue, useMemo } from 'react';
import type { Draft } from '#shared/api/notes.ts';
import type { StripPoints } from '#shared/api/note-rows.ts';
import { findingsOf } from '#shared/firing/findings.ts';
import { readFiring } from '#shared/firing/read-firing.ts';
import { checkNote } from '#shared/note/checks/check-note.ts';
import type { Check } from '#shared/note/checks/check.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { readingsOf, type NoteReading, type StoredReadings } from '#shared/note/read-note.ts';
import { todayAtKiln } from '#shared/note/today-at-kiln.ts';
import { noteQueries } from '../notes/note-queries.ts';
import type { FormKiln } from './form-context.ts';
import { completeReadings } from './record/typed-rows.ts';

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

  // The firing is read anew only when something it is read from was typed.
  const { record, plan, when } = settled;
  const kilnFields = kiln?.fields ?? null;
  const { targetCelsius, drawnBecause } = plan;
  const { startClass } = when;
  const firing = useMemo(
    () =>
      readFiring({
        readings: stored ? stored.readings : completeReadings(record.typedRows),
        secondProbe: stored?.secondProbe ?? null,
        marks: record.marks,
        targetCelsius,
        fuel: kilnFields?.fuel ?? null,
        startClass,
        drawnBecause,
        probe: kilnFields?.probe ?? null,
        answers: record.levelAnswers,
      }),
    [stored, record, targetCelsius, drawnBecause, startClass, kilnFields],
  );
  const findings = useMemo(() => (firing ? findingsOf(firing) : []), [firing]);

  const reading = useMemo((): NoteReading => {
    const { proposedChanges } = draft;
    if (recordId !== null && stored === null) {
      return { reading: null, findings: draft.findings, checks: checksOf(draft), proposedChanges };
    }
    const checks = checkNote({
      fields: settled,
      kiln: kilnFields,
      reading: firing,
      hasRecord: readingsOf(settled, stored).length > 0,
      // The checks ask only whether there was an earlier firing; its differences the server tells.
      earlier: draft.earlier && kilnFields ? { fields: settled, kiln: kilnFields } : null,
      today: todayAtKiln(settled, kilnFields),
    });
    return {
      reading: firing,
      findings,
      checks: checks.filter((check) => check.forModerators !== true),
      proposedChanges,
    };
  }, [settled, stored, recordId, kilnFields, draft, firing, findings]);
  return { reading, stored };
}
