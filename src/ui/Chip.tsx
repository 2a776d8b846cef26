import type { ReactNode } from 'react';
import { Icon } from './Icon.tsx';

interface Props {
  readonly children: ReactNode;
  /** Opens the part for editing. */
  readonly onEdit?: () => void;
  readonly onRemove?: () => void;
  /** "Remove near 700 °C". */
  readonly removeLabel?: string;
}

/** A part of a question or a filter in force: editable, removable. */
export function Chip({ children, onEdit, onRemove, removeLabel }: Props) {
  const words = 'px-2.5 py-1';
  return (
    <span className="inline-flex min-h-8 items-stretch bg-verdigris-tint text-small text-verdigris-ink touch:min-h-11 forced-colors:border">
      {onEdit ? (
        <button
          type="button"
          onClick={onEdit}
          title="Change"
          className={`${words} underline decoration-dotted underline-offset-4 hover:decoration-solid`}
        >
          {children}
        </button>
      ) : (
        <span className={`${words} inline-flex items-center`}>{children}</span>
      )}
      {onRemove && (
        <button
          type="button"
          onClick={onRemove}
          aria-label={removeLabel ?? 'Remove'}
          className="inline-flex min-w-7 items-center justify-center border-l border-ash px-1.5 hover:bg-verdigris hover:text-on-verdigris touch:min-w-11"
        >
          <Icon name="close" className="size-3" />
        </button>
      )}
    </span>
  );
}
