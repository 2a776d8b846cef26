import { DASHES } from './chart-dashes.ts';

interface Props {
  /** Readings are drawn one by one, not as a hairline. */
  readonly single: boolean;
  readonly second: boolean;
  readonly overlayLabel: string | null;
}

/** Which line is which: told by thickness and dashes, never by colour. */
export function ChartKey({ single, second, overlayLabel }: Props) {
  return (
    <ul className="mt-2 flex flex-wrap gap-x-6 gap-y-1 text-note text-soot-2">
      <KeyLine words="course of the probe, smoothed" width={2.25} />
      <KeyLine words="its readings" width={single ? 4 : 1} {...(single ? { dash: '4 6' } : {})} />
      {second && <KeyLine words="second probe" width={2} dash={DASHES.second} />}
      {overlayLabel !== null && <KeyLine words={overlayLabel} width={2} dash={DASHES.overlay} />}
    </ul>
  );
}

interface KeyLineProps {
  readonly words: string;
  readonly width: number;
  readonly dash?: string;
}

function KeyLine({ words, width, dash }: KeyLineProps) {
  return (
    <li className="flex items-center gap-2">
      <svg aria-hidden="true" viewBox="0 0 36 8" className="ink-drawing h-2 w-9 shrink-0">
        <path className="stroke-soot" strokeWidth={width} strokeDasharray={dash} d="M0 4h36" />
      </svg>
      {words}
    </li>
  );
}
