/**
 * Parts the facts of a row. It hangs on the fact before it, so that a wrapped line never begins
 * with it.
 */
export const FACT_SEPARATOR = '\u00a0· ';
