import { Link } from 'react-router-dom';
import type { To } from 'react-router-dom';
import { Icon } from './Icon.tsx';

interface Props {
  /** 1 is the first page. */
  readonly page: number;
  readonly pageSize: number;
  readonly total: number;
  readonly toPage: (page: number) => To;
  /** What is counted: "notes". */
  readonly what: string;
}

/** Where one is in a long list, and the way on and back. */
export function Pager({ page, pageSize, total, toPage, what }: Props) {
  const pages = Math.max(1, Math.ceil(total / pageSize));
  if (pages === 1) return null;
  const first = (page - 1) * pageSize + 1;
  const link =
    'inline-flex min-h-10 items-center gap-2 px-1 text-verdigris underline underline-offset-4 touch:min-h-11';
  return (
    <nav
      aria-label={`Pages of ${what}`}
      className="flex flex-wrap items-center justify-between gap-x-6 gap-y-1 border-t-2 border-soot pt-2 text-small"
    >
      <span className="order-2 min-w-20 sm:order-1">
        {page > 1 && (
          <Link to={toPage(page - 1)} rel="prev" className={link}>
            <Icon name="back" className="size-3.5" />
            Back
          </Link>
        )}
      </span>
      <span className="order-1 w-full text-soot-2 sm:order-2 sm:w-auto">
        <span className="reading">
          {first}–{Math.min(total, page * pageSize)}
        </span>{' '}
        of <span className="reading">{total}</span> {what}
      </span>
      <span className="order-3 min-w-20 text-right">
        {page < pages && (
          <Link to={toPage(page + 1)} rel="next" className={link}>
            On
            <Icon name="on" className="size-3.5" />
          </Link>
        )}
      </span>
    </nav>
  );
}
