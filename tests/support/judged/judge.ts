import { readFiring } from '#shared/firing/read-firing.ts';
import { quantile } from '#shared/statistics/quantile.ts';
import { JUDGED_KINDS } from './kinds.ts';
import type { JudgedKind } from './kinds.ts';
import type { JudgedRecord } from './records.ts';
import { judgedRecord } from './records.ts';
import { doubtfulLevels, truthOf } from './truth.ts';

export interface Score {
  found: number;
  missed: number;
  invented: number;
}
export interface Judgement {
  readonly records: number;
  readonly stalls: Score;
  readonly sags: Score;
  readonly stallLevelErrors: number[];
  readonly stallStartErrors: number[];
  readonly timeErrors: number[];
  readonly holdErrors: number[];
  readonly crossingErrors: number[];
  readonly faults: string[];
}

export const f1 = (score: Score): number =>
  score.found === 0 && score.missed + score.invented === 0
    ? 1
    : (2 * score.found) / (2 * score.found + score.missed + score.invented);

export const JUDGED_KIND_IDS = Object.keys(JUDGED_KINDS) as JudgedKind[];

export function judgeAll(
  seeds: readonly number[],
  kinds: readonly JudgedKind[] = JUDGED_KIND_IDS,
): Judgement {
  const judgement: Judgement = {
    records: 0,
    stalls: { found: 0, missed: 0, invented: 0 },
    sags: { found: 0, missed: 0, invented: 0 },
    stallLevelErrors: [],
    stallStartErrors: [],
    timeErrors: [],
    holdErrors: [],
    crossingErrors: [],
    faults: [],
  };
  let records = 0;
  for (const kind of kinds) {
    for (const seed of seeds) {
      judge(judgedRecord(kind, seed * 100 + JUDGED_KIND_IDS.indexOf(kind)), judgement);
      records += 1;
    }
  }
  return { ...judgement, records };
}

function judge(record: JudgedRecord, judgement: Judgement): void {
  const { course, plan, sampling, input } = record;
  const reading = readFiring(input);
  const name = `${record.kind} #${record.seed} ${sampling.name} ${(sampling.stepMinutes * 60).toFixed(0)} s, noise ${sampling.noiseCelsius.toFixed(1)}${sampling.hasMarks ? '' : ', no marks'}`;
  if (reading === null) {
    judgement.faults.push(`${name}: not read`);
    return;
  }
  let peak = -Infinity;
  for (const value of course.celsius) peak = Math.max(peak, value);
  const aim =
    plan.drawnBecause === 'melt' ? Math.min(plan.targetCelsius, peak) : plan.targetCelsius;
  const smooth = plan.smoothMinutes ?? 0;
  const truth = truthOf(course, aim, smooth);
  const doubtful = doubtfulLevels(course, aim, smooth);
  const isLogger = !sampling.isHandNoted;

  const trueStalls = truth.levels.filter((one) => one.kind === 'stall');
  const stalls = reading.levels.filter((one) => one.kind === 'stall');
  const isAtLimit = (from: number, to: number) => {
    const last = course.celsius[Math.round(Math.min(to, course.shutOffMinute) * 60)] ?? 0;
    return Math.abs(last - (aim - 15)) < 4 && to > from;
  };
  for (const one of trueStalls) {
    const match = stalls.find((stall) => stall.fromMinute < one.to && stall.toMinute > one.from);
    if (match !== undefined) {
      judgement.stalls.found += 1;
      judgement.stallLevelErrors.push(Math.abs(match.levelCelsius - one.level));
      if (isLogger) judgement.stallStartErrors.push(Math.abs(match.fromMinute - one.from));
      if (isLogger && Math.abs(match.fromMinute - one.from) > 4)
        judgement.faults.push(
          `${name}: stall start ${match.fromMinute.toFixed(1)} for ${one.from.toFixed(1)}, to ${match.toMinute.toFixed(1)} for ${one.to.toFixed(1)}`,
        );
    } else if (
      !isDoubtful(one, truth.pace) &&
      !isAtLimit(one.from, one.to) &&
      !isTooSparse(record, one)
    ) {
      judgement.stalls.missed += 1;
      judgement.faults.push(
        `${name}: missed stall ${show(one)}; read ${JSON.stringify(reading.levels.map((l) => [l.kind, Math.round(l.fromMinute), Math.round(l.toMinute), Math.round(l.levelCelsius)]))}`,
      );
    }
  }
  for (const one of stalls) {
    if (isAtLimit(one.fromMinute, one.toMinute)) continue;
    const overlaps = (other: { from: number; to: number }) =>
      one.fromMinute < other.to + 1 && one.toMinute > other.from - 1;
    if (!trueStalls.some(overlaps) && !doubtful.some(overlaps)) {
      judgement.stalls.invented += 1;
      judgement.faults.push(
        `${name}: invented stall ${one.fromMinute.toFixed(1)}–${one.toMinute.toFixed(1)} at ${one.levelCelsius.toFixed(0)}, pace ${truth.pace?.toFixed(1)}; true ${JSON.stringify(truth.levels.map(show))}`,
      );
    }
  }
  for (const one of truth.sags) {
    const match = reading.sags.find((sag) => sag.fromMinute < one.to && sag.toMinute > one.from);
    if (match !== undefined) {
      if (!one.doubtful) judgement.sags.found += 1;
    } else if (!one.doubtful && !isTooSparse(record, one)) {
      judgement.sags.missed += 1;
      judgement.faults.push(
        `${name}: missed sag ${one.from.toFixed(1)}–${one.to.toFixed(1)} by ${one.drop.toFixed(0)}`,
      );
    }
  }
  for (const one of reading.sags) {
    if (!truth.sags.some((sag) => one.fromMinute < sag.to && one.toMinute > sag.from)) {
      judgement.sags.invented += 1;
      judgement.faults.push(
        `${name}: invented sag ${one.fromMinute.toFixed(1)}–${one.toMinute.toFixed(1)} by ${one.dropCelsius.toFixed(0)}`,
      );
    }
  }
  if (truth.reachedMinute !== null) {
    if (reading.timeToTemperatureMinutes === null) {
      const seen = input.readings.filter((one) => one.celsius >= aim - 5 && one.celsius < aim + 20);
      if (isLogger && seen.length >= 3) {
        judgement.faults.push(`${name}: reached not seen`);
        judgement.timeErrors.push(Infinity);
      }
    } else {
      const error = Math.abs(
        reading.timeToTemperatureMinutes - (truth.reachedMinute - truth.startMinute),
      );
      if (isLogger) judgement.timeErrors.push(error);
      if (isLogger && error > 1)
        judgement.faults.push(
          `${name}: time off by ${error.toFixed(1)} (start read ${reading.start.minute.toFixed(1)} for ${truth.startMinute.toFixed(1)})`,
        );
    }
  } else if (reading.reachedMinute !== null) judgement.faults.push(`${name}: reached invented`);
  if (isLogger && truth.hold !== null) {
    const error = Math.abs((reading.hold?.minutes ?? 0) - truth.hold.minutes);
    judgement.holdErrors.push(error);
    if (error > 2)
      judgement.faults.push(
        `${name}: hold ${reading.hold?.minutes.toFixed(1)} for ${truth.hold.minutes.toFixed(1)}`,
      );
  }
  if (isLogger) {
    const last = truth.crossings[truth.crossings.length - 1];
    const seen = reading.quartzCrossings[reading.quartzCrossings.length - 1];
    if (last !== undefined) {
      const error = seen === undefined ? 1 : Math.abs(seen.minutes - last.minutes) / last.minutes;
      judgement.crossingErrors.push(error);
      if (error > 0.5)
        judgement.faults.push(
          `${name}: crossing ${seen?.minutes.toFixed(1)} for ${last.minutes.toFixed(1)}`,
        );
    }
    if (truth.crossings.length !== reading.quartzCrossings.length)
      judgement.faults.push(
        `${name}: ${reading.quartzCrossings.length} crossings for ${truth.crossings.length}`,
      );
  }
}

const show = (one: { kind: string; from: number; to: number; level: number }): string =>
  `${one.kind} ${one.from.toFixed(1)}–${one.to.toFixed(1)} at ${one.level.toFixed(0)}`;

function isDoubtful(one: { from: number; to: number }, pace: number | null): boolean {
  const least = Math.max(5, pace === null ? 0 : 20 / pace);
  return one.to - one.from < 1.3 * least;
}

/** Fewer than three readings in it, or a hand-noted one of fewer than four: it cannot be shown. */
function isTooSparse(record: JudgedRecord, one: { from: number; to: number }): boolean {
  const inside = record.input.readings.filter(
    (reading) => reading.minute >= one.from && reading.minute <= one.to,
  );
  return inside.length < 4;
}

/** The judgement as lines of a table. */
export function judgedLines(
  judgement: Judgement,
): { readonly what: string; readonly value: string; readonly aim: string }[] {
  const { stalls, sags } = judgement;
  const number = (values: readonly number[], share: number) =>
    (quantile(values, share) ?? Number.NaN).toFixed(2);
  const percent = (values: readonly number[], share: number) =>
    (100 * (quantile(values, share) ?? Number.NaN)).toFixed(1);
  const scored = (score: Score) =>
    `F1 ${f1(score).toFixed(3)}: ${String(score.found)} found, ${String(score.missed)} missed, ${String(score.invented)} invented`;
  return [
    {
      what: `stalls in ${String(judgement.records)} records`,
      value: scored(stalls),
      aim: 'aim ≥ 0.98',
    },
    { what: 'sags', value: scored(sags), aim: 'aim ≥ 0.97' },
    {
      what: 'level of a stall, error',
      value: `median ${number(judgement.stallLevelErrors, 0.5)} °C`,
      aim: 'aim ≤ 2 °C',
    },
    {
      what: 'start of a stall, error',
      value: `median ${number(judgement.stallStartErrors, 0.5)} min, p90 ${number(judgement.stallStartErrors, 0.9)} min`,
      aim: 'aim ≤ 2 min',
    },
    {
      what: 'time to temperature, error',
      value: `p90 ${number(judgement.timeErrors, 0.9)} min`,
      aim: 'aim ≤ 1 min',
    },
    {
      what: 'hold, error',
      value: `median ${number(judgement.holdErrors, 0.5)} min, p90 ${number(judgement.holdErrors, 0.9)} min`,
      aim: 'aim ≤ 0.5 min',
    },
    {
      what: 'quartz crossing, error',
      value: `median ${percent(judgement.crossingErrors, 0.5)} %, p90 ${percent(judgement.crossingErrors, 0.9)} %`,
      aim: 'aim ≤ 8 %',
    },
  ];
}
