import { beforeAll, describe, expect, it } from 'vitest';
import { measuredTroubles } from '#shared/firing/findings.ts';
import { readFiring } from '#shared/firing/read-firing.ts';
import { quantile } from '#shared/statistics/quantile.ts';
import type { Judgement } from '../../../support/judged/judge.ts';
import { f1, judgeAll, JUDGED_KIND_IDS } from '../../../support/judged/judge.ts';
import { judgedRecord } from '../../../support/judged/records.ts';

const seedsFrom = (first: number, count: number) =>
  Array.from({ length: count }, (_, i) => first + i);

// Looser than what is measured by `npm run bench`, whose table says how much.
describe('of 414 made-up records as loggers and people write them', () => {
  let judgement: Judgement;
  beforeAll(() => {
    judgement = judgeAll(seedsFrom(1, 23));
  }, 120_000);

  it('are of every kind of firing', () => {
    expect(judgement.records).toBe(23 * JUDGED_KIND_IDS.length);
    expect(judgement.records).toBeGreaterThanOrEqual(400);
  });
  it('stalls are found, and none invented', () => {
    expect(judgement.stalls.found).toBeGreaterThan(40);
    expect(f1(judgement.stalls), judgement.faults.join('\n')).toBeGreaterThanOrEqual(0.96);
  });
  it('sags are found, and none invented', () => {
    expect(judgement.sags.found).toBeGreaterThan(8);
    expect(f1(judgement.sags), judgement.faults.join('\n')).toBeGreaterThanOrEqual(0.93);
  });
  it('the level of a stall is right to 2 °C and its start to 2 min, by the median', () => {
    expect(quantile(judgement.stallLevelErrors, 0.5)).toBeLessThan(2);
    expect(quantile(judgement.stallStartErrors, 0.5)).toBeLessThan(2);
  });
  it('time to temperature is right to 1 min nine times in ten', () => {
    expect(quantile(judgement.timeErrors, 0.9)).toBeLessThan(1.2);
  });
  it('hold and quartz crossing are right to half a minute and 8 %, by the median', () => {
    expect(quantile(judgement.holdErrors, 0.5)).toBeLessThan(0.6);
    expect(quantile(judgement.crossingErrors, 0.5)).toBeLessThan(0.08);
  });
});

it('no trouble is invented on a hundred plain records', () => {
  const invented = seedsFrom(5001, 100).flatMap((seed) => {
    const { input } = judgedRecord('plain', seed);
    const reading = readFiring({ ...input, startClass: 'cold' });
    return reading === null
      ? ['unread']
      : measuredTroubles(reading).map((one) => `${seed}: ${one}`);
  });
  expect(invented).toEqual([]);
});
