import { useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import type { Neighbour } from '#shared/api/notes.ts';
import type { ComparedRecord } from '../ui/chart/record-chart-props.ts';
import { canAlignAtLit, shiftMinutes, type Alignment, type TimedRecord } from './compared-start.ts';
import { drawnMarks } from './drawn-findings.ts';
import { noteQueries } from './note-queries.ts';

/** The firing before or after in the same kiln, or a published look-alike by its note. */
export type Comparison = 'earlier' | 'next' | `alike-${number}`;

/** What is needed of another firing to offer and to fetch it. */
export type OtherFiring = Pick<Neighbour, 'noteId' | 'title' | 'firedOn' | 'status'>;

interface Others {
  readonly earlier: Neighbour | null;
  readonly next: Neighbour | null;
  /** Published firings that climbed alike, the most alike first. */
  readonly alike?: readonly Pick<OtherFiring, 'noteId' | 'title' | 'firedOn'>[];
}

export interface Compared {
  /** What can be chosen: firings that have a record. */
  readonly choices: readonly { readonly value: Comparison; readonly other: OtherFiring }[];
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

/** As a word before “firing”. */
export const COMPARED_WORDS = { earlier: 'earlier', next: 'next', alike: 'similar' } as const;
export const kindOf = (value: Comparison): keyof typeof COMPARED_WORDS =>
  value === 'earlier' || value === 'next' ? value : 'alike';

const hasStrip = (neighbour: Neighbour | null): neighbour is Neighbour =>
  (neighbour?.strip?.length ?? 0) > 1;

/** The record of another firing, fetched when it is chosen and laid over this one. */
export function useComparedRecord(
  { earlier, next, alike = [] }: Others,
  own: TimedRecord,
): Compared {
  const [wanted, choose] = useState<Comparison | null>(null);
  const [asked, align] = useState<Alignment | null>(null);
  const beside = [earlier?.noteId, next?.noteId];
  const choices: Compared['choices'] = [
    ...(hasStrip(earlier) ? [{ value: 'earlier' as const, other: earlier }] : []),
    ...(hasStrip(next) ? [{ value: 'next' as const, other: next }] : []),
    ...alike
      .filter(({ noteId }) => !beside.includes(noteId))
      .map((other) => ({
        value: `alike-${other.noteId}` as const,
        other: { ...other, status: 'published' as const },
      })),
  ];
  const chosen = choices.find(({ value }) => value === wanted);
  const id = chosen?.other.noteId ?? 0;
  // One's own unpublished firing is there as its author would see it.
  const published = chosen?.other.status === 'published';
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
      label: `${COMPARED_WORDS[kindOf(value)]} firing, “${title || 'Untitled'}”`,
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
