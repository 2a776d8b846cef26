import type { ReactNode } from 'react';

/** One component or family on the workbench. */
export function Bench({
  title,
  children,
}: {
  readonly title: string;
  readonly children: ReactNode;
}) {
  return (
    <section className="space-y-8">
      <h2 className="border-b-2 border-soot pb-1 text-section">{title}</h2>
      {children}
    </section>
  );
}
