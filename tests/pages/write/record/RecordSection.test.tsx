import { cleanup, fireEvent, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { draftSchema, noteAbilitiesSchema, type Draft } from '#shared/api/notes.ts';
import type { FiringRecord } from '#shared/api/records.ts';
import { emptyNoteFields } from '#shared/note/note-fields.ts';
import { WritePage } from '../../../../src/write/WritePage.tsx';
import { answerFetch, ok } from '../../../support/page-fetch.ts';
import { aMe, aSession, renderPages } from '../../../support/render-pages.tsx';

// The editor of the story has tests of its own, in a browser.
vi.mock('../../../../src/write/story/StorySection.tsx', () => ({ StorySection: () => null }));

const TABLE = 'min;C\r\n0;68\r\n10;650\r\nbroken;700\r\n20;1472\r\n';
const RECORD: FiringRecord = {
  id: 5,
  status: 'failed',
  fileName: 'logger.csv',
  source: 'file',
  count: null,
  unit: null,
  assumed: [],
  skipped: [],
  skippedCount: 0,
  strip: null,
  error: { message: 'This is no time: broken.', line: 4 },
  choice: {
    delimiter: ';',
    decimal: ',',
    headerLine: 1,
    timeColumn: 0,
    timeFormat: 'minutes',
    temperatureColumn: 1,
    secondColumn: null,
    unit: 'C',
  },
};

function aDraft(record: FiringRecord): Draft {
  const fields = emptyNoteFields();
  return draftSchema.parse({
    id: 31,
    version: 1,
    status: 'draft',
    publishedRevision: null,
    savedAt: '2026-05-02T14:32:00.000Z',
    fields: { ...fields, record: { ...fields.record, recordId: record.id } },
    record,
    pictures: [],
    findings: [],
    checks: [],
    proposedChanges: [],
    earlier: null,
    remarks: [],
    decision: null,
    abilities: Object.fromEntries(
      Object.keys(noteAbilitiesSchema.shape).map((name) => [name, name === 'edit']),
    ),
  });
}

/** The page of a visit in which nothing was uploaded: the server alone has the table. */
async function openPage(record: FiringRecord, table: () => Response) {
  const sent = answerFetch({
    'GET /api/session': ok(aSession(aMe())),
    'GET /api/kilns': ok({ kilns: [] }),
    'GET /api/notes/31/draft': ok(aDraft(record)),
    'PUT /api/notes/31/draft': ok(aDraft(record)),
    'GET /api/notes/31/records/5': ok(record),
    'PUT /api/notes/31/records/5': ok({ ...record, status: 'reading', error: null }),
  });
  const rest = globalThis.fetch;
  vi.stubGlobal('fetch', (path: string, init?: RequestInit) =>
    path === '/api/notes/31/records/5/file' ? Promise.resolve(table()) : rest(path, init),
  );
  renderPages([{ path: '/write/:id', Component: WritePage }], '/write/31');
  const section = await screen.findByRole('region', { name: 'Record' });
  return { sent, section: within(section), user: userEvent.setup() };
}

beforeEach(() => {
  localStorage.clear();
  vi.stubGlobal('scrollTo', () => undefined);
});
afterEach(() => {
  // The page saves once more as it goes: before its server does.
  cleanup();
  vi.unstubAllGlobals();
});

// Queries by role walk the whole form, which takes its time here.
describe('a record uploaded in an earlier visit', { timeout: 60_000 }, () => {
  it('can have its columns and units chosen again, from the table the server keeps', async () => {
    const whole = TABLE.replace('broken;700\r\n', '');
    const { sent, section, user } = await openPage(RECORD, () => new Response(whole));
    await user.click(await section.findByRole('button', { name: /Choose columns and units/ }));
    expect(await section.findByText(/^logger\.csv: is it read rightly/)).toHaveFocus();
    const unit = section.getByRole('combobox', { name: 'Temperature in' });
    expect(unit).toHaveValue('C');
    await user.selectOptions(unit, 'F');
    await user.click(section.getByRole('button', { name: 'Yes, use it as the record' }));
    await waitFor(() =>
      expect(
        sent.find(({ method, path }) => method === 'PUT' && path.endsWith('/5'))?.body,
      ).toEqual({ choice: { ...RECORD.choice, unit: 'F' } }),
    );
  });

  it('is sent as another table once a line of it was left out', async () => {
    const uploads: FormData[] = [];
    vi.stubGlobal(
      'XMLHttpRequest',
      class {
        upload = {};
        open() {}
        setRequestHeader() {}
        abort() {}
        send(form: FormData) {
          uploads.push(form);
        }
      },
    );
    const { sent, section, user } = await openPage(RECORD, () => new Response(TABLE));
    await user.click(await section.findByRole('button', { name: /Choose columns and units/ }));
    await user.click(await section.findByRole('button', { name: 'Leave line 4 out' }));
    await user.click(section.getByRole('button', { name: 'Yes, use it as the record' }));
    await waitFor(() => expect(uploads).toHaveLength(1));
    const file = uploads[0]?.get('file');
    expect(file instanceof Blob && (await file.text())).toContain('# left out: broken;700');
    expect(sent.some(({ method, path }) => method === 'PUT' && path.endsWith('/5'))).toBe(false);
  });

  it('says so when its table cannot be fetched, and can be tried again', async () => {
    let answers = false;
    const { section, user } = await openPage(RECORD, () =>
      answers ? new Response(TABLE) : Response.json(null, { status: 500 }),
    );
    await user.click(await section.findByRole('button', { name: /Choose columns and units/ }));
    const again = await screen.findByRole('button', { name: 'Try again', hidden: true });
    answers = true;
    fireEvent.click(again);
    expect(await section.findByText(/is it read rightly/)).toBeVisible();
  });

  it('offers no choice where no table is kept', async () => {
    const { section } = await openPage({ ...RECORD, choice: null }, () => new Response(TABLE));
    expect(await section.findByRole('button', { name: 'Remove it' })).toBeVisible();
    expect(section.queryByRole('button', { name: /Choose columns/ })).toBeNull();
  });
});
