import { describe, expect, test } from 'vitest';
import { readQuestion } from '#shared/question/read-question.ts';
import type { QuestionReading } from '#shared/question/reading-types.ts';

type Expected = Partial<Omit<QuestionReading, 'q' | 'parts' | 'words' | 'allWords'>>;

/** Fields not named must be absent; changes are compared only where they are named. */
const NOTHING: Expected = {
  trouble: [],
  notTrouble: [],
  tempC: null,
  toleranceC: null,
  tempMinC: null,
  tempMaxC: null,
  tempUnit: null,
  cone: null,
  minutes: null,
  minutesOp: null,
  ratePerMin: null,
  diffC: null,
  form: null,
  sizeCm: null,
  glaze: null,
  causes: [],
  fuel: null,
  clay: null,
};

/** Worked out by hand from the rules of reading; the trade's words are from memory. */
const QUESTIONS: readonly (readonly [question: string, expected: Expected])[] = [
  [
    'kiln sticks at about 680 and I have the gas full on',
    { trouble: ['stall'], tempC: 680, toleranceC: 35, tempUnit: 'guessed', causes: ['low-gas'] },
  ],
  [
    'my kiln refuses to climb beyond 690',
    { trouble: ['stall'], tempC: 690, toleranceC: 10, tempUnit: 'guessed' },
  ],
  [
    'why does my kiln plateau near 1300 fahrenheit',
    { trouble: ['stall'], tempC: 704, toleranceC: 35, tempUnit: 'F' },
  ],
  ['never got above 900 C', { trouble: ['stall'], tempC: 900, toleranceC: 20, tempUnit: 'C' }],
  [
    'levels off at 720 after 40 minutes',
    {
      trouble: ['stall'],
      tempC: 720,
      toleranceC: 10,
      tempUnit: 'guessed',
      minutes: 40,
      minutesOp: '=',
    },
  ],
  ["can't crack 700", { trouble: ['stall'], tempC: 700, toleranceC: 20, tempUnit: 'guessed' }],
  [
    'stuck around six eighty for twenty minutes',
    {
      trouble: ['stall'],
      tempC: 680,
      toleranceC: 35,
      tempUnit: 'guessed',
      minutes: 20,
      minutesOp: '=',
    },
  ],
  [
    'hung up at eight-fifty',
    { trouble: ['stall'], tempC: 850, toleranceC: 20, tempUnit: 'guessed' },
  ],
  ['tops out at 1500 F', { trouble: ['stall'], tempC: 816, toleranceC: 20, tempUnit: 'F' }],
  [
    'just under 700 it stops climbing',
    { trouble: ['stall'], tempMinC: 670, tempMaxC: 700, tempUnit: 'guessed' },
  ],
  [
    'stalled a bit past 700',
    { trouble: ['stall'], tempMinC: 700, tempMaxC: 730, tempUnit: 'guessed' },
  ],
  [
    'stalls between 1200F and 1300F',
    { trouble: ['stall'], tempMinC: 649, tempMaxC: 704, tempUnit: 'F' },
  ],
  ['650ish stall', { trouble: ['stall'], tempC: 650, toleranceC: 35, tempUnit: 'guessed' }],
  ['stuck at 650-700', { trouble: ['stall'], tempMinC: 650, tempMaxC: 700, tempUnit: 'guessed' }],
  ['stall above 800', { trouble: ['stall'], tempMinC: 800, tempUnit: 'guessed' }],
  [
    'aiming for 1000 but stalled at 700',
    { trouble: ['stall'], tempC: 700, toleranceC: 20, tempUnit: 'guessed' },
  ],
  ["can't get my kiln up to temperature", { trouble: ['stall'] }],
  [
    'fell from 760 to 700 when a gust came',
    {
      trouble: ['sag'],
      tempC: 760,
      toleranceC: 10,
      tempMinC: 700,
      tempMaxC: 760,
      tempUnit: 'guessed',
      causes: ['wind'],
    },
  ],
  ['dropped 50 degrees when it started raining', { trouble: ['sag'], causes: ['rain'] }],
  ['drops when I load pots', { trouble: ['sag'] }],
  [
    'it took an hour and a half to get to 1000',
    {
      trouble: ['slow-climb'],
      tempC: 1000,
      toleranceC: 20,
      tempUnit: 'guessed',
      minutes: 90,
      minutesOp: '>',
    },
  ],
  [
    '1h20 to reach 900',
    {
      trouble: ['slow-climb'],
      tempC: 900,
      toleranceC: 20,
      tempUnit: 'guessed',
      minutes: 80,
      minutesOp: '>',
    },
  ],
  ['not at heat after 2 hours', { trouble: ['slow-climb'], minutes: 120, minutesOp: '>' }],
  [
    'creeping up from 700 at 2 C a minute',
    { trouble: ['slow-climb'], tempMinC: 700, tempUnit: 'guessed', ratePerMin: 2 },
  ],
  ['5 F per minute', { trouble: ['slow-climb'], ratePerMin: 2.78 }],
  ['over-fired the copper matt', { trouble: ['overshoot'], glaze: 'copper-matt' }],
  [
    'ran away past 1000',
    { trouble: ['overshoot'], tempC: 1000, toleranceC: 20, tempUnit: 'guessed' },
  ],
  ['front of the kiln is 80 degrees hotter than the back', { trouble: ['uneven-heat'], diffC: 80 }],
  ['hot spots', { trouble: ['uneven-heat'] }],
  ['burner keeps going out in wind', { trouble: ['flame-out'], causes: ['wind'] }],
  ["burner won't stay lit", { trouble: ['flame-out'] }],
  ['flashback in burner', { trouble: ['burn-back'] }],
  [
    'ice on the propane bottle',
    { trouble: ['tank-chill'], causes: ['cold-bottle'], fuel: 'propane' },
  ],
  ['11 kg bottle freezing up', { trouble: ['tank-chill'], causes: ['cold-bottle'] }],
  [
    'my bottle cracked at the neck',
    { trouble: ['crack-after-draw', 'crack-in-firing'], form: 'bottle' },
  ],
  ['pyrometer reads 50 degrees low', { trouble: ['wrong-reading'], causes: ['probe'] }],
  ['two pyrometers 40 degrees apart', { trouble: ['wrong-reading'], diffC: 40, causes: ['probe'] }],
  [
    'platter split when quenched',
    { trouble: ['crack-after-draw'], form: 'plate', causes: ['quench'] },
  ],
  ['bowl cracked in the bin', { trouble: ['crack-after-draw'], form: 'bowl' }],
  ['chawan cracked on the way up', { trouble: ['crack-in-firing'], form: 'cup' }],
  [
    'vase blew up at 250 degrees',
    {
      form: 'pot',
      trouble: ['crack-in-firing'],
      tempC: 250,
      toleranceC: 20,
      tempUnit: 'guessed',
      causes: ['damp-clay'],
    },
  ],
  [
    'teabowl went bang at 180C',
    {
      trouble: ['crack-in-firing'],
      tempC: 180,
      toleranceC: 10,
      tempUnit: 'C',
      form: 'cup',
      causes: ['damp-clay'],
    },
  ],
  ['crazing on white glaze', { glaze: 'crackle' }],
  ['crackle or crack?', { trouble: ['crack-after-draw', 'crack-in-firing'], glaze: 'crackle' }],
  [
    'cone not down at 980',
    { trouble: ['dull-glaze'], tempC: 980, toleranceC: 10, tempUnit: 'guessed' },
  ],
  ['matt patches in clear glaze', { trouble: ['dull-glaze'], glaze: 'clear' }],
  ['body stayed white', { trouble: ['weak-reduction'] }],
  ['patchy black on naked raku', { trouble: ['weak-reduction'], glaze: 'slip-resist' }],
  ['horsehair lines faint', { trouble: ['weak-reduction'], glaze: 'horsehair' }],
  ['obvara too pale', { trouble: ['weak-reduction'], glaze: 'dipped' }],
  ['glaze pulled back from the edge leaving bare spots', { trouble: ['crawling'] }],
  ['pin holes white crackle', { trouble: ['blistering'], glaze: 'crackle' }],
  ["can't get the lid off the jar", { trouble: ['stuck-to-shelf'], form: 'pot' }],
  [
    'lid stuck after firing to 1000',
    { trouble: ['stuck-to-shelf'], tempC: 1000, toleranceC: 20, tempUnit: 'guessed' },
  ],
  ['dropped a hot bowl', { trouble: ['broken-in-handling'], form: 'bowl' }],
  ['knob broke off lid', { trouble: ['broken-in-handling'] }],
  ['market stall', {}],
  ['stall at the craft fair', {}],
  ['shelf sags in the middle', {}],
  ['K26 brick or fibre', {}],
  ['type K thermocouple', { causes: ['probe'] }],
  [
    'no cracks but glaze dull',
    { trouble: ['dull-glaze'], notTrouble: ['crack-after-draw', 'crack-in-firing'] },
  ],
  ["it didn't stall, it fell back", { trouble: ['sag'], notTrouble: ['stall'] }],
  [
    'no pinholes or blisters just pale',
    { trouble: ['weak-reduction'], notTrouble: ['blistering'] },
  ],
  ['slow rather than stalled', { trouble: ['slow-climb'], notTrouble: ['stall'] }],
  ['not sure why it cracked', { trouble: ['crack-after-draw', 'crack-in-firing'] }],
  ['stalled with no wind', { trouble: ['stall'] }],
  [
    'how to stop plates cracking',
    { trouble: ['crack-after-draw', 'crack-in-firing'], form: 'plate' },
  ],
  ['does a bigger burner help a stall', { trouble: ['stall'], changes: ['burner-bigger'] }],
  [
    'would sealing the lid stop it stalling at 720',
    {
      trouble: ['stall'],
      tempC: 720,
      toleranceC: 10,
      tempUnit: 'guessed',
      changes: ['leaks-sealed'],
    },
  ],
  [
    '14 inch charger dunting',
    { trouble: ['crack-after-draw', 'crack-in-firing'], form: 'plate', sizeCm: 36 },
  ],
  ['40 x 40 cm tile', { form: 'tile', sizeCm: 40 }],
  [
    '8 mm thick base cracked',
    { trouble: ['crack-after-draw', 'crack-in-firing'], causes: ['thick-base'] },
  ],
  [
    'two burners and 1.5 bar stuck at 730',
    {
      trouble: ['stall'],
      tempC: 730,
      toleranceC: 10,
      tempUnit: 'guessed',
      changes: ['burner-added'],
    },
  ],
  [
    'on 12/05 at 14:30 it stalled at 700',
    { trouble: ['stall'], tempC: 700, toleranceC: 20, tempUnit: 'guessed' },
  ],
  [
    'cone six stoneware cracked',
    { trouble: ['crack-after-draw', 'crack-in-firing'], cone: '6', clay: 'stoneware' },
  ],
  ['^06 stall', { trouble: ['stall'], cone: '06' }],
  ['fired to 06 but dull', { trouble: ['dull-glaze'], cone: '06' }],
  ['craked platter', { trouble: ['crack-after-draw', 'crack-in-firing'], form: 'plate' }],
  [
    'temprature stals at 700',
    { trouble: ['stall'], tempC: 700, toleranceC: 20, tempUnit: 'guessed' },
  ],
  ['flatplate cracked', { trouble: ['crack-after-draw', 'crack-in-firing'], form: 'plate' }],
  ['reglator frosted', { trouble: ['tank-chill'], causes: ['cold-bottle'] }],
  ['too slow getting it to the bin', { causes: ['slow-to-bin'] }],
  [
    'cooled too fast in the wind and cracked',
    { trouble: ['crack-after-draw'], causes: ['quick-cooling-in-wind'] },
  ],
  ['wood fired raku slow', { trouble: ['slow-climb'], fuel: 'wood' }],
  [
    'soak for 10 min at 950',
    { tempC: 950, toleranceC: 20, tempUnit: 'guessed', minutes: 10, minutesOp: '=' },
  ],
  ['within 25 minutes', { minutes: 25, minutesOp: '<' }],
  ['1,050 overshoot', { trouble: ['overshoot'], tempC: 1050, toleranceC: 20, tempUnit: 'guessed' }],
  [
    'twelve fifty fahrenheit stall',
    { trouble: ['stall'], tempC: 677, toleranceC: 20, tempUnit: 'F' },
  ],
  [
    "I can't seem to get my small fibre kiln past about 1290F, any ideas?",
    { trouble: ['stall'], tempC: 699, toleranceC: 35, tempUnit: 'F' },
  ],
  [
    'kiln climbs fine to 800 then nothing',
    { trouble: ['stall'], tempC: 800, toleranceC: 20, tempUnit: 'guessed' },
  ],
  [
    'got to 650 and stayed there for half an hour',
    {
      trouble: ['stall'],
      tempC: 650,
      toleranceC: 20,
      tempUnit: 'guessed',
      minutes: 30,
      minutesOp: '=',
    },
  ],
  [
    'reached 940 but no higher',
    { trouble: ['stall'], tempC: 940, toleranceC: 10, tempUnit: 'guessed' },
  ],
  [
    'falls back to 1200F from 1300F',
    { trouble: ['sag'], tempC: 704, toleranceC: 20, tempMinC: 649, tempMaxC: 704, tempUnit: 'F' },
  ],
  [
    'dropped from 1000 to 930 while holding',
    {
      trouble: ['sag'],
      tempC: 1000,
      toleranceC: 20,
      tempMinC: 930,
      tempMaxC: 1000,
      tempUnit: 'guessed',
    },
  ],
  [
    '3 hours and only at 850',
    {
      trouble: ['slow-climb'],
      tempC: 850,
      toleranceC: 20,
      tempUnit: 'guessed',
      minutes: 180,
      minutesOp: '>',
    },
  ],
  [
    "isn't it too hot at 1080",
    { trouble: ['overshoot'], tempC: 1080, toleranceC: 10, tempUnit: 'guessed' },
  ],
  ["isn't overfired, just blistered", { trouble: ['blistering'], notTrouble: ['overshoot'] }],
  ['glaze melted at the top but not the bottom', { trouble: ['uneven-heat'] }],
  ['flame jumping off the burner tip', { trouble: ['flame-out'], causes: ['too-much-air'] }],
  ['pyrometer is way off', { trouble: ['wrong-reading'], causes: ['probe'] }],
  [
    'heard a bang at 350',
    {
      trouble: ['crack-in-firing'],
      tempC: 350,
      toleranceC: 20,
      tempUnit: 'guessed',
      causes: ['damp-clay'],
    },
  ],
  ['cone 06 still standing', { trouble: ['dull-glaze'], cone: '06' }],
  ['uneven colour on plate', { trouble: ['weak-reduction'], form: 'plate' }],
  ['lid not sealed in bin so no black', { trouble: ['weak-reduction'], causes: ['lid-gap'] }],
  ['took too long to get from kiln to bin', { causes: ['slow-to-bin'] }],
  [
    'porcelain bottle exploded at 400 C',
    {
      trouble: ['crack-in-firing'],
      tempC: 400,
      toleranceC: 20,
      tempUnit: 'C',
      form: 'bottle',
      clay: 'porcelain',
    },
  ],
  [
    'never cracked a bowl but plates always crack',
    { trouble: ['crack-after-draw', 'crack-in-firing'], form: 'plate' },
  ],
  ["don't want cracks", { notTrouble: ['crack-after-draw', 'crack-in-firing'] }],
];

describe('readQuestion reads further questions by the same rules', () => {
  test.each(QUESTIONS)('%s', (question, expected) => {
    expect(readQuestion(question)).toMatchObject({ ...NOTHING, ...expected });
  });
});
