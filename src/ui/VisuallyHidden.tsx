import type { ReactNode } from 'react';

/** Read by screen readers, seen by nobody. */
export function VisuallyHidden({ children }: { readonly children: ReactNode }) {
  return <span className="sr-only">{children}</span>;
}
