/** Words and marks that follow a number and say what it counts. */
export const DEGREE_WORDS: ReadonlySet<string> = new Set(['°', 'deg', 'degs', 'degree', 'degrees']);
export const TEMPERATURE_UNITS: Readonly<Record<string, 'C' | 'F' | 'K'>> = {
  c: 'C',
  celsius: 'C',
  centigrade: 'C',
  f: 'F',
  fahrenheit: 'F',
  k: 'K',
  kelvin: 'K',
};
/** Kelvin is read only where a kiln can be, so that brick and probe names stay names. */
export const KELVIN_RANGE = { min: 600, max: 1450 } as const;
/** After "K" these make it a probe's name: "1000 K type thermocouple". */
export const PROBE_NAME_WORDS: ReadonlySet<string> = new Set(['type', 'thermocouple', 'probe']);

export const MINUTE_WORDS: ReadonlySet<string> = new Set(['min', 'mins', 'minute', 'minutes']);
export const HOUR_WORDS: ReadonlySet<string> = new Set(['h', 'hr', 'hrs', 'hour', 'hours']);

/** Centimetres in one of the unit. An inch is 2.54 cm exactly (NIST SP 811, Appendix B). */
export const SIZE_UNITS: Readonly<Record<string, number>> = {
  cm: 1,
  cms: 1,
  centimetre: 1,
  centimetres: 1,
  centimeter: 1,
  centimeters: 1,
  mm: 0.1,
  mms: 0.1,
  millimetre: 0.1,
  millimetres: 0.1,
  millimeter: 0.1,
  millimeters: 0.1,
  inch: 2.54,
  inches: 2.54,
  ins: 2.54,
  in: 2.54,
  '"': 2.54,
  ft: 30.48,
  foot: 30.48,
  feet: 30.48,
  "'": 30.48,
};
/** Larger numbers before an inch or foot mark are the end of a quotation. */
export const MAX_INCHES = 60;
export const MAX_FEET = 6;

/** Units of things that are neither heat, time nor the size of a piece. */
export const OTHER_UNITS: ReadonlySet<string> = new Set(
  (
    'bar bars mbar millibar psi kpa kg kgs kilo kilos g gm grams gram % percent litre litres ' +
    'liter liters l ltr ltrs lb lbs pound pounds oz ounce ounces ml kw btu watt watts v volts ' +
    'amps sec secs second seconds s day days week weeks month months year years pm am oclock ' +
    'gallon gallons st nd rd th euro euros dollar dollars quid £ $ € mesh m metre metres meter ' +
    'meters coat coats layer layers times percentage cubic cfm'
  ).split(' '),
);
export const CURRENCY: ReadonlySet<string> = new Set(['£', '$', '€']);
export const MONTHS: ReadonlySet<string> = new Set(
  (
    'january february march april may june july august september october november december jan ' +
    'feb mar apr jun jul aug sep sept oct nov dec'
  ).split(' '),
);

/** After "N degrees": the number compares two places. */
export const DIFFERENCE_WORDS: ReadonlySet<string> = new Set(
  (
    'hotter cooler colder warmer apart difference different lower higher behind ahead between ' +
    'spread gap variation'
  ).split(' '),
);
/** After "N degrees": the number says how far a meter or a firing was out; it is no temperature. */
export const OFFSET_WORDS: ReadonlySet<string> = new Set(
  'low high off out wrong short over under too of more less further'.split(' '),
);
/** Before "N degrees": the number is a step, "dropped 50 degrees", "by 60 degrees". */
export const STEP_VERBS: ReadonlySet<string> = new Set(
  (
    'by drop drops dropped dropping slid slide slides sliding slipping dips dipped sank sinks dip ' +
    'fall falls fell falling lose loses lost losing gain gains ' +
    'gained gaining rise rises rose rising jump jumps jumped climb climbs climbed climbing ' +
    'within another extra slipped slips overshot overshoot last'
  ).split(' '),
);
/** Steps and differences are smaller than this; from here on it is a temperature. */
export const MAX_STEP_DEGREES = 300;

/** After a size these say it is the size of something that is not the piece. */
export const NOT_THE_PIECE: ReadonlySet<string> = new Set(
  (
    'jet burner port flue blanket fibre board gap setback thick wall walls from away shelf brick ' +
    'bricks posts props kiln base lining insulation deep nozzle orifice tube pipe hole probe ' +
    'thermocouple bin thickness sawdust'
  ).split(' '),
);
