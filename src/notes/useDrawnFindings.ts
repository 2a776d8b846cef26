import { useMemo } from 'react';
import type { NotePageData } from '#shared/api/notes.ts';
import type { Finding } from '#shared/firing/findings.ts';
import type { Units } from '#shared/units/units.ts';
import { drawnMarks, holdOf, stretchesOf } from './drawn-findings.ts';

/** Findings and marks as a chart draws them; the same while they are, so that it is not drawn anew. */
export function useDrawnFindings(
  findings: readonly Finding[],
  marks: NotePageData['marks'],
  { temperature, system }: Units,
) {
  const hold = useMemo(() => holdOf(findings), [findings]);
  const stretches = useMemo(
    () => stretchesOf(findings, { temperature, system }),
    [findings, temperature, system],
  );
  const drawn = useMemo(() => drawnMarks(marks), [marks]);
  return { hold, stretches, marks: drawn };
}
