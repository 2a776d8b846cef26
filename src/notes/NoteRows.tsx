import type { ReactNode } from 'react';
import type { NoteRow } from '#shared/api/note-rows.ts';
import type { Units } from '#shared/units/units.ts';
import { stripScaleMinutes } from '#shared/heat/strip-scale.ts';
import { HeatLegend } from '../ui/HeatLegend.tsx';
import { NoteRowItem } from './NoteRowItem.tsx';

interface Props {
  readonly rows: readonly NoteRow[];
  readonly units: Units;
  readonly headingLevel?: 2 | 3;
  /** What belongs under a row's facts, e.g. why it was found. */
  readonly under?: (row: NoteRow) => ReactNode;
}

/** Notes as rows on one scale of minutes, with the legend of the heat beside them. */
export function NoteRows({ rows, units, headingLevel = 3, under }: Props) {
  const scaleMinutes = stripScaleMinutes(
    rows.flatMap((row) => {
      const first = row.strip?.[0];
      const last = row.strip?.at(-1);
      return first && last ? [last[0] - first[0]] : [];
    }),
  );
  return (
    <div>
      <ul className="border-t border-soot">
        {rows.map((row) => (
          <NoteRowItem
            key={row.id}
            row={row}
            units={units}
            scaleMinutes={scaleMinutes}
            headingLevel={headingLevel}
          >
            {under?.(row)}
          </NoteRowItem>
        ))}
      </ul>
      <div className="pt-3">
        <HeatLegend unit={units.temperature} withSentence />
      </div>
    </div>
  );
}
