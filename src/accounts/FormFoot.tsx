import type { ReactNode } from 'react';

/** The buttons of a form, under its fields' controls rather than under their labels. */
export function FormFoot({ children }: { readonly children: ReactNode }) {
  return (
    <div className="grid gap-x-5 pt-2 pb-1 @2xl:grid-cols-[10.5rem_minmax(0,1fr)]">
      <div className="flex flex-wrap items-center gap-x-5 gap-y-2 @2xl:col-start-2">{children}</div>
    </div>
  );
}
