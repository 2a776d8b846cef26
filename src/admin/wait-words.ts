/** How long something has waited, in the largest unit that tells it: "40 s", "12 min", "3 h". */
export function waitWords(seconds: number): string {
  const NO_BREAK_SPACE = '\u00a0';
  if (seconds < 90) return `${String(Math.max(0, Math.round(seconds)))}${NO_BREAK_SPACE}s`;
  if (seconds < 90 * 60) return `${String(Math.round(seconds / 60))}${NO_BREAK_SPACE}min`;
  return `${String(Math.round(seconds / 3600))}${NO_BREAK_SPACE}h`;
}
