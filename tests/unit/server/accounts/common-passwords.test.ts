import { describe, expect, it } from 'vitest';
import { commonPasswords, passwordFault } from '../../../../server/accounts/common-passwords.ts';

const PERSON = { name: 'Mira Ashgrove', email: 'mira.ashgrove@example.org' };

describe('commonPasswords', () => {
  it('holds at least 3,000 different passwords, each of 15 characters or more', () => {
    const list = [...commonPasswords()];
    expect(list.length).toBeGreaterThanOrEqual(3000);
    expect(list.filter((password) => [...password].length < 15)).toEqual([]);
  });

  it('is the same every time', () => {
    expect([...commonPasswords()]).toEqual([...commonPasswords()]);
  });
});

describe('passwordFault', () => {
  it.each([
    'passwordpassword',
    'PasswordPassword1',
    'password password 123',
    'p4ssw0rdp4ssw0rd',
    'qwertyuiopasdfg',
    'qwertyuiopqwertyuiop',
    '123456789012345',
    '1q2w3e4r5t6y7u8',
    '1qaz2wsx3edc4rfv',
    'zxcvbnmzxcvbnmz',
    'abcdefghijklmnop',
    'aaaaaaaaaaaaaaaa',
    'abcabcabcabcabc',
    '!!!!!!!!!!!!!!!!',
    'Correct Horse Battery Staple',
    'correct-horse-battery-staple1',
    'to be or not to be',
    'The quick brown fox 2024',
    'sunshineprincess',
    'iloveyouiloveyou',
    'dragon2019dragon',
    'monkey123456789',
  ])('refuses the common password %j', (password) => {
    expect(passwordFault(password, PERSON)).toMatch(/tried first/);
  });

  it.each([
    'miraashgrove123456',
    'Mira Ashgrove 1984',
    'mira.ashgrove@example.org',
    'ashgroveashgrove',
    'MiraMiraMira2020',
    'spyhole raku kiln',
    'SpyholeSpyhole1',
    'raku kiln password',
    'kilnkilnkilnkiln',
    'ashgrove-spyhole-1',
    'mira spyhole 2026',
  ])('refuses %j, which is made of words anyone here would think of', (password) => {
    expect(passwordFault(password, PERSON)).not.toBeNull();
  });

  it.each([
    'ember lantern gravel 88',
    'vqkzpwmxjtrnybd',
    'my kiln door sticks in wet weather',
    'Mira once dropped three teapots',
    '🔥🏺🌋🪨💨🌙⭐🍂🐝🦊🐢🌻🍋🎈🪵',
    'ゆうやけこやけでひがくれてやまの',
    'x'.repeat(8) + 'ember lantern gravel',
  ])('takes %j', (password) => {
    expect(passwordFault(password, PERSON)).toBeNull();
  });
});
