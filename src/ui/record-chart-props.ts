import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';
import type { DrawnMark } from './drawn-mark.ts';

/** A stretch of a record that is said in words: a level one or a fall. */
export interface DrawnStretch {
  readonly fromMinute: number;
  readonly toMinute: number;
  /** "stall 708 °C, 17 min". */
  readonly label: string;
}

export interface RecordChartProps {
  /** Minute and °C, in order of time. */
  readonly points: readonly HeatPoint[];
  readonly alt: string;
  readonly unit?: TemperatureUnit;
  readonly targetCelsius?: number | null;
  readonly hold?: { readonly fromMinute: number; readonly toMinute: number } | null;
  readonly stretches?: readonly DrawnStretch[];
  readonly marks?: readonly DrawnMark[];
  readonly secondProbe?: readonly HeatPoint[] | null;
  /** Another record on the same minutes, to compare with. */
  readonly overlay?: { readonly points: readonly HeatPoint[]; readonly label: string } | null;
}
