import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { defaultSettings } from '#shared/api/settings.ts';
import type { Draft } from '#shared/api/notes.ts';
import { emptyNoteFields, type NoteFields } from '#shared/note/note-fields.ts';
import { rememberToken } from '../../../src/http/client.ts';
import { MessagesProvider } from '../../../src/ui/MessagesProvider.tsx';
import { WritePage } from '../../../src/write/WritePage.tsx';

// The editor of the story has tests of its own, in a browser.
vi.mock('../../../src/write/story/StorySection.tsx', () => ({ StorySection: () => null }));

const ABILITIES: Draft['abilities'] = {
  edit: true,
  handIn: true,
  takeBack: false,
  revise: false,
  remove: true,
  claim: false,
  takeDown: false,
  dispute: false,
  tryIt: false,
};

/** A server of one note, with its author signed in. */
class Server {
  version = 1;
  fields: NoteFields = emptyNoteFields();
  abilities = ABILITIES;
  status: Draft['status'] = 'draft';
  remarks: Draft['remarks'] = [];

  draft(): Draft {
    return {
      id: 31,
      version: this.version,
      status: this.status,
      publishedRevision: null,
      savedAt: '2026-05-02T14:32:00.000Z',
      fields: this.fields,
      record: null,
      pictures: [],
      findings: [],
      checks: [],
      proposedChanges: [],
      earlier: null,
      remarks: this.remarks,
      decision: null,
      abilities: this.abilities,
    };
  }

  readonly fetch = (path: string, init: RequestInit = {}): Promise<Response> => {
    const at = `${init.method ?? 'GET'} ${path}`;
    if (at === 'GET /api/session') {
      return Promise.resolve(
        Response.json({
          me: {
            id: 7,
            name: 'Wren',
            email: 'wren@example.org',
            emailVerified: true,
            role: 'member',
            place: '',
            about: '',
            settings: defaultSettings(),
          },
          abilities: { write: true, handIn: true, moderate: false, administer: false },
          token: 'a-token',
        }),
      );
    }
    if (at === 'GET /api/kilns') return Promise.resolve(Response.json({ kilns: [] }));
    if (at === 'GET /api/notes/31/draft') return Promise.resolve(Response.json(this.draft()));
    if (at === 'PUT /api/notes/31/draft') return Promise.resolve(this.save(init));
    return Promise.reject(new Error(`Nobody answers ${at}`));
  };

  save(init: RequestInit): Response {
    if (new Headers(init.headers).get('If-Match') !== `"v${String(this.version)}"`) {
      const current = {
        version: this.version,
        savedAt: '2026-05-02T15:10:00.000Z',
        fields: this.fields,
      };
      return Response.json(
        {
          type: 'about:blank',
          code: 'stale',
          title: 'Saved elsewhere',
          status: 412,
          detail: 'Saved elsewhere.',
          current,
        },
        { status: 412 },
      );
    }
    this.fields = (JSON.parse(init.body as string) as { fields: NoteFields }).fields;
    this.version += 1;
    return Response.json(this.draft());
  }
}

let server: Server;
beforeEach(() => {
  server = new Server();
  localStorage.clear();
  rememberToken('a-token');
  vi.stubGlobal('fetch', server.fetch);
  vi.stubGlobal('scrollTo', () => undefined);
});
afterEach(() => {
  // The page saves once more as it goes: before its server does.
  cleanup();
  vi.unstubAllGlobals();
});

async function openPage() {
  const router = createMemoryRouter([{ path: '/write/:id', Component: WritePage }], {
    initialEntries: ['/write/31'],
  });
  render(
    <QueryClientProvider
      client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}
    >
      <MessagesProvider>
        <RouterProvider router={router} />
      </MessagesProvider>
    </QueryClientProvider>,
  );
  await screen.findByRole('heading', { level: 2, name: 'When' }, { timeout: 5000 });
  return userEvent.setup();
}
const section = (name: string) => within(screen.getByRole('region', { name }));
const SAVED = { timeout: 4000 };

// Queries by role walk the whole form, which takes its time here.
describe('the Write page', { timeout: 30_000 }, () => {
  it('does not scold a note that has not been begun', async () => {
    await openPage();
    expect(section('When').queryByText('Must mend.')).not.toBeInTheDocument();
    expect(section('Hand in').getAllByText('Must mend.').length).toBeGreaterThan(5);
  });

  it('says in the margin what must be mended as soon as a number is out of range', async () => {
    const user = await openPage();
    await user.click(screen.getByText('Burner, gas and flue'));
    const angle = section('Set-up of this firing').getByRole('textbox', { name: /Burner to/ });
    await user.type(angle, '120');
    await waitFor(() => expect(angle).toBeInvalid());
    expect(angle).toHaveAccessibleDescription(/120° lies outside 0 to 90°/);
    await user.clear(angle);
    await user.type(angle, '45');
    await waitFor(() => expect(angle).toBeValid());
  });

  it('keeps zero apart from blank', async () => {
    const user = await openPage();
    await user.click(screen.getByText('Burner, gas and flue'));
    const gap = screen.getByRole('textbox', { name: /Gap at the lid/ });
    await user.type(gap, '0');
    await waitFor(() => expect(server.fields.setUp.lidGapMm).toBe(0), SAVED);
    await user.clear(gap);
    await waitFor(() => expect(server.fields.setUp.lidGapMm).toBeNull(), SAVED);
  });

  it('mends 1850 typed as °C with one press', async () => {
    const user = await openPage();
    const plan = section('Plan, and what came of it');
    const by = within(plan.getByRole('radiogroup', { name: /Target known by/ }));
    await user.click(by.getByRole('radio', { name: 'Temperature' }));
    const target = plan.getByRole('textbox', { name: /^Target/ });
    await user.type(target, '1850');
    await user.tab();
    await user.click(await plan.findByRole('button', { name: /1850.°F is 1010.°C/ }));
    expect(target).toHaveValue('1010');
  });

  it('counts an answered check as settled and leaves it to be read', async () => {
    server.fields = {
      ...server.fields,
      when: { ...server.fields.when, startClass: 'cold', startCelsius: 200 },
    };
    const user = await openPage();
    const when = section('When');
    expect(when.getByText('Look again.')).toBeInTheDocument();
    await user.type(when.getByRole('textbox', { name: 'Your answer' }), 'So it was.');
    expect(when.queryByText('Look again.')).not.toBeInTheDocument();
    expect(when.getByText('Answered.')).toBeInTheDocument();
    expect(when.getByRole('textbox', { name: 'Your answer' })).toHaveFocus();
  });

  it('shows both versions when the note was saved elsewhere, and keeps the one that is chosen', async () => {
    const user = await openPage();
    server.version = 5;
    server.fields = {
      ...server.fields,
      result: { ...server.fields.result, surprised: 'Written on the phone' },
    };
    await user.type(screen.getByRole('textbox', { name: /What surprised/ }), 'Mine');
    await user.click(await screen.findByRole('button', { name: 'See both versions' }, SAVED));
    expect(screen.getByRole('heading', { name: 'Two versions of this note' })).toHaveFocus();
    expect(screen.getByText('Written on the phone')).toBeInTheDocument();
    expect(screen.getByText('Mine')).toBeInTheDocument();
    expect(server.fields.result.surprised).toBe('Written on the phone');
    await user.click(screen.getByRole('button', { name: 'Keep mine' }));
    await waitFor(() => expect(server.fields.result.surprised).toBe('Mine'), SAVED);
    expect(screen.getByRole('textbox', { name: /What surprised/ })).toHaveValue('Mine');
  });

  it('pins a remark from the desk to its field', async () => {
    server.status = 'sent-back';
    server.remarks = [
      {
        id: 3,
        pointer: '/when/date',
        text: 'Was it not the day after?',
        by: { id: 2, name: 'Ash' },
        at: '2026-05-03T09:00:00.000Z',
        mended: false,
      },
    ];
    await openPage();
    expect(section('When').getByText('Was it not the day after?')).toBeInTheDocument();
    expect(screen.getByText('1 of 1 to mend.')).toBeInTheDocument();
  });
});
