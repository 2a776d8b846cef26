import { useId, useState } from 'react';
import { QUARTZ_INVERSION_CELSIUS, textOnHeat } from '#shared/heat/heat-colour.ts';
import { celsiusAt, firstMinuteAt } from '#shared/heat/heat-stops.ts';
import type { HeatPoint } from '#shared/heat/heat-stops.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import type { TemperatureUnit } from '#shared/units/temperature.ts';
import { minuteTicks } from './axis-ticks.ts';
import type { DrawnMark } from './drawn-mark.ts';
import { HeatGradient } from './HeatGradient.tsx';
import { estimateTextWidth, placeLabels } from './label-lanes.ts';
import type { LabelWish } from './label-lanes.ts';
import { LabelLanes } from './LabelLanes.tsx';
import { LABEL_SIZE, LANE_HEIGHT } from './lane-size.ts';
import { MarkList } from './MarkList.tsx';
import { MinuteRuler } from './MinuteRuler.tsx';
import { ReadAlong } from './ReadAlong.tsx';
import { ReadOffFlag } from './ReadOffFlag.tsx';
import { readOff } from './read-off.ts';
import { stripOutline } from './strip-shape.ts';
import { useWidth } from './useWidth.ts';

interface Props {
  /** Minute and °C, in order of time. */
  readonly points: readonly HeatPoint[];
  /** Says what the strip shows, in words. */
  readonly alt: string;
  readonly targetCelsius?: number | null;
  readonly hold?: { readonly fromMinute: number; readonly toMinute: number } | null;
  readonly marks?: readonly DrawnMark[];
  readonly unit?: TemperatureUnit;
}

/** On a narrow page more marks than this are numbered on the strip and named beneath it. */
const MOST_NAMED_ON_NARROW = 3;
const NARROW_PX = 560;

/** A climb at full width: the face of a note. Hover or arrow along it to read it off. */
export function GlowStrip({ points, alt, targetCelsius, hold, marks = [], unit = 'C' }: Props) {
  const gradientId = useId();
  const [ref, width] = useWidth<HTMLDivElement>();
  const [minute, setMinute] = useState<number | null>(null);
  const first = points[0];
  const last = points[points.length - 1];
  if (!first || !last || last[0] <= first[0]) {
    return <p className="border-y border-line py-4 text-small text-soot-2">{alt}</p>;
  }
  const [start, end] = [first[0], last[0]];
  const stripHeight = width < NARROW_PX ? 68 : 88;
  const xOf = (at: number) => 0.5 + ((at - start) / (end - start)) * (width - 1);
  const within = (at: number) => at >= start && at <= end;

  const numbered = width < NARROW_PX && marks.length > MOST_NAMED_ON_NARROW;
  const shownMarks = marks.filter((mark) => within(mark.minute));
  const quartzMinute = firstMinuteAt(points, QUARTZ_INVERSION_CELSIUS);
  const targetMinute = targetCelsius == null ? null : firstMinuteAt(points, targetCelsius - 5);
  const holdMinutes = hold ? Math.round((hold.toMinute - hold.fromMinute) * 2) / 2 : 0;

  const texts = new Map<string, string>();
  const wishes: LabelWish[] = [];
  const wish = (id: string, text: string, atMinute: number, toMinute?: number) => {
    texts.set(id, text);
    wishes.push({
      id,
      x: xOf(atMinute),
      textWidth: estimateTextWidth(text, LABEL_SIZE),
      ...(toMinute === undefined ? {} : { spanToX: xOf(toMinute) }),
    });
  };
  if (quartzMinute !== null) {
    wish('quartz', formatTemperature(QUARTZ_INVERSION_CELSIUS, unit), quartzMinute);
  }
  if (targetMinute !== null && targetCelsius != null) {
    wish('target', `target ${formatTemperature(targetCelsius, unit)}`, targetMinute);
  }
  if (hold && within(hold.fromMinute)) {
    wish('hold', `hold ${holdMinutes}\u00a0min`, hold.fromMinute, Math.min(end, hold.toMinute));
  }
  shownMarks.forEach((mark, index) =>
    wish(`mark-${index}`, numbered ? String(index + 1) : mark.label, mark.minute),
  );
  const { placed, lanes } = placeLabels(wishes, width);
  const top = lanes * LANE_HEIGHT + 4;
  const height = top + stripHeight + 26;

  return (
    <figure className="whole-in-print">
      <div ref={ref} className="relative">
        <svg
          role="img"
          aria-label={alt}
          viewBox={`0 0 ${width} ${height}`}
          className="ink-drawing block h-auto w-full overflow-visible"
        >
          <defs>
            <HeatGradient id={gradientId} points={points} xOf={xOf} />
          </defs>
          <path
            className="heat stroke-soot-2"
            d={stripOutline(0.5, width - 0.5, top, stripHeight, false)}
            fill={`url(#${gradientId})`}
          />
          {quartzMinute !== null && (
            <path
              d={`M${xOf(quartzMinute)} ${top}v${stripHeight}`}
              stroke={textOnHeat(QUARTZ_INVERSION_CELSIUS)}
            />
          )}
          {targetMinute !== null && targetCelsius != null && (
            <path
              d={`M${xOf(targetMinute)} ${top}v${stripHeight}`}
              stroke={textOnHeat(targetCelsius)}
              strokeDasharray="5 3"
            />
          )}
          {shownMarks.map((mark, index) => (
            <path
              key={index}
              d={notch(xOf(mark.minute), top, width)}
              fill={textOnHeat(celsiusAt(points, mark.minute) ?? 0)}
            />
          ))}
          <LabelLanes placed={placed} texts={texts} baseY={top} />
          <MinuteRuler
            ticks={minuteTicks(start, end, width)}
            xOf={xOf}
            y={top + stripHeight}
            width={width}
          />
          {minute !== null && (
            <ReadOffFlag
              x={xOf(minute)}
              top={top}
              height={stripHeight}
              width={width}
              text={readOff(points, minute, unit)}
            />
          )}
        </svg>
        <ReadAlong
          label="Read along the strip"
          fromMinute={start}
          toMinute={end}
          minute={minute}
          valueText={readOff(points, minute ?? start, unit)}
          onMinute={setMinute}
        />
      </div>
      {numbered && <MarkList marks={shownMarks} />}
    </figure>
  );
}

/** A mark's notch in the upper edge; at either end of the strip only its inner half. */
function notch(x: number, top: number, width: number): string {
  const left = Math.max(1, x - 5);
  const right = Math.min(width - 1, x + 5);
  return `M${left} ${top}H${right}L${x} ${top + 8}Z`;
}
