import type { ReactNode } from 'react';

interface Props {
  readonly title: string;
  /** Why there is nothing, and what would change that. */
  readonly children?: ReactNode;
  readonly action?: ReactNode;
  readonly headingLevel?: 1 | 2 | 3;
}

/** Nothing to see through the spyhole: its plug is in. */
export function EmptyState({ title, children, action, headingLevel = 2 }: Props) {
  const Heading = `h${headingLevel}` as const;
  return (
    <div className="flex flex-col items-start gap-x-6 gap-y-4 py-10 sm:flex-row sm:items-center">
      <svg
        aria-hidden="true"
        viewBox="0 0 96 96"
        className="ink-drawing size-24 shrink-0"
        fill="none"
      >
        <circle cx="48" cy="48" r="36" className="stroke-soot" strokeWidth="20" />
        <path
          className="stroke-ash"
          strokeWidth="2"
          d="M48 1v17l5 7M95 48H78l-7-5M48 95V79l-4-8M1 48h15l9 4"
        />
        <circle cx="48" cy="48" r="20" className="fill-ash-2 stroke-soot-2" />
        <path className="stroke-soot-2" d="M33 44l9 3 4 9 10-4 8 2M42 47l4-12-2-6M46 56l-3 11" />
      </svg>
      <div className="space-y-2">
        <Heading className="text-section">{title}</Heading>
        {children && <div className="max-w-measure text-soot-2">{children}</div>}
        {action && <div className="flex flex-wrap gap-3 pt-2">{action}</div>}
      </div>
    </div>
  );
}
