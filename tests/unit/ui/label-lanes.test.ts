import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { placeLabels } from '../../../src/ui/label-lanes.ts';
import type { LabelWish, PlacedLabel } from '../../../src/ui/label-lanes.ts';

const extent = (label: PlacedLabel, wish: LabelWish) => {
  const left = label.anchor === 'end' ? label.textX - wish.textWidth : label.textX;
  return { left, right: left + wish.textWidth };
};

describe('placeLabels', () => {
  it('sets a label to the right of its point in the lowest lane', () => {
    const { placed, lanes } = placeLabels([{ id: 'a', x: 100, textWidth: 60 }], 500);
    expect(placed[0]).toMatchObject({ lane: 0, textX: 105, anchor: 'start' });
    expect(lanes).toBe(1);
  });

  it('turns a label to the left where the right edge would clip it', () => {
    const { placed } = placeLabels([{ id: 'a', x: 480, textWidth: 60 }], 500);
    expect(placed[0]).toMatchObject({ lane: 0, textX: 475, anchor: 'end' });
  });

  it('ends the leader below a text that has to stand over it', () => {
    const { placed } = placeLabels([{ id: 'a', x: 60, textWidth: 100 }], 120);
    expect(placed[0]).toMatchObject({ textX: 10, over: true });
  });

  it('stacks labels that share a point and crosses none of them', () => {
    const wishes = ['a', 'b', 'c'].map((id) => ({ id, x: 250, textWidth: 200 }));
    const { placed, lanes } = placeLabels(wishes, 500);
    expect(new Set(placed.map((label) => `${label.lane} ${label.textX}`)).size).toBe(3);
    expect(lanes).toBe(2);
  });

  it('never lets a text leave the drawing or touch another, whatever is asked', () => {
    const wish = fc.record({
      x: fc.integer({ min: 0, max: 360 }),
      textWidth: fc.integer({ min: 8, max: 150 }),
      spanWidth: fc.option(fc.integer({ min: 0, max: 100 }), { nil: undefined }),
    });
    fc.assert(
      fc.property(fc.array(wish, { maxLength: 14 }), (raw) => {
        const wishes = raw.map(({ x, textWidth, spanWidth }, index): LabelWish => ({
          id: String(index),
          x,
          textWidth,
          ...(spanWidth === undefined ? {} : { spanToX: Math.min(360, x + spanWidth) }),
        }));
        const { placed } = placeLabels(wishes, 360);
        expect(placed).toHaveLength(wishes.length);
        const boxes = placed.map((label) => ({
          lane: label.lane,
          ...extent(label, wishes.find(({ id }) => id === label.id) as LabelWish),
        }));
        for (const [index, box] of boxes.entries()) {
          expect(box.left).toBeGreaterThanOrEqual(0);
          expect(box.right).toBeLessThanOrEqual(360);
          for (const other of boxes.slice(index + 1)) {
            const apart =
              other.lane !== box.lane || other.left >= box.right || box.left >= other.right;
            expect(apart).toBe(true);
          }
        }
      }),
    );
  });
});
