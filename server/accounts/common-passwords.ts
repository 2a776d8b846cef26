/**
 * Common passwords of 15 characters and more. Published lists hold hardly any that long, so this one
 * is GENERATED: from what people do when a short password is refused. They double it, walk along
 * the keyboard, add a year, write out a well-known phrase. Compared without case and signs, so
 * one entry stands for many spellings. Nothing is looked up over the network.
 */

const MIN_LENGTH = 15;

const WORDS =
  `password passwort letmein welcome dragon monkey sunshine princess football baseball master shadow
  superman batman trustno iloveyou whatever freedom starwars computer internet secret admin login
  michael jordan charlie thomas jessica jennifer summer winter spring autumn flower cookie chocolate
  butterfly orange purple yellow banana cheese pepper ginger hunter ranger soccer hockey tigger
  pokemon money love angel baby qwerty access mustang corvette ferrari mercedes liverpool arsenal
  chelsea london england america canada australia family mother father sister brother
  pottery ceramics ceramic potter glaze kiln raku clay firing furnace stoneware porcelain studio`
    .split(/\s+/)
    .filter((word, index, all) => all.indexOf(word) === index);

const ENDINGS = ['', '1', '12', '123', '1234', '12345', '123456', '1234567', '12345678', '0', '00'];
const YEARS = Array.from({ length: 61 }, (_, index) => String(1970 + index));

const KEYBOARD_ROWS = [
  'qwertyuiop',
  'asdfghjkl',
  'zxcvbnm',
  '1234567890',
  '0987654321',
  'qwertzuiop',
  'azertyuiop',
  'abcdefghijklmnopqrstuvwxyz',
  'zyxwvutsrqponmlkjihgfedcba',
  '1qaz2wsx3edc4rfv5tgb6yhn7ujm8ik9ol0p',
  'zaq1xsw2cde3vfr4bgt5nhy6mju7',
  'qazwsxedcrfvtgbyhnujmikolp',
  '1q2w3e4r5t6y7u8i9o0p',
  'q1w2e3r4t5y6u7i8o9p0',
  'qwertyuiopasdfghjklzxcvbnm',
  '01234567890123456789',
  '11223344556677889900',
  'aabbccddeeffgghhiijj',
];

const PHRASES = `
  correct horse battery staple
  to be or not to be
  to be or not to be that is the question
  may the force be with you
  i love you so much
  i love you forever
  let me in please
  open sesame please
  the quick brown fox
  the quick brown fox jumps over the lazy dog
  jumps over the lazy dog
  once upon a time
  happily ever after
  happy birthday to you
  merry christmas everyone
  in the beginning
  our father who art in heaven
  the lord is my shepherd
  i have a dream today
  i think therefore i am
  carpe diem carpe diem
  live laugh love forever
  home sweet home
  there is no place like home
  never gonna give you up
  never say never again
  practice makes perfect
  practise makes perfect
  time flies when you are having fun
  an apple a day keeps the doctor away
  all you need is love
  let it be let it be
  hello world hello world
  this is my password
  this is a password
  this is my secret password
  my password is password
  my secret password
  what is my password
  i forgot my password
  i hate passwords
  change me please
  change this password
  default password
  administrator
  password password
  please let me in
  nobody knows this
  twinkle twinkle little star
  mary had a little lamb
  row row row your boat
  winter is coming soon
  houston we have a problem
  elementary my dear watson
  keep calm and carry on
  god save the king
  god save the queen
  rule britannia
  one two three four five
  one two three four
  four score and seven years ago
  we the people of the united states
  monday tuesday wednesday
  january february march
  red orange yellow green
  keep the kiln hot
  fire and clay and smoke
  out of the frying pan
`
  .split('\n')
  .map((phrase) => phrase.trim())
  .filter((phrase) => phrase !== '');

/** How passwords are compared: small letters and digits only, common substitutions undone. */
export function squash(password: string): string {
  return password
    .normalize('NFKC')
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]/gu, '');
}

const SUBSTITUTIONS: Readonly<Record<string, string>> = {
  '0': 'o',
  '1': 'i',
  '3': 'e',
  '4': 'a',
  '5': 's',
  '7': 't',
  '@': 'a',
  $: 's',
};
const unsubstituted = (password: string): string =>
  squash([...password.toLowerCase()].map((sign) => SUBSTITUTIONS[sign] ?? sign).join(''));

function generate(): Set<string> {
  const list = new Set<string>();
  const add = (candidate: string): void => {
    if (candidate.length >= MIN_LENGTH) list.add(candidate);
  };
  for (const word of WORDS) {
    // The word over and over, with an ending.
    const twice = word.repeat(2);
    const thrice = word.repeat(3);
    const enough = word.repeat(Math.ceil(MIN_LENGTH / word.length));
    for (const base of [twice, thrice, enough]) for (const end of ENDINGS) add(base + end);
    for (const year of YEARS) {
      add(`${word}${year}${word}`);
      add(`${twice}${year}`);
    }
    // The word filled up with the digits in their order, or one digit.
    for (const digits of ['123456789012345', '012345678901234', '987654321098765']) {
      const missing = Math.max(0, MIN_LENGTH - word.length);
      for (const length of [missing, missing + 1]) add(word + digits.slice(0, length));
    }
    for (const digit of '0123456789') add(word.padEnd(MIN_LENGTH, digit));
    for (const other of WORDS) if (other !== word) add(`${word}${other}`);
  }
  for (const row of KEYBOARD_ROWS) {
    const back = [...row].reverse().join('');
    for (const line of [row.repeat(4), back.repeat(4), (row + back).repeat(2)]) {
      for (let start = 0; start < row.length; start += 1) {
        for (const length of [15, 16, 17, 18, 20, 24, 26]) add(line.slice(start, start + length));
      }
    }
  }
  for (const phrase of PHRASES) {
    // With its spaces too: some have 15 characters only with them.
    for (const written of [phrase, squash(phrase)]) {
      for (const end of [...ENDINGS, ...YEARS.slice(-20)]) {
        add(written + end);
        add(`${written} ${end}`.trim());
      }
    }
  }
  return list;
}

let list: ReadonlySet<string> | undefined;
/** The whole list, squashed; made when it is first asked for. */
export function commonPasswords(): ReadonlySet<string> {
  list ??= generate();
  return list;
}

/** "aaaaaaaaaaaaaaa", "abcabcabcabcabc": one short group over and over. */
const REPEATED = /^([\x20-\x7e]{1,6}?)\1+[\x20-\x7e]{0,5}$/;
const isRepeated = (password: string): boolean => {
  const match = REPEATED.exec(password);
  const group = match?.[1];
  if (group === undefined) return false;
  return group.repeat(Math.ceil(password.length / group.length)).startsWith(password);
};

const PRODUCT_WORDS = ['spyhole', 'raku', 'kiln', 'firing', 'password', 'notebook', 'pottery'];
/** What has to be left of a password when the words anyone would guess are taken away. */
const MUST_REMAIN = 8;

export interface Person {
  readonly name: string;
  readonly email: string;
}

/**
 * What is wrong with a new password, in words for its owner; null when nothing is (NIST SP
 * 800-63B-4 section 3.1.1.2, ASVS 6.2.4 and 6.2.11). Its length has been checked before.
 */
export function passwordFault(password: string, person: Person): string | null {
  const squashed = squash(password);
  if (
    commonPasswords().has(password.toLowerCase().replace(/[\s_.-]+/g, ' ')) ||
    commonPasswords().has(squashed) ||
    commonPasswords().has(unsubstituted(password)) ||
    isRepeated(password)
  ) {
    return 'This is one of the passwords that are tried first. Take another one.';
  }
  if (remainder(squashed, personalWords(person)).length < MUST_REMAIN && squashed !== '') {
    return 'This is mostly your name or address. Take another one.';
  }
  if (
    remainder(squashed, [...PRODUCT_WORDS, ...personalWords(person)]).length < MUST_REMAIN &&
    squashed !== ''
  ) {
    return 'This is mostly words that anyone here would think of. Take another one.';
  }
  return null;
}

function personalWords({ name, email }: Person): string[] {
  const parts = [name, email, ...name.split(/\s+/), ...email.split(/[@.+_-]/)];
  return parts
    .map(squash)
    .filter((part) => part.length >= 3)
    .sort((left, right) => right.length - left.length);
}

/** The password without the words, and without the digits of years and counting. */
function remainder(squashed: string, words: readonly string[]): string {
  let rest = squashed;
  for (const word of words) rest = rest.split(word).join(' ');
  if (rest === squashed) return squashed;
  return rest.replace(/(19|20)\d\d|0?1234567890?|123456|12345|1234|123|\s/g, '');
}
