import { clearUnsent } from '../write/unsent-work.ts';

const PREFIX = 'spyhole-';
/** How bright the screen is says nothing about anybody, and an eye is used to it. */
const KEPT: ReadonlySet<string> = new Set(['spyhole-theme']);

/** Everything this site keeps in this browser goes, except the theme. */
export function clearBrowserStorage(): void {
  clearUnsent();
  for (const open of [() => localStorage, () => sessionStorage]) {
    try {
      const storage = open();
      for (const key of Object.keys(storage)) {
        if (key.startsWith(PREFIX) && !KEPT.has(key)) storage.removeItem(key);
      }
    } catch {
      // Storage is shut: nothing was kept.
    }
  }
}
