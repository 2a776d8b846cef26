import { Disclosure } from '../ui/Disclosure.tsx';

interface Props {
  readonly reasons: readonly { readonly reason: string; readonly count: number }[];
}

/** What is not in the numbers above it, and why; nothing where nothing is left out. */
export function LeftOut({ reasons }: Props) {
  const left = reasons.reduce((sum, { count }) => sum + count, 0);
  if (left === 0) return null;
  return (
    <Disclosure summary={`Left out: ${String(left)}, and why`}>
      <dl className="max-w-measure border-t border-line">
        {reasons.map(({ reason, count }) => (
          <div
            key={reason}
            className="flex items-baseline justify-between gap-6 border-b border-line py-1.5"
          >
            <dt className="text-soot-2 first-letter:uppercase">{reason}</dt>
            <dd className="reading">{count}</dd>
          </div>
        ))}
      </dl>
    </Disclosure>
  );
}
