import { caution, change, h2, list, p, picture, quote, story } from '../story.ts';
import { cracked, piece, smoked, TURQUOISE, unmelted, WHITE, type FiringTold } from './firing.ts';

const base = {
  burnerAngleDegrees: 85,
  burnerSetbackMm: 40,
  primaryAir: 'open',
  flameAtFlue: 'short-clear',
  flueCoverPercent: 25,
  standsOn: 'solid-block',
  fibreBeneath: false,
  baseLayers: 'Concrete slabs on solid blocks, one layer of hard brick',
  shelfKind: 'cordierite',
  shelfThicknessMm: 20,
  shelfHeightMm: 60,
  shelfFloorSharePercent: 60,
  windShelter: 'one-side',
  wind: 'light',
  weather: 'dry',
  kilnDamp: false,
  regulatorBar: 1,
  cylinderKg: 19,
  probeDepthMm: 80,
} as const;
const insulated = {
  ...base,
  fibreBeneath: true,
  baseLayers: 'Slabs, 50 mm fibre, soft brick on top',
} as const;
/** The winter rebuild: a new slab, and the fibre not put back. */
const rebuilt = { ...base, baseLayers: 'New concrete slab on blocks, hard brick', airCelsius: 9 };

const bowls = (more = {}) => piece('bowl', 4, 170, WHITE, more);
const bin = smoked(60, 'sawdust', 8);

export const ropers: readonly FiringTold[] = [
  {
    key: 'ropers-2025-03-22',
    kiln: 'ropers',
    author: 'tunde',
    date: '2025-03-22',
    time: '10:20',
    published: '2025-03-25',
    title: 'Stalled at 700 °C on a cold floor',
    set: { ...base, airCelsius: 8, gasUsedKg: 3.4 },
    target: 1000,
    because: 'gave-up',
    climb: { level: 707, rate: 52, giveUp: 64, by: 'hand-3' },
    pieces: [bowls(unmelted)],
    troubles: ['stall', 'dull-glaze'],
    causes: ['cold-shelf'],
    surprised: 'How steady it was. You could have set a clock by it.',
    nextTime: 'Try more gas, since everybody says so, and write down that it did nothing.',
    says: { stallCelsius: 704 },
    story: story(
      p(
        'First firing of the year in Ropers’ Yard and I made every speech I make to beginners, to myself, aloud. Joints soaped. Flame first, then gas. The hat down gently. It went up like a lift to six hundred and I was already choosing which bowl to draw first.',
      ),
      p(
        'Then the needle slowed, and at about 704 °C it stopped. Not a wobble in it. Twenty minutes of the same number, and a burner roaring as if it were doing something.',
      ),
      picture(
        'notebook-stall',
        'Hand-drawn graph on squared paper: a climb that bends over and runs level near seven hundred degrees, far below a line marked wanted.',
        'Drawing: my page from the day, tidied up.',
      ),
      p(
        'What gave it away was my boot. The blocks under the kiln were warm on the outside, properly warm, and the yard slab under them was warm too. I was heating the rope store’s foundations. The walls of the hat I could lay a hand on.',
      ),
      change(
        'Something between the floor and the fire. But one thing at a time, so first the thing everyone will tell me to do.',
      ),
    ),
  },
  {
    key: 'ropers-2025-03-29',
    kiln: 'ropers',
    author: 'tunde',
    date: '2025-03-29',
    time: '10:05',
    published: '2025-04-02',
    title: 'More gas, same 711',
    set: { ...base, regulatorBar: 1.5, flameAtFlue: 'long-yellow', airCelsius: 10, gasUsedKg: 4.6 },
    target: 1000,
    because: 'gave-up',
    climb: { level: 714, rate: 58, giveUp: 58, by: 'hand-3' },
    pieces: [bowls(unmelted)],
    troubles: ['stall', 'dull-glaze'],
    causes: ['rich-flame', 'cold-shelf'],
    changes: [['gas-more', 'to see whether the kiln was short of heat']],
    says: { stallCelsius: 711 },
    story: story(
      p(
        'Same kiln, same four bowls, same shelf, half a bar more. It got to 650 a few minutes sooner. It then sat down at 711 °C, seven degrees better than last week, and a kilo and a bit of propane dearer.',
      ),
      p(
        'The extra gas did not burn in the kiln. It burned above it: a yellow tongue at the flue as long as my forearm, and that soft smell of a flame that cannot find air.',
      ),
      caution(
        'A long yellow flame outside the kiln is gas that did not find air inside it, and where there is that there is carbon monoxide. I stood upwind, turned it back after ten minutes and left it there. Please do not copy the half bar.',
      ),
      p('So: not the gas. Next week the floor.'),
    ),
  },
  {
    key: 'ropers-2025-04-12',
    kiln: 'ropers',
    author: 'tunde',
    date: '2025-04-12',
    time: '11:00',
    published: '2025-04-15',
    title: 'Fifty millimetres of fibre under the floor, and it went past 700 without looking',
    set: { ...insulated, airCelsius: 11, gasUsedKg: 2.9 },
    target: 1000,
    because: 'melt',
    climb: { reach: 42, hold: 4, by: 'hand-2' },
    pieces: [bowls()],
    smoke: bin,
    changes: [
      ['floor-insulated', 'to stop heating the yard'],
      ['gas-less', 'back to one bar, where it burns clean'],
    ],
    surprised: 'Less gas than either of the two that failed.',
    story: story(
      p(
        'I lifted the brick, laid two folds of blanket on the slab, put soft brick on top of that and the old shelf back on its posts. An hour’s work with a mask on and the hose running, because old fibre is no friend of lungs.',
      ),
      picture(
        'floor-layers',
        'A section through a kiln floor: shelf on posts, soft brick, a blanket of fibre, a fibre board, hollow blocks, shingle.',
        'Drawing: what lies under the ware now, from the top down. Hollow blocks would be better still than my solid ones.',
      ),
      h2('What it did'),
      list(
        'Seven hundred at twenty-six minutes, with no bend in the line at all.',
        'A thousand at forty-two. Four minutes there while I looked for the shine.',
        'Blocks underneath: cool enough to sit on afterwards, and I did.',
      ),
      p(
        'Four bowls out, all four whole, all four with a net on them like the cracks in the mud at low water. I had expected to change three things this spring. It was one.',
      ),
    ),
  },
  {
    key: 'ropers-2025-06-14',
    kiln: 'ropers',
    author: 'haruka',
    date: '2025-06-14',
    time: '15:40',
    published: '2025-06-20',
    title: 'Second load of the afternoon, into a hot hat',
    set: { ...insulated, wind: 'calm', airCelsius: 21 },
    target: 980,
    because: 'melt',
    climb: { startCelsius: 390, reach: 17, hold: 0, by: 'hand-2' },
    pieces: [
      piece('cup', 3, 120, TURQUOISE, {
        preheating: 'on-the-lid',
        kilnCelsiusAtLoading: 390,
      }),
    ],
    smoke: smoked(30, 'shavings', 5),
    story: story(
      p(
        'Tunde’s kiln on loan, and he had already fired once when I came, so I set my three bowls on the crown while he drew his. They went in at 390 without a sound. Seventeen minutes later they were shining. A hot kiln is a different animal; I would not set this beside anybody’s morning firing.',
      ),
    ),
  },
  {
    key: 'ropers-2025-09-20',
    kiln: 'ropers',
    author: 'noor',
    date: '2025-09-20',
    time: '13:15',
    published: '2025-09-23',
    title: 'No reduction to speak of in a newspaper bin',
    set: { ...insulated, wind: 'light', airCelsius: 17 },
    unreported: 2,
    target: 1000,
    because: 'melt',
    climb: { reach: 40, hold: 3, by: 'hand-3' },
    pieces: [bowls({ colour: 'partly', bareClay: 'grey' })],
    smoke: smoked(60, 'paper', 4, { secondsInAir: 35, minutesCovered: 8 }),
    troubles: ['weak-reduction'],
    causes: ['smoke-material', 'slow-to-bin'],
    story: story(
      p(
        'The firing was easy, because the kiln is now easy. The bin was not. I had brought newspaper, a week of it, crumpled, because that is what the book said, and it was gone in one yellow whoosh before the second bowl was over the rim.',
      ),
      p(
        'By the time I had the lid down there was nothing left to smoke. Eight minutes later I lifted it on four white bowls with grey feet. The crackle is there if you wet it. It looks like a road map of somewhere with no roads.',
      ),
      picture(
        'pale-crackle',
        'A white tea bowl whose crackle is only faint grey lines, on a pale unsmoked foot.',
        'Drawing: pale all over. The foot should be black.',
      ),
      p('Thirty-five seconds from the hat to the lid, somebody counted. It felt like four.'),
      p(
        'Tunde says that the kiln is not the half of it. I am beginning to see what he means by that.',
      ),
      change('Twice as much paper? It is what I have.'),
    ),
  },
  {
    key: 'ropers-2025-10-04',
    kiln: 'ropers',
    author: 'noor',
    date: '2025-10-04',
    time: '13:30',
    published: '2025-10-08',
    title: 'Twice the newspaper, twice the whoosh',
    set: { ...insulated, airCelsius: 14 },
    target: 1000,
    because: 'melt',
    climb: { reach: 41, hold: 3, by: 'hand-3' },
    pieces: [bowls({ colour: 'partly', bareClay: 'patchy' })],
    smoke: smoked(60, 'paper', 9, { secondsInAir: 33, minutesCovered: 10 }),
    troubles: ['weak-reduction'],
    causes: ['smoke-material'],
    changes: [['combustible-more', 'to have something left when the lid goes on']],
    story: story(
      p(
        'Nine litres instead of four. Bigger flame, same grey. One bowl has a black thumbprint where a wad lay against it and is white an inch away. I think paper is for lighting things with.',
      ),
    ),
  },
  {
    key: 'ropers-2026-03-14',
    kiln: 'ropers',
    author: 'tunde',
    date: '2026-03-14',
    time: '10:30',
    published: '2026-03-17',
    title: 'It would not get past 715: what I forgot to put back',
    set: { ...rebuilt },
    unreported: 3,
    target: 1000,
    because: 'gave-up',
    climb: { level: 718, rate: 50, giveUp: 60, by: 'logger-30' },
    pieces: [bowls(unmelted)],
    troubles: ['stall', 'dull-glaze'],
    causes: ['cold-shelf'],
    says: { stallCelsius: 715 },
    story: story(
      p(
        'Over the winter the yard got a new slab and the kiln got new blocks, and I got a bad knee, so somebody else put the base back together. The fibre is in a bag in the rope store. I found it afterwards.',
      ),
      p(
        'The logger drew the prettiest plateau I have ever paid for: up to 700 in half an hour, then 715, 715, 716, 715. I nudged the damper both ways. I said things to it. Nothing.',
      ),
      quote(
        'It is not stuck, said Agnes, who had come for the bowls. It has arrived. You have just not asked it to go any further.',
      ),
      p(
        'She is right in the way that physics is right. A kiln levels off where what goes in is what goes out, and mine has a hole in the bottom as big as its own floor.',
      ),
    ),
  },
  {
    key: 'ropers-2026-03-21',
    kiln: 'ropers',
    author: 'tunde',
    date: '2026-03-21',
    time: '10:10',
    published: '2026-03-24',
    title: 'The same again, on purpose',
    set: { ...rebuilt, airCelsius: 11, wind: 'calm' },
    target: 1000,
    because: 'gave-up',
    climb: { level: 716, rate: 50, giveUp: 56, by: 'logger-30' },
    pieces: [bowls(unmelted)],
    troubles: ['stall', 'dull-glaze'],
    says: { stallCelsius: 713 },
    story: story(
      p(
        'Changed nothing, to have one honest “nothing” in the book. Calm day, warmer air, same slab: 713. Anyone who tells you that a kiln has moods should be made to do this once.',
      ),
    ),
  },
  {
    key: 'ropers-2026-03-28',
    kiln: 'ropers',
    author: 'tunde',
    date: '2026-03-28',
    time: '10:40',
    published: '2026-03-31',
    title: 'Burner swept round the wall: heat at last, and two plates gone',
    set: { ...rebuilt, burnerAngleDegrees: 40, burnerSetbackMm: 50, airCelsius: 12, wind: 'calm' },
    target: 1000,
    because: 'melt',
    climb: { reach: 31, hold: 3, by: 'logger-20' },
    pieces: [
      piece('bowl', 2, 170, WHITE),
      piece('flat-plate', 2, 270, WHITE, {
        ...cracked('right-through', 'in-the-firing'),
        remark: 'Heard both go, a minute apart, somewhere after 550.',
      }),
    ],
    smoke: bin,
    troubles: ['crack-in-firing'],
    causes: ['fast-heating'],
    changes: [['burner-more-sweeping', 'to send the flame round instead of at the ware']],
    story: story(
      p(
        'While the fibre dried out I did the other thing I had been told to do: turned the burner so that it licks along the wall instead of punching straight in. Forty degrees by my plastic protractor, and the tip a little further back so it draws air.',
      ),
      picture(
        'burner-plan',
        'Two kilns seen from above. In the left the flame strikes the pots straight on; in the right it runs round the wall.',
        'Drawing: before on the left, now on the right.',
      ),
      p(
        'You could hear the difference. The roar went from a cough to a hum, and the flame came past the spyhole sideways. A thousand in half an hour, with the same bad floor.',
      ),
      p(
        'And then the bill. I had put two plates on the shelf, flat, because there was room. Between 550 and 600 there was a *tock*, and a minute later another. Both right across. It was climbing at thirty-odd degrees a minute just there and I was so pleased with it that I did not turn it down.',
      ),
      change(
        'Plates want a gentle climb to 600 and a bit beyond. The kiln can do fast now; that does not mean that everything in it can.',
      ),
    ),
  },
  {
    key: 'ropers-2026-04-18',
    kiln: 'ropers',
    author: 'tunde',
    date: '2026-04-18',
    time: '10:15',
    published: '2026-04-25',
    title: 'Two plates, a slow start, and nothing to hear',
    set: { ...rebuilt, burnerAngleDegrees: 40, burnerSetbackMm: 50, airCelsius: 13, wind: 'light' },
    target: 1000,
    because: 'melt',
    climb: { reach: 52, gentle: 21, hold: 3, by: 'logger-20' },
    pieces: [piece('bowl', 2, 170, WHITE), piece('flat-plate', 2, 260, WHITE)],
    smoke: bin,
    changes: [['slower-start', 'for the plates']],
    story: story(
      p(
        'Same set-up to the millimetre, but I kept the valve low and watched the rate instead of the number. Under twenty-one a minute all the way to 650, then let it go. It cost twenty minutes and about a mug of gas.',
      ),
      p(
        'I listened through the whole of the five hundreds with my good ear to the port side, well away from it. Nothing. Both plates came out in one piece, went over the sawdust in one piece, and rang in one piece on Sunday when I finally believed it.',
      ),
      picture(
        'plate-whole',
        'A turquoise crackle plate seen from above, whole, with a fine black net.',
        'Drawing: one of them, more or less, in the colour it ought to have been.',
      ),
      p(
        'I have done it both ways now in the same kiln, with the same clay, three weeks apart, and I do not pretend that two plates are statistics. But I know which of the two I shall do with a plate I like.',
      ),
    ),
  },
];
