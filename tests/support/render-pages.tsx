import { QueryClientProvider, type QueryClient } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import { createMemoryRouter, RouterProvider, type RouteObject } from 'react-router-dom';
import { meSchema, type Me, type SessionAnswer } from '#shared/api/accounts.ts';
import { defaultSettings } from '#shared/api/settings.ts';
import { createQueryClient } from '../../src/app/query-client.ts';
import { rememberToken } from '../../src/http/client.ts';
import { MessagesProvider } from '../../src/ui/MessagesProvider.tsx';

/** Pages with the router, the cache and the messages they have in the application. */
export function renderPages(routes: RouteObject[], address: string) {
  const client: QueryClient = createQueryClient();
  const router = createMemoryRouter(routes, { initialEntries: [address] });
  rememberToken('a-token-of-the-test');
  render(
    <QueryClientProvider client={client}>
      <MessagesProvider>
        <RouterProvider router={router} />
      </MessagesProvider>
    </QueryClientProvider>,
  );
  return { client, router };
}

export function aMe(traits: Partial<Me> = {}): Me {
  return meSchema.parse({
    id: 7,
    name: 'Marit Quell',
    email: 'marit@example.org',
    emailVerified: true,
    role: 'member',
    place: '',
    about: '',
    settings: defaultSettings(),
    ...traits,
  });
}

export function aSession(me: Me | null): SessionAnswer {
  return {
    me,
    abilities: {
      write: me !== null,
      handIn: me?.emailVerified ?? false,
      moderate: false,
      administer: me?.role === 'admin',
    },
    token: me === null ? null : 'a-token-of-the-session',
  };
}
