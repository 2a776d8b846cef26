import { screen } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { DeskPage } from '../../../src/desk/DeskPage.tsx';
import { answerFetch, ok, refused } from '../../support/page-fetch.ts';
import { aMe, aSession, renderPages } from '../../support/render-pages.tsx';

afterEach(() => vi.unstubAllGlobals());

describe('the desk', () => {
  it('is one closed page to a member, without parts of it that fail once more', async () => {
    const sent = answerFetch({
      'GET /api/session': ok(aSession(aMe())),
      'GET /api/desk': refused(403, 'not-allowed', 'You may not do this'),
    });
    renderPages([{ path: '/desk', Component: DeskPage }], '/desk');
    expect(await screen.findByText('You may not see this')).toBeVisible();
    expect(screen.getByText(/Your account does not open this page/)).toBeVisible();
    expect(screen.queryByText('Disputed findings')).toBeNull();
    expect(sent.some(({ path }) => path === '/api/desk/disputes')).toBe(false);
  });
});
