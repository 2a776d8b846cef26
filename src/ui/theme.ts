/** `system` follows the device; the other two override it. */
export type ThemeChoice = 'system' | 'day' | 'dusk';

const STORAGE_KEY = 'spyhole-theme';

/** What this browser chose earlier. Storage may be shut (private windows): then the system's. */
export function storedThemeChoice(): ThemeChoice {
  try {
    const stored = localStorage.getItem(STORAGE_KEY);
    return stored === 'day' || stored === 'dusk' ? stored : 'system';
  } catch {
    return 'system';
  }
}

/** Shows a theme without remembering it. */
export function applyThemeChoice(choice: ThemeChoice): void {
  if (choice === 'system') delete document.documentElement.dataset['theme'];
  else document.documentElement.dataset['theme'] = choice;
}

/** Shows a theme and remembers it in this browser, where storage allows. */
export function rememberThemeChoice(choice: ThemeChoice): void {
  applyThemeChoice(choice);
  try {
    if (choice === 'system') localStorage.removeItem(STORAGE_KEY);
    else localStorage.setItem(STORAGE_KEY, choice);
  } catch {
    // The theme holds for this page; there is nowhere to keep it.
  }
}
