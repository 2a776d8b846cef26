import type { MouseEvent } from 'react';
import { Icon } from './Icon.tsx';
import type { IconName } from './Icon.tsx';

interface Props {
  readonly icon: IconName;
  /** What it does and to what: "Remove piece 2". Also its tooltip. */
  readonly label: string;
  readonly onClick: (event: MouseEvent<HTMLButtonElement>) => void;
  readonly disabled?: boolean;
}

/** A square button of one sign, for repeated actions in a row. */
export function IconButton({ icon, label, onClick, disabled = false }: Props) {
  return (
    <button
      type="button"
      aria-label={label}
      title={label}
      aria-disabled={disabled || undefined}
      onClick={(event) => {
        if (!disabled) onClick(event);
      }}
      className="inline-flex size-8 items-center justify-center text-soot-2 hover:bg-verdigris-tint hover:text-verdigris-ink touch:size-11 aria-disabled:cursor-not-allowed aria-disabled:opacity-40"
    >
      <Icon name={icon} />
    </button>
  );
}
