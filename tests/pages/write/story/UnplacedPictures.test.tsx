import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { draftSchema } from '#shared/api/notes.ts';
import { emptyNoteFields } from '#shared/note/note-fields.ts';
import { UnplacedPictures } from '../../../../src/write/story/UnplacedPictures.tsx';
import { useDraftKeeper } from '../../../../src/write/useDraftKeeper.ts';
import { giveDialogs } from '../../../support/dialogs.ts';
import { answerFetch, ok, refused } from '../../../support/page-fetch.ts';
import { renderPages } from '../../../support/render-pages.tsx';

beforeEach(() => {
  giveDialogs();
  localStorage.clear();
});
afterEach(() => vi.unstubAllGlobals());

const NAMES = ['a'.repeat(32), 'b'.repeat(32)];
const draftOf = (version: number, title: string) =>
  draftSchema.parse({
    id: 31,
    version,
    status: 'draft',
    publishedRevision: null,
    savedAt: '2026-05-02T14:32:00.000Z',
    fields: { ...emptyNoteFields(), title },
    record: null,
    pictures: NAMES.map((name) => ({ name, width: 4, height: 3, widths: [4], placeholder: '' })),
    findings: [],
    checks: [],
    proposedChanges: [],
    earlier: null,
    remarks: [],
    decision: null,
    abilities: {
      edit: true,
      handIn: true,
      takeBack: false,
      revise: false,
      remove: true,
      claim: false,
      takeDown: false,
      dispute: false,
      tryIt: false,
    },
  });
const OPENED = draftOf(4, '');

function Pictures() {
  const [kept, keeper] = useDraftKeeper(7, OPENED);
  return (
    <>
      <button onClick={() => keeper.change((fields) => ({ ...fields, title: 'Typed' }))}>
        Type
      </button>
      <p>{kept.draft.pictures.length} kept</p>
      <UnplacedPictures
        pictures={kept.draft.pictures}
        onPlace={() => undefined}
        numberOf={({ name }) => NAMES.indexOf(name) + 1}
        editable
        keeper={keeper}
      />
    </>
  );
}

describe('UnplacedPictures', () => {
  it('deletes a picture after asking, once what was typed is saved, and keeps it where refused', async () => {
    let tries = 0;
    const sent = answerFetch({
      'PUT /api/notes/31/draft': ok(draftOf(5, 'Typed')),
      [`DELETE /api/notes/31/pictures/${NAMES[1] ?? ''}`]: () => {
        tries += 1;
        return tries === 1
          ? refused(409, 'in-use', 'This is in use')
          : ok({ message: 'The picture is deleted.' });
      },
    });
    renderPages([{ path: '/', Component: Pictures }], '/');
    await userEvent.click(await screen.findByRole('button', { name: 'Type' }));
    await userEvent.click(screen.getByRole('button', { name: 'Delete picture 2' }));
    await userEvent.click(screen.getByRole('button', { name: 'Delete it' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('This is in use');
    expect(screen.getByText('2 kept')).toBeVisible();
    await userEvent.click(screen.getByRole('button', { name: 'Delete it' }));
    await waitFor(() => expect(screen.getByText('1 kept')).toBeVisible());
    expect(sent.map(({ method }) => method)).toEqual(['PUT', 'DELETE', 'DELETE']);
    expect(screen.queryByRole('button', { name: 'Delete picture 2' })).toBeNull();
  });
});
