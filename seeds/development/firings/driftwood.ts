import { caution, change, h2, list, p, picture, story } from '../story.ts';
import { BARE, cracked, piece, smoked, WHITE, type FiringTold } from './firing.ts';

const base = {
  standsOn: 'bare-ground',
  fibreBeneath: false,
  shelfKind: 'cordierite',
  shelfThicknessMm: 20,
  shelfHeightMm: 90,
  wind: 'light',
  windShelter: 'one-side',
  weather: 'dry',
} as const;
const bin = smoked(70, 'pine-needles', 18, { seal: 'sand' });

export const driftwood: readonly FiringTold[] = [
  {
    key: 'driftwood-2025-09-28',
    kiln: 'driftwood',
    author: 'emrys',
    date: '2025-09-28',
    time: '10:00',
    published: '2025-10-04',
    title: 'Bread, beer and flour: four bowls dipped hot',
    set: { ...base, kilnDamp: false, airCelsius: 13 },
    target: 900,
    because: 'temperature',
    climb: { reach: 140, gentle: 9, hold: 8, by: 'hand-5' },
    pieces: [
      piece('bowl', 4, 190, BARE, {
        clay: 'Coarse local clay',
        bisqueCelsius: 960,
        route: 'dipped',
        bareClay: 'not-applicable',
      }),
    ],
    story: story(
      p(
        'Two hours and twenty minutes by wood, feeding it a stick at a time, which is the quickest that kiln goes and I would not have it quicker. The batter had been in a bucket by the stove since Monday: rye flour, sugar, a spoon of yeast, water. By Sunday it smelled like a pub carpet.',
      ),
      h2('The dip'),
      list(
        'Bowl out at nine hundred. Count three.',
        'Into the bucket, all under, and out again before you can say it.',
        'Hold it up and turn it. It scorches where it runs: cream, brown, black.',
        'Water bath last, to stop it where you like it.',
      ),
      picture(
        'dipped-bowl',
        'A wide bowl with a scorched surface of brown, black and cream in clouds.',
        'Drawing: number three, the one I kept.',
      ),
      caution(
        'The bucket spits like fat. Long tongs, face shield, nobody opposite you. And a wood kiln throws sparks: hose charged, grass wetted.',
      ),
      p(
        'Every one different. It is the only firing I know in which the pot is finished by being nearly burnt.',
      ),
    ),
  },
  {
    key: 'driftwood-2026-04-04',
    kiln: 'driftwood',
    author: 'emrys',
    date: '2026-04-04',
    time: '10:30',
    published: '2026-04-08',
    title: 'Pot exploded at 200: a damp one',
    set: { ...base, weather: 'damp', kilnDamp: true, airCelsius: 9 },
    unreported: 1,
    target: 960,
    because: 'melt',
    climb: { reach: 118, level: 1300, hold: 5, by: 'hand-3' },
    pieces: [
      piece('pot', 1, 240, WHITE, {
        wallMm: 14,
        dampness: 'damp',
        ...cracked('right-through', 'in-the-firing'),
        melt: 'under-fired',
        colour: 'not',
        bareClay: 'not-applicable',
        remark: 'Burst. Glazed the evening before, thick base.',
      }),
      piece('pot', 2, 200, WHITE),
    ],
    smoke: bin,
    troubles: ['crack-in-firing', 'dull-glaze'],
    causes: ['damp-clay', 'thick-base', 'fast-heating'],
    story: story(
      p(
        'Bang at about 200 °C, seventeen minutes in, and bits against the inside of the door like hail. It was the fat one. I had glazed it the evening before and it had spent the night in the shed with the wet dog.',
      ),
      picture(
        'burst-shards',
        'Seen from above: a thick round pot base in the middle of its own scattered shards.',
        'Drawing: what we raked out. The base stayed where it stood.',
      ),
      p(
        'Water in the clay turns to steam at a hundred and wants sixteen hundred times the room. A thin wall lets it out. A base as thick as your thumb does not; it waits, and the fire goes on, and then it does not wait.',
      ),
      list(
        'Wall 14 mm, base more.',
        'Glazed with a wet dip, not twelve hours dry.',
        'Pallet wood, and me in a hurry to get past the smoky bit.',
      ),
      p(
        'The two beside it survived, peppered with their neighbour. One has a tooth of him in its shoulder.',
      ),
    ),
  },
  {
    key: 'driftwood-2026-05-02',
    kiln: 'driftwood',
    author: 'emrys',
    date: '2026-05-02',
    time: '09:45',
    published: '2026-05-11',
    title: 'Two days by the stove and an hour under two hundred',
    set: { ...base, kilnDamp: false, airCelsius: 13 },
    target: 960,
    because: 'melt',
    climb: { reach: 165, gentle: 8, soaks: [{ celsius: 140, minutes: 25 }], hold: 5, by: 'hand-5' },
    pieces: [piece('pot', 1, 235, WHITE, { wallMm: 13 }), piece('pot', 2, 200, WHITE)],
    smoke: bin,
    changes: [
      ['slower-start', 'twenty-five minutes at 140 before anything else'],
      ['ware-dried', 'two days by the stove, on a rack'],
    ],
    story: story(
      p(
        'Same fat pot, thrown again a finger thinner for vanity. Glazed on the Wednesday, on a rack by the stove till Saturday, turned like a cheese.',
      ),
      picture(
        'driftwood-kiln',
        'A brick kiln with a short chimney at dusk, fire in its firebox and a stack of logs beside it.',
        'Drawing: later, when it was dark enough to be worth looking at.',
      ),
      p(
        'I lit a fire you could have warmed your hands at and no more, and kept it there, about 140, for twenty-five minutes, until a cold knife held at the spyhole came away dry. Then up, no faster than eight degrees a minute. It was a long day. There was no bang in it.',
      ),
      p(
        'The pot itself is nothing much. White crackle, a bit heavy in the hip. But I have set it on the wall by the door of the yard where the other one would have stood, and I nod to it.',
      ),
      change('Nothing. I would bring a better sandwich.'),
    ),
  },
  {
    key: 'driftwood-2026-09-26',
    kiln: 'driftwood',
    author: 'emrys',
    date: '2026-09-26',
    time: '11:00',
    published: '2026-10-01',
    title: 'Rust on purpose',
    set: { ...base, kilnDamp: false, airCelsius: 15 },
    unreported: 2,
    target: 820,
    because: 'temperature',
    climb: { reach: 120, gentle: 10, hold: 5, by: 'hand-5' },
    pieces: [
      piece('pot', 2, 180, BARE, {
        clay: 'Smooth white body, burnished',
        route: 'sprayed-or-fumed',
        bareClay: 'not-applicable',
      }),
    ],
    story: story(
      p(
        'Iron salts in a garden sprayer, on burnished pots at about five hundred on the way down. It goes on yellow, smokes, and comes up the orange of a buoy chain. A horsehair or two while it will still take them.',
      ),
      picture(
        'sprayed-vase',
        'A tall vase in streaks of rust, ochre and cream with dark specks and a few burnt lines.',
        'Drawing: the taller one.',
      ),
      caution(
        'The fume is acid and gets you in the throat. Respirator with the right cartridge, wind behind you, nobody downwind for thirty metres, and keep the sprayer for nothing else.',
      ),
    ),
  },
];
