/**
 * Everyday words one or two letters away from a trade word, which are not misspellings of it
 * ("struck", "regular", "frame"). Found by running the mending over a list of spoken English; a few that
 * in a question about firing are surely slips ("gaze") are left out on purpose.
 */
const WORDS = `
  babble babbling barns battle battles bearer beater beavers blithering blocker bottomless
  bowels bows breaker breakers broker bumbling buns burbs burger burgers buried burying cackle
  cackles cackling canvases carbonated case cases cater causeway changer chapped charge charged
  charges charmer charter chipper chirping chopped chopper chopping chuckling cinders clack
  clause clauses climber clipped clipping cooker copier copped copter cracker crackhead
  crackheads crackpot crate crates craved craving craw crawler crepe crest crock dampen dapper
  daunting decree decrees dented ditty dropper droppings dusky duty excluding expanding
  expansion exploiting explored exploring explosive exposing expulsion falter fame fasten father
  fathers fatter flare flares frame frames freeing glare greaseball greaser guests gusto guts
  gutsy handlebars handler handlers hatter hitter hooter hors hotshot itches kills lather levers
  meats minuet molting named outburst overbearing overhead overheard overhearing overrated
  overreacted overreacting overriding oversized palate perimeter pitches plague plagues plait
  plane planes planter planters plaster powder powders presented prevented profane promoter
  raindrops reacted reaction regular regulate regulated regulation rejection resection savings
  scabs scale scales scattered scattering scripture scriptures sculptor self selves shall
  shaving shitting sideburns slams slapped slaps slats slits slobs smoker snapper snuck spits
  spitting splattered spoke stabs stack stacking stalk stalked stalking stalks staple stapled
  steal stinking stock stocking stoke stoked stoker stove strap stray struck stunk stuttering
  suck swabs tales thongs tides ties tires titles tones tons underlined undermining winner
`;

export const PLAIN_WORDS: ReadonlySet<string> = new Set(WORDS.trim().split(/\s+/));
