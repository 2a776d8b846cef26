import type { PointerEvent } from 'react';

interface Props {
  /** What is read, e.g. "Read along the strip". */
  readonly label: string;
  readonly fromMinute: number;
  readonly toMinute: number;
  readonly minute: number | null;
  /** What stands at the chosen minute, spoken by screen readers. */
  readonly valueText: string;
  readonly onMinute: (minute: number | null) => void;
  readonly className?: string;
}

/**
 * Lies unseen over a drawing and reads it off: by hovering, by dragging a finger, and by the arrow
 * keys of a native range (Page Up and Down go in tenths, Home and End to the ends).
 */
export function ReadAlong(props: Props) {
  const { fromMinute, toMinute, minute, onMinute } = props;
  const hover = (event: PointerEvent<HTMLInputElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    if (box.width === 0) return;
    const share = Math.min(1, Math.max(0, (event.clientX - box.left) / box.width));
    onMinute(fromMinute + share * (toMinute - fromMinute));
  };
  return (
    <input
      type="range"
      aria-label={props.label}
      aria-valuetext={props.valueText}
      min={fromMinute}
      max={toMinute}
      step={toMinute - fromMinute > 20 ? 0.5 : 0.1}
      value={minute ?? fromMinute}
      onChange={(event) => onMinute(event.currentTarget.valueAsNumber)}
      onFocus={() => onMinute(minute ?? fromMinute)}
      onBlur={() => onMinute(null)}
      onPointerMove={hover}
      onPointerLeave={(event) => {
        if (document.activeElement !== event.currentTarget) onMinute(null);
      }}
      className={`read-along not-in-print absolute cursor-crosshair ${props.className ?? 'inset-0'}`}
    />
  );
}
