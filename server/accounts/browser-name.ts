const BROWSERS: readonly (readonly [RegExp, string])[] = [
  [/\bEdg/, 'Edge'],
  [/\bOPR\//, 'Opera'],
  [/\bSamsungBrowser\//, 'Samsung Internet'],
  [/\b(Firefox|FxiOS)\//, 'Firefox'],
  [/\b(Chrome|CriOS|Chromium)\//, 'Chrome'],
  [/\bSafari\//, 'Safari'],
];
const SYSTEMS: readonly (readonly [RegExp, string])[] = [
  [/\bAndroid\b/, 'Android'],
  [/\biPhone\b/, 'iPhone'],
  [/\biPad\b/, 'iPad'],
  [/\bWindows\b/, 'Windows'],
  [/\bMac OS X\b/, 'macOS'],
  [/\bCrOS\b/, 'ChromeOS'],
  [/\bLinux\b/, 'Linux'],
];

const nameIn = (list: typeof BROWSERS, userAgent: string): string | undefined =>
  list.find(([pattern]) => pattern.test(userAgent))?.[1];

/**
 * "Firefox on Linux": enough for members to tell their sessions apart. Made of our own words only,
 * so nothing a client sends is shown.
 */
export function browserName(userAgent: string | undefined): string {
  const browser = nameIn(BROWSERS, userAgent ?? '') ?? 'A browser';
  const system = nameIn(SYSTEMS, userAgent ?? '');
  return system === undefined ? browser : `${browser} on ${system}`;
}
