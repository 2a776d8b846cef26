import { useRef, useState, type PointerEvent } from 'react';
import type { Histogram } from '#shared/api/search.ts';
import type { Units } from '#shared/units/units.ts';
import type { RangeEnds } from './find-address.ts';
import { RANGE_LABELS, rangeWords } from './range-words.ts';

const HEIGHT = 36;
const BAR = 10;

interface Props {
  readonly histogram: Histogram;
  readonly ends: RangeEnds;
  readonly units: Units;
  readonly onRange: (ends: RangeEnds) => void;
}

/**
 * How many notes lie where, in ink: heights say it. Dragging over the bars sets the range; the two
 * fields below do the same, so that nobody has to drag.
 */
export function RangeHistogram({ histogram, ends, units, onRange }: Props) {
  const { range, from, step, counts } = histogram;
  const drawing = useRef<SVGSVGElement>(null);
  const [dragged, setDragged] = useState<readonly [begun: number, at: number] | null>(null);
  const most = Math.max(1, ...counts);
  const barAt = (event: PointerEvent): number => {
    const box = drawing.current?.getBoundingClientRect();
    if (!box || box.width === 0) return 0;
    const share = (event.clientX - box.left) / box.width;
    return Math.min(counts.length - 1, Math.max(0, Math.floor(share * counts.length)));
  };
  const endsOf = ([begun, at]: readonly [number, number]): RangeEnds => ({
    min: from + Math.min(begun, at) * step,
    max: from + (Math.max(begun, at) + 1) * step,
  });
  const shown = dragged ? endsOf(dragged) : ends;
  const isIn = (bar: number): boolean =>
    from + (bar + 1) * step > (shown.min ?? -Infinity) &&
    from + bar * step < (shown.max ?? Infinity);
  const fullest = counts.indexOf(most);
  const whole = { min: from, max: from + counts.length * step };
  const around = { min: from + fullest * step, max: from + (fullest + 1) * step };
  return (
    <svg
      ref={drawing}
      role="img"
      aria-label={`${RANGE_LABELS[range]} of these notes: ${rangeWords(range, whole, units)}, most of them ${rangeWords(range, around, units)} (${String(most)})`}
      viewBox={`0 0 ${String(counts.length * BAR)} ${String(HEIGHT)}`}
      preserveAspectRatio="none"
      className="block h-9 w-full cursor-col-resize touch-pan-y border-b border-soot-2"
      onPointerDown={(event) => {
        if (event.button !== 0) return;
        event.currentTarget.setPointerCapture(event.pointerId);
        setDragged([barAt(event), barAt(event)]);
      }}
      onPointerMove={(event) => {
        if (dragged) setDragged([dragged[0], barAt(event)]);
      }}
      onPointerUp={() => {
        if (dragged) onRange(endsOf(dragged));
        setDragged(null);
      }}
      onPointerCancel={() => setDragged(null)}
    >
      {counts.map((count, bar) => {
        const height = count === 0 ? 0 : Math.max(2, (count / most) * (HEIGHT - 2));
        return (
          <rect
            key={bar}
            x={bar * BAR + 1}
            y={HEIGHT - height}
            width={BAR - 2}
            height={height}
            className={isIn(bar) ? 'fill-soot' : 'fill-line'}
          />
        );
      })}
    </svg>
  );
}
