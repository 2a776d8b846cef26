const STEP = 1024;
const UNITS = ['bytes', 'kiB', 'MiB', 'GiB'] as const;

/**
 * A file's size as it is shown: binary units, at most one decimal, rounded up, so that a file just
 * over a limit is never shown as exactly the limit.
 */
export function formatFileSize(bytes: number): string {
  let unit = 0;
  let size = Math.max(0, Math.ceil(bytes));
  while (size >= STEP && unit < UNITS.length - 1) {
    size /= STEP;
    unit += 1;
  }
  const shown = unit === 0 ? size : Math.ceil(Math.round(size * 1e6) / 1e5) / 10;
  return `${String(shown)} ${UNITS[unit] ?? 'bytes'}`;
}
