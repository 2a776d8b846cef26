import { useEffect, useId, useRef } from 'react';
import type { ReactNode } from 'react';
import { IconButton } from './IconButton.tsx';

interface Props {
  readonly open: boolean;
  /** Escape, the close button, or the way back. */
  readonly onClose: () => void;
  readonly title: string;
  readonly children: ReactNode;
  /** Buttons, the main one first. */
  readonly actions?: ReactNode;
}

/** The browser's own dialog: it holds the focus, closes on Escape and gives the focus back. */
export function Dialog({ open, onClose, title, children, actions }: Props) {
  const ref = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  useEffect(() => {
    const dialog = ref.current;
    if (!dialog || dialog.open === open) return;
    if (open) dialog.showModal();
    else dialog.close();
  }, [open]);
  return (
    <dialog
      ref={ref}
      aria-labelledby={titleId}
      onClose={onClose}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      className="m-auto w-[min(36rem,calc(100vw-2rem))] border-2 border-soot bg-ash p-0 text-soot backdrop:bg-[#0c0f10]/70"
    >
      {open && (
        <div className="p-5 sm:p-7">
          <div className="flex items-start justify-between gap-4 border-b border-line pb-3">
            <h2 id={titleId} className="text-section">
              {title}
            </h2>
            <IconButton icon="close" label="Close" onClick={onClose} />
          </div>
          <div className="space-y-3 py-4">{children}</div>
          {actions && <div className="flex flex-wrap gap-3 pt-1">{actions}</div>}
        </div>
      )}
    </dialog>
  );
}
