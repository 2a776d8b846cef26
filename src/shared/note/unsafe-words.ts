import type { StoryText } from './story.ts';

/** A dangerous practice that the words of a story may tell of. */
export type UnsafePractice =
  | 'gas-before-flame'
  | 'relit-hot-or-unaired'
  | 'indoors'
  | 'left-alone'
  | 'no-mask-in-smoke'
  | 'heat-on-the-cylinder';

export const UNSAFE_PRACTICES: Readonly<Record<UnsafePractice, string>> = {
  'gas-before-flame': 'Gas on before the flame is there: it gathers in the chamber and explodes.',
  'relit-hot-or-unaired': 'Relit in a hot or unaired chamber: gas must be cleared out first.',
  indoors: 'Fired indoors, in a garage, shed or tent: carbon monoxide gathers.',
  'left-alone': 'A burning kiln left alone.',
  'no-mask-in-smoke': 'Smoke, dust or fumes without a mask.',
  'heat-on-the-cylinder': 'A heater, torch or flame on the gas cylinder.',
};

export interface UnsafePassage {
  /** Which of the story's texts, by place in the list given. */
  readonly blockIndex: number;
  /** Where in that text, as string offsets. */
  readonly from: number;
  readonly to: number;
  readonly practice: UnsafePractice;
  readonly reason: string;
}

interface Rule {
  readonly practice: UnsafePractice;
  readonly pattern: RegExp;
  /** Words that must stand somewhere in the same text for the pattern to mean this. */
  readonly about?: RegExp;
  /** A sentence with these words is about something else. */
  readonly except?: RegExp;
}

const ROOM =
  '(?:garage|shed|tent|gazebo|marquee|barn|workshop|studio|kitchen|conservatory|greenhouse|basement|cellar|polytunnel)';
const FIRING = '(?:fir(?:e|ed|es|ing)|kiln|lit|light(?:ing)?|burner|raku)';
const CYLINDER = '(?:cylinder|(?:gas |propane |butane )?bottle|tank)';
const HEATER =
  '(?:heater|torch|blow ?torch|blow ?lamp|heat ?gun|hair ?dryer|naked flame|flame|burner)';
const MASK = '(?:mask|respirator)';
/** Up to so many characters of the same sentence. */
const WITHIN = (most: number): string => `[^.!?\\n]{0,${String(most)}}?`;

const rule = (practice: UnsafePractice, source: string, rest: Partial<Rule> = {}): Rule => ({
  practice,
  pattern: new RegExp(source, 'gi'),
  ...rest,
});

const RULES: readonly Rule[] = [
  rule(
    'gas-before-flame',
    `\\b(?:gas (?:first|on)|(?:turn(?:ed|ing)?|switch(?:ed|ing)?|open(?:ed|ing)?|put) (?:on )?the gas(?: on)?|gas (?:was|is) (?:already )?on)\\b${WITHIN(50)}\\b(?:then|before|and only then|only afterwards)\\b${WITHIN(30)}\\b(?:lit|light|lighting|lighter|match|flame|torch|ignit\\w+|spark\\w*)\\b`,
  ),
  rule(
    'gas-before-flame',
    `\\b(?:let|left|with) the (?:gas|burner) (?:run(?:ning)?|hiss(?:ing)?|flow(?:ing)?|fill|on)\\b${WITHIN(50)}\\b(?:before|then|and)\\b${WITHIN(30)}\\b(?:lit|light|lighting|lighter|match|flame|torch|ignit\\w+)\\b`,
  ),
  rule(
    'relit-hot-or-unaired',
    `\\b(?:re-?lit|re-?light(?:ing|ed)?|re-?ignit(?:e|ed|ing)|(?:lit|lighted) (?:it|the burner|the kiln) again)\\b${WITHIN(50)}\\b(?:straight (?:away|off|back)|at once|right away|immediately|without (?:airing|opening|clearing|letting)|still (?:glowing|hot|red)|(?:hot|red-hot|glowing|unaired) (?:chamber|kiln|walls?|lining|shelf))\\b`,
  ),
  rule(
    'relit-hot-or-unaired',
    `\\b(?:did not|didn[’']t|never|without)\\b${WITHIN(25)}\\b(?:air(?:ing)?|clear(?:ing)?|ventilat\\w+)\\b${WITHIN(40)}\\bre-?(?:lit|light\\w*|ignit\\w+)\\b`,
  ),
  rule(
    'relit-hot-or-unaired',
    `\\b(?:straight (?:away|off|back)|at once|right away|immediately|(?:hot|red-hot|glowing) (?:walls?|lining|shelf|chamber))\\b${WITHIN(25)}\\bre-?(?:lit|ignit\\w+)\\b`,
  ),
  rule(
    'indoors',
    `\\b${FIRING}\\b${WITHIN(50)}\\b(?:in|inside|under)\\s+(?:(?:the|a|an|my|our|his|her|their)\\s+)?(?:[\\w-]+\\s+){0,2}${ROOM}\\b`,
    {
      except:
        /\b(?:stor(?:e|ed|age)|kept|keeps?|lives?|put away|winter(?:s|ed)?|dr(?:y|ied|ying))\b/i,
    },
  ),
  rule(
    'indoors',
    `\\b${FIRING}\\b${WITHIN(40)}\\bindoors\\b|\\bindoors\\b${WITHIN(30)}\\bfired\\b`,
    {
      except: /\b(?:stor(?:e|ed|age)|kept|keeps?|lives?|put away|dr(?:y|ied|ying))\b/i,
    },
  ),
  rule(
    'left-alone',
    `\\b(?:left|leave|leaving)\\s+(?:it|the (?:kiln|burner|firing|fire)|everything)\\s+(?:[\\w-]+\\s+){0,2}?(?:alone|unattended|unwatched|to itself|by itself|on its own)\\b`,
    { about: /\b(?:kiln|burner|firing|fire|fired|gas|flame)\b/i },
  ),
  rule(
    'left-alone',
    `\\b(?:went|gone|going|drove|popped)\\s+(?:off|in|inside|out|away|to|for|home)\\b${WITHIN(50)}\\b(?:while|with)\\b${WITHIN(20)}\\b(?:kiln|burner|it)\\b${WITHIN(15)}\\b(?:fir(?:ed|ing)|running|ran|burn(?:ed|ing)|going|climb(?:ed|ing)|lit|on)\\b`,
  ),
  rule('left-alone', `\\b(?:burner|kiln|firing)\\b${WITHIN(30)}\\bunattended\\b`),
  rule('left-alone', `\\b(?:nobody|no one) (?:was )?(?:watch(?:ed|ing)|with the kiln|there)\\b`, {
    about: /\b(?:kiln|burner|firing|gas|flame)\b/i,
  }),
  rule(
    'no-mask-in-smoke',
    `\\b(?:without (?:a |any |my |our )?${MASK}s?|no ${MASK}s?|(?:did not|didn[’']t|do not|don[’']t|never) (?:wear|bother with|need|use|put on) (?:a |any |my |our |the )?${MASK}s?|forgot (?:my|the|our|a) ${MASK}s?)\\b`,
    { about: /\b(?:smok\w*|reduc\w+|bin|sawdust|fum\w+|salts?|dust|fibre|ferric|lid)\b/i },
  ),
  rule(
    'heat-on-the-cylinder',
    `\\b${HEATER}\\b${WITHIN(25)}\\b(?:on|at|against|under|over|round|around|beside|next to|to)\\s+(?:the |a |our |my )?(?:[\\w-]+\\s+)?${CYLINDER}\\b`,
    { about: /\b(?:gas|propane|butane|cylinder|tank|regulator|frost\w*|hose)\b/i },
  ),
  rule(
    'heat-on-the-cylinder',
    `\\b(?:heat(?:ed|ing)?|warm(?:ed|ing)?(?: up)?)\\s+(?:up )?(?:the |our |my |a )?(?:[\\w-]+\\s+)?${CYLINDER}\\b`,
    { about: /\b(?:gas|propane|butane|cylinder|tank|regulator|frost\w*|hose)\b/i },
  ),
];

/** Said before the words, these turn them into advice against: "never", "do not", "instead of". */
const NEGATED_BEFORE =
  /\b(?:never|not|don[’']t|doesn[’']t|didn[’']t|won[’']t|wouldn[’']t|shouldn[’']t|mustn[’']t|can[’']?t|cannot|avoid(?:ed|ing)?|instead of|rather than|nobody should|no one should|no longer|stopped|no reason to|refus(?:e|ed) to|without)\b(?![^.!?\n]*\b(?:but|so i|so we|and then)\b[^.!?\n]*$)/i;
/** Said after them, these warn: "… is dangerous". */
const WARNED_AFTER =
  /^[^.!?\n]{0,60}\b(?:is|are|would be|can be|could be)\s+(?:very |really |so |too )?(?:dangerous|unsafe|deadly|not safe|never safe|forbidden|a bad idea)\b/i;

/** Sentences are read this far each way, so that a story without full stops stays quick to read. */
const SENTENCE_REACH = 300;

function sentenceStart(text: string, at: number): number {
  const furthest = Math.max(0, at - SENTENCE_REACH);
  for (let index = at - 1; index >= furthest; index -= 1) {
    if ('.!?\n'.includes(text.charAt(index))) return index + 1;
  }
  return furthest;
}
function sentenceEnd(text: string, at: number): number {
  const furthest = Math.min(text.length, at + SENTENCE_REACH);
  for (let index = at; index < furthest; index += 1) {
    if ('.!?\n'.includes(text.charAt(index))) return index;
  }
  return furthest;
}

/** The desk needs no more than this of one block to see what it is about. */
const MOST_PASSAGES = 20;

function passagesOf(text: string, blockIndex: number): UnsafePassage[] {
  const found: UnsafePassage[] = [];
  for (const { practice, pattern, about, except } of RULES) {
    if (about && !about.test(text)) continue;
    for (const match of text.matchAll(pattern)) {
      const from = match.index;
      const to = from + match[0].length;
      const start = sentenceStart(text, from);
      const sentence = text.slice(start, sentenceEnd(text, to));
      if (except?.test(sentence)) continue;
      if (NEGATED_BEFORE.test(text.slice(start, from))) continue;
      if (WARNED_AFTER.test(text.slice(to, to + SENTENCE_REACH))) continue;
      const told = found.some(
        (other) => other.practice === practice && other.from < to && from < other.to,
      );
      if (!told && found.length < MOST_PASSAGES) {
        found.push({ blockIndex, from, to, practice, reason: UNSAFE_PRACTICES[practice] });
      }
    }
  }
  return found.sort((a, b) => a.from - b.from);
}

/**
 * Passages that suggest a dangerous practice, for the moderators to look at. Words decide, so it
 * errs both ways; it never stops a note. Negated phrases ("never relight it hot"), warnings and
 * caution blocks do not count. The practices are those the cautions speak against (sources: North
 * Carolina Department of Labor, Furnace Explosions; US Consumer Product Safety Commission on carbon
 * monoxide; the rest common practice).
 */
export function unsafePassages(texts: readonly StoryText[]): UnsafePassage[] {
  return texts.flatMap(({ kind, text }, index) =>
    kind === 'caution' ? [] : passagesOf(text, index),
  );
}
