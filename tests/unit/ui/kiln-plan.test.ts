import { describe, expect, it } from 'vitest';
import { kilnInWords } from '../../../src/ui/kiln-dimensions.ts';
import type { KilnDimensions } from '../../../src/ui/kiln-dimensions.ts';
import { burnerPlan } from '../../../src/ui/kiln-plan.ts';
import type { BurnerPlan } from '../../../src/ui/kiln-plan.ts';

const ROUND: KilnDimensions = {
  shape: 'round',
  insideWidthMm: 400,
  insideHeightMm: 500,
  wall: 'fibre',
  wallMm: 50,
};
const SQUARE: KilnDimensions = { ...ROUND, shape: 'square', insideDepthMm: 300 };
const planOf = (kiln: KilnDimensions, angleDegrees: number, setbackMm = 0) =>
  burnerPlan({ ...kiln, burner: { angleDegrees, setbackMm } }) as BurnerPlan;

describe('burnerPlan', () => {
  it('aims a burner at 90° through the middle to the far wall', () => {
    const plan = planOf(ROUND, 90);
    expect(plan.aim.x).toBeCloseTo(1, 9);
    expect(plan.meets.x).toBeCloseTo(200, 6);
    expect(plan.meets.y).toBeCloseTo(0, 6);
    expect(plan.throughWallMm).toBeCloseTo(50, 6);
  });

  it('sweeps round the wall at a smaller angle: the flame meets it sooner, off the middle', () => {
    const plan = planOf(ROUND, 60);
    expect(Math.hypot(plan.meets.x, plan.meets.y)).toBeCloseTo(200, 6);
    expect(plan.meets.y).toBeLessThan(-100);
    expect(plan.throughWallMm).toBeGreaterThan(50);
  });

  it('puts the tip outside by the setback, and inside the port when it is negative', () => {
    expect(planOf(ROUND, 90, 50).tip.x).toBeCloseTo(-300, 6);
    expect(planOf(ROUND, 90, -20).tip.x).toBeCloseTo(-230, 6);
  });

  it('meets the side of a square kiln where that is nearer than its far wall', () => {
    const plan = planOf(SQUARE, 45);
    expect(plan.meets.y).toBeCloseTo(-150, 6);
    expect(plan.meets.x).toBeCloseTo(-100, 6);
  });

  it('stays finite at angles that would pass the port', () => {
    for (const kiln of [ROUND, SQUARE]) {
      const plan = planOf(kiln, 0);
      expect(Number.isFinite(plan.meets.x + plan.meets.y + plan.throughWallMm)).toBe(true);
    }
  });

  it('is null without a burner', () => {
    expect(burnerPlan(ROUND)).toBeNull();
  });
});

describe('kilnInWords', () => {
  it('says what is drawn and nothing that is not given', () => {
    expect(kilnInWords(ROUND)).toBe(
      'A round kiln, inside 400 mm across and 500 mm high; ceramic fibre wall of 50 mm.',
    );
    expect(
      kilnInWords({
        ...SQUARE,
        wall: 'brick',
        wallMm: 115,
        flue: { place: 'wall', openingMm: 100 },
        burner: { angleDegrees: 45, setbackMm: -20, count: 2 },
      }),
    ).toBe(
      'A square kiln, inside 400 by 300 mm and 500 mm high; brick wall of 115 mm; flue of 100 mm in the wall; 2 burners at 45° to the wall, its tip 20 mm inside the port.',
    );
  });
});
