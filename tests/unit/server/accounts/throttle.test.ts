import { describe, expect, it } from 'vitest';
import { clientOf, nextTries, THROTTLES } from '../../../../server/accounts/throttle.ts';

const { signInOfAccount, joining } = THROTTLES;

describe('nextTries', () => {
  it('counts tries within a window that begins with the first', () => {
    expect(nextTries(joining, { count: 0, secondsLeft: 0 })).toEqual({
      count: 1,
      windowSeconds: 1800,
    });
    expect(nextTries(joining, { count: 4, secondsLeft: 100 })).toEqual({
      count: 5,
      windowSeconds: 100,
    });
  });

  it('makes the one over the limit wait for the end of the window, then begins anew', () => {
    expect(nextTries(joining, { count: 5, secondsLeft: 100 })).toEqual({ waitSeconds: 100 });
    expect(nextTries(joining, { count: 5, secondsLeft: -1 })).toMatchObject({ count: 1 });
  });

  it('doubles the wait of an account with every further wrong password, up to six hours', () => {
    const waits: number[] = [];
    let count = 10;
    for (let index = 0; index < 8; index += 1) {
      const next = nextTries(signInOfAccount, { count, secondsLeft: -1 });
      if ('waitSeconds' in next) throw new Error('A wait that is over must let one try through.');
      expect(nextTries(signInOfAccount, { count: next.count, secondsLeft: 1 })).toHaveProperty(
        'waitSeconds',
      );
      waits.push(next.windowSeconds / 60);
      count = next.count;
    }
    expect(waits).toEqual([30, 60, 120, 240, 360, 360, 360, 360]);
  });

  it('forgets after a quiet day', () => {
    expect(nextTries(signInOfAccount, { count: 40, secondsLeft: -86_401 })).toMatchObject({
      count: 1,
    });
  });
});

describe('clientOf', () => {
  it.each([
    ['192.0.2.7', '192.0.2.7'],
    ['::ffff:192.0.2.7', '192.0.2.7'],
    ['2001:db8:1:2:3:4:5:6', '2001:db8:1:2'],
    ['2001:0DB8:0001:0002::9', '2001:db8:1:2'],
    ['2001:db8::1', '2001:db8:0:0'],
    ['::1', '0:0:0:0'],
    ['fe80::1%eth0', 'fe80:0:0:0'],
  ])('takes %s for %s', (address, client) => {
    expect(clientOf(address)).toBe(client);
  });
});
