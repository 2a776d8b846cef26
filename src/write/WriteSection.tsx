import type { ReactNode } from 'react';

interface Props {
  /** Where the table of contents leads: `section-record`. */
  readonly id: string;
  readonly title: string;
  readonly lead?: ReactNode;
  readonly children: ReactNode;
}

/** A section of the form under a heavy rule. It is the container its fields measure themselves by. */
export function WriteSection({ id, title, lead, children }: Props) {
  return (
    <section
      id={`section-${id}`}
      tabIndex={-1}
      aria-labelledby={`heading-${id}`}
      className="@container min-w-0 scroll-mt-4 border-t-2 border-soot pt-3 outline-none"
    >
      <h2 id={`heading-${id}`} className="text-section">
        {title}
      </h2>
      {lead && <p className="max-w-measure pt-1 text-small text-soot-2">{lead}</p>}
      <div className="pt-3">{children}</div>
    </section>
  );
}
