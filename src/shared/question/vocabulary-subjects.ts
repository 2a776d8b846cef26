import type { VocabularyEntry } from './vocabulary-entry.ts';

/**
 * What the question is about: forms, glazes, clays, fuels. A bare "pot" is any piece of ware, and a
 * bare "copper" may be copper matt or lustre: neither is read as a form or a glaze.
 */
export const SUBJECT_VOCABULARY: readonly VocabularyEntry[] = [
  {
    means: ['form:plate'],
    says: [
      'plate',
      'flat|dinner|wide|large|big plate',
      'platter',
      'dish',
      'charger',
      'flatware',
      'saucer',
      'tray',
      'tazza',
      'shallow dish|bowl',
    ],
  },
  { means: ['form:bowl'], says: ['bowl', 'bowls', 'basin'] },
  {
    means: ['form:cup'],
    says: [
      'cup',
      'teabowl',
      'mug',
      'beaker',
      'goblet',
      'tankard',
      'guinomi',
      'sake cup',
      'egg cup',
      'tumbler',
      'tea cup',
      'tea bowl',
      'teacup',
    ],
  },
  {
    means: ['form:bottle'],
    says: ['bottle', 'bottle vase|form', 'flask', 'decanter', 'carafe', 'narrow neck'],
  },
  {
    means: ['form:pot'],
    says: [
      'vase',
      'jar',
      'ginger|lidded|storage|moon jar',
      'lidded pot|form|vessel',
      'teapot',
      'urn',
      'amphora',
      'ewer',
      'canister',
      'planter',
      'tea pot|caddy',
      'jug',
      'pitcher',
      'pot with lid',
    ],
  },
  {
    means: ['form:tile'],
    says: ['tile', 'test tile', 'slab', 'plaque', 'tile panel'],
  },
  { means: ['form:box'], says: ['box', 'lidded box', 'casket'] },
  {
    means: ['form:sculpture'],
    says: [
      'sculpture',
      'sculptural',
      'figure',
      'figurine',
      'head',
      'bust',
      'statue',
      'torso',
      'mask',
      'horse',
      'bird',
      'fish',
      'animal',
    ],
  },
  {
    means: ['form:bead'],
    says: ['bead', 'beads', 'pendant', 'earring', 'button', 'jewellery', 'jewelry'],
  },

  {
    means: ['glaze:copper-matt'],
    says: ['copper matt', 'copper matt glaze', 'matt copper', 'copper penny? matt'],
  },
  {
    means: ['glaze:lustre'],
    says: ['lustre', 'copper lustre', 'lustre glaze', 'metallic lustre', 'lustre copper'],
  },
  {
    means: ['glaze:crackle'],
    says: [
      'crackle',
      'white crackle',
      'clear crackle',
      'crack line|lines',
      'crackle glaze',
      'white crackle glaze',
      'craze',
      'crazing',
      'craquelure',
    ],
  },
  { means: ['glaze:clear'], says: ['clear', 'clear glaze', 'transparent', 'transparent glaze'] },
  {
    means: ['glaze:coloured-gloss'],
    says: [
      'turquoise',
      'turquoise glaze',
      'coloured gloss|glaze',
      'gloss glaze|colour',
      'glossy|shiny glaze',
      'blue|red|yellow|purple|cobalt|green|pink|orange glaze',
      'alkaline glaze',
    ],
  },
  {
    means: ['glaze:slip-resist'],
    says: ['naked raku', 'naked', 'slip resist', 'slipresist', 'resist slip', 'slip shell'],
  },
  {
    means: ['glaze:horsehair'],
    says: ['horsehair', 'horse hair', 'feather', 'sugar', 'horsehair raku', 'hair line|mark'],
  },
  {
    means: ['glaze:dipped'],
    says: [
      'dipped',
      'batter',
      'obvara',
      'fermented',
      'ferment batter|dip|flour|yeast',
      'dip in batter|milk|yeast|flour|ferment',
      'yeast',
    ],
  },
  {
    means: ['glaze:bare-clay'],
    says: ['unglazed', 'bare clay|body', 'no glaze', 'without glaze', 'raw clay surface'],
  },

  { means: ['clay:stoneware'], says: ['stoneware', 'stoneware clay'] },
  { means: ['clay:porcelain'], says: ['porcelain'] },
  { means: ['clay:earthenware'], says: ['earthenware'] },
  { means: ['clay:terracotta'], says: ['terracotta', 'terra cotta'] },
  { means: ['clay:crank'], says: ['crank', 'crank clay'] },
  { means: ['clay:grogged'], says: ['grog', 'grogged', 'groggy', 'grogged clay|body'] },
  { means: ['clay:paper-clay'], says: ['paperclay', 'paper clay'] },
  { means: ['clay:raku-body'], says: ['raku body|clay'] },

  { means: ['fuel:propane'], says: ['propane'] },
  { means: ['fuel:butane'], says: ['butane'] },
  { means: ['fuel:mixed-lpg'], says: ['lpg', 'mixed gas|lpg'] },
  { means: ['fuel:natural-gas'], says: ['natural gas', 'mains gas', 'town gas'] },
  {
    means: ['fuel:wood'],
    says: [
      'wood fire|fired|firing|kiln|burning|fuelled|fueled|raku',
      'woodfire',
      'woodfired',
      'fire|fired with wood',
    ],
  },
  { means: ['fuel:electric'], says: ['electric', 'electric kiln', 'electricity'] },

  {
    means: ['took'],
    says: [
      '(#min) up? to (#)',
      'take|need (#min)',
      '(#min) to reach|get|climb|hit',
      'spend (#min)',
    ],
  },
  {
    means: ['hold'],
    says: ['hold|soak .. (#min)', '(#min) hold|soak', 'soak (#min)', 'hold (#) .. (#min)'],
  },
];
