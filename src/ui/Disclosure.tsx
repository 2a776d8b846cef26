import type { ReactNode } from 'react';

interface Props {
  readonly summary: ReactNode;
  readonly children: ReactNode;
  readonly open?: boolean;
}

/** More of something, folded away. */
export function Disclosure({ summary, children, open = false }: Props) {
  return (
    <details open={open} className="group mt-2 text-small">
      <summary className="inline-flex min-h-8 list-none items-center gap-2 text-verdigris underline decoration-1 underline-offset-4 hover:decoration-2 touch:min-h-11 [&::-webkit-details-marker]:hidden">
        <svg
          aria-hidden="true"
          viewBox="0 0 10 10"
          className="size-2.5 fill-current group-open:rotate-90"
        >
          <path d="M1 0l8 5-8 5z" />
        </svg>
        {summary}
      </summary>
      <div className="pt-2">{children}</div>
    </details>
  );
}
