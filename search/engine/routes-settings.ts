import { EngineError } from './errors.ts';
import type { Route } from './http-route.ts';
import { isJsonObject, type Json, type JsonObject } from './json.ts';
import { checkIndexUid, storedIndex } from './routes-indexes.ts';
import { patchSettings } from './settings-patch.ts';
import { defaultSettings, SETTING_ROUTES, type SettingName, type Settings } from './settings.ts';
import { enqueueTask } from './task-queue.ts';
import { presentEnqueued } from './tasks.ts';

const MERGED_BY_PATCH: readonly SettingName[] = ['typoTolerance', 'faceting', 'pagination'];

function asJson(settings: Settings): JsonObject {
  return { ...settings };
}

/** Checks a patch against the defaults, so that its shape errors are answered at once. */
function checkedPatch(body: Json | undefined): JsonObject {
  if (body === undefined) throw new EngineError('missing_payload', 'A json payload is missing.');
  patchSettings(defaultSettings(), body);
  return isJsonObject(body) ? body : {};
}

const resetAll: JsonObject = Object.fromEntries(
  Object.keys(defaultSettings()).map((name) => [name, null]),
);

function write(
  method: 'PUT' | 'PATCH' | 'DELETE',
  path: string,
  patchOf: (body: Json | undefined) => JsonObject,
): Route {
  return {
    method,
    path,
    action: 'settings.update',
    handle: async ({ engine, params, body }) => {
      const uid = checkIndexUid(params['indexUid'] ?? '');
      const patch = patchOf(body);
      const task = await enqueueTask(engine, uid, { type: 'settingsUpdate', patch });
      return { status: 202, body: presentEnqueued(task) };
    },
  };
}

function routesOfOne(segment: string, name: SettingName): Route[] {
  const path = `/indexes/:indexUid/settings/${segment}`;
  return [
    {
      method: 'GET',
      path,
      action: 'settings.get',
      handle: ({ engine, params }) => ({
        status: 200,
        body: asJson(storedIndex(engine, params['indexUid']).settings)[name] ?? null,
      }),
    },
    write(MERGED_BY_PATCH.includes(name) ? 'PATCH' : 'PUT', path, (body) => {
      if (body === undefined) {
        throw new EngineError('missing_payload', 'A json payload is missing.');
      }
      return checkedPatch({ [name]: body });
    }),
    write('DELETE', path, () => ({ [name]: null })),
  ];
}

export const settingsRoutes: readonly Route[] = [
  {
    method: 'GET',
    path: '/indexes/:indexUid/settings',
    action: 'settings.get',
    handle: ({ engine, params }) => ({
      status: 200,
      body: asJson(storedIndex(engine, params['indexUid']).settings),
    }),
  },
  write('PATCH', '/indexes/:indexUid/settings', checkedPatch),
  write('DELETE', '/indexes/:indexUid/settings', () => resetAll),
  ...Object.entries(SETTING_ROUTES).flatMap(([segment, name]) => routesOfOne(segment, name)),
  // Embedders are merged where they exist; here the only value is the empty one.
  write('PATCH', '/indexes/:indexUid/settings/embedders', (body) =>
    checkedPatch({ embedders: body ?? null }),
  ),
];
