import argon2 from 'argon2';
import { describe, expect, it } from 'vitest';
import { hashPassword, isOutdated, isPassword } from '../../../../server/accounts/hashing.ts';

describe('hashPassword', () => {
  it('makes argon2id hashes of at least 19 MiB and two passes, each with its own 16-byte salt', async () => {
    const [first, second] = await Promise.all([hashPassword('one'), hashPassword('one')]);
    expect(first).toMatch(/^\$argon2id\$v=19\$m=19456,p=1,t=2\$/);
    expect(first).not.toBe(second);
    const salt = Buffer.from((first ?? '').split('$')[4] ?? '', 'base64');
    expect(salt).toHaveLength(16);
  });

  it('tells more than four at work and forty waiting to come back later', async () => {
    const outcomes = await Promise.allSettled(
      Array.from({ length: 60 }, () => hashPassword('one of many')),
    );
    const refused = outcomes.filter((outcome) => outcome.status === 'rejected');
    expect(refused).toHaveLength(16);
    expect(refused[0]?.reason).toMatchObject({ code: 'busy', details: { retryAfter: 3 } });
    // And the places are free again.
    await expect(hashPassword('afterwards')).resolves.toContain('$argon2id$');
  });
});

describe('isPassword', () => {
  it('reads the password to its last character', async () => {
    const hash = await hashPassword(`${'x'.repeat(255)}a`);
    expect(await isPassword(hash, `${'x'.repeat(255)}a`)).toBe(true);
    expect(await isPassword(hash, `${'x'.repeat(255)}b`)).toBe(false);
    expect(await isPassword(hash, 'x'.repeat(255))).toBe(false);
  });

  it('takes about as long for an unknown address as for a wrong password', async () => {
    const hash = await hashPassword('the right one');
    await isPassword(null, 'warm up');
    const times = { known: [] as number[], unknown: [] as number[] };
    for (let round = 0; round < 9; round += 1) {
      for (const kind of ['known', 'unknown'] as const) {
        const startedAt = performance.now();
        expect(await isPassword(kind === 'known' ? hash : null, 'a wrong one')).toBe(false);
        times[kind].push(performance.now() - startedAt);
      }
    }
    const median = (list: number[]): number => list.sort((a, b) => a - b)[4] ?? Number.NaN;
    const known = median(times.known);
    expect(Math.abs(median(times.unknown) - known)).toBeLessThan(Math.max(25, known / 4));
  });

  it('takes a composed and a decomposed letter for the same', async () => {
    const hash = await hashPassword('caf\u00e9');
    expect(await isPassword(hash, 'cafe\u0301')).toBe(true);
  });
});

describe('isOutdated', () => {
  it('is true for weaker parameters only', async () => {
    const weak = await argon2.hash('x', { memoryCost: 8192, timeCost: 1, parallelism: 1 });
    expect(isOutdated(weak)).toBe(true);
    expect(isOutdated(await hashPassword('x'))).toBe(false);
  });
});
