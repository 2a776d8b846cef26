/**
 * The trade words whose misspellings are mended, with the forms people type. Verbs are given in all
 * four forms, nouns in two, so that nothing is mended to a word that does not exist.
 */
const WORDS_AS_THEY_STAND = `
  blisters blistered blistering blocked bottom breeze broken burst bursting carbonised celsius
  centigrade chipped chipping chimney clogged colder colour colourless coloured cooler copper
  crackle crackled crackling crazed crazing creeping crept damper degree degrees dirty
  draughty dropped dropping drops dunted dunting dusty earthenware exploded explodes exploding
  explosion fahrenheit faster flashback freezing frosted frosting frosty frozen glazed glossy greasy
  grease gusty hairline hotspot hotter horsehair hours immature january february december kelvin
  leather levelled levelling levels lustre melted melting minute minutes moisture naked newspaper
  overfired overfiring overheated overheating overshot overshooting oxidised patches patchy
  pinholes pinholing plateau plateaued plateaus porcelain powdery preheat preheated pressure
  propane pyrometer quench quenched quenching rainy reached reduced reduction regulator
  reoxidised sandpaper sandpapery sawdust sculptural shattered shattering shatters shavings shelf
  shelves sluggish smoke smoked smoky snapped splits splitting stoneware straw stuck sticking
  temperature temperatures terracotta thermocouple thickly tongs transparent turquoise underfired
  underfiring uneven unevenly unglazed unmelted windy winter
  celsius inches centimetres millimetres obvara craquelure crackled flameout
`;
const NOUNS = `
  beaker bottle bowl burner cause charger crater cylinder damper dish feather figure figurine flame
  glaze handle gust kiln nozzle orifice pinhole plaque plate platter sculpture slab teabowl
  teapot tile vase bubble blister
`;
const VERBS = `
  stall crack bubble crawl climb crackle burn blister melt
`;

function split(words: string): string[] {
  return words.trim().split(/\s+/);
}

function verbForms(verb: string): string[] {
  const stem = verb.endsWith('e') ? verb.slice(0, -1) : verb;
  return [verb, `${verb}s`, `${stem}ed`, `${stem}ing`];
}

function nounForms(noun: string): string[] {
  return [noun, /(?:s|x|sh|ch)$/.test(noun) ? `${noun}es` : `${noun}s`];
}

/** Known words shorter than this are matched only exactly. */
export const MIN_MENDABLE_LETTERS = 5;

export const MENDABLE_WORDS: readonly string[] = [
  ...new Set([
    ...split(WORDS_AS_THEY_STAND),
    ...split(NOUNS).flatMap(nounForms),
    ...split(VERBS).flatMap(verbForms),
  ]),
].filter((word) => word.length >= MIN_MENDABLE_LETTERS);
