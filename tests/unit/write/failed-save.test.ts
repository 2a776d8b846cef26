import { describe, expect, it } from 'vitest';
import { emptyNoteFields } from '#shared/note/note-fields.ts';
import { OfflineError, ProblemError } from '../../../src/http/client.ts';
import { failedSave } from '../../../src/write/failed-save.ts';

const problem = (status: number, current?: unknown) =>
  new ProblemError({
    type: 'about:blank',
    code: 'x',
    title: 'x',
    status,
    detail: 'Said why.',
    ...(current === undefined ? {} : { current }),
  });

describe('failedSave', () => {
  it('is tried again without network, and while the server is busy, full or away', () => {
    expect(failedSave(new OfflineError()).kind).toBe('again');
    for (const status of [429, 503, 507]) expect(failedSave(problem(status)).kind).toBe('again');
  });

  it('is refused, with the server’s reason, where sending the same again cannot help', () => {
    for (const status of [400, 401, 403, 404, 409, 413, 422, 500]) {
      expect(failedSave(problem(status))).toEqual({ kind: 'refused', reason: 'Said why.' });
    }
    expect(failedSave('?')).toEqual({ kind: 'refused', reason: 'The save did not work.' });
  });

  it('hands over what the server has when something else was saved there', () => {
    const current = { version: 4, savedAt: '2026-06-01T10:00:00.000Z', fields: emptyNoteFields() };
    expect(failedSave(problem(412, current))).toEqual({ kind: 'stale', current });
    expect(failedSave(problem(412, { version: 4 })).kind).toBe('refused');
    expect(failedSave(problem(412)).kind).toBe('refused');
  });
});
