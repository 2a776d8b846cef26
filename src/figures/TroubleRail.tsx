import { Link } from 'react-router-dom';
import type { TroubleShares } from '#shared/api/figures.ts';
import { TROUBLE_SHORT, type Trouble } from '#shared/vocabulary/troubles.ts';

interface Props {
  readonly shares: TroubleShares;
  /** Where a trouble leads: its notes, or what helped with it. */
  readonly toTrouble: (trouble: Trouble) => string;
}

/** Each trouble with the share of notes that had it, as a rule of that length: cold, no heat. */
export function TroubleRail({ shares, toTrouble }: Props) {
  const anyDisputed = shares.troubles.some(({ disputed }) => disputed > 0);
  const most = Math.max(1, ...shares.troubles.map(({ notes }) => notes));
  return (
    <section aria-labelledby="troubles" className="space-y-4">
      <h2 id="troubles" className="text-section">
        What goes wrong
      </h2>
      <p className="text-small text-soot-2">
        Share of {shares.notes} notes by {shares.members} members that had each trouble, found in
        the record or named by the author.{anyDisputed && ' Disputed findings are counted apart.'}
      </p>
      <ul className="grid grid-cols-1 gap-x-10 border-t border-soot sm:grid-cols-2 lg:grid-cols-3">
        {shares.troubles.map(({ trouble, notes, disputed }) => (
          <li key={trouble} className="border-b border-line">
            <Link
              to={toTrouble(trouble)}
              className="group flex min-h-11 items-center gap-4 py-1.5 text-small text-soot no-underline"
            >
              <span className="w-36 shrink-0 underline decoration-line underline-offset-4 group-hover:decoration-verdigris">
                {TROUBLE_SHORT[trouble]}
              </span>
              <svg
                aria-hidden="true"
                className="h-2 w-0 grow"
                viewBox="0 0 100 2"
                preserveAspectRatio="none"
              >
                <rect
                  width={(notes / most) * 100}
                  height="2"
                  className="fill-soot-2 group-hover:fill-verdigris"
                />
              </svg>
              <span className="reading w-20 shrink-0 text-right text-note text-soot-2">
                {notes} of {shares.notes}
                {disputed > 0 && <span className="block">{disputed} disputed</span>}
              </span>
            </Link>
          </li>
        ))}
      </ul>
    </section>
  );
}
