import { DASHES } from './chart-dashes.ts';

interface Props {
  readonly second: boolean;
  readonly overlayLabel?: string;
}

/** Which line is which, where there is more than one. */
export function ChartKey({ second, overlayLabel }: Props) {
  return (
    <ul className="mt-2 flex flex-wrap gap-x-6 gap-y-1 text-note text-soot-2">
      <KeyLine words="probe" />
      {second && <KeyLine words="second probe" dash={DASHES.second} />}
      {overlayLabel && <KeyLine words={overlayLabel} dash={DASHES.overlay} />}
    </ul>
  );
}

function KeyLine({ words, dash }: { readonly words: string; readonly dash?: string }) {
  return (
    <li className="flex items-center gap-2">
      <svg aria-hidden="true" viewBox="0 0 36 8" className="ink-drawing h-2 w-9">
        <path className="stroke-soot" strokeWidth="2.25" strokeDasharray={dash} d="M0 4h36" />
      </svg>
      {words}
    </li>
  );
}
