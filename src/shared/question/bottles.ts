import type { Item } from './items.ts';

const GAS: ReadonlySet<string> = new Set('gas propane butane lpg fuel'.split(' '));
const TANK_CUES: ReadonlySet<string> = new Set(
  (
    'gas propane butane lpg frost frosty freeze ice iced icy freezing valve regulator hose pressure empty refill ' +
    'exchange cylinder tank burner winter cold'
  ).split(' '),
);
const WARE_CUES: ReadonlySet<string> = new Set(
  (
    'neck rim glaze crack split come shape tall lustre matt copper crackle base foot lid throw raku ' +
    'pot dunt shatter explode break clay pale grey fire vase narrow bubble blister stuck'
  ).split(' '),
);

function nearest(items: readonly Item[], index: number, cues: ReadonlySet<string>): number {
  let best = Infinity;
  items.forEach((item, at) => {
    if (at === index || item.kind !== 'word') return;
    if (cues.has(item.lemma) || cues.has(item.text)) best = Math.min(best, Math.abs(at - index));
  });
  return best;
}

/**
 * "Bottle" is a gas cylinder beside gas, frost or a regulator, and a piece of ware beside a neck, a
 * rim or a crack. Where both stand in the question the nearer decides. Gas bottles become
 * "cylinder", so that the vocabulary never meets the wrong one. Only the first few are looked at.
 */
export function tellBottles(items: readonly Item[]): Item[] {
  let looked = 0;
  return items.map((item, index) => {
    if (item.kind !== 'word' || item.lemma !== 'bottle' || looked >= 5) return item;
    looked += 1;
    const before = items[index - 1];
    const gasBefore = before?.kind === 'word' && GAS.has(before.text);
    const heavy =
      before?.kind === 'quantity' &&
      before.quantity.type === 'other' &&
      before.quantity.unit.startsWith('k');
    const tank =
      gasBefore || heavy || nearest(items, index, TANK_CUES) < nearest(items, index, WARE_CUES);
    return tank ? { ...item, text: 'cylinder', lemma: 'cylinder' } : item;
  });
}
