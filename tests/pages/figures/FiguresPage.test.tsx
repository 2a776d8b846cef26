import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { topicFiguresSchema, type TopicFigures } from '#shared/api/figure-topics.ts';
import { FiguresPage } from '../../../src/figures/FiguresPage.tsx';
import { answerFetch, ok } from '../../support/page-fetch.ts';
import { aSession, renderPages } from '../../support/render-pages.tsx';

afterEach(() => vi.unstubAllGlobals());

const ROUTES = [{ path: '/figures', Component: FiguresPage }];
const VISITOR = { 'GET /api/session': ok(aSession(null)) };

const points = (values: number[]) => ({ kind: 'points' as const, values });
const cracks: TopicFigures = topicFiguresSchema.parse({
  topic: 'cracks',
  by: 'crossing',
  kiln: null,
  ware: null,
  groups: [
    { id: 'gentle', label: 'Gentle', range: { from: null, to: 20 } },
    { id: 'fast', label: 'Fast', range: { from: 40, to: null } },
  ],
  groupQuantity: 'rate',
  quantity: null,
  tables: [
    {
      startClass: 'cold',
      cases: 14,
      firings: 8,
      members: 4,
      groups: [
        {
          id: 'gentle',
          cases: 10,
          firings: 6,
          members: 3,
          enough: true,
          share: {
            count: 2,
            of: 10,
            effective: 6.7,
            share: 0.2,
            interval: { low: 0.05, high: 0.55 },
            byMember: [{ count: 2, of: 10 }],
          },
          numbers: null,
        },
        {
          id: 'fast',
          cases: 4,
          firings: 2,
          members: 1,
          enough: false,
          share: {
            count: 3,
            of: 4,
            effective: 2.5,
            share: null,
            interval: null,
            byMember: [{ count: 3, of: 4 }],
          },
          numbers: null,
        },
      ],
      along: { yes: points([12, 41]), no: points([9, 14]) },
      comparison: {
        a: 'gentle',
        b: 'fast',
        difference: { share: -0.55, low: -0.8, high: -0.1 },
      },
    },
  ],
  domain: { low: 9, high: 41 },
  leftOut: [{ reason: 'how it came out is not told', count: 3 }],
  kilns: [{ id: 5, name: 'Drum by the hedge', firings: 8 }],
});

describe('The page of figures', () => {
  it('says each share with its interval, its firings and members, or that they are too few', async () => {
    answerFetch({ ...VISITOR, 'GET /api/figures/cracks?by=crossing': ok(cracks) });
    renderPages(ROUTES, '/figures');
    expect(
      await screen.findByRole('img', {
        name: /Gentle, under 20\s°C\/min: 2 of 10, 20\s% \(5 to 55\s%\)/,
      }),
    ).toBeVisible();
    expect(screen.getByRole('img', { name: /Fast.*3 of 4, too few to say/ })).toBeVisible();
    expect(
      screen.getByText(/55 fewer in a hundred; anything from 80 fewer to 10 fewer/),
    ).toBeVisible();
    expect(screen.getByText('Left out: 3, and why')).toBeVisible();
    await userEvent.click(screen.getByText('As a table'));
    const row = within(screen.getByRole('table')).getByRole('row', { name: /Gentle/ });
    expect(row).toHaveTextContent(/6\s*3\s*10\s*2\s*6\.7\s*20.%/);
    expect(screen.getByRole('link', { name: 'The rows as CSV' })).toHaveAttribute(
      'href',
      '/api/figures/cracks/rows.csv?by=crossing',
    );
  });

  it('keeps what is chosen in the address, and asks for it', async () => {
    const sent = answerFetch({
      ...VISITOR,
      'GET /api/figures/cracks?by=crossing': ok(cracks),
      'GET /api/figures/cracks?by=crossing&kiln=5': ok({ ...cracks, kiln: 5 }),
      'GET /api/figures/time?by=volume&kiln=5': ok({
        ...cracks,
        topic: 'time',
        by: 'volume',
        tables: [],
        quantity: 'duration',
      }),
    });
    const { router } = renderPages(ROUTES, '/figures');
    await screen.findByText('Cold starts');
    await userEvent.selectOptions(screen.getByLabelText('Kiln'), 'Drum by the hedge (8)');
    expect(router.state.location.search).toBe('?topic=cracks&by=crossing&kiln=5');
    await userEvent.selectOptions(screen.getByLabelText('Figure'), 'Time to temperature');
    expect(router.state.location.search).toBe('?topic=time&by=volume&kiln=5');
    expect(await screen.findByText('Nothing to draw yet')).toBeVisible();
    expect(screen.queryByLabelText('Compare')).toBeNull();
    expect(sent.map(({ path }) => path)).toContain('/api/figures/time?by=volume&kiln=5');
  });

  it('reads an address with what it does not know as if that were not there', async () => {
    answerFetch({ ...VISITOR, 'GET /api/figures/cracks?by=crossing': ok(cracks) });
    renderPages(ROUTES, '/figures?topic=luck&by=volume&kiln=x&ware=spoon');
    expect(await screen.findByText('Cold starts')).toBeVisible();
  });
});
