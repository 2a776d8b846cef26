/** How long a note has waited: "waiting 3 h", from the moments it was handed in and is looked at. */
export function waitingWords(handedInAt: string, now: Date): string {
  const minutes = Math.max(0, Math.floor((now.getTime() - Date.parse(handedInAt)) / 60_000));
  if (minutes < 1) return 'waiting less than a minute';
  if (minutes < 60) return `waiting ${String(minutes)}\u00a0min`;
  const hours = Math.floor(minutes / 60);
  if (hours < 48) return `waiting ${String(hours)}\u00a0h`;
  return `waiting ${String(Math.floor(hours / 24))} days`;
}

/** A time of day in the reader's own time zone: "15:20". */
export function clockWords(iso: string): string {
  return new Intl.DateTimeFormat('en-GB', { timeStyle: 'short' }).format(new Date(iso));
}

/** What was decided before, as people say it. */
export function actWords(act: string): string {
  return act.replace(/-/g, ' ');
}
