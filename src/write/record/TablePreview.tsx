import { useMemo } from 'react';
import { stripSignature } from '#shared/firing/strip.ts';
import type { Reading } from '#shared/firing/types.ts';
import type { SkippedLine } from '#shared/record/read-table.ts';
import { formatDuration } from '#shared/units/duration.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';
import { SmallGlowStrip } from '../../ui/SmallGlowStrip.tsx';
import { spanWords } from './record-source.ts';
import { SkippedLines } from './SkippedLines.tsx';

interface Props {
  readonly table: {
    readonly readings: readonly Reading[];
    readonly skipped: readonly SkippedLine[];
    readonly secondProbe?: readonly Reading[] | null;
    readonly assumed?: readonly string[];
  };
  readonly unit: TemperatureUnit;
  readonly leftOut?: readonly number[];
}

/** What the readings would be: their strip, their count and span, what was taken for granted. */
export function TablePreview({ table, unit, leftOut = [] }: Props) {
  const strip = useMemo(() => stripSignature(table.readings), [table.readings]);
  const first = strip[0]?.[0] ?? 0;
  const last = strip[strip.length - 1]?.[0] ?? 0;
  const count = table.readings.length;
  const words = `${count} ${count === 1 ? 'reading' : 'readings'} over ${formatDuration(last - first)}, ${spanWords(table.readings, unit)}`;
  return (
    <div className="space-y-2 text-small">
      <div className="max-w-112">
        <SmallGlowStrip
          points={strip}
          scaleMinutes={Math.max(1, last - first)}
          alt={`Preview: ${words}`}
        />
      </div>
      <p className="font-[600]">{words}.</p>
      {table.secondProbe && <p>The second probe gave {table.secondProbe.length} readings.</p>}
      {(table.assumed ?? []).map((sentence) => (
        <p key={sentence}>{sentence}</p>
      ))}
      {leftOut.length > 0 && (
        <p>
          Left out by hand: line {leftOut.join(', ')}. The file is sent with these lines marked as
          comments.
        </p>
      )}
      <SkippedLines skipped={table.skipped} count={table.skipped.length} />
    </div>
  );
}
