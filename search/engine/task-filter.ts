import { EngineError } from './errors.ts';
import { TASK_STATUSES, TASK_TYPES, type Task } from './tasks.ts';

const LIST_PARAMETERS = ['limit', 'from', 'reverse'];
const FILTER_PARAMETERS = [
  'uids',
  'batchUids',
  'statuses',
  'types',
  'indexUids',
  'canceledBy',
  'beforeEnqueuedAt',
  'afterEnqueuedAt',
  'beforeStartedAt',
  'afterStartedAt',
  'beforeFinishedAt',
  'afterFinishedAt',
];

type TaskTest = (task: Task) => boolean;

function snake(name: string): string {
  return name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);
}

function invalid(name: string, message: string): EngineError {
  return new EngineError(`invalid_task_${snake(name)}`, message);
}

function list(query: URLSearchParams, name: string): string[] | undefined {
  const text = query.get(name);
  if (text === null) return undefined;
  const values = text.split(',').map((value) => value.trim());
  return values.includes('*') ? undefined : values;
}

function numbers(query: URLSearchParams, name: string): Set<number> | undefined {
  const values = list(query, name);
  if (values === undefined) return undefined;
  return new Set(
    values.map((value) => {
      if (!/^\d+$/.test(value)) {
        throw invalid(
          name,
          `Invalid value in parameter \`${name}\`: could not parse \`${value}\` as a positive integer`,
        );
      }
      return Number(value);
    }),
  );
}

function closedList(
  query: URLSearchParams,
  name: string,
  allowed: readonly string[],
): Set<string> | undefined {
  const values = list(query, name);
  if (values === undefined) return undefined;
  return new Set(
    values.map((value) => {
      const known = allowed.find((each) => each.toLowerCase() === value.toLowerCase());
      if (known === undefined) {
        throw invalid(
          name,
          `Invalid value in parameter \`${name}\`: \`${value}\` is not a valid task ${name === 'types' ? 'type' : 'status'}. Available values are ${allowed.map((each) => `\`${each}\``).join(', ')}.`,
        );
      }
      return known;
    }),
  );
}

function moment(query: URLSearchParams, name: string): number | undefined {
  const text = query.get(name);
  if (text === null || text === '*') return undefined;
  const time = /^\d{4}-\d{2}-\d{2}(T[\d:.]+(Z|[+-]\d{2}:\d{2}))?$/.test(text)
    ? Date.parse(text)
    : NaN;
  if (Number.isNaN(time)) {
    throw invalid(
      name,
      `Invalid value in parameter \`${name}\`: \`${text}\` is an invalid date-time. It should follow the YYYY-MM-DD or RFC 3339 date-time format.`,
    );
  }
  return time;
}

/** Whether a request names at least one filter: cancelling or deleting tasks needs one. */
export function hasTaskFilter(query: URLSearchParams): boolean {
  return FILTER_PARAMETERS.some((name) => query.has(name));
}

/** The condition that a query string of the task routes describes. */
export function readTaskFilter(query: URLSearchParams, listing: boolean): TaskTest {
  const known = listing ? [...FILTER_PARAMETERS, ...LIST_PARAMETERS] : FILTER_PARAMETERS;
  for (const name of query.keys()) {
    if (!known.includes(name)) {
      throw new EngineError(
        'bad_request',
        `Unknown parameter \`${name}\`: expected one of ${known.map((each) => `\`${each}\``).join(', ')}`,
      );
    }
  }
  const uids = numbers(query, 'uids');
  const batchUids = numbers(query, 'batchUids');
  const canceledBy = numbers(query, 'canceledBy');
  const statuses = closedList(query, 'statuses', TASK_STATUSES);
  const types = closedList(query, 'types', TASK_TYPES);
  const indexUids = list(query, 'indexUids');
  for (const uid of indexUids ?? []) {
    if (!/^[\w-]+$/.test(uid)) {
      throw new EngineError(
        'invalid_index_uid',
        `Invalid value in parameter \`indexUids\`: \`${uid}\` is not a valid index uid.`,
      );
    }
  }
  const times = (['enqueuedAt', 'startedAt', 'finishedAt'] as const).map((field) => {
    const suffix = field.charAt(0).toUpperCase() + field.slice(1);
    return {
      field,
      before: moment(query, `before${suffix}`),
      after: moment(query, `after${suffix}`),
    };
  });

  return (task) => {
    if (uids && !uids.has(task.uid)) return false;
    if (batchUids && (task.status === 'enqueued' || !batchUids.has(task.uid))) return false;
    if (canceledBy && (task.canceledBy === null || !canceledBy.has(task.canceledBy))) return false;
    if (statuses && !statuses.has(task.status)) return false;
    if (types && !types.has(task.type)) return false;
    if (indexUids && (task.indexUid === null || !indexUids.includes(task.indexUid))) return false;
    return times.every(({ field, before, after }) => {
      if (before === undefined && after === undefined) return true;
      const text = task[field];
      if (text === null) return false;
      const time = Date.parse(text);
      return (before === undefined || time < before) && (after === undefined || time > after);
    });
  };
}

export type TaskPage = {
  results: Task[];
  total: number;
  limit: number;
  from: number | null;
  next: number | null;
};

function count(query: URLSearchParams, name: string): number | undefined {
  const text = query.get(name);
  if (text === null) return undefined;
  const value = Number(text);
  if (!/^\d+$/.test(text) || !Number.isSafeInteger(value)) {
    throw invalid(
      name,
      `Invalid value in parameter \`${name}\`: could not parse \`${text}\` as a positive integer`,
    );
  }
  return value;
}

/** One page of tasks, newest first (oldest first with `reverse=true`), from a list in uid order. */
export function listTasks(tasks: readonly Task[], query: URLSearchParams): TaskPage {
  const test = readTaskFilter(query, true);
  const limit = Math.min(count(query, 'limit') ?? 20, 10_000);
  const from = count(query, 'from');
  const reverse = query.get('reverse') === 'true';
  const matching = tasks.filter(test);
  if (!reverse) matching.reverse();
  const rest =
    from === undefined
      ? matching
      : matching.filter((task) => (reverse ? task.uid >= from : task.uid <= from));
  const results = rest.slice(0, limit);
  return {
    results,
    total: matching.length,
    limit,
    from: results[0]?.uid ?? null,
    next: rest[limit]?.uid ?? null,
  };
}
