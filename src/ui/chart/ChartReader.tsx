import { useEffect, useRef, useState, type KeyboardEvent, type PointerEvent } from 'react';
import type { ChartFrame } from './chart-frame.ts';
import { ChartReadOff } from './ChartReadOff.tsx';
import { readingStep, windowWith, ZOOM_STEP } from './minute-window.ts';
import type { Zoom } from './useZoom.ts';

interface Props {
  readonly frame: ChartFrame;
  readonly zoom: Zoom;
  readonly partsAt: (minute: number) => readonly string[];
  readonly celsiusAt: (minute: number) => number | null;
}

/** A press that wanders less than this, px, is a press and selects nothing. */
const LEAST_DRAG_PX = 6;
const WHEEL_LINE_PX = 16;
const WHEEL_MOST_PX = 60;
const WHEEL_PER_PX = 0.008;

interface Drag {
  readonly start: number;
  readonly now: number;
}

/**
 * Lies over the chart and reads it off, by hovering, by a finger, by the arrow keys; dragging with
 * a mouse or pen selects the minutes to show. A finger never selects and two fingers are left to
 * the browser's own zoom. What it shows is its own, so that the chart beneath is not drawn anew.
 */
export function ChartReader({ frame, zoom, partsAt, celsiusAt }: Props) {
  const { plot, xOf, yOf } = frame;
  const { window, whole } = zoom;
  const [minute, setMinute] = useState<number | null>(null);
  const [drag, setDrag] = useState<Drag | null>(null);
  const surface = useRef<HTMLDivElement>(null);
  const range = useRef<HTMLInputElement>(null);
  const place = (event: { clientX: number }): number | null => {
    const box = surface.current?.getBoundingClientRect();
    if (!box || box.width === 0) return null;
    const share = Math.min(1, Math.max(0, (event.clientX - box.left) / box.width));
    return window.from + share * (window.to - window.from);
  };
  useWheel(surface, zoom, place);

  const go = (to: number): void => {
    const there = Math.min(whole.to, Math.max(whole.from, to));
    const shown = windowWith(window, whole, there);
    if (shown !== window) zoom.show(shown);
    setMinute(there);
  };
  const onKeyDown = (event: KeyboardEvent): void => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const at = minute ?? window.from;
    const step = readingStep(window);
    const tenth = (window.to - window.from) / 10;
    const acts: Record<string, () => void> = {
      ArrowRight: () => (event.shiftKey ? zoom.move(0.25) : go(at + step)),
      ArrowLeft: () => (event.shiftKey ? zoom.move(-0.25) : go(at - step)),
      ArrowUp: () => go(at + step),
      ArrowDown: () => go(at - step),
      PageUp: () => go(at + tenth),
      PageDown: () => go(at - tenth),
      Home: () => go(whole.from),
      End: () => go(whole.to),
      '+': () => zoom.by(ZOOM_STEP, at),
      '=': () => zoom.by(ZOOM_STEP, at),
      '-': () => zoom.by(1 / ZOOM_STEP, at),
      '0': zoom.showWhole,
      Escape: () => setDrag(null),
    };
    const act = acts[event.key];
    if (!act || (event.key === 'Escape' && !drag)) return;
    event.preventDefault();
    act();
  };
  const onPointerDown = (event: PointerEvent<HTMLDivElement>): void => {
    const at = place(event);
    if (at === null || event.button !== 0) return;
    setMinute(at);
    if (event.pointerType === 'touch') return;
    event.preventDefault();
    range.current?.focus({ preventScroll: true });
    event.currentTarget.setPointerCapture(event.pointerId);
    setDrag({ start: at, now: at });
  };
  const onPointerMove = (event: PointerEvent<HTMLDivElement>): void => {
    const at = place(event);
    if (at === null) return;
    setMinute(at);
    if (drag) setDrag({ ...drag, now: at });
  };
  const onPointerUp = (): void => {
    setDrag(null);
    if (!drag || Math.abs(xOf(drag.now) - xOf(drag.start)) < LEAST_DRAG_PX) return;
    zoom.show({ from: Math.min(drag.start, drag.now), to: Math.max(drag.start, drag.now) });
  };

  const inSight = minute !== null && minute >= window.from && minute <= window.to;
  const celsius = minute === null ? null : celsiusAt(minute);
  const selected = drag && Math.abs(xOf(drag.now) - xOf(drag.start)) >= LEAST_DRAG_PX;
  return (
    <>
      <svg
        aria-hidden="true"
        viewBox={`0 0 ${frame.width} ${frame.height}`}
        className="ink-drawing not-in-print pointer-events-none absolute inset-0 h-full w-full overflow-visible"
      >
        {selected && (
          <rect
            className="fill-verdigris stroke-verdigris"
            fillOpacity="0.25"
            x={Math.min(xOf(drag.start), xOf(drag.now))}
            y={plot.top}
            width={Math.abs(xOf(drag.now) - xOf(drag.start))}
            height={plot.bottom - plot.top}
          />
        )}
        {inSight && (
          <ChartReadOff
            frame={frame}
            x={xOf(minute)}
            y={celsius === null ? null : yOf(celsius)}
            parts={partsAt(minute)}
          />
        )}
      </svg>
      <div
        ref={surface}
        className="chart-surface not-in-print absolute inset-y-0 right-[8px] left-[58px] cursor-crosshair"
        onPointerDown={onPointerDown}
        onPointerMove={onPointerMove}
        onPointerUp={onPointerUp}
        onPointerCancel={() => setDrag(null)}
        onPointerLeave={() => {
          if (document.activeElement !== range.current) setMinute(null);
        }}
      >
        <input
          ref={range}
          type="range"
          aria-label="Read along the curve"
          aria-keyshortcuts="+ - 0"
          aria-valuetext={partsAt(minute ?? window.from).join('; ')}
          min={whole.from}
          max={whole.to}
          step="any"
          value={minute ?? window.from}
          onChange={(event) => go(event.currentTarget.valueAsNumber)}
          onKeyDown={onKeyDown}
          onFocus={() => setMinute(minute ?? window.from)}
          onBlur={() => setMinute(null)}
          className="read-along pointer-events-none absolute inset-0"
        />
      </div>
    </>
  );
}

/** Ctrl and wheel, which a pinch on a touchpad also is, zoom; a sideways wheel moves along. */
function useWheel(
  surface: { readonly current: HTMLDivElement | null },
  zoom: Zoom,
  place: (event: { clientX: number }) => number | null,
): void {
  useEffect(() => {
    const element = surface.current;
    if (!element) return;
    const onWheel = (event: WheelEvent): void => {
      const unit = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? WHEEL_LINE_PX : 1;
      if (event.ctrlKey || event.metaKey) {
        // Else the browser would zoom the page as well.
        event.preventDefault();
        const turned = event.deltaY * unit;
        const delta = Math.max(-WHEEL_MOST_PX, Math.min(WHEEL_MOST_PX, turned));
        zoom.by(Math.exp(-delta * WHEEL_PER_PX), place(event) ?? undefined);
      } else if (zoom.zoomed && Math.abs(event.deltaX) > Math.abs(event.deltaY)) {
        event.preventDefault();
        zoom.move((event.deltaX * unit) / Math.max(1, element.clientWidth));
      }
    };
    element.addEventListener('wheel', onWheel, { passive: false });
    return () => element.removeEventListener('wheel', onWheel);
  });
}
