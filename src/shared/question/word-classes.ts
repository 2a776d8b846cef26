/** Words that stand for one another inside phrases of the vocabulary, as `@name`. */
export const WORD_CLASSES: Readonly<Record<string, string>> = {
  /** Cannot, does not, refuses to. */
  cannot:
    'wont cant cannot not isnt arent wasnt werent never hasnt havent hadnt didnt doesnt dont couldnt wouldnt refuse fail struggle unable barely hardly aint reluctant unwilling hesitate decline loath',
  climb: 'get go climb rise move push pass come make creep crawl nudge inch break heat fire',
  past: 'past above over beyond up further farther higher hotter through',
  heat: 'temperature temp temps temperatures heat kiln reading needle display digits',
  probe: 'pyrometer thermocouple probe reading readings meter readout sensor pyro',
  ware: 'pot piece ware bowl plate platter dish vase jar cup mug bottle tile sculpture teabowl pots work bead box slab figure urn jug teapot rim base handle foot glazeware',
  tank: 'cylinder tank regulator',
  burner: 'burner flame fire torch pilot gas',
  part: 'top bottom front back side left right upper lower floor roof rear',
  hotter: 'hotter cooler colder warmer hot cold cool warm behind lag slower lower',
  smoke: 'smoke reduction black blacks carbon colour colours',
  gone: 'go come turn stay leave look remain get end be become',
  neg: 'no not isnt wasnt didnt doesnt dont never without wont cant hasnt havent cannot couldnt lack',
  fall: 'drop fall slip sink dip slide tumble plummet decrease',
  sticky:
    'shelf shelves lid prop stilt pot glaze ware piece base foot plate bowl jar vase cup tile bottle batt pots dish cover stopper',
  bin: 'bin drum bucket can dustbin barrel container tin',
  bigger: 'bigger larger big large',
  smaller: 'smaller small',
  combustible:
    'sawdust newspaper paper straw hay leaf leaves shavings needles combustible combustibles chippings cardboard woodchips',
};

/** Small words that may stand between the words of a phrase and carry nothing. */
export const FILLERS: ReadonlySet<string> = new Set(
  (
    'a an the my our your his her its it this that these those they very really quite so just even ' +
    'all both keep keeps kept keeping is was are were be been being am has have had having got then ' +
    'still always suddenly slowly slightly completely totally too much bit little of and will would ' +
    'to start starts started begin begins began seem seems do does did some any me i we again ever ' +
    'right straight only itself themselves'
  ).split(' '),
);

/** Words that may lead up to a temperature inside a phrase: "hung at about 700". */
export const HEAT_LEADS: ReadonlySet<string> = new Set(
  (
    'at about around near on roughly approximately approx circa to from by in the a just under below ' +
    'over above past beyond nearly almost somewhere of up only ~ between as low high little or so no'
  ).split(' '),
);

/** Words after a negation that do not end it. */
export const NEGATION_CARRIES: ReadonlySet<string> = new Set([
  ...[...FILLERS].filter((word) => !['and', 'then', 'still', 'just', 'only'].includes(word)),
  ...'or nor any more single sign signs trace problem problems trouble issue issues with from seen see want need happen'.split(
    ' ',
  ),
  ...'use used using put add added try tried need'.split(' '),
  ...'one ones more another actual actually get getting about at in on for ware pot pots piece pieces glaze kiln'.split(
    ' ',
  ),
]);
export const NEGATIONS: ReadonlySet<string> = new Set(
  (
    'no not isnt arent wasnt werent never hasnt havent hadnt didnt doesnt dont wont cant cannot ' +
    'couldnt wouldnt without nor neither none aint'
  ).split(' '),
);

/** Words that carry nothing for a search by text. Shared with the index's stop words. */
export const EMPTY_WORDS: readonly string[] = (
  'a an the my our your his her its it this that these those they them i we you me us he she is was ' +
  'are were be been being am has have had having do does did doing will would should could can may ' +
  'might must to of for with and or so as if then than there here what which who whom how when where ' +
  'why while whilst about at by from in on into onto some any very really quite just too also again ' +
  'get got gets getting keep keeps kept im ive id'
).split(' ');

/** Left out of the text search too, though the index keeps them, for they open no useful search. */
export const QUESTION_WORDS: readonly string[] = (
  'no not never isnt arent wasnt werent hasnt havent hadnt didnt doesnt dont wont cant cannot ' +
  'couldnt wouldnt without nor neither none only even still like help please anyone anybody know ' +
  'tell best way best thing things happens happened happening happen wrong problem problems issue ' +
  'because but yet though up down over under off out past above below after before until near ' +
  'around between and - / ~ + < > ish bit odd than less within more most few ' +
  'avoid prevent stop fix cure help solve solution solved reason whenever soon time enough straight right always sometimes often'
).split(' ');
