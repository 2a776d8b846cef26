/** The columns of a list of shares: words, rule, figures. */
export const SHARE_COLUMNS =
  'sm:grid-cols-[minmax(9rem,2fr)_minmax(12rem,4fr)_minmax(12.5rem,2fr)]';
