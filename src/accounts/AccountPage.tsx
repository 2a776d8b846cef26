import type { ReactNode } from 'react';
import { usePageTitle } from '../ui/usePageTitle.ts';

interface Props {
  readonly title: string;
  readonly lead?: ReactNode;
  readonly children: ReactNode;
}

/** A page with one thing to do. */
export function AccountPage({ title, lead, children }: Props) {
  usePageTitle(title);
  return (
    <div className="max-w-3xl space-y-6">
      <div className="space-y-3">
        <h1 className="text-title">{title}</h1>
        {lead && <p className="max-w-measure text-soot-2">{lead}</p>}
      </div>
      {children}
    </div>
  );
}
