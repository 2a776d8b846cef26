import type { MouseEvent, ReactNode, Ref } from 'react';
import { buttonLook } from './button-look.ts';
import type { ButtonKind } from './button-look.ts';
import { Icon } from './Icon.tsx';
import type { IconName } from './Icon.tsx';
import { SpyholeMark } from './SpyholeMark.tsx';

interface Props {
  readonly children: ReactNode;
  readonly kind?: ButtonKind;
  readonly type?: 'button' | 'submit';
  readonly onClick?: (event: MouseEvent<HTMLButtonElement>) => void;
  readonly icon?: IconName;
  /** Its work is under way: it keeps its place and its focus, and does nothing when pressed. */
  readonly busy?: boolean;
  readonly disabled?: boolean;
  /** Says why it is disabled, or adds to the visible words. */
  readonly describedBy?: string;
  /** For a button whose visible words do not tell it from its neighbours. Starts with those words. */
  readonly label?: string;
  readonly expanded?: boolean;
  readonly controls?: string;
  readonly ref?: Ref<HTMLButtonElement>;
}

/**
 * Disabled and busy buttons stay in the tab order (`aria-disabled`), so that nobody's focus is lost
 * and the reason can be read. A danger button always carries an icon.
 */
export function Button({ ref, ...props }: Props) {
  const { kind = 'plain', type = 'button', busy = false, disabled = false } = props;
  const idle = busy || disabled;
  const icon = props.icon ?? (kind === 'danger' ? 'must-mend' : undefined);
  return (
    <button
      ref={ref}
      type={type}
      className={buttonLook(kind)}
      aria-disabled={idle || undefined}
      aria-busy={busy || undefined}
      aria-describedby={props.describedBy}
      aria-label={props.label}
      aria-expanded={props.expanded}
      aria-controls={props.controls}
      onClick={(event) => {
        if (idle) event.preventDefault();
        else props.onClick?.(event);
      }}
    >
      {busy ? (
        <SpyholeMark busy plain={kind === 'main'} className="-ml-1 size-5" />
      ) : (
        icon && <Icon name={icon} />
      )}
      {props.children}
    </button>
  );
}
