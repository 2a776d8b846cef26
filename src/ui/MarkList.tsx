import { formatNumber } from '#shared/units/number.ts';
import type { DrawnMark } from './drawn-mark.ts';

/** The names of numbered marks, where the drawing is too narrow to hold them. */
export function MarkList({ marks }: { readonly marks: readonly DrawnMark[] }) {
  return (
    <ol className="mt-2 grid grid-cols-[repeat(auto-fill,minmax(9.5rem,1fr))] gap-x-4 text-small">
      {marks.map((mark, index) => (
        <li key={index} className="flex items-baseline gap-2 border-b border-line py-1">
          <span className="reading text-soot-2">{index + 1}</span>
          <span className="grow">{mark.label}</span>
          <span className="reading text-soot-2">{formatNumber(mark.minute, 1)}&nbsp;min</span>
        </li>
      ))}
    </ol>
  );
}
