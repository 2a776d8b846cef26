/** What a member has chosen to read: degrees C or F, metric or imperial. Nothing is stored in it. */
export interface Units {
  readonly temperature: 'C' | 'F';
  readonly system: 'metric' | 'imperial';
}

/** °C and metric: what a visitor sees. */
export const METRIC_UNITS: Units = { temperature: 'C', system: 'metric' };

/** °F and imperial. */
export const IMPERIAL_UNITS: Units = { temperature: 'F', system: 'imperial' };

/** No-break space, so that a number and its unit are never parted at a line's end. */
export const NO_BREAK_SPACE = '\u00A0';
