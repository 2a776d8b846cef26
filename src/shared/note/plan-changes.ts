import { formatDuration } from '../units/duration.ts';
import { NO_BREAK_SPACE } from '../units/units.ts';
import { DRAWN_BECAUSE } from '../vocabulary/kiln.ts';
import { HOLD_MINUTES, TARGET_CELSIUS } from './change-thresholds.ts';
import { compareNumbers, insteadOf } from './compare-fields.ts';
import type { Plan } from './plan.ts';
import type { ProposedChange } from './proposed-changes.ts';

/** What another plan proposes: aim, hold, and what told when to draw. */
export function planChanges(before: Plan, now: Plan): ProposedChange[] {
  const target = (plan: Plan): number | null =>
    plan.targetBy === 'temperature' ? plan.targetCelsius : null;
  const bothPlanned = before.holdPlannedMinutes !== null && now.holdPlannedMinutes !== null;
  const hold = (plan: Plan): number | null => {
    if (bothPlanned) return plan.holdPlannedMinutes;
    return plan.noHold ? 0 : plan.holdKeptMinutes;
  };
  const held = (minutes: number): string =>
    minutes === 0 ? 'no hold' : `a hold of ${formatDuration(minutes)}`;
  const found = [
    ...compareNumbers(
      target(before),
      target(now),
      TARGET_CELSIUS,
      { up: 'target-up', down: 'target-down' },
      (a, b) => `target ${insteadOf(`${NO_BREAK_SPACE}°C`)(Math.round(a), Math.round(b))}`,
    ),
    ...compareNumbers(
      hold(before),
      hold(now),
      HOLD_MINUTES,
      { up: 'hold-longer', down: 'hold-shorter' },
      (a, b) => `${held(a)} instead of ${held(b)}`,
    ),
  ];
  if (
    before.drawnBecause !== null &&
    before.drawnBecause !== 'melt' &&
    now.drawnBecause === 'melt'
  ) {
    const reason =
      before.drawnBecause === 'gave-up'
        ? 'giving up'
        : DRAWN_BECAUSE[before.drawnBecause].toLowerCase();
    found.push({ change: 'drawn-by-melt', text: `drawn by the melt instead of ${reason}` });
  }
  return found;
}
