/** The main action, any other, one that destroys, and one that is barely there. */
export type ButtonKind = 'main' | 'plain' | 'danger' | 'quiet';

const COMMON =
  'inline-flex items-center justify-center gap-2 text-body leading-tight font-[550] select-none touch:min-h-11 aria-disabled:cursor-not-allowed forced-colors:border';

const KINDS: Readonly<Record<ButtonKind, string>> = {
  main: 'min-h-11 bg-verdigris px-5 py-2 text-on-verdigris hover:bg-verdigris-ink hover:text-ash aria-disabled:bg-soot-2 aria-disabled:text-ash',
  plain:
    'min-h-10 border border-soot-2 px-4 py-1.5 text-soot hover:border-soot hover:bg-ash-2 aria-disabled:border-dashed aria-disabled:text-soot-2',
  danger:
    'min-h-10 border-2 border-caution px-4 py-1.5 font-[650] text-caution hover:bg-caution-tint aria-disabled:border-dashed aria-disabled:text-soot-2',
  quiet:
    'min-h-8 px-1 py-1 text-small text-verdigris underline decoration-1 underline-offset-4 hover:decoration-2 aria-disabled:text-soot-2 aria-disabled:no-underline',
};

/** The classes of a button, for what looks like one. */
export function buttonLook(kind: ButtonKind): string {
  return `${COMMON} ${KINDS[kind]}`;
}
