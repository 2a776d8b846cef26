import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { To } from 'react-router-dom';
import { buttonLook } from './button-look.ts';
import type { ButtonKind } from './button-look.ts';
import { Icon } from './Icon.tsx';
import type { IconName } from './Icon.tsx';

interface Props {
  readonly to: To;
  readonly children: ReactNode;
  readonly kind?: Exclude<ButtonKind, 'danger'>;
  readonly icon?: IconName;
}

/** A link that stands where a button would: it goes somewhere, it does nothing. */
export function LinkButton({ to, children, kind = 'plain', icon }: Props) {
  return (
    <Link to={to} className={buttonLook(kind)}>
      {icon && <Icon name={icon} />}
      {children}
    </Link>
  );
}
