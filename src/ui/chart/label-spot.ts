import { celsiusAt, type HeatPoint } from '#shared/heat/heat-stops.ts';
import type { ChartFrame } from './chart-frame.ts';

export interface LabelSpot {
  readonly x: number;
  readonly y: number;
  readonly anchor: 'start' | 'middle' | 'end';
}

const TRIES = 24;
/** Height of a line of text with its air, px. */
const TEXT_PX = 18;

/**
 * Where the name of a line stands on it: at the visible minute where the other lines are farthest,
 * on the side away from the nearest of them and inside the plot. Null where it is out of sight.
 */
export function labelSpot(
  line: readonly HeatPoint[],
  others: readonly (readonly HeatPoint[])[],
  frame: ChartFrame,
  textWidth: number,
): LabelSpot | null {
  const { startMinute, endMinute, plot, xOf, yOf } = frame;
  let best: (LabelSpot & { readonly room: number }) | null = null;
  for (let index = 1; index < TRIES; index += 1) {
    const minute = startMinute + ((endMinute - startMinute) * index) / TRIES;
    const celsius = celsiusAt(line, minute);
    if (celsius === null) continue;
    const [x, y] = [xOf(minute), yOf(celsius)];
    if (y < plot.top || y > plot.bottom) continue;
    const offs = others.flatMap((other) => {
      const theirs = celsiusAt(other, minute);
      return theirs === null ? [] : [yOf(theirs) - y];
    });
    const nearest = offs.reduce(
      (least, off) => (Math.abs(off) < Math.abs(least) ? off : least),
      plot.bottom - plot.top,
    );
    // A climbing line leaves room above it to the left and below it to the right.
    const below = nearest < 0;
    const textY = below ? y + TEXT_PX : y - TEXT_PX / 2;
    const textX = below ? x + 6 : x - 6;
    const [from, to] = below ? [textX, textX + textWidth] : [textX - textWidth, textX];
    if (from < plot.left + 4 || to > plot.right - 2) continue;
    if (textY < plot.top + TEXT_PX || textY > plot.bottom - 6) continue;
    const room = Math.min(Math.abs(nearest), 120);
    if (!best || room > best.room) {
      best = { x: textX, y: textY, anchor: below ? 'start' : 'end', room };
    }
  }
  return best && { x: best.x, y: best.y, anchor: best.anchor };
}
