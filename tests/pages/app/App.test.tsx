import { render, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { App } from '../../../src/App.tsx';
import { answerFetch, ok } from '../../support/page-fetch.ts';
import { aSession } from '../../support/render-pages.tsx';

const warned = vi.spyOn(console, 'warn').mockImplementation(() => undefined);

beforeEach(() => {
  localStorage.clear();
  vi.stubGlobal('matchMedia', () => ({ matches: false, addEventListener: () => undefined }));
  vi.stubGlobal('scrollTo', () => undefined);
  answerFetch({ 'GET /api/session': ok(aSession(null)) });
  window.history.replaceState(null, '', '/cautions');
});
afterEach(() => {
  warned.mockClear();
  vi.unstubAllGlobals();
});

describe('the first page of a visit', () => {
  it('shows the frame and the shape of what comes until its code is there, without a warning', async () => {
    render(<App />);
    expect(screen.getByRole('navigation', { name: 'Main' })).toBeVisible();
    expect(screen.getByRole('status')).toHaveTextContent('The page is being fetched');
    expect(await screen.findByRole('heading', { level: 1, name: 'Cautions' })).toBeVisible();
    expect(screen.queryByText('The page is being fetched')).toBeNull();
    expect(warned).not.toHaveBeenCalled();
  });
});
