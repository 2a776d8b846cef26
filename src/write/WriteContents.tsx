import type { ReactNode } from 'react';
import { WRITE_SECTIONS, type WriteSectionId } from './write-sections.ts';

interface Props {
  readonly openIn: ReadonlyMap<WriteSectionId, number>;
  /** Saving has more to say than a few words. */
  readonly isLong: boolean;
  /** How saving stands. */
  readonly children: ReactNode;
}

/** The table of contents, always in reach, with how much each section still asks. */
export function WriteContents({ openIn, isLong, children }: Props) {
  return (
    <div
      className={`sticky top-0 z-30 flex items-center justify-between gap-x-6 border-y border-soot-2 bg-ash ${isLong ? 'flex-wrap' : ''}`}
    >
      <nav
        aria-label="Sections of this note"
        className="relative min-w-0 max-w-full overflow-x-auto"
      >
        <ol className="flex gap-x-4 text-small whitespace-nowrap">
          {WRITE_SECTIONS.map(({ id, title }) => {
            const open = openIn.get(id) ?? 0;
            return (
              <li key={id}>
                <a
                  href={`#section-${id}`}
                  className="group inline-flex min-h-11 items-center gap-1.5 text-soot no-underline"
                  onClick={(event) => {
                    event.preventDefault();
                    const section = document.getElementById(`section-${id}`);
                    section?.scrollIntoView({ block: 'start' });
                    section?.focus({ preventScroll: true });
                  }}
                >
                  <span className="underline decoration-line underline-offset-4 group-hover:decoration-verdigris">
                    {title}
                  </span>
                  {open > 0 && (
                    <span className="reading text-note text-caution">
                      {open}
                      <span className="sr-only"> to look at</span>
                    </span>
                  )}
                </a>
              </li>
            );
          })}
        </ol>
      </nav>
      <div className="shrink-0 py-1.5">{children}</div>
    </div>
  );
}
