import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import type { ComparedRecord, DrawnStretch } from '../ui/chart/record-chart-props.ts';
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

/** A reading a second for fourteen hours, with a probe's noise, a blip and a drop of one second each. */
export const FIFTY_THOUSAND: readonly HeatPoint[] = Array.from(
  { length: 50_000 },
  (_, second): HeatPoint => {
    const minute = second / 60;
    const climb = 18 + 1150 * (1 - Math.exp(-minute / 260)) - 60 * Math.sin(minute / 40);
    const noise = 3 * Math.sin(second * 12.9898) + 2 * Math.sin(second * 78.233);
    const wild = second === 21_000 ? 140 : second === 33_333 ? -170 : 0;
    return [minute, Math.round((climb + noise + wild) * 10) / 10];
  },
);
export const STALL: readonly DrawnStretch[] = [
  { fromMinute: 29, toMinute: 46, label: 'stall 708\u00a0°C, 17\u00a0min' },
];
export const SAG_AND_STALL: readonly DrawnStretch[] = [
  { fromMinute: 31, toMinute: 38, label: 'sag to 688\u00a0°C' },
  { fromMinute: 48, toMinute: 57, label: 'stall 714\u00a0°C, 9\u00a0min' },
];
export const HELD = { fromMinute: 61, toMinute: 66 };
export const GUST: readonly DrawnMark[] = [{ minute: 33, label: 'gust' }];
/** Its own minutes begin seven before it was lit. */
export const COMPARED: ComparedRecord = {
  points: QUICK.map(([minute, celsius]): HeatPoint => [minute + 7, celsius]),
  label: 'next firing, “Wind shelter up”',
  shiftMinutes: -7,
};
