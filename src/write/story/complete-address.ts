/** An address as it was typed, with the https:// or mailto: that people leave out. */
export function completeAddress(typed: string): string {
  const tidy = typed.trim();
  if (tidy === '' || /^[a-z][a-z0-9+.-]*:/i.test(tidy)) return tidy;
  if (/^[^\s@/]+@[^\s@/]+\.[^\s@/]+$/.test(tidy)) return `mailto:${tidy}`;
  return `https://${tidy.replace(/^\/+/, '')}`;
}
