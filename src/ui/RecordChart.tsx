import { useCallback, useDeferredValue, useId, useMemo } from 'react';
import { celsiusAt } from '#shared/heat/heat-stops.ts';
import { ChartDrawing } from './chart/ChartDrawing.tsx';
import { chartFrame, degreesFor, plotWidth } from './chart/chart-frame.ts';
import { ChartKey } from './chart/ChartKey.tsx';
import { chartLabels, holdWords } from './chart/chart-labels.ts';
import { haveRoom, quartzMinuteOf } from './chart/ChartLines.tsx';
import { ChartReader } from './chart/ChartReader.tsx';
import { drawnLines, readingsIn, shiftedPoints, wholeWindow } from './chart/drawn-lines.ts';
import { readOffParts } from './chart/read-off-parts.ts';
import { ReadingsTable } from './chart/ReadingsTable.tsx';
import type { RecordChartProps } from './chart/record-chart-props.ts';
import { smoothLine } from './chart/smooth-line.ts';
import { useZoom } from './chart/useZoom.ts';
import { ZoomBar } from './chart/ZoomBar.tsx';
import type { DrawnMark } from './drawn-mark.ts';
import { MarkList } from './MarkList.tsx';
import { useWidth } from './useWidth.ts';

/** So low that sheet, strip and chart of a note share one page. */
const PAPER_PLOT_PX = 170;
const NO_MARKS: readonly DrawnMark[] = [];
const NO_STRETCHES: NonNullable<RecordChartProps['stretches']> = [];

/**
 * A record as temperature over time: readings, their course in ink, its heat beneath. It is read
 * off by pointer, finger or arrows and looked at more closely by buttons, drag, wheel or keys.
 */
export function RecordChart(props: RecordChartProps) {
  if (props.points.length < 2) {
    return <p className="border-y border-line py-4 text-small text-soot-2">{props.alt}</p>;
  }
  return <Chart {...props} />;
}

function Chart(props: RecordChartProps) {
  const { points, alt, unit = 'C', targetCelsius = null, overlay = null, hold = null } = props;
  const { marks = NO_MARKS, stretches = NO_STRETCHES, detail = null, secondProbe = null } = props;
  const id = useId();
  const [ref, width, onPaper] = useWidth<HTMLDivElement>();

  const smooth = useMemo(() => smoothLine(points, marks), [points, marks]);
  // Dashes would be lost in the unrest of readings: dashed lines are courses.
  const smoothSecond = useMemo(
    () => secondProbe && smoothLine(secondProbe, marks),
    [secondProbe, marks],
  );
  const smoothOther = useMemo(
    () => overlay && shiftedPoints({ ...overlay, points: smoothLine(overlay.points, NO_MARKS) }),
    [overlay],
  );
  const otherPoints = useMemo(() => overlay && shiftedPoints(overlay), [overlay]);
  const whole = useMemo(
    () => wholeWindow([points, secondProbe, otherPoints]),
    [points, secondProbe, otherPoints],
  );
  const zoom = useZoom(whole, props.onWindow);
  // Paper cannot be zoomed out of.
  const window = onPaper ? whole : zoom.window;
  const part = window !== whole;
  const sources = useMemo(
    () => ({ points, smooth, secondProbe, smoothSecond, overlay: smoothOther, detail }),
    [points, smooth, secondProbe, smoothSecond, smoothOther, detail],
  );
  const lines = useMemo(
    () => drawnLines(sources, window, plotWidth(width)),
    [sources, window, width],
  );
  const labels = useMemo(() => {
    const labelled = { marks, stretches, hold };
    const own = chartLabels(labelled, window, width);
    // As many lanes as the whole needs, so that nothing jumps when it is looked at more closely.
    const lanes = part ? Math.max(own.lanes, chartLabels(labelled, whole, width).lanes) : own.lanes;
    return { ...own, lanes };
  }, [marks, stretches, hold, window, whole, part, width]);
  const frame = useMemo(() => {
    const drawn = [lines.readings, lines.smooth, lines.second, lines.overlay];
    return chartFrame({
      window,
      degrees: degreesFor(drawn, targetCelsius, unit, part ? window : null),
      unit,
      width,
      lanes: labels.lanes,
      plotHeight: onPaper ? PAPER_PLOT_PX : undefined,
    });
  }, [lines, window, targetCelsius, unit, part, width, labels.lanes, onPaper]);
  const quartzMinute = useMemo(() => quartzMinuteOf(smooth), [smooth]);

  const fine = useMemo(() => readingsIn(sources, window), [sources, window]);
  const overlayLabel = overlay?.label ?? null;
  const partsAt = useCallback(
    (minute: number) =>
      readOffParts(
        {
          ...fine,
          overlay:
            otherPoints && overlayLabel !== null
              ? { points: otherPoints, label: overlayLabel }
              : null,
          marks,
          unit,
          window,
        },
        minute,
      ),
    [fine, otherPoints, overlayLabel, marks, unit, window],
  );
  const ownAt = useCallback((minute: number) => celsiusAt(fine.points, minute), [fine]);
  const count = props.count ?? points.length;
  const rows = useMemo(
    () => ({
      ...fine,
      overlay: otherPoints,
      thinned: fine.points === points && count > points.length,
    }),
    [fine, otherPoints, points, count],
  );
  const tabled = useDeferredValue({ rows, window });
  const toShow = hold ? [...stretches, { ...hold, label: holdWords(hold) }] : stretches;

  return (
    <figure className="whole-in-print">
      <ZoomBar zoom={zoom} stretches={toShow} />
      <div ref={ref} className="relative">
        <ChartDrawing
          id={id}
          alt={alt}
          frame={frame}
          lines={lines}
          labels={labels}
          unit={unit}
          stretches={stretches}
          hold={hold}
          marks={marks}
          targetCelsius={targetCelsius}
          overlayLabel={overlayLabel}
          quartzMinute={quartzMinute}
        />
        <ChartReader frame={frame} zoom={zoom} partsAt={partsAt} celsiusAt={ownAt} />
      </div>
      {labels.numbered && <MarkList marks={marks} />}
      <ChartKey
        single={haveRoom(lines.readings, width)}
        second={secondProbe !== null}
        overlayLabel={overlayLabel}
      />
      <ReadingsTable
        sources={tabled.rows}
        window={tabled.window}
        unit={unit}
        count={count}
        overlayLabel={overlayLabel}
        csvHref={props.csvHref ?? null}
      />
    </figure>
  );
}
