import { useId } from 'react';
import type { ReactNode } from 'react';

interface Props {
  readonly label: string;
  readonly done: number;
  readonly of: number;
  /** "4 of 11 pictures"; the share in per cent unless given. */
  readonly words?: string;
  /** A button that stops it. */
  readonly cancel?: ReactNode;
}

/** Long work on a ruled tape: how far, in words too. */
export function ProgressBar({ label, done, of, words, cancel }: Props) {
  const labelId = useId();
  const share = of > 0 ? Math.min(1, Math.max(0, done / of)) : 0;
  const percent = `${Math.round(share * 100)}\u00a0%`;
  return (
    <div className="flex flex-wrap items-end gap-x-4 gap-y-2">
      <div className="min-w-48 grow">
        <p className="flex justify-between gap-4 pb-1 text-small">
          <span id={labelId}>{label}</span>
          <span className="reading text-soot-2">{words ?? percent}</span>
        </p>
        <svg
          role="progressbar"
          aria-labelledby={labelId}
          aria-valuemin={0}
          aria-valuemax={of}
          aria-valuenow={done}
          aria-valuetext={words ?? percent}
          className="ink-drawing block h-3.5 w-full"
        >
          <rect className="fill-verdigris" width={`${share * 100}%`} height="10" />
          <path className="stroke-soot-2" d="M0 .5H4000M0 10H4000" />
          {[0, 10, 20, 30, 40, 50, 60, 70, 80, 90, 100].map((tick) => (
            <line
              key={tick}
              className="stroke-soot-2"
              x1={`${tick}%`}
              x2={`${tick}%`}
              y1={tick % 50 === 0 ? 0 : 10}
              y2="14"
              strokeWidth={tick % 100 === 0 ? 2 : 1}
            />
          ))}
        </svg>
      </div>
      {cancel}
    </div>
  );
}
