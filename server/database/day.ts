/** The day of a DATE column (which arrives as midnight UTC), as `YYYY-MM-DD`. */
export function dayOf(value: Date): string {
  return value.toISOString().slice(0, 10);
}

/** The same for a column that may be NULL. */
export function dayOrNull(value: Date | null): string | null {
  return value === null ? null : dayOf(value);
}
