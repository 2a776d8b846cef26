import type { Knex } from 'knex';
import type { Logger } from 'pino';
import { describeError, GiveUp, type Handler, type Handlers, waitSeconds } from './job.ts';
import {
  claimJobs,
  type ClaimedJob,
  markDone,
  markGivenUp,
  markHandedOver,
  putOff,
  releaseJob,
} from './job-repository.ts';
import { onNudge } from './nudge.ts';
import type { OutboxTopic } from './outbox.ts';

export interface WorkerDeps {
  readonly db: Knex;
  readonly log: Logger;
}
export interface OutboxWorker {
  /** Lets the jobs under way finish, gives the rest back, and then stops. */
  readonly stop: () => Promise<void>;
}

/** A job that takes longer than this is taken for abandoned; handlers end long before. */
const LEASE_SECONDS = 120;
const POLL_MILLISECONDS = 1000;

/**
 * Does the promised work: one loop a topic, so a mail server that is slow does not hold up the
 * index. Wakes when nudged and looks by itself every second.
 */
export function startOutboxWorker(
  deps: WorkerDeps,
  handlers: Handlers,
  { pollMilliseconds = POLL_MILLISECONDS } = {},
): OutboxWorker {
  let stopping = false;
  let nudges = 0;
  const wakers = new Set<() => void>();
  const wake = (): void => {
    nudges += 1;
    for (const waker of wakers) waker();
  };
  const pause = (): Promise<void> =>
    new Promise((resolve) => {
      const waker = (): void => {
        clearTimeout(timer);
        wakers.delete(waker);
        resolve();
      };
      const timer = setTimeout(waker, pollMilliseconds);
      wakers.add(waker);
    });
  const loop = async <Topic extends OutboxTopic>(topic: Topic): Promise<void> => {
    while (!stopping) {
      const nudgesBefore = nudges;
      let claimed = 0;
      try {
        claimed = await workOnce(deps, topic, handlers[topic], () => stopping);
      } catch (error) {
        // The database is away: the leases run out by themselves.
        deps.log.error({ event: 'outbox', topic, err: error }, 'outbox cannot be read');
      }
      // Nudged while looking: what was promised then may not have been seen.
      if (claimed === 0 && nudges === nudgesBefore && !stopping) await pause();
    }
  };
  const stopListening = onNudge(wake);
  const loops = (Object.keys(handlers) as OutboxTopic[]).map(loop);
  return {
    stop: async () => {
      stopping = true;
      stopListening();
      wake();
      await Promise.all(loops);
    },
  };
}

/**
 * Claims the due jobs of one topic and does them, group by group.
 *
 * @returns how many were claimed
 */
export async function workOnce<Topic extends OutboxTopic>(
  deps: WorkerDeps,
  topic: Topic,
  handler: Handler<Topic>,
  isStopping: () => boolean = () => false,
): Promise<number> {
  const jobs = await claimJobs(deps.db, topic, handler.atOnce, LEASE_SECONDS);
  const groups = groupBy(jobs, (job) => handler.groupOf(job.payload));
  await Promise.all(
    [...groups.values()].map(async (group) => {
      for (const job of group) {
        if (isStopping()) await releaseJob(deps.db, job);
        else await doJob(deps, topic, handler, job);
      }
    }),
  );
  return jobs.length;
}

function groupBy<T>(items: readonly T[], keyOf: (item: T) => string): Map<string, T[]> {
  const groups = new Map<string, T[]>();
  for (const item of items) {
    const key = keyOf(item);
    groups.set(key, [...(groups.get(key) ?? []), item]);
  }
  return groups;
}

async function doJob<Topic extends OutboxTopic>(
  { db, log }: WorkerDeps,
  topic: Topic,
  handler: Handler<Topic>,
  job: ClaimedJob<Topic>,
): Promise<void> {
  const facts = { event: 'outbox', topic, jobId: job.id, attempts: job.attempts };
  try {
    await handler.handle({
      ...job,
      handOver: async () => {
        if (!(await markHandedOver(db, job))) throw new Error('The lease ran out.');
      },
    });
    await markDone(db, job);
    log.info({ ...facts, result: 'done' }, 'outbox job');
  } catch (error) {
    const reason = describeError(error);
    const tooOld =
      handler.giveUpAfterSeconds !== null && job.ageSeconds > handler.giveUpAfterSeconds;
    if (error instanceof GiveUp || tooOld) {
      await markGivenUp(db, job, reason);
      log.error({ ...facts, result: 'given-up', reason }, 'outbox job');
      return;
    }
    const seconds = waitSeconds(handler, job.attempts, Math.random());
    await putOff(db, job, seconds, reason);
    log.warn({ ...facts, result: 'put-off', seconds: Math.round(seconds), reason }, 'outbox job');
  }
}
