import { Disclosure } from '../../ui/Disclosure.tsx';

interface Props {
  /** The first of them. */
  readonly skipped: readonly { readonly line: number; readonly reason: string }[];
  /** All of them. */
  readonly count: number;
}

const SHOWN = 20;

/** Lines that were not read, each with its number and why. */
export function SkippedLines({ skipped, count }: Props) {
  if (count === 0) return null;
  const shown = skipped.slice(0, SHOWN);
  return (
    <Disclosure summary={count === 1 ? '1 line skipped' : `${count} lines skipped`}>
      <ul className="space-y-0.5">
        {shown.map(({ line, reason }) => (
          <li key={line}>
            <span className="reading">Line {line}</span>: {reason}
          </li>
        ))}
        {count > shown.length && <li>and {count - shown.length} more</li>}
      </ul>
    </Disclosure>
  );
}
