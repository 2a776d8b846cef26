/**
 * The one form in which addresses and names are compared (ASVS 1.1.1, 2.2.1). Two strings that a
 * reader would take for the same have the same form, so nobody can join as somebody else's double.
 */

/** Letters of other scripts, and Latin ones of their own, that look like one of a to z. */
const LOOK_ALIKES: ReadonlyMap<string, string> = new Map([
  // Cyrillic
  ...pairs('авеѕіјкмнорстухһԁԛԝьү', 'abesijkmhopctyxhdqwby'),
  // Greek
  ...pairs('αβγεζηικμνορτυχω', 'abyeznikuvoptuxw'),
  // Armenian
  ...pairs('օոսցհ', 'onugh'),
  // Latin
  ...pairs('ıȷɩɪɑɡɫłøđħŧ', 'ijiiagllodht'),
]);

function pairs(from: string, to: string): [string, string][] {
  const targets = [...to];
  return [...from].map((letter, index) => [letter, targets[index] ?? letter]);
}

/** Everything that takes no room on the page: zero-width, direction marks, variation selectors. */
const INVISIBLE = /[\p{Default_Ignorable_Code_Point}\p{Cf}\p{Cc}]/gu;

/**
 * A name's key: NFKC, case folded (dotless i and long s too), without accents and invisible
 * characters, look-alike letters as Latin ones, spaces as one. '' when nothing visible is left.
 */
export function nameKeyOf(name: string): string {
  const folded = name
    .normalize('NFKC')
    .replace(/\s+/gu, ' ')
    .replace(INVISIBLE, '')
    // Upper first: ſ becomes S, ı becomes I, ß becomes SS.
    .toUpperCase()
    .toLowerCase()
    .normalize('NFKD')
    .replace(/\p{M}/gu, '');
  return [...folded]
    .map((letter) => LOOK_ALIKES.get(letter) ?? letter)
    .join('')
    .replace(/\s+/gu, ' ')
    .trim()
    .slice(0, 190);
}

/** A name as it is kept and shown: one line, no invisible characters that turn or split text. */
export function cleanName(name: string): string {
  return name
    .normalize('NFC')
    .replace(/\s+/gu, ' ')
    .replace(/[\u00ad\u200b\u200e\u200f\u2028-\u202e\u2060-\u2069\ufeff]/gu, '')
    .trim();
}

/**
 * An address's key: ASCII letters in lower case, nothing else changed, so a look-alike is another
 * address. Null for what no stored address can be: those are ASCII.
 */
export function emailKeyOf(email: string): string | null {
  if (!/^[!-~]{3,254}$/.test(email)) return null;
  return email.replace(/[A-Z]/g, (letter) => letter.toLowerCase());
}
