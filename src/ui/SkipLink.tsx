/** The first thing a keyboard reaches on a page. */
export function SkipLink({
  to,
  children,
}: {
  readonly to: `#${string}`;
  readonly children: string;
}) {
  return (
    <a
      href={to}
      className="not-in-print fixed left-3 top-3 z-50 -translate-y-24 bg-verdigris px-4 py-3 font-[550] text-on-verdigris focus:translate-y-0"
    >
      {children}
    </a>
  );
}
