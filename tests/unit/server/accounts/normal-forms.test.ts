import { describe, expect, it } from 'vitest';
import { cleanName, emailKeyOf, nameKeyOf } from '../../../../server/accounts/normal-forms.ts';

describe('nameKeyOf', () => {
  it.each([
    ['capitals', 'MIRA KILN'],
    ['a trailing space', 'Mira Kiln '],
    ['two spaces', 'Mira  Kiln'],
    ['a dotless i', 'Mıra Kıln'],
    ['an accent', 'Míra Kiln'],
    ['a combining accent', 'Mi\u0301ra Kiln'],
    ['full-width letters', 'Ｍｉｒａ Ｋｉｌｎ'],
    ['a Cyrillic a', 'Mirа Kiln'],
    ['a Greek iota and alpha', 'Mιrα Kiln'],
    ['a zero-width space', 'Mi\u200bra Kiln'],
    ['a soft hyphen', 'Mi\u00adra Kiln'],
    ['a direction mark', '\u202eMira Kiln'],
    ['a no-break space', 'Mira\u00a0Kiln'],
  ])('takes a name with %s for the same name', (_what, lookAlike) => {
    expect(nameKeyOf(lookAlike)).toBe(nameKeyOf('Mira Kiln'));
  });

  it('takes a long s for an s and a sharp s for two', () => {
    expect(nameKeyOf('Jeſsa')).toBe(nameKeyOf('Jessa'));
    expect(nameKeyOf('Strauß')).toBe(nameKeyOf('Strauss'));
  });

  it('keeps different names apart', () => {
    const keys = ['Mira Kiln', 'Mira Kilns', 'Mira', 'MiraKiln', '窯 焼', '窯'].map(nameKeyOf);
    expect(new Set(keys).size).toBe(keys.length);
  });

  it('is empty for a name of which nothing can be seen', () => {
    expect(nameKeyOf('\u200b\u2060\ufeff \u00ad')).toBe('');
  });

  it('fits its column however long the name grows', () => {
    expect(nameKeyOf('\ufdfa'.repeat(60)).length).toBeLessThanOrEqual(190);
  });
});

describe('cleanName', () => {
  it('makes one line of a name and keeps its letters', () => {
    expect(cleanName(' Élan\n\tder  Ofen\u202e ')).toBe('Élan der Ofen');
  });
});

describe('emailKeyOf', () => {
  it('puts ASCII letters in lower case and changes nothing else', () => {
    expect(emailKeyOf('Ash.Potter+Kiln@Example.ORG')).toBe('ash.potter+kiln@example.org');
  });

  it.each([
    'ash@exаmple.org',
    'aſh@example.org',
    'ash@example.org\r\nBcc: x',
    'ash @example.org',
    '',
  ])('is null for %j, which no stored address can be', (email) => {
    expect(emailKeyOf(email)).toBeNull();
  });
});
