import { outdoorDrawings } from './outdoors.ts';
import { plateDrawings } from './plates.ts';
import { copperPots } from './pots-copper.ts';
import { cracklePots } from './pots-crackle.ts';
import { faultDrawings } from './pots-faults.ts';
import { smokePots } from './pots-smoke.ts';
import { sectionDrawings } from './sections.ts';
import type { Drawing } from './sheet.ts';

/** Every drawing of the demo, made when asked for. */
export function allDrawings(): Drawing[] {
  return [
    ...cracklePots,
    ...smokePots,
    ...copperPots,
    ...plateDrawings,
    ...faultDrawings,
    ...sectionDrawings,
    ...outdoorDrawings,
  ].map((draw) => draw());
}
