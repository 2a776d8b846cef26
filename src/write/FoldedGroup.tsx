import { useState, type ReactNode } from 'react';

interface Props {
  readonly title: string;
  /** How many of its fields are filled in, of how many. */
  readonly filled: number;
  readonly of: number;
  /** A check or a remark stands in it: never folded away at first. */
  readonly asks: boolean;
  readonly children: ReactNode;
}

/** Fields that may all be left blank: folded while they are, open once one is filled in. */
export function FoldedGroup({ title, filled, of, asks, children }: Props) {
  const [wasOpen] = useState(filled > 0 || asks);
  return (
    <details open={wasOpen} className="group border-b border-line">
      <summary className="flex min-h-11 list-none items-center gap-3 py-1.5 [&::-webkit-details-marker]:hidden">
        <svg
          aria-hidden="true"
          viewBox="0 0 10 10"
          className="size-2.5 shrink-0 fill-verdigris group-open:rotate-90"
        >
          <path d="M1 0l8 5-8 5z" />
        </svg>
        <span className="font-[600] text-verdigris underline decoration-1 underline-offset-4">
          {title}
        </span>
        <span className="text-note text-soot-2">
          {filled === 0 ? 'blank' : `${String(filled)} of ${String(of)} filled in`}
        </span>
      </summary>
      <div className="pb-4">{children}</div>
    </details>
  );
}
