import { useEffect, useRef } from 'react';
import { useBlocker } from 'react-router-dom';
import { Button } from '../ui/Button.tsx';
import { Dialog } from '../ui/Dialog.tsx';

/**
 * Asks before a form with unsaved work is left, by a link, by Back or by closing the tab.
 *
 * @returns the question, to be put on the page, and `release`, called when the work is saved
 */
export function useUnsavedGuard(isUnsaved: boolean) {
  const released = useRef(false);
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) =>
      isUnsaved && !released.current && currentLocation.pathname !== nextLocation.pathname,
  );
  useEffect(() => {
    if (!isUnsaved) return;
    const ask = (event: BeforeUnloadEvent): void => {
      if (!released.current) event.preventDefault();
    };
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [isUnsaved]);
  const question = (
    <Dialog
      open={blocker.state === 'blocked'}
      onClose={() => blocker.reset?.()}
      title="Leave without saving?"
      actions={
        <>
          <Button kind="main" onClick={() => blocker.reset?.()}>
            Stay here
          </Button>
          <Button kind="danger" onClick={() => blocker.proceed?.()}>
            Leave it
          </Button>
        </>
      }
    >
      <p>What you changed about this kiln is not saved yet.</p>
    </Dialog>
  );
  return {
    question,
    release: () => {
      released.current = true;
    },
  };
}
