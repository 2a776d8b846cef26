import { useCallback, useMemo, useState } from 'react';
import {
  clampWindow,
  isWhole,
  moveWindow,
  zoomWindow,
  type MinuteWindow,
} from './minute-window.ts';

export interface Zoom {
  readonly window: MinuteWindow;
  readonly whole: MinuteWindow;
  readonly zoomed: boolean;
  /** Somebody has zoomed since the chart was there: what is shown is worth telling. */
  readonly used: boolean;
  readonly show: (window: MinuteWindow) => void;
  readonly showWhole: () => void;
  /** More than 1: closer. */
  readonly by: (factor: number, at?: number) => void;
  /** By a share of what is shown; less than 0: earlier. */
  readonly move: (share: number) => void;
}

/** Which part of a record is shown. It changes at once: nothing moves across the screen. */
export function useZoom(
  whole: MinuteWindow,
  onWindow: ((window: MinuteWindow | null) => void) | undefined,
): Zoom {
  const [wanted, setWanted] = useState<MinuteWindow | null>(null);
  const [used, setUsed] = useState(false);
  const window = useMemo(() => (wanted ? clampWindow(wanted, whole) : whole), [wanted, whole]);
  const show = useCallback(
    (next: MinuteWindow) => {
      const clamped = clampWindow(next, whole);
      const shown = isWhole(clamped, whole) ? null : clamped;
      setUsed(true);
      setWanted(shown);
      onWindow?.(shown);
    },
    [whole, onWindow],
  );
  return useMemo(
    () => ({
      window,
      whole,
      zoomed: !isWhole(window, whole),
      used,
      show,
      showWhole: () => show(whole),
      by: (factor, at) => show(zoomWindow(window, whole, factor, at)),
      move: (share) => show(moveWindow(window, whole, share)),
    }),
    [window, whole, used, show],
  );
}
