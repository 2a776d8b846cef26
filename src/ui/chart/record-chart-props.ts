import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';
import type { DrawnMark } from '../drawn-mark.ts';
import type { MinuteWindow } from './minute-window.ts';

/** A stretch of a record that is said in words: a level one or a fall. */
export interface DrawnStretch {
  readonly fromMinute: number;
  readonly toMinute: number;
  /** "stall 708 °C, 17 min". */
  readonly label: string;
}

/** Another record, to compare with: the earlier firing, a look-alike, any. */
export interface ComparedRecord {
  /** On its own minutes. */
  readonly points: readonly HeatPoint[];
  /** How it is called in the key and on the line. */
  readonly label: string;
  /** Added to its minutes, so that both lie on those of the record shown. */
  readonly shiftMinutes?: number;
}

/** A part of the record with more of its readings than `points` has. */
export interface RecordPart {
  readonly part: MinuteWindow;
  readonly points: readonly HeatPoint[];
  readonly secondProbe: readonly HeatPoint[] | null;
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
  readonly overlay?: ComparedRecord | null;
  /** Readings of the part in sight, where `points` are not all of them. */
  readonly detail?: RecordPart | null;
  /** Told which part is in sight, or null for the whole. */
  readonly onWindow?: (window: MinuteWindow | null) => void;
  /** All readings of the record, where `points` are thinned. */
  readonly count?: number;
  /** Address of all readings as CSV. */
  readonly csvHref?: string;
}
