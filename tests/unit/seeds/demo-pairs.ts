import type { DemoFiring } from '../../../seeds/development/demo.ts';
import type { FiringReading } from '#shared/firing/types.ts';
import { namedTroubles } from '#shared/note/note-troubles.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import type { Change } from '#shared/vocabulary/changes.ts';
import type { Trouble } from '#shared/vocabulary/troubles.ts';
import { FAMILY_OF_FORM, type FormFamily } from '#shared/vocabulary/ware.ts';

/**
 * A second, plain counting of the pairs (a trouble and the same kiln's next firing), written for
 * these tests only, so that the demo does not lean on the code it demonstrates.
 */
export interface ReadFiring {
  readonly firing: DemoFiring;
  readonly fields: NoteFields;
  readonly reading: FiringReading;
}
export interface Cell {
  readonly pairs: number;
  readonly gone: number;
  readonly members: number;
}
type Paired = 'stall' | 'sag' | 'crack-in-firing' | 'weak-reduction';

const has = ({ fields, reading }: ReadFiring, trouble: Trouble): boolean => {
  if (trouble === 'stall') return reading.levels.some(({ kind }) => kind === 'stall');
  if (trouble === 'sag') return reading.sags.length > 0;
  return namedTroubles(fields).includes(trouble);
};

const cracked = ({ fields }: ReadFiring) =>
  fields.pieces.filter(
    (piece) =>
      piece.form !== null &&
      piece.cracks.some(
        ({ noticed }) => noticed === 'in-the-firing' || noticed === 'put-into-hot-kiln',
      ),
  );

/** Gone, not gone, or null where the two cannot be compared. */
function outcome(trouble: Paired, earlier: ReadFiring, next: ReadFiring): boolean | null {
  if (trouble === 'stall' || trouble === 'sag') {
    const [target, nextTarget] = [
      earlier.fields.plan.targetCelsius,
      next.fields.plan.targetCelsius,
    ];
    if (target === null || nextTarget === null || nextTarget < target - 50) return null;
    if (has(next, trouble)) return false;
    const level =
      trouble === 'stall'
        ? Math.max(
            ...earlier.reading.levels
              .filter(({ kind }) => kind === 'stall')
              .map(({ levelCelsius }) => levelCelsius),
          )
        : Math.max(...earlier.reading.sags.map(({ topCelsius }) => topCelsius));
    const aims = Math.min(
      earlier.reading.aimCelsius ?? Infinity,
      next.reading.aimCelsius ?? Infinity,
    );
    return next.reading.peak.celsius >= Math.min(level + 50, aims - 15);
  }
  if (trouble === 'crack-in-firing') {
    for (const piece of cracked(earlier)) {
      const family: FormFamily | null = piece.form && FAMILY_OF_FORM[piece.form];
      const alike = next.fields.pieces.filter(
        ({ form, spanMm }) =>
          form !== null &&
          FAMILY_OF_FORM[form] === family &&
          Math.abs((spanMm ?? 0) - (piece.spanMm ?? 0)) <= 0.3 * (piece.spanMm ?? 0),
      );
      if (alike.length > 0)
        return !cracked(next).some(({ form }) => form && FAMILY_OF_FORM[form] === family);
    }
    return null;
  }
  const route = earlier.fields.pieces.find(({ bareClay }) => bareClay !== 'black')?.route;
  const alike = next.fields.pieces.filter((piece) => piece.route === route);
  if (alike.length === 0) return null;
  return alike.every(({ bareClay, colour }) => bareClay === 'black' && colour === 'as-hoped');
}

/** Pairs by change (or `none`) for a trouble: one for each kiln and season. */
export function cellsOf(
  trouble: Paired,
  firings: readonly ReadFiring[],
): Map<Change | 'none', Cell> {
  const counted = new Set<string>();
  const found = new Map<Change | 'none', { gone: boolean; member: string }[]>();
  for (const [index, earlier] of firings.entries()) {
    const next = firings
      .slice(index + 1)
      .find((other) => other.firing.kilnKey === earlier.firing.kilnKey);
    if (!next || !has(earlier, trouble)) continue;
    if (earlier.fields.when.startClass !== next.fields.when.startClass) continue;
    if ((next.fields.when.unreportedFirings ?? 0) > 0) continue;
    const gone = outcome(trouble, earlier, next);
    if (gone === null) continue;
    const named = next.fields.changes.map(({ change }) => change);
    for (const change of named.length > 0 ? named : (['none'] as const)) {
      const once = `${change} ${earlier.firing.kilnKey} ${earlier.fields.when.date?.slice(0, 4) ?? ''}`;
      if (counted.has(once)) continue;
      counted.add(once);
      found.set(change, [...(found.get(change) ?? []), { gone, member: next.firing.authorKey }]);
    }
  }
  return new Map(
    [...found].map(([change, pairs]) => [
      change,
      {
        pairs: pairs.length,
        gone: pairs.filter((pair) => pair.gone).length,
        members: new Set(pairs.map(({ member }) => member)).size,
      },
    ]),
  );
}
