import { createBrowserRouter, type RouteObject } from 'react-router-dom';
import type { ComponentType } from 'react';
import type { PagePattern } from '#shared/paths.ts';
import { Layout } from './Layout.tsx';
import { PageComing } from './PageComing.tsx';
import { NotFoundPage } from '../http/NotFoundPage.tsx';
import { RouteErrorPage } from './RouteErrorPage.tsx';

type Page = () => Promise<ComponentType>;

/** Every page, fetched when first visited. */
const PAGES: Readonly<Record<Exclude<PagePattern, '/workbench'>, Page>> = {
  '/': async () => (await import('./FrontPage.tsx')).FrontPage,
  '/find': async () => (await import('../find/FindPage.tsx')).FindPage,
  '/look-alikes': async () => (await import('../look-alikes/LookAlikesPage.tsx')).LookAlikesPage,
  '/notes': async () => (await import('../notes/NewestPage.tsx')).NewestPage,
  '/notes/:id': async () => (await import('../notes/NotePage.tsx')).NotePage,
  '/notes/:id/:slug': async () => (await import('../notes/NotePage.tsx')).NotePage,
  '/write': async () => (await import('../write/NewNotePage.tsx')).NewNotePage,
  '/write/:id': async () => (await import('../write/WritePage.tsx')).WritePage,
  '/write/:id/preview': async () => (await import('../write/PreviewPage.tsx')).PreviewPage,
  '/notebook': async () => (await import('../notes/NotebookPage.tsx')).NotebookPage,
  '/kilns': async () => (await import('../kilns/KilnsPage.tsx')).KilnsPage,
  '/kilns/new': async () => (await import('../kilns/NewKilnPage.tsx')).NewKilnPage,
  '/kilns/:id': async () => (await import('../kilns/KilnPage.tsx')).KilnPage,
  '/kilns/:id/edit': async () => (await import('../kilns/EditKilnPage.tsx')).EditKilnPage,
  '/desk': async () => (await import('../desk/DeskPage.tsx')).DeskPage,
  '/desk/:id': async () => (await import('../desk/DeskNotePage.tsx')).DeskNotePage,
  '/what-helped': async () => (await import('../figures/WhatHelpedPage.tsx')).WhatHelpedPage,
  '/what-helped/:trouble': async () =>
    (await import('../figures/WhatHelpedTroublePage.tsx')).WhatHelpedTroublePage,
  '/figures': async () => (await import('../figures/FiguresPage.tsx')).FiguresPage,
  '/members/:id': async () => (await import('../accounts/MemberPage.tsx')).MemberPage,
  '/cautions': async () => (await import('./CautionsPage.tsx')).CautionsPage,
  '/sign-in': async () => (await import('../accounts/SignInPage.tsx')).SignInPage,
  '/join': async () => (await import('../accounts/JoinPage.tsx')).JoinPage,
  '/forgotten-password': async () =>
    (await import('../accounts/ForgottenPasswordPage.tsx')).ForgottenPasswordPage,
  '/new-password': async () => (await import('../accounts/NewPasswordPage.tsx')).NewPasswordPage,
  '/confirm-address': async () =>
    (await import('../accounts/ConfirmAddressPage.tsx')).ConfirmAddressPage,
  '/settings': async () => (await import('../accounts/SettingsPage.tsx')).SettingsPage,
  '/saved-searches': async () =>
    (await import('../saved-searches/SavedSearchesPage.tsx')).SavedSearchesPage,
  '/unsubscribe': async () =>
    (await import('../saved-searches/UnsubscribePage.tsx')).UnsubscribePage,
  '/admin/members': async () => (await import('../admin/AdminMembersPage.tsx')).AdminMembersPage,
  '/admin/state': async () => (await import('../admin/AdminStatePage.tsx')).AdminStatePage,
  '/admin/mail': async () => (await import('../admin/AdminMailPage.tsx')).AdminMailPage,
  '/admin/audit': async () => (await import('../admin/AdminAuditPage.tsx')).AdminAuditPage,
};

const routes: RouteObject[] = Object.entries(PAGES).map(([path, page]) => ({
  path,
  lazy: async () => ({ Component: await page() }),
  HydrateFallback: PageComing,
  ErrorBoundary: RouteErrorPage,
}));

// The workbench shows the components in all their states; it is not part of a built client.
if (import.meta.env.DEV) {
  routes.push({
    path: '/workbench',
    lazy: async () => ({
      Component: (await import('../workbench/WorkbenchPage.tsx')).WorkbenchPage,
    }),
    HydrateFallback: PageComing,
  });
}

export function createRouter() {
  return createBrowserRouter([
    {
      Component: Layout,
      ErrorBoundary: RouteErrorPage,
      children: [...routes, { path: '*', Component: NotFoundPage }],
    },
  ]);
}
