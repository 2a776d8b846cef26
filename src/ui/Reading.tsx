/** Figures with their unit, in the mono face, never parted at a line's end. */
export function Reading({ children }: { readonly children: string | number }) {
  return <span className="reading">{children}</span>;
}
