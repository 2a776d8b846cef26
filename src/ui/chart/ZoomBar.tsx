import { Button } from '../Button.tsx';
import { IconButton } from '../IconButton.tsx';
import { LiveRegion } from '../LiveRegion.tsx';
import { LEAST_MINUTES, windowAround, ZOOM_STEP } from './minute-window.ts';
import type { DrawnStretch } from './record-chart-props.ts';
import type { Zoom } from './useZoom.ts';
import { windowWords } from './window-words.ts';

/** By this share of what is shown "earlier" and "later" move. */
const MOVE_SHARE = 0.5;

interface Props {
  readonly zoom: Zoom;
  /** What a press shows at once: stalls, sags, the hold. */
  readonly stretches: readonly DrawnStretch[];
}

/** Every way of looking closer has a button here, so that nothing needs a drag, a wheel or keys. */
export function ZoomBar({ zoom, stretches }: Props) {
  const { window, whole, zoomed } = zoom;
  const closest = window.to - window.from <= Math.min(LEAST_MINUTES, whole.to - whole.from) + 1e-6;
  const words = zoomed
    ? `${windowWords(window)} of ${windowWords(whole)}`
    : `all of it, ${windowWords(whole)}`;
  return (
    <div
      role="group"
      aria-label="What the chart shows"
      className="not-in-print flex flex-wrap items-center gap-x-3 gap-y-1 border-b border-line pb-1 text-note"
    >
      <span className="inline-flex items-center gap-1">
        <IconButton
          icon="add"
          label="Look closer"
          disabled={closest}
          onClick={() => zoom.by(ZOOM_STEP)}
        />
        <IconButton
          icon="less"
          label="Look from further away"
          disabled={!zoomed}
          onClick={() => zoom.by(1 / ZOOM_STEP)}
        />
        <IconButton
          icon="back"
          label="Earlier minutes"
          disabled={!zoomed || window.from <= whole.from}
          onClick={() => zoom.move(-MOVE_SHARE)}
        />
        <IconButton
          icon="on"
          label="Later minutes"
          disabled={!zoomed || window.to >= whole.to}
          onClick={() => zoom.move(MOVE_SHARE)}
        />
      </span>
      <Button kind="quiet" disabled={!zoomed} onClick={zoom.showWhole}>
        Whole
      </Button>
      {stretches.map((stretch) => (
        <Button
          key={`${stretch.label}-${stretch.fromMinute}`}
          kind="quiet"
          onClick={() => zoom.show(windowAround(stretch, whole))}
        >
          To {stretch.label}
        </Button>
      ))}
      <span className="reading ml-auto text-soot-2">{words}</span>
      <LiveRegion
        quietMs={500}
        text={zoom.used ? `The chart shows ${zoomed ? words : 'the whole record'}.` : ''}
      />
    </div>
  );
}
