import { SHARE_COLUMNS } from './share-columns.ts';

/** The figures over a list of `IntervalBar`s: what its rule runs from and to. */
export function ShareScale({ heading }: { readonly heading: string }) {
  return (
    <div
      className={`grid items-end gap-x-6 border-b border-soot py-1.5 text-note text-soot-2 ${SHARE_COLUMNS}`}
    >
      <span className="text-balance">{heading}</span>
      <span aria-hidden="true" className="flex justify-between px-1">
        <span className="reading -translate-x-1/2">0</span>
        <span className="reading">50</span>
        <span className="reading translate-x-1/2">100&nbsp;%</span>
      </span>
    </div>
  );
}
