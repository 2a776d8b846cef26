import { useCallback, useEffect, useRef, useState } from 'react';
import type { ReactNode } from 'react';
import { Button } from './Button.tsx';
import { Icon } from './Icon.tsx';
import { IconButton } from './IconButton.tsx';
import { MessagesContext } from './messages-context.ts';
import type { Message } from './messages-context.ts';

/** Good news without an action leaves by itself; the rest stays until it is closed (WCAG 2.2.1). */
const GOOD_NEWS_MS = 9000;
const MOST_SHOWN = 4;

interface Shown extends Message {
  readonly id: number;
}

/** How work went, at the foot of the page, above dialogs, spoken politely. */
export function MessagesProvider({ children }: { readonly children: ReactNode }) {
  const [shown, setShown] = useState<readonly Shown[]>([]);
  const nextId = useRef(1);
  const region = useRef<HTMLDivElement>(null);

  const close = useCallback(
    (id: number) => setShown((before) => before.filter((message) => message.id !== id)),
    [],
  );
  const tell = useCallback(
    (message: Message) => {
      const id = nextId.current;
      nextId.current += 1;
      setShown((before) => [...before, { ...message, id }].slice(-MOST_SHOWN));
      if (message.kind === 'done' && !message.action) setTimeout(() => close(id), GOOD_NEWS_MS);
    },
    [close],
  );

  // The top layer: shown anew with each message, so that it stands above a dialog opened since.
  useEffect(() => {
    const element = region.current;
    if (!element || typeof element.showPopover !== 'function') return;
    if (element.matches(':popover-open')) element.hidePopover();
    if (shown.length > 0) element.showPopover();
  }, [shown]);

  return (
    <MessagesContext value={tell}>
      {children}
      <div
        ref={region}
        popover="manual"
        role="status"
        aria-live="polite"
        aria-relevant="additions"
        className="not-in-print fixed inset-auto bottom-3 left-3 m-0 w-[min(30rem,calc(100vw-1.5rem))] bg-transparent p-0 text-soot"
      >
        <ul className="space-y-2">
          {shown.map((message) => (
            <li
              key={message.id}
              className={`flex items-start gap-3 border bg-ash-2 py-1.5 pl-3 pr-1 ${message.kind === 'error' ? 'border-2 border-caution' : 'border-soot'}`}
            >
              <Icon
                name={message.kind === 'error' ? 'must-mend' : message.kind}
                className={`mt-2 size-4.5 ${message.kind === 'error' ? 'text-caution' : 'text-verdigris'}`}
              />
              <span className="grow py-1 text-small">{message.text}</span>
              {message.action && (
                <Button
                  kind="quiet"
                  onClick={() => {
                    message.action?.onClick();
                    close(message.id);
                  }}
                >
                  {message.action.label}
                </Button>
              )}
              <IconButton
                icon="close"
                label={`Close: ${message.text}`}
                onClick={() => close(message.id)}
              />
            </li>
          ))}
        </ul>
      </div>
    </MessagesContext>
  );
}
