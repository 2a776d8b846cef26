import { SHARE_COLUMNS } from './share-columns.ts';

interface Props {
  /** What the share is of: "floor insulated". */
  readonly label: string;
  readonly count: number;
  readonly of: number;
  /** 0–1; the interval at the level its page names. null: too few to say. */
  readonly interval: { readonly low: number; readonly high: number } | null;
  /** Another share to hold it against, drawn as a dashed line. */
  readonly against?: { readonly share: number; readonly label: string } | null;
  /** "7 members". */
  readonly aside?: string;
}

const percent = (share: number) => `${Math.round(share * 100)}`;

/** A share as a mark within its interval on a rule from 0 to 100 %, and in figures. Cold: no heat. */
export function IntervalBar({ label, count, of, interval, against, aside }: Props) {
  const share = of > 0 ? count / of : 0;
  const figures = `${count} of ${of}`;
  const words = interval
    ? `${percent(share)}\u00a0% (${percent(interval.low)} to ${percent(interval.high)}\u00a0%)`
    : 'too few to say';
  const at = (value: number) => `${(value * 100).toFixed(2)}%`;
  return (
    <div
      className={`grid items-center gap-x-6 gap-y-1 border-b border-line py-2.5 text-small ${SHARE_COLUMNS}`}
    >
      <p className="font-[550]">{label}</p>
      <div className="px-1">
        <svg
          role="img"
          aria-label={`${label}: ${figures}, ${words}${against ? `; ${against.label} ${percent(against.share)}\u00a0%` : ''}`}
          className="ink-drawing shaded block h-6 w-full overflow-visible"
        >
          <line className="stroke-line" x1="0" x2="100%" y1="20" y2="20" />
          {[0, 0.25, 0.5, 0.75, 1].map((tick) => (
            <line
              key={tick}
              className="stroke-soot-2"
              x1={at(tick)}
              x2={at(tick)}
              y1="16"
              y2="20"
            />
          ))}
          {interval && (
            <>
              <rect
                className="fill-verdigris-tint stroke-verdigris"
                x={at(interval.low)}
                y="4.5"
                width={at(Math.max(0.002, interval.high - interval.low))}
                height="9"
              />
              <line
                className="stroke-soot"
                strokeWidth="3"
                x1={at(share)}
                x2={at(share)}
                y1="0"
                y2="18"
              />
            </>
          )}
          {against && (
            <line
              className="stroke-soot-2"
              strokeWidth="1.5"
              strokeDasharray="2 2"
              x1={at(against.share)}
              x2={at(against.share)}
              y1="0"
              y2="20"
            />
          )}
        </svg>
      </div>
      <p aria-hidden="true" className="flex flex-wrap items-baseline gap-x-3">
        <span className="reading font-[500]">{figures}</span>
        <span className={interval ? 'reading text-soot-2' : 'text-soot-2'}>{words}</span>
        {aside && <span className="text-soot-2">{aside}</span>}
      </p>
    </div>
  );
}
