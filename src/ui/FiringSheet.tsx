import type { ReactNode } from 'react';

export interface SheetRow {
  readonly label: string;
  /** null is blank; zero is a value. */
  readonly value: ReactNode;
  /** Figures, set in the mono face. */
  readonly reading?: boolean;
}

export interface SheetGroup {
  readonly heading: string;
  readonly rows: readonly SheetRow[];
}

interface Props {
  readonly groups: readonly SheetGroup[];
  /** Blanks are left out, or shown as a dash where a sheet must be seen whole. */
  readonly blanks?: 'leave-out' | 'dash';
  /** Level of the group headings on the page. */
  readonly headingLevel?: 2 | 3 | 4;
}

const isBlank = (value: ReactNode) => value === null || value === undefined || value === '';

/** Structured facts in ruled columns of label and value; groups flow into as many as fit. */
export function FiringSheet({ groups, blanks = 'leave-out', headingLevel = 3 }: Props) {
  const Heading = `h${headingLevel}` as const;
  const shown = groups
    .map((group) => ({
      ...group,
      rows: group.rows.filter((row) => blanks === 'dash' || !isBlank(row.value)),
    }))
    .filter((group) => group.rows.length > 0);
  return (
    <div className="@container border-t-2 border-soot">
      <div className="gap-x-10 @3xl:columns-2 @6xl:columns-3 print:columns-3 print:gap-x-6">
        {shown.map((group) => (
          <section
            key={group.heading}
            className="break-inside-avoid pt-3 pb-2 print:break-inside-auto print:pt-1 print:pb-1"
          >
            <Heading className="border-b border-line pb-1 text-note font-[650] tracking-normal">
              {group.heading}
            </Heading>
            <dl className="text-small">
              {group.rows.map((row) => (
                <div
                  key={row.label}
                  className="grid grid-cols-[minmax(7rem,2fr)_3fr] items-baseline gap-x-4 break-inside-avoid border-b border-line py-1.5 print:gap-x-2 print:py-px"
                >
                  <dt className="text-soot-2">{row.label}</dt>
                  <dd className={row.reading ? 'reading text-small whitespace-normal' : 'min-w-0'}>
                    {isBlank(row.value) ? <Blank /> : row.value}
                  </dd>
                </div>
              ))}
            </dl>
          </section>
        ))}
      </div>
    </div>
  );
}

function Blank() {
  return (
    <>
      <span aria-hidden="true" className="text-soot-2">
        –
      </span>
      <span className="sr-only">not given</span>
    </>
  );
}
