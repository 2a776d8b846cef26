import { screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { kilnPageSchema } from '#shared/api/kilns.ts';
import { EditKilnPage } from '../../../src/kilns/EditKilnPage.tsx';
import { kilnFields } from '../../support/notes.ts';
import { giveDialogs } from '../../support/dialogs.ts';
import { answerFetch, ok, refused } from '../../support/page-fetch.ts';
import { aMe, aSession, renderPages } from '../../support/render-pages.tsx';

afterEach(() => vi.unstubAllGlobals());

const ROUTES = [
  { path: '/kilns/:id/edit', Component: EditKilnPage },
  { path: '/kilns/:id', Component: () => <p>The kiln’s page</p> },
];
const aKiln = (version: number, traits = {}) =>
  kilnPageSchema.parse({
    id: 4,
    version,
    keeper: { id: 7, name: 'Marit Quell' },
    fields: kilnFields(traits),
    volumeLitres: 48,
    picture: null,
    removed: false,
    lentTo: [],
    abilities: { edit: true, lend: true, remove: true, fire: true },
    versions: [],
    firings: [],
  });
const SIGNED_IN = { 'GET /api/session': ok(aSession(aMe())) };

describe('EditKilnPage', () => {
  it('keeps what was typed when the kiln was altered elsewhere, and saves over it when told to', async () => {
    let saves = 0;
    const sent = answerFetch({
      ...SIGNED_IN,
      'GET /api/kilns/4': ok(aKiln(3)),
      'PUT /api/kilns/4': () => {
        saves += 1;
        return saves === 1
          ? refused(412, 'stale', 'A newer version was saved elsewhere', {
              current: { version: 5, fields: kilnFields({ jet: '0.8' }) },
            })
          : ok(aKiln(6));
      },
    });
    renderPages(ROUTES, '/kilns/4/edit');
    const jet = await screen.findByLabelText('Jet');
    await userEvent.type(jet, '1.2');
    await userEvent.click(screen.getByRole('button', { name: 'Save the kiln' }));
    expect(await screen.findByText(/altered elsewhere since you opened it/)).toBeVisible();
    expect(screen.getByText(/They differ in: Jet\./)).toBeVisible();
    expect(jet).toHaveValue('1.2');
    await userEvent.click(screen.getByRole('button', { name: /^Keep mine/ }));
    await userEvent.click(screen.getByRole('button', { name: 'Save the kiln' }));
    expect(await screen.findByText('The kiln’s page')).toBeVisible();
    expect(sent.filter(({ method }) => method === 'PUT').at(-1)?.body).toMatchObject({
      fields: { jet: '1.2' },
    });
  });

  it('sends nothing while a measure lies outside its range, and goes to that field', async () => {
    const sent = answerFetch({ ...SIGNED_IN, 'GET /api/kilns/4': ok(aKiln(3)) });
    renderPages(ROUTES, '/kilns/4/edit');
    const flue = await screen.findByLabelText('Flue opening');
    await userEvent.clear(flue);
    await userEvent.type(flue, '9000');
    await userEvent.click(screen.getByRole('button', { name: 'Save the kiln' }));
    await waitFor(() => expect(flue).toHaveFocus());
    expect(screen.getByText('Something above must be mended first.')).toBeVisible();
    expect(sent.filter(({ method }) => method !== 'GET')).toEqual([]);
  });

  it('says beside the field when nobody bears the name it is lent to', async () => {
    answerFetch({
      ...SIGNED_IN,
      'GET /api/kilns/4': ok(aKiln(3)),
      'PUT /api/kilns/4/loans': refused(422, 'bad-input', 'Some of this cannot be kept', {
        errors: [{ pointer: '/members/0', detail: 'There is no member called “Nobdoy”.' }],
      }),
    });
    renderPages(ROUTES, '/kilns/4/edit');
    const name = await screen.findByLabelText('Name of a member');
    await userEvent.type(name, 'Nobdoy');
    await userEvent.click(screen.getByRole('button', { name: 'Lend' }));
    await waitFor(() => expect(name).toHaveAccessibleDescription(/no member called “Nobdoy”/));
    expect(name).toHaveValue('Nobdoy');
  });

  it('sends no picture that is too large, and says the limit and its size', async () => {
    const sent = answerFetch({ ...SIGNED_IN, 'GET /api/kilns/4': ok(aKiln(3)) });
    renderPages(ROUTES, '/kilns/4/edit');
    const file = new File(['x'], 'large.jpg', { type: 'image/jpeg' });
    Object.defineProperty(file, 'size', { value: 17.3 * 1024 * 1024 });
    await userEvent.upload(await screen.findByLabelText('Picture of the kiln'), file);
    expect(await screen.findByRole('alert')).toHaveTextContent(
      'A picture may have at most 16 MiB; this one has 17.3 MiB.',
    );
    expect(sent.filter(({ method }) => method !== 'GET')).toEqual([]);
  });

  it('deletes the kiln’s picture after asking once more', async () => {
    giveDialogs();
    const picture = { name: 'a'.repeat(32), width: 4, height: 3, widths: [4], placeholder: '' };
    let isThere = true;
    const sent = answerFetch({
      ...SIGNED_IN,
      'GET /api/kilns/4': () => ok({ ...aKiln(3), picture: isThere ? picture : null }),
      'DELETE /api/kilns/4/picture': () => {
        isThere = false;
        return ok({ message: 'The picture is deleted.' });
      },
    });
    renderPages(ROUTES, '/kilns/4/edit');
    await userEvent.click(await screen.findByRole('button', { name: 'Delete the picture' }));
    expect(sent.filter(({ method }) => method === 'DELETE')).toEqual([]);
    await userEvent.click(screen.getByRole('button', { name: 'Delete it' }));
    expect(await screen.findByRole('button', { name: 'Add a picture' })).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Delete the picture' })).toBeNull();
  });
});
