import { Children } from 'react';
import type { ReactNode } from 'react';

/**
 * Several short fields beside each other, each with its label above and its checks below: for rows
 * of like things, where one field a line would make a long page.
 */
export function FieldRow({ children }: { readonly children: ReactNode }) {
  return (
    <div className="grid grid-cols-[repeat(auto-fill,minmax(min(11rem,100%),1fr))] gap-x-5">
      {Children.map(children, (child) => child && <div className="@container">{child}</div>)}
    </div>
  );
}
