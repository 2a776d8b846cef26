import type { ReactNode } from 'react';
import { Icon } from './Icon.tsx';
import type { IconName } from './Icon.tsx';

export type NoticeKind = 'info' | 'done' | 'caution' | 'error';

const ICONS: Readonly<Record<NoticeKind, IconName>> = {
  info: 'info',
  done: 'done',
  caution: 'look-again',
  error: 'must-mend',
};
const LOOKS: Readonly<Record<NoticeKind, string>> = {
  info: 'border-soot-2 text-soot',
  done: 'border-verdigris text-soot [&>svg]:text-verdigris',
  caution: 'border-dashed border-caution text-soot [&>svg]:text-caution',
  error: 'border-y-2 border-caution text-soot [&>svg]:text-caution',
};

interface Props {
  readonly kind: NoticeKind;
  readonly heading?: string;
  readonly children: ReactNode;
  /** Buttons or links: retry, undo, where to go. */
  readonly action?: ReactNode;
  /** Appeared after the page: spoken at once for errors, politely for the rest. */
  readonly appeared?: boolean;
}

/** A sentence the page has to say, between two rules. */
export function Notice({ kind, heading, children, action, appeared = false }: Props) {
  return (
    <div
      role={appeared ? (kind === 'error' ? 'alert' : 'status') : undefined}
      className={`flex gap-3 border-y py-3 ${LOOKS[kind]}`}
    >
      <Icon name={ICONS[kind]} className="mt-1 size-5" />
      <div className="min-w-0 grow space-y-1">
        {heading && <p className="font-[650]">{heading}</p>}
        <div className="max-w-measure text-small">{children}</div>
        {action && <div className="flex flex-wrap gap-3 pt-1.5">{action}</div>}
      </div>
    </div>
  );
}
