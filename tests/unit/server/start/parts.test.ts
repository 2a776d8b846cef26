import { describe, expect, it } from 'vitest';
import { keepParts, type Part } from '../../../../server/start/parts.ts';
import type { Ending } from '../../../../server/start/processes.ts';

function aPart(name: string, stopOrder: number, log: string[], ended?: Promise<Ending>): Part {
  return {
    name,
    stopOrder,
    ended: ended ?? null,
    stop: async () => {
      log.push(`${name} asked`);
      await new Promise((resolve) => setTimeout(resolve, 10));
      log.push(`${name} stopped`);
    },
  };
}

describe('keepParts', () => {
  it('stops the server wholly before the database behind it', async () => {
    const log: string[] = [];
    const parts = keepParts();
    await parts.add(aPart('database', 2, log));
    await parts.add(aPart('server', 1, log));
    await parts.stopAll();
    expect(log).toEqual(['server asked', 'server stopped', 'database asked', 'database stopped']);
  });

  it('stops each part once, however often it is asked', async () => {
    const log: string[] = [];
    const parts = keepParts();
    await parts.add(aPart('server', 1, log));
    await Promise.all([parts.stopAll(), parts.stopAll()]);
    expect(log).toEqual(['server asked', 'server stopped']);
  });

  it('stops a part at once that is added during a stop', async () => {
    const log: string[] = [];
    const parts = keepParts();
    const stopping = parts.stopAll();
    await parts.add(aPart('late', 1, log));
    await stopping;
    expect(log).toEqual(['late asked', 'late stopped']);
    expect(parts.isStopping()).toBe(true);
  });

  it('reports the part that ended by itself, and how', async () => {
    const parts = keepParts();
    await parts.add(aPart('database', 2, [], Promise.resolve({ code: null, signal: 'SIGKILL' })));
    const failure = await parts.failure;
    expect(failure.message).toBe('The database has ended (signal SIGKILL), so Spyhole stops.');
    expect(failure.exitCode).not.toBe(0);
  });
});
