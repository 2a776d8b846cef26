import { useEffect, type RefObject } from 'react';
import { useSession } from '../accounts/useSession.ts';

/** True where a letter belongs to what is being typed. */
function isTyping(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement &&
    (target.isContentEditable || target.closest('input, textarea, select, dialog') !== null)
  );
}

/**
 * "/" goes to the question field. Never while typing, and not at all for members who switched
 * single keys off (WCAG 2.1.4).
 */
export function useSlashKey(field: RefObject<HTMLInputElement | null>): void {
  const { singleKeys } = useSession().settings;
  useEffect(() => {
    if (!singleKeys) return;
    const onKeyDown = (event: KeyboardEvent): void => {
      const withOthers = event.ctrlKey || event.metaKey || event.altKey;
      if (event.key !== '/' || withOthers || event.defaultPrevented || isTyping(event.target)) {
        return;
      }
      event.preventDefault();
      field.current?.focus();
      field.current?.select();
    };
    document.addEventListener('keydown', onKeyDown);
    return () => document.removeEventListener('keydown', onKeyDown);
  }, [field, singleKeys]);
}
