import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import type { DrawnMark } from '../ui/drawn-mark.ts';

/** A climb through given minutes and °C, read every half minute, with a probe's small unrest. */
function read(through: readonly HeatPoint[]): readonly HeatPoint[] {
  const points: HeatPoint[] = [];
  for (let index = 1; index < through.length; index += 1) {
    const [from, to] = [through[index - 1], through[index]];
    if (!from || !to) continue;
    for (let minute = from[0]; minute < to[0]; minute += 0.5) {
      const share = (minute - from[0]) / (to[0] - from[0]);
      const eased = share + 0.12 * Math.sin(Math.PI * share) * Math.sign(to[1] - from[1]);
      const unrest = 2.2 * Math.sin(minute * 3.1) + 1.3 * Math.sin(minute * 7.7);
      points.push([minute, Math.round((from[1] + (to[1] - from[1]) * eased + unrest) * 10) / 10]);
    }
  }
  const last = through[through.length - 1];
  return last ? [...points, last] : points;
}

export const STALLED_THEN_WENT_ON = read([
  [0, 18],
  [9, 240],
  [18.5, 573],
  [29, 706],
  [46, 708],
  [52, 850],
  [58.5, 1000],
  [61, 1006],
  [66, 1004],
  [69.5, 905],
]);
export const STALLED_MARKS: readonly DrawnMark[] = [
  { minute: 0, label: 'lit' },
  { minute: 12, label: 'gas up' },
  { minute: 33, label: 'flue closed 40\u00a0%' },
  { minute: 46, label: 'floor changed' },
  { minute: 48, label: 'relit' },
  { minute: 66, label: 'shut off' },
  { minute: 68, label: 'drawn: two bowls' },
];
export const SECOND_PROBE = STALLED_THEN_WENT_ON.filter((_, index) => index % 4 === 0).map(
  ([minute, celsius]): HeatPoint => [minute, celsius - 12 - 46 * Math.sin((minute / 70) * Math.PI)],
);
export const QUICK = read([
  [0, 22],
  [8, 480],
  [14, 700],
  [24, 1002],
  [29, 1011],
  [31, 960],
]);
export const SAGGED = read([
  [0, 12],
  [14, 420],
  [31, 715],
  [38, 688],
  [49, 716],
  [57, 712],
  [61, 640],
]);
export const LONG = read([
  [0, 8],
  [60, 300],
  [95, 560],
  [130, 690],
  [170, 880],
  [184, 985],
]);
export const COLD = read([
  [0, 14],
  [20, 180],
  [44, 390],
]);
