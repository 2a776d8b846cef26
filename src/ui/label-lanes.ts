/** A label that wants to stand above a point of a drawing, all lengths in the drawing's px. */
export interface LabelWish {
  readonly id: string;
  /** Where its leader goes down; for a bracket, its left end. */
  readonly x: number;
  /** The right end of a bracket drawn in the label's own lane. */
  readonly spanToX?: number;
  readonly textWidth: number;
}

export interface PlacedLabel {
  readonly id: string;
  readonly x: number;
  readonly spanToX: number | null;
  /** Left end of the text. */
  readonly textX: number;
  /** 0 is the lane next to the drawing. */
  readonly lane: number;
}

const BESIDE_LEADER = 5;
const BETWEEN_TEXTS = 10;
const CROSSING_COST = 4;

interface Taken {
  readonly lane: number;
  readonly from: number;
  readonly to: number;
  readonly leaderX: number | null;
}

/** Bricolage Grotesque's average advance is about 0.54 em; a little more keeps labels apart. */
export function estimateTextWidth(text: string, fontSize: number): number {
  return Math.ceil(text.length * fontSize * 0.56);
}

/**
 * Finds each label a lane and a side so that no text leaves the drawing or touches another text;
 * a leader passes through a text only where nothing else fits. Brackets choose first, then points
 * from right to left, so that a text standing to the right of its leader blocks nobody.
 */
export function placeLabels(
  wishes: readonly LabelWish[],
  width: number,
): { readonly placed: readonly PlacedLabel[]; readonly lanes: number } {
  const taken: Taken[] = [];
  const placed: PlacedLabel[] = [];
  const ordered = [...wishes].sort(
    (one, other) =>
      Number(other.spanToX !== undefined) - Number(one.spanToX !== undefined) || other.x - one.x,
  );
  for (const wish of ordered) {
    const best = bestPlace(wish, taken, width);
    taken.push(best);
    placed.push({
      id: wish.id,
      x: wish.x,
      spanToX: wish.spanToX ?? null,
      textX: best.textX,
      lane: best.lane,
    });
  }
  return { placed, lanes: placed.reduce((most, label) => Math.max(most, label.lane + 1), 0) };
}

function bestPlace(wish: LabelWish, taken: readonly Taken[], width: number) {
  const rightEdge = wish.spanToX ?? wish.x;
  const fitted = (textX: number) => Math.max(0, Math.min(textX, width - wish.textWidth));
  const sides = [
    rightEdge + BESIDE_LEADER,
    wish.x - BESIDE_LEADER - wish.textWidth,
    fitted(wish.x - wish.textWidth / 2),
  ].filter((textX) => textX >= 0 && textX + wish.textWidth <= width);
  if (sides.length === 0) sides.push(fitted(wish.x));

  let best: (Taken & { textX: number; cost: number }) | null = null;
  const highest = taken.reduce((most, one) => Math.max(most, one.lane), -1) + 1;
  for (let lane = 0; lane <= highest; lane += 1) {
    for (const [order, textX] of sides.entries()) {
      const isSpan = wish.spanToX !== undefined;
      // A centred text would lie on its own bracket.
      if (isSpan && textX < rightEdge && textX + wish.textWidth > wish.x && sides.length > 1)
        continue;
      const from = isSpan ? Math.min(wish.x, textX) : textX;
      const to = Math.max(isSpan ? rightEdge : 0, textX + wish.textWidth);
      if (overlaps(taken, lane, from, to)) continue;
      const crossings = taken.filter(
        (one) =>
          (!isSpan && one.lane < lane && one.from - 2 < wish.x && wish.x < one.to + 2) ||
          (one.leaderX !== null &&
            one.lane > lane &&
            from - 2 < one.leaderX &&
            one.leaderX < to + 2),
      ).length;
      const cost = lane + crossings * CROSSING_COST + order * 0.1;
      if (!best || cost < best.cost) {
        best = { lane, from, to, leaderX: isSpan ? null : wish.x, textX, cost };
      }
    }
  }
  // The lane above all others is empty, so something was found.
  return best ?? { lane: highest, from: 0, to: width, leaderX: wish.x, textX: 0, cost: 0 };
}

function overlaps(taken: readonly Taken[], lane: number, from: number, to: number): boolean {
  return taken.some(
    (one) => one.lane === lane && from < one.to + BETWEEN_TEXTS && one.from < to + BETWEEN_TEXTS,
  );
}
