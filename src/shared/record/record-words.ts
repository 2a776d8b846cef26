import type { TemperatureUnit } from './parse-number.ts';
import type { TimeUnit } from './parse-time.ts';

/**
 * The words of loggers' files, in one place: English, with what is common in German, French, Spanish,
 * Italian and Dutch files. Lower case; a name is cut into words at everything but letters and digits.
 * From memory and common practice: there is no published list.
 */

/** What a word of a column's name says of the column. */
export type WordMeaning =
  | 'time'
  | 'date'
  | 'counter'
  | 'temperature'
  | 'kiln'
  | 'set-point'
  | 'reference'
  | 'statistic'
  | 'average'
  | 'change'
  | 'quantity';

const MEANINGS: Readonly<Record<WordMeaning, string>> = {
  time: `time elapsed timestamp datetime clock hour hours hr hrs minute minutes mins seconds secs sec
    zeit uhrzeit zeitpunkt zeitstempel laufzeit dauer stunde stunden minuten sekunden heure temps duree
    durée tiempo hora tempo ora tijd uur duration runtime unix epoch utc`,
  date: 'date datum day tag jour fecha dia giorno dag',
  counter: `index idx no nr num number nummer record rec sample samples row zeile line count counter id
    messung lfd serial entry n scan punkt point seq`,
  temperature: `temperature temperatures temp temps temperatur température temperatura temperatuur
    tmp tc thermocouple thermoelement termopar termocoppia pyrometer probe sonde sensor fühler fuehler
    pv ist istwert celsius fahrenheit kelvin degc degf degk channel ch kanal canal input thermo actual
    measured gemessen mesure mesurée flue stack exhaust chimney burner`,
  kiln: `kiln chamber ware oven furnace ofen brennofen brennraum kammer four horno forno muffle
    firing raku pot top bottom middle centre center upper lower oben unten mitte haut bas shelf arch crown`,
  'set-point': `setpoint setpoints setp set sp sv target soll sollwert consigne consigna programme
    program programmed profile goal desired demand setting curve planned wanted aim stell zielwert
    setwert vorgabe`,
  reference: `ambient room junction cj cjc cold internal int reference ref board device logger case
    environment environmental umgebung umgebungstemperatur raum raumtemperatur raumtemp vergleichsstelle
    outside outdoor aussen außen ambiante ambiance ambiente air dew chip housing body shed studio
    enclosure electronics cpu weather`,
  average: 'avg average mean mittel mittelwert moyenne media promedio',
  statistic: `max maximum mini minimum min std stdev sd peak highest lowest alarm limit threshold median sum total error err deviation
    uncertainty tolerance offset correction calibration`,
  change: 'rate ramp slope gradient delta diff difference derivative change dt rise climb speed',
  quantity: `mass weight load masse gewicht poids hrr heat power output humidity rh pressure druck
    pression flow voltage volt volts mv millivolt emf battery batt bat akku current amps amp ampere watt
    watts kw energy kwh event events status state relay door fan valve gas propane butane oxygen o2 co co2
    carbon lambda light lux level note notes comment comments remark remarks flag alarm1 mode segment
    seg step stage phase duty percent pct signal rssi snr leistung feuchte luftfeuchte feuchtigkeit
    humidité humedad humidad strom spannung quality firmware latitude longitude altitude angle
    distance volume noise ph cone heatwork`,
};

const MEANING_OF = new Map<string, WordMeaning>();
for (const meaning of Object.keys(MEANINGS) as WordMeaning[]) {
  for (const word of MEANINGS[meaning].split(/\s+/)) {
    if (!MEANING_OF.has(word)) MEANING_OF.set(word, meaning);
  }
}

/** What a word of a name means; words with a number behind count as the word ("tc2", "ch1"). */
export function meaningOfWord(word: string): WordMeaning | null {
  const own = MEANING_OF.get(word);
  if (own !== undefined) return own;
  let end = word.length;
  while (end > 0 && word.charCodeAt(end - 1) >= 48 && word.charCodeAt(end - 1) <= 57) end -= 1;
  if (end === word.length || end === 0) return null;
  const stem = word.slice(0, end);
  if (stem === 't') return 'temperature';
  const meaning = MEANING_OF.get(stem) ?? null;
  return meaning === 'time' || meaning === 'date' ? null : meaning;
}

const TIME_UNIT_WORDS: Readonly<Record<TimeUnit, string>> = {
  milliseconds: 'ms msec msecs millis millisecond milliseconds',
  seconds: 's sec secs second seconds sek sekunde sekunden seconde secondes segundos secondi',
  minutes: 'm min mins minute minutes minuten minutos minuti',
  hours: 'h hr hrs hour hours std stunde stunden heures horas ore uur',
  days: 'd day days tage jours dias giorni',
};
const TIME_UNIT_OF = new Map<string, TimeUnit>();
for (const unit of Object.keys(TIME_UNIT_WORDS) as TimeUnit[]) {
  for (const word of TIME_UNIT_WORDS[unit].split(' ')) TIME_UNIT_OF.set(word, unit);
}

/** The time unit a word stands for; null for none. */
export function timeUnit(word: string): TimeUnit | null {
  return TIME_UNIT_OF.get(word.toLowerCase()) ?? null;
}

const TEMPERATURE_UNIT_OF = new Map<string, TemperatureUnit>();
for (const [unit, words] of [
  [
    'C',
    'c degc celsius degreesc degreec degreescelsius degcelsius centigrade gradc grad gradcelsius',
  ],
  ['F', 'f degf fahrenheit degreesf degreef degreesfahrenheit degfahrenheit gradf gradfahrenheit'],
  ['K', 'k degk kelvin kelvins degreesk degreesk'],
] as const) {
  for (const word of words.split(' ')) TEMPERATURE_UNIT_OF.set(word, unit);
}

/**
 * Signs a degree is written with, or turns into when a file was read as what it is not: °, º, ˚, the
 * replacement character, "Â" of UTF-8 read as Latin-1, "¡" of an old Macintosh, "ø" of DOS.
 */
const DEGREE_LIKE = '°º˚\ufffdÂâ¡ø*';

/** The temperature unit a few letters stand for ("°C", "[K]", "degF"); null for none. */
export function temperatureUnit(text: string): TemperatureUnit | null {
  if (text.length > 24) return null;
  let word = '';
  for (const char of text) {
    if (char === '\u2103') word += 'c';
    else if (char === '\u2109') word += 'f';
    else if (!DEGREE_LIKE.includes(char) && !'[](). _{}'.includes(char)) word += char.toLowerCase();
  }
  return TEMPERATURE_UNIT_OF.get(word) ?? null;
}

/** Whether a sign is one that degrees are written with. */
export function isDegreeSign(char: string): boolean {
  return '°º˚\ufffd'.includes(char);
}

/** Units of what is no temperature and no time; their column is no probe. */
const OTHER_UNITS = new Set(
  `% g kg mg lb lbs oz w kw kw/m2 mw mv v a ma ohm pa kpa hpa mbar bar psi ppm %rh rh l/min m/s rpm hz
  kwh wh j kj °c/h °c/min °f/h °f/min k/min k/h c/h c/min f/h f/min °c/hr °f/hr ° db lux`.split(
    /\s+/,
  ),
);

/** Whether a word is the unit of some other quantity ("%", "kW", "°C/h"). */
export function isOtherUnit(text: string): boolean {
  return OTHER_UNITS.has(text.toLowerCase().trim());
}

/** What a logger writes instead of a temperature when its probe is open, torn or out of range. */
const FAULT_WORDS = new Set(
  `open opn oc ol o.l ovl over overload overrange over-range under underrange under-range fault fail
  failed err error nan null none n/a na n.a. #n/a #value! #num! #div/0! inf infinity +inf -inf - -- ---
  ---- ----- ------ . .. ... … * ** *** **** ? ?? ??? ???? invalid missing nc n.c. disconnected unplugged
  break burnout burn-out sensor-break lost nosensor notc no-tc offline void bad x xxx xxxx hi lo hhh hhhh
  lll llll ur or fehler kein offen`.split(/\s+/),
);

/** Whether a cell says that no temperature could be measured ("OPEN", "----", "NaN", "Err 2"). */
export function isFaultWord(cell: string): boolean {
  if (cell.length > 24) return false;
  const word = cell.toLowerCase().trim();
  if (FAULT_WORDS.has(word)) return true;
  const first = word.split(/[\s:_]/, 1)[0] ?? '';
  return first.length > 1 && FAULT_WORDS.has(first);
}

/**
 * Numbers written for a probe that is not connected, and not otherwise reached in one step: zero, the
 * ends of type K (-200, -270, 1370, 1372 °C; 2498, 2501.6, 2502 °F), of 10 to 16 bits, rows of nines. From memory of common converters; counted as such only where the reading leaps to them.
 */
export const FAULT_NUMBERS: ReadonlySet<number> = new Set([
  0, -1, 1023.75, 1024, 1370, 1371, 1372, 1372.1, 2048, 2047.75, 2498, 2500, 2501, 2501.6, 2502,
  -200, -210, -250, -270, -273, -273.15, -328, -346, -454, -459.67, -460, -99, -99.9, -100, -999,
  -999.9, -9999, 999, 999.9, 9999, 9999.9, 99999, -99999, 3276.7, 3276.8, -3276.8, 32767, 32768,
  -32768, 6553.5, 65535, 6999, 7999, 8888, 1e6, -1e6,
]);

const MONTHS: readonly string[] = [
  'jan january janvier janv januar jän jänner enero ene gennaio gen januari',
  'feb february februar février fev fév févr febrero febbraio februari febr',
  'mar march märz mär mars marzo maart mrz mrt',
  'apr april avril avr abril abr aprile',
  'may mai mayo maggio mag mei',
  'jun june juni juin junio giugno giu',
  'jul july juli juillet juil julio luglio lug',
  'aug august août aout agosto ago augustus',
  'sep sept september septembre septiembre settembre set',
  'oct october okt oktober octobre octubre ottobre ott',
  'nov november novembre noviembre',
  'dec december dez dezember décembre déc diciembre dic dicembre',
];
const MONTH_OF = new Map<string, number>();
MONTHS.forEach((words, index) => {
  for (const word of words.split(' ')) MONTH_OF.set(word, index + 1);
});

/** The month of a name, 1 to 12; null for none. */
export function monthOfName(word: string): number | null {
  return MONTH_OF.get(word) ?? null;
}

/** Minutes a named zone is ahead of UTC: those that change within a night, and UTC itself. */
export const ZONE_MINUTES: ReadonlyMap<string, number> = new Map([
  ['utc', 0],
  ['gmt', 0],
  ['wet', 0],
  ['bst', 60],
  ['west', 60],
  ['cet', 60],
  ['mez', 60],
  ['cest', 120],
  ['mesz', 120],
  ['eet', 120],
  ['eest', 180],
  ['est', -300],
  ['edt', -240],
  ['cst', -360],
  ['cdt', -300],
  ['mst', -420],
  ['mdt', -360],
  ['pst', -480],
  ['pdt', -420],
]);
