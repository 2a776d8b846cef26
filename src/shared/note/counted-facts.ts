import type { Finding } from '../firing/findings.ts';
import { MEASURED_TROUBLES } from '../vocabulary/troubles.ts';
import type { Trouble } from '../vocabulary/troubles.ts';
import type { FiringFacts } from './facts.ts';
import { disputeAbout, leavesFigures, type StandingDispute } from './finding-disputes.ts';

/** A firing's facts without what its author disputes: what lists, search and figures work on. */
export interface CountedFacts extends FiringFacts {
  /**
   * Troubles that the record shows by disputed findings only. They count nowhere, not even where
   * the author ticked them too, but are counted as disputed.
   */
  readonly disputed: readonly Trouble[];
}

const EXACT = 1e-6;
const same = (one: number | undefined, other: number): boolean =>
  one !== undefined && Math.abs(one - other) < EXACT;

/**
 * Takes out of a firing's facts every number that a disputed finding tells; a restored one counts.
 * Of two stalls one of which is disputed, the other stays a stall. The time to temperature goes
 * with *reached*, the peak with *overshoot* and *not reached*, the rates with the last crossing.
 */
export function countedFacts(
  facts: FiringFacts,
  findings: readonly Finding[],
  disputes: readonly StandingDispute[],
): CountedFacts {
  const standing = disputes.filter(leavesFigures);
  const out = findings.filter((finding) => disputeAbout(finding, findings, standing) !== null);
  if (out.length === 0) return { ...facts, disputed: [] };
  const isOut = (code: Finding['code']): boolean => out.some((finding) => finding.code === code);
  const disputed = MEASURED_TROUBLES.filter((trouble) => {
    const ofTrouble = findings.filter((finding) => finding.trouble === trouble);
    return ofTrouble.length > 0 && ofTrouble.every((finding) => out.includes(finding));
  });
  const counts = (trouble: Trouble): boolean => !disputed.some((other) => other === trouble);
  const lastCrossing = findings.findLast(({ code }) => code === 'quartz-crossing');
  const crossingOut = lastCrossing !== undefined && out.includes(lastCrossing);
  return {
    ...facts,
    measuredTroubles: facts.measuredTroubles.filter(counts),
    namedTroubles: facts.namedTroubles.filter(counts),
    stalls: facts.stalls.filter(
      ({ fromMinute }) =>
        !out.some((finding) => finding.code === 'stall' && same(finding.fromMinute, fromMinute)),
    ),
    sags: facts.sags.filter(
      ({ topCelsius, dropCelsius }) =>
        !out.some(
          ({ code, numbers }) =>
            code === 'sag' &&
            same(numbers['topCelsius'], topCelsius) &&
            same(numbers['dropCelsius'], dropCelsius),
        ),
    ),
    timeToTemperatureMinutes: isOut('reached') ? null : facts.timeToTemperatureMinutes,
    peakCelsius: isOut('overshoot') || isOut('not-reached') ? null : facts.peakCelsius,
    holdMinutes: isOut('hold') ? null : facts.holdMinutes,
    crossingRatePerMinute: crossingOut ? null : facts.crossingRatePerMinute,
    rate400To700: crossingOut ? null : facts.rate400To700,
    disputed,
  };
}
