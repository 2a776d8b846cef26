import { useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import type { Neighbour } from '#shared/api/notes.ts';
import type { ComparedRecord } from '../ui/chart/record-chart-props.ts';
import { canAlignAtLit, shiftMinutes, type Alignment, type TimedRecord } from './compared-start.ts';
import { drawnMarks } from './drawn-findings.ts';
import { noteQueries } from './note-queries.ts';

export type Comparison = 'earlier' | 'next';

interface Neighbours {
  readonly earlier: Neighbour | null;
  readonly next: Neighbour | null;
}

export interface Compared {
  /** What can be chosen: firings of the same kiln that have a record. */
  readonly choices: readonly { readonly value: Comparison; readonly neighbour: Neighbour }[];
  readonly choice: Comparison | null;
  readonly choose: (choice: Comparison | null) => void;
  readonly alignment: Alignment;
  readonly align: (alignment: Alignment) => void;
  /** Both firings have a mark of being lit. */
  readonly litKnown: boolean;
  readonly overlay: ComparedRecord | null;
  readonly isPending: boolean;
  readonly error: Error | null;
  readonly retry: () => void;
}

const hasStrip = (neighbour: Neighbour | null): neighbour is Neighbour =>
  (neighbour?.strip?.length ?? 0) > 1;

/** The record of the firing before or after, fetched when it is chosen and laid over this one. */
export function useComparedRecord({ earlier, next }: Neighbours, own: TimedRecord): Compared {
  const [wanted, choose] = useState<Comparison | null>(null);
  const [asked, align] = useState<Alignment | null>(null);
  const choices = [
    ...(hasStrip(earlier) ? [{ value: 'earlier' as const, neighbour: earlier }] : []),
    ...(hasStrip(next) ? [{ value: 'next' as const, neighbour: next }] : []),
  ];
  const chosen = choices.find(({ value }) => value === wanted);
  const id = chosen?.neighbour.noteId ?? 0;
  // One's own unpublished firing is there as its author would see it.
  const published = chosen?.neighbour.status === 'published';
  const page = useQuery({
    ...(published ? noteQueries.page(id) : noteQueries.preview(id)),
    enabled: chosen !== undefined,
  });
  const wantsRecord = chosen !== undefined && page.data?.hasRecord === true;
  const record = useQuery({
    ...noteQueries.record(id, published ? 'published' : 'draft', page.data?.revision ?? 0),
    enabled: wantsRecord,
  });
  const other = useMemo((): TimedRecord | null => {
    if (!page.data) return null;
    const points = page.data.hasRecord ? record.data?.points : page.data.row.strip;
    return points ? { points, marks: drawnMarks(page.data.marks) } : null;
  }, [page.data, record.data]);

  const litKnown = other !== null && canAlignAtLit(own, other);
  const alignment = litKnown ? (asked ?? 'lit') : 'climb';
  const value = chosen?.value ?? null;
  const title = page.data?.row.title ?? '';
  const overlay = useMemo((): ComparedRecord | null => {
    if (value === null || other === null) return null;
    return {
      points: other.points,
      label: `${value} firing, “${title || 'Untitled'}”`,
      shiftMinutes: shiftMinutes(own, other, alignment),
    };
  }, [value, other, own, alignment, title]);
  return {
    choices,
    choice: value,
    choose,
    alignment,
    align,
    litKnown,
    overlay,
    isPending: chosen !== undefined && (page.isPending || (wantsRecord && record.isPending)),
    error: chosen === undefined ? null : (page.error ?? (wantsRecord ? record.error : null)),
    retry: () => void (page.error ? page.refetch() : record.refetch()),
  };
}
