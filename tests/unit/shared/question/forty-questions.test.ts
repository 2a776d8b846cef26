import { describe, expect, test } from 'vitest';
import { readQuestion } from '#shared/question/read-question.ts';
import type { QuestionReading } from '#shared/question/reading-types.ts';

/** What must be read; every field not named must be absent. */
type Expected = Partial<Omit<QuestionReading, 'q' | 'parts' | 'words' | 'allWords' | 'changes'>>;

const bothAfterFirst = ['crack-after-draw', 'crack-in-firing'] as const;
const near = (
  tempC: number,
  toleranceC: number,
  tempUnit: 'C' | 'F' | 'K' | 'guessed',
): Expected => ({
  tempC,
  toleranceC,
  tempUnit,
});

/** The questions of people at a kiln, as they say them. */
const QUESTIONS: readonly (readonly [question: string, expected: Expected])[] = [
  ['stalled at 700 °C', { trouble: ['stall'], ...near(700, 20, 'C') }],
  ['stuck at 1300F', { trouble: ['stall'], ...near(704, 20, 'F') }],
  ["won't get past 715", { trouble: ['stall'], ...near(715, 10, 'guessed') }],
  ['cracked flat plate', { trouble: bothAfterFirst, form: 'plate' }],
  ['dunting on a big platter', { trouble: bothAfterFirst, form: 'plate' }],
  ['copper matt no colour', { trouble: ['weak-reduction'], glaze: 'copper-matt' }],
  ['took 2 hours to reach temperature', { trouble: ['slow-climb'], minutes: 120, minutesOp: '>' }],
  ['temperature drops when windy', { trouble: ['sag'], causes: ['wind'] }],
  ['glaze dull under fired', { trouble: ['dull-glaze'] }],
  ['crack straight after sawdust', { trouble: ['crack-after-draw'], causes: ['smoke-material'] }],
  ['cone 06 raku stalled', { trouble: ['stall'], cone: '06' }],
  ['hung at about seven hundred', { trouble: ['stall'], ...near(700, 35, 'guessed') }],
  ['burner blows out', { trouble: ['flame-out'] }],
  [
    'tank frosting up pressure falling',
    { trouble: ['tank-chill'], causes: ['cold-bottle', 'low-gas'] },
  ],
  ['top hotter than bottom by 100 degrees', { trouble: ['uneven-heat'], diffC: 100 }],
  ['shot past 1050 while I was talking', { trouble: ['overshoot'], ...near(1050, 20, 'guessed') }],
  ['glaze stuck to the shelf', { trouble: ['stuck-to-shelf'] }],
  ['lid stuck on jar after firing', { trouble: ['stuck-to-shelf'], form: 'pot' }],
  ['white crackle with no black lines', { trouble: ['weak-reduction'], glaze: 'crackle' }],
  [
    'pot exploded at 200',
    { trouble: ['crack-in-firing'], causes: ['damp-clay'], ...near(200, 20, 'guessed') },
  ],
  ['handle came off in the tongs', { trouble: ['broken-in-handling'], causes: ['tongs'] }],
  ['bubbles and craters in clear glaze', { trouble: ['blistering'], glaze: 'clear' }],
  ['bare patches, glaze crept back from rim', { trouble: ['crawling'] }],
  [
    'climbing only 3 degrees a minute after 600',
    { trouble: ['slow-climb'], ratePerMin: 3, tempMinC: 600, tempUnit: 'guessed' },
  ],
  [
    'peaked 740 then fell to 690',
    { trouble: ['sag'], tempMinC: 690, tempMaxC: 740, ...near(740, 10, 'guessed') },
  ],
  [
    'stays at 1270 F even with regulator wide open',
    { trouble: ['stall'], causes: ['low-gas'], ...near(688, 10, 'F') },
  ],
  [
    'between 650 and 720 very slow',
    { trouble: ['slow-climb'], tempMinC: 650, tempMaxC: 720, tempUnit: 'guessed' },
  ],
  ['bottle split when it came out of the kiln', { trouble: ['crack-after-draw'], form: 'bottle' }],
  ['gas bottle too cold in January', { trouble: ['tank-chill'], causes: ['cold-weather'] }],
  ['no reduction in newspaper bin', { trouble: ['weak-reduction'], causes: ['smoke-material'] }],
  ['not stalling just slow', { trouble: ['slow-climb'], notTrouble: ['stall'] }],
  ['30 cm dish cracked right across', { trouble: bothAfterFirst, form: 'plate', sizeCm: 30 }],
  [
    '12" tile warped and cracked in kiln',
    { trouble: ['crack-in-firing'], form: 'tile', sizeCm: 30 },
  ],
  ['950K is that enough to melt the glaze', { trouble: ['dull-glaze'], ...near(677, 20, 'K') }],
  ['copper luster went green', { trouble: ['weak-reduction'], glaze: 'lustre' }],
  ['flame keeps lifting off the jet', { trouble: ['flame-out'], causes: ['too-much-air'] }],
  ['how to fire faster than 45 minutes', { minutes: 45, minutesOp: '<' }],
  ['raku in the rain', { causes: ['rain'] }],
  ['heat crawls up after 800', { trouble: ['slow-climb'], tempMinC: 800, tempUnit: 'guessed' }],
  [
    'gazle not melted at 900 pulled too early',
    { trouble: ['dull-glaze'], causes: ['early-draw'], ...near(900, 20, 'guessed') },
  ],
];

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

describe('readQuestion reads the forty questions of the trade, every field of each', () => {
  test('there are forty of them', () => {
    expect(QUESTIONS).toHaveLength(40);
  });
  test.each(QUESTIONS)('%s', (question, expected) => {
    expect(readQuestion(question)).toMatchObject({ ...NOTHING, ...expected });
  });
});
