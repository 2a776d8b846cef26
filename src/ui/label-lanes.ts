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
  /** Where the text begins, or ends if it stands to the left of its leader. */
  readonly textX: number;
  readonly anchor: 'start' | 'end';
  /** The text stands over its own leader, which then ends below it. */
  readonly over: boolean;
  /** 0 is the lane next to the drawing. */
  readonly lane: number;
}

const BESIDE_LEADER = 5;
const BETWEEN_TEXTS = 10;
const CROSSING_COST = 4;

interface Place {
  readonly lane: number;
  /** What the text and its bracket take up of the lane. */
  readonly from: number;
  readonly to: number;
  readonly leaderX: number | null;
  readonly textX: number;
  readonly cost: number;
}

/** Bricolage Grotesque's average advance is about 0.54 em; a little more keeps labels apart. */
export function estimateTextWidth(text: string, fontSize: number): number {
  return Math.ceil(text.length * fontSize * 0.56);
}

/** Most rounds in which each label may look for a better place, once the others have theirs. */
const MOST_ROUNDS = 10;

/**
 * Finds each label a lane and a side so that no text leaves the drawing or touches another text;
 * a leader passes through a text only where nothing else fits. Short labels and brackets choose
 * first, then the rest from right to left (a text standing to the right of its leader blocks
 * nobody), then each in turn looks again.
 */
export function placeLabels(
  wishes: readonly LabelWish[],
  width: number,
): { readonly placed: readonly PlacedLabel[]; readonly lanes: number } {
  const rank = (wish: LabelWish) => (wish.textWidth < 24 ? 0 : wish.spanToX !== undefined ? 1 : 2);
  const ordered = [...wishes].sort((one, other) => rank(one) - rank(other) || other.x - one.x);
  const places = new Map<string, Place>();
  for (let round = 0; round <= MOST_ROUNDS; round += 1) {
    let moved = false;
    for (const wish of ordered) {
      const before = places.get(wish.id);
      places.delete(wish.id);
      const now = bestPlace(wish, [...places.values()], width);
      places.set(wish.id, now);
      moved ||= before?.lane !== now.lane || before.textX !== now.textX;
    }
    if (!moved) break;
  }
  const placed = ordered.map((wish): PlacedLabel => {
    const place = places.get(wish.id);
    return {
      id: wish.id,
      x: wish.x,
      spanToX: wish.spanToX ?? null,
      ...anchored(wish, place?.textX ?? 0),
      lane: place?.lane ?? 0,
    };
  });
  return { placed, lanes: placed.reduce((most, label) => Math.max(most, label.lane + 1), 0) };
}

/** Where a label's text stands to its leader or bracket, tried in this order. */
function textPositions(wish: LabelWish, width: number): readonly number[] {
  const { x, textWidth, spanToX = x } = wish;
  const fits = (textX: number) => textX >= 0 && textX + textWidth <= width;
  const beside = [spanToX + BESIDE_LEADER, x - BESIDE_LEADER - textWidth].filter(fits);
  const over = Math.max(0, Math.min(x - textWidth / 2, width - textWidth));
  // A text over its own bracket would hide it: only where there is no room beside.
  return wish.spanToX !== undefined && beside.length > 0 ? beside : [...beside, over];
}

/** A text left of its leader is set against it, because its width is only an estimate. */
function anchored(wish: LabelWish, textX: number): Pick<PlacedLabel, 'textX' | 'anchor' | 'over'> {
  const end = textX + wish.textWidth;
  return end <= wish.x
    ? { textX: end, anchor: 'end', over: false }
    : { textX, anchor: 'start', over: textX <= wish.x };
}

function bestPlace(wish: LabelWish, taken: readonly Place[], width: number): Place {
  const isSpan = wish.spanToX !== undefined;
  const highest = taken.reduce((most, one) => Math.max(most, one.lane), -1) + 1;
  let best: Place | null = null;
  for (let lane = 0; lane <= highest; lane += 1) {
    for (const [order, textX] of textPositions(wish, width).entries()) {
      const from = isSpan ? Math.min(wish.x, textX) : textX;
      const to = Math.max(isSpan ? (wish.spanToX ?? 0) : 0, textX + wish.textWidth);
      const touches = taken.some(
        (one) =>
          one.lane === lane && from < one.to + BETWEEN_TEXTS && one.from < to + BETWEEN_TEXTS,
      );
      if (touches) continue;
      const leaderX = isSpan ? null : wish.x;
      const crossings = taken.filter(
        (one) =>
          (lane > one.lane && passes(leaderX, one)) ||
          (one.lane > lane && passes(one.leaderX, { from, to })),
      ).length;
      const cost = lane + crossings * CROSSING_COST + order * 0.1;
      if (!best || cost < best.cost) best = { lane, from, to, leaderX, textX, cost };
    }
  }
  if (!best) throw new Error('The lane above all others is empty, yet no place was found.');
  return best;
}

function passes(leaderX: number | null, text: { from: number; to: number }): boolean {
  return leaderX !== null && text.from - 2 < leaderX && leaderX < text.to + 2;
}
