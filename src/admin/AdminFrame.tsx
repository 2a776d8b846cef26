import type { ReactNode } from 'react';
import { NavLink } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { usePageTitle } from '../ui/usePageTitle.ts';

const PAGES = [
  { to: paths.adminMembers, label: 'Members' },
  { to: paths.adminState, label: 'State' },
  { to: paths.adminMail, label: 'Mail' },
  { to: paths.adminAudit, label: 'Acts' },
] as const;

interface Props {
  readonly title: string;
  readonly lead?: ReactNode;
  /** What the page is made of: without it, its refusal is the page. */
  readonly query: {
    readonly isLoadingError: boolean;
    readonly error: Error | null;
    readonly refetch: () => unknown;
  };
  readonly children: ReactNode;
}

/** A page of the people who run the site, with the ways to the others. */
export function AdminFrame({ title, lead, query, children }: Props) {
  usePageTitle(title);
  if (query.isLoadingError) {
    return <ProblemPage error={query.error} onRetry={() => void query.refetch()} />;
  }
  return (
    <div className="space-y-8">
      <nav aria-label="Admin" className="border-b border-line">
        <ul className="flex flex-wrap gap-x-6 text-small">
          {PAGES.map(({ to, label }) => (
            <li key={to}>
              <NavLink
                to={to}
                className={({ isActive }) =>
                  `-mb-px inline-flex min-h-11 items-center border-b-2 no-underline ${
                    isActive
                      ? 'border-verdigris font-[600] text-verdigris'
                      : 'border-transparent text-soot-2 hover:text-soot'
                  }`
                }
              >
                {label}
              </NavLink>
            </li>
          ))}
        </ul>
      </nav>
      <header className="space-y-2">
        <h1 className="text-title">{title}</h1>
        {lead && <p className="max-w-measure text-small text-soot-2">{lead}</p>}
      </header>
      {children}
    </div>
  );
}
