import { change, list, p, picture, story } from '../story.ts';
import { cracked, piece, smoked, TURQUOISE, WHITE, type FiringTold } from './firing.ts';

const base = {
  standsOn: 'metal-stand',
  fibreBeneath: true,
  shelfKind: 'cordierite',
  shelfThicknessMm: 12,
  shelfHeightMm: 30,
  wind: 'calm',
  windShelter: 'one-side',
  weather: 'dry',
  kilnDamp: false,
} as const;
const bin = smoked(50, 'sawdust', 10, { seal: 'sand' });

export const plug: readonly FiringTold[] = [
  {
    key: 'plug-2025-10-04',
    kiln: 'plug',
    author: 'leocadia',
    date: '2025-10-04',
    time: '08:00',
    published: '2025-10-08',
    title: 'Electric, full power from cold, three plates, three cracks',
    set: { ...base, airCelsius: 12 },
    target: 980,
    because: 'temperature',
    climb: { reach: 95, hold: 10, by: 'logger-30', level: 1250 },
    pieces: [
      piece('flat-plate', 3, 220, TURQUOISE, {
        ...cracked('rim', 'in-the-firing'),
        wallMm: 10,
      }),
    ],
    smoke: bin,
    troubles: ['crack-in-firing'],
    causes: ['fast-heating', 'thick-base'],
    story: story(
      p(
        'I bought an electric kiln for its patience and then gave it none. Full power from cold: about twenty degrees a minute to begin with, on plates stacked flat with a shelf between each two. All three cracked from the rim, early, with the edges melted over.',
      ),
      p('A plug does not make it gentle. The dial does.'),
    ),
  },
  {
    key: 'plug-2025-10-18',
    kiln: 'plug',
    author: 'leocadia',
    date: '2025-10-18',
    time: '07:45',
    published: '2025-10-27',
    title: 'Low, medium, high, and three plates whole',
    set: { ...base, airCelsius: 10 },
    target: 980,
    because: 'temperature',
    climb: { reach: 175, gentle: 6.5, hold: 10, by: 'logger-30' },
    pieces: [piece('flat-plate', 3, 220, TURQUOISE, { wallMm: 10 })],
    smoke: bin,
    changes: [['slower-start', 'an hour on low, an hour on medium']],
    story: story(
      p(
        'An hour on low with the bung out, an hour on medium, then up. Just short of three hours. Switch off, *plug out*, count ten, lift the lid. Three plates over shavings and all three still in one piece nine days later.',
      ),
    ),
  },
  {
    key: 'plug-2026-02-14',
    kiln: 'plug',
    author: 'leocadia',
    date: '2026-02-14',
    time: '08:30',
    published: '2026-02-19',
    title: 'Crack straight after the sawdust',
    set: { ...base, airCelsius: 3 },
    unreported: 2,
    target: 985,
    because: 'temperature',
    climb: { reach: 170, gentle: 7, hold: 8, by: 'logger-30' },
    pieces: [
      piece('bowl', 2, 210, WHITE),
      piece('bowl', 1, 230, WHITE, {
        ...cracked('base', 'in-reduction'),
        remark: 'Stood in cold damp sawdust.',
      }),
    ],
    smoke: smoked(50, 'sawdust', 14, {
      seal: 'sand',
      combustibles: [{ kind: 'sawdust', litres: 14, dampness: 'damp', placement: 'under' }],
    }),
    troubles: ['crack-after-draw'],
    causes: ['smoke-material', 'cold-weather'],
    story: story(
      p(
        'Three bowls, three degrees, three bins. Two of the bins had stood by the kiln and were dry and lukewarm. The third had stood under the gutter. I knew. I thought: sawdust is sawdust.',
      ),
      p(
        'The bowl went into it at nine hundred and something, foot first, and there was a bang like a dropped book before I had the lid on. Steam, not smoke. A crack across the base, branching like the river at Thorle.',
      ),
      list(
        'Damp sawdust under a foot is a quench from below.',
        'The walls were in hot air and the foot was in cold porridge.',
        'The two in dry sawdust are perfect.',
      ),
      change(
        'Sawdust kept in a closed drum, and a handful of dry shavings where the foot will land.',
      ),
    ),
  },
  {
    key: 'plug-2026-10-24',
    kiln: 'plug',
    author: 'leocadia',
    date: '2026-10-24',
    time: '09:00',
    published: '2026-10-29',
    title: '950 kelvin is not enough: test tiles at 677 °C stayed dull',
    set: { ...base, airCelsius: 11 },
    unreported: 3,
    target: 677,
    because: 'temperature',
    climb: { reach: 88, gentle: 9, hold: 15, by: 'logger-30' },
    pieces: [
      piece('test-tile', 7, 60, TURQUOISE, {
        melt: 'under-fired',
        faults: ['dull'],
        colour: 'not',
        bareClay: 'not-applicable',
        route: 'air-only',
        lies: 'on-edge',
      }),
    ],
    troubles: ['dull-glaze'],
    causes: ['early-draw'],
    story: story(
      p(
        'My nephew, who does physics, asked whether 950 would melt it, and wrote K after it. I fired a set to 677 °C, which is what that comes to, and held it a quarter of an hour, and then drew one of the same tiles from every firing since, each twenty degrees on.',
      ),
      picture(
        'draw-tiles',
        'Seven test tiles in a row, marked 880 to 1000; the first three dry and dull, the last four more and more glossy.',
        'Drawing: the later tiles. The set at 677 is not shown because it looks like biscuit with dust on it.',
      ),
      list(
        '677: powder. It rubs off on your thumb.',
        '880: stuck, and rough.',
        '920: a sheen in the thick places.',
        '960: glass.',
      ),
      p(
        'So no. But now we know where the line is for this frit, in this kiln, at this speed, and that is more than the tin says.',
      ),
      p(
        'He asked next why it does not simply melt at one temperature, like ice. I said that glass has never made up its mind, and sent him to his teacher.',
      ),
    ),
  },
];
