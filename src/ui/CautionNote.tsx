import type { ReactNode } from 'react';

interface Props {
  readonly heading?: string;
  readonly children: ReactNode;
}

/** What can hurt somebody: barred at the edge like a guard rail, in words, never folded away. */
export function CautionNote({ heading = 'Take care', children }: Props) {
  return (
    <div
      role="note"
      className="shaded whole-in-print caution-rail border-y border-caution py-3 pl-8 pr-4"
      aria-label={heading}
    >
      <p className="font-[650] text-caution">{heading}</p>
      <div className="max-w-measure space-y-1.5 text-small">{children}</div>
    </div>
  );
}
