import type { PartMeaning, QuestionPart, QuestionReading } from './reading-types.ts';

/** The fields a part stands for, emptied of it. */
function withoutOne(reading: QuestionReading, part: PartMeaning): QuestionReading {
  switch (part.kind) {
    case 'trouble':
      return { ...reading, trouble: reading.trouble.filter((kind) => kind !== part.value) };
    case 'not-trouble':
      return { ...reading, notTrouble: reading.notTrouble.filter((kind) => kind !== part.value) };
    case 'temperature':
      return {
        ...reading,
        tempC: null,
        toleranceC: null,
        tempMinC: null,
        tempMaxC: null,
        tempUnit: null,
      };
    case 'cone':
      return { ...reading, cone: null };
    case 'minutes':
      return { ...reading, minutes: null, minutesOp: null };
    case 'rate':
      return { ...reading, ratePerMin: null };
    case 'difference':
      return { ...reading, diffC: null };
    case 'form':
      return { ...reading, form: null };
    case 'size':
      return { ...reading, sizeCm: null };
    case 'glaze':
      return { ...reading, glaze: null };
    case 'cause':
      return { ...reading, causes: reading.causes.filter((cause) => cause !== part.value) };
    case 'change':
      return { ...reading, changes: reading.changes.filter((change) => change !== part.value) };
    case 'fuel':
      return { ...reading, fuel: null };
    case 'clay':
      return { ...reading, clay: null };
  }
}

/** Parts whose typed words, once switched off, are searched as text like any other words. */
const SAID_IN_WORDS: ReadonlySet<PartMeaning['kind']> = new Set([
  'trouble',
  'form',
  'glaze',
  'cause',
  'change',
] as const);

function typedWords(reading: QuestionReading, part: QuestionPart): string[] {
  if (!SAID_IN_WORDS.has(part.kind)) return [];
  const typed = reading.q.slice(part.span[0], part.span[1]).toLowerCase();
  return typed.split(/[^\p{L}]+/u).filter((word) => word.length > 2);
}

/**
 * A reading with some of its parts switched off, by key; unknown keys do nothing. The words such a
 * part was read from are searched as text instead, unless another part still stands on them.
 */
export function withoutParts(reading: QuestionReading, keys: readonly string[]): QuestionReading {
  const off = reading.parts.filter((part) => keys.includes(part.key));
  if (off.length === 0) return reading;
  const left = reading.parts.filter((part) => !keys.includes(part.key));
  const stillMeant = new Set(left.flatMap((part) => typedWords(reading, part)));
  const freed = off
    .flatMap((part) => typedWords(reading, part))
    .filter((word) => !stillMeant.has(word));
  const words = [...new Set([...reading.words.split(' '), ...freed])].filter((word) => word !== '');
  const emptied = off.reduce<QuestionReading>((kept, part) => withoutOne(kept, part), reading);
  return { ...emptied, words: words.join(' '), parts: left };
}
