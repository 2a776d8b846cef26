import { EngineError } from './errors.ts';
import type { Route, RouteAnswer, RouteRequest } from './http-route.ts';
import { mayUseIndex, type Access } from './keys.ts';
import { hasTaskFilter, listTasks, readTaskFilter } from './task-filter.ts';
import { enqueueTask } from './task-queue.ts';
import { presentEnqueued, presentTask, type Task } from './tasks.ts';

/** Tasks without an index are shown to keys that may use every index. */
function maySee(access: Access, task: Task): boolean {
  return mayUseIndex(access, task.indexUid ?? '*');
}

async function actOnTasks(
  { engine, access, query }: RouteRequest,
  type: 'taskCancelation' | 'taskDeletion',
): Promise<RouteAnswer> {
  if (!hasTaskFilter(query)) {
    throw new EngineError(
      'missing_task_filters',
      'Query parameters to filter the tasks to act on are missing.',
    );
  }
  const test = readTaskFilter(query, false);
  const { state } = engine;
  const uids = [...state.tasks.values()]
    .filter((task) => maySee(access, task) && test(task))
    .map((task) => task.uid);
  const payload = { type, uids, originalFilter: `?${query.toString()}` };
  const task = await enqueueTask(engine, null, payload);
  return { status: 202, body: presentEnqueued(task) };
}

export const taskRoutes: readonly Route[] = [
  {
    method: 'GET',
    path: '/tasks',
    action: 'tasks.get',
    handle: ({ engine, access, query }) => {
      const visible = [...engine.state.tasks.values()]
        .filter((task) => maySee(access, task))
        .sort((a, b) => a.uid - b.uid);
      const page = listTasks(visible, query);
      return { status: 200, body: { ...page, results: page.results.map(presentTask) } };
    },
  },
  {
    method: 'DELETE',
    path: '/tasks',
    action: 'tasks.delete',
    handle: (request) => actOnTasks(request, 'taskDeletion'),
  },
  {
    method: 'POST',
    path: '/tasks/cancel',
    action: 'tasks.cancel',
    handle: (request) => actOnTasks(request, 'taskCancelation'),
  },
  {
    method: 'GET',
    path: '/tasks/:taskUid',
    action: 'tasks.get',
    handle: ({ engine, access, params }) => {
      const text = params['taskUid'] ?? '';
      if (!/^\d{1,15}$/.test(text)) {
        throw new EngineError(
          'invalid_task_uids',
          `Invalid value in parameter \`uid\`: could not parse \`${text}\` as a positive integer`,
        );
      }
      const task = engine.state.tasks.get(Number(text));
      if (task === undefined || !maySee(access, task)) {
        throw new EngineError('task_not_found', `Task \`${text}\` not found.`);
      }
      return { status: 200, body: presentTask(task) };
    },
  },
];
