import { skipToken, useQuery } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import type { RecordPoints } from '#shared/api/records.ts';
import { partFor, type MinuteWindow } from '../ui/chart/minute-window.ts';
import type { RecordPart } from '../ui/chart/record-chart-props.ts';
import { noteQueries, type RecordOf } from './note-queries.ts';

/** A wheel passes many windows on its way; only where it rests is fetched. */
const REST_MS = 150;

/**
 * The readings of the part a chart shows, where the record has more of them than came with the
 * whole. While they are fetched, or when they cannot be, the chart draws those it has.
 */
export function useRecordDetail(
  noteId: number,
  of: RecordOf,
  revision: number,
  record: RecordPoints | undefined,
): {
  readonly detail: RecordPart | null;
  readonly onWindow: (window: MinuteWindow | null) => void;
} {
  const [window, onWindow] = useState<MinuteWindow | null>(null);
  const [rested, setRested] = useState<MinuteWindow | null>(null);
  useEffect(() => {
    const timer = setTimeout(() => setRested(window), REST_MS);
    return () => clearTimeout(timer);
  }, [window]);
  const [first, last] = [record?.points[0], record?.points.at(-1)];
  const thinned = record !== undefined && record.count > record.points.length;
  const part =
    thinned && rested && first && last ? partFor(rested, { from: first[0], to: last[0] }) : null;
  const whole = noteQueries.recordPart(noteId, of, revision, part ?? { from: 0, to: 1 });
  const { data } = useQuery(part ? whole : { ...whole, queryFn: skipToken });
  return { detail: data ?? null, onWindow };
}
