import { celsiusAt, type HeatPoint } from '#shared/heat/heat-stops.ts';
import type { DrawnMark } from '../drawn-mark.ts';
import type { ChartFrame } from './chart-frame.ts';

interface Props {
  readonly frame: ChartFrame;
  readonly marks: readonly DrawnMark[];
  readonly line: readonly HeatPoint[];
}

/** A diamond on the curve where something was done, with the leader to its label. */
export function ChartMarks({ frame, marks, line }: Props) {
  const { plot, xOf, yOf, startMinute, endMinute } = frame;
  return marks.map(({ minute }, index) => {
    const celsius = celsiusAt(line, minute);
    if (celsius === null || minute < startMinute || minute > endMinute) return null;
    const [x, y] = [xOf(minute), yOf(celsius)];
    return (
      <g key={index} aria-hidden="true">
        <path className="stroke-soot-2" strokeDasharray="2 3" d={`M${x} ${plot.top}V${y}`} />
        <path
          className="fill-ash stroke-soot"
          strokeWidth="1.5"
          d={`M${x} ${y - 5}l5 5-5 5-5-5z`}
        />
      </g>
    );
  });
}
