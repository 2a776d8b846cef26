import { Suspense, useEffect, useRef } from 'react';
import { Link, Outlet, ScrollRestoration, useLocation, useNavigation } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { useSession } from '../accounts/useSession.ts';
import { applyThemeChoice, storedThemeChoice } from '../ui/theme.ts';
import { SkipLink } from '../ui/SkipLink.tsx';
import { SpyholeMark } from '../ui/SpyholeMark.tsx';
import { ThemeSwitch } from '../ui/ThemeSwitch.tsx';
import { MainNavigation } from './MainNavigation.tsx';
import { OfflineNotice } from './OfflineNotice.tsx';
import { PageComing } from './PageComing.tsx';

/** The frame of every page: name, ways to go, the page itself, and the lines at the foot. */
export function Layout() {
  const { pathname } = useLocation();
  const navigation = useNavigation();
  const { me } = useSession();
  const main = useRef<HTMLElement>(null);
  const arrived = useRef(false);

  // A member's choice of theme holds on every device; without one this browser's does.
  const theme = me?.settings.theme;
  useEffect(() => {
    applyThemeChoice(theme === undefined || theme === 'system' ? storedThemeChoice() : theme);
  }, [theme]);

  // After going to another page, reading and tabbing start at its beginning.
  useEffect(() => {
    if (arrived.current) main.current?.focus({ preventScroll: true });
    arrived.current = true;
  }, [pathname]);

  const busy = navigation.state !== 'idle';
  return (
    <div className="mx-auto flex min-h-dvh max-w-page flex-col px-4 sm:px-8">
      <SkipLink to="#main">To the page</SkipLink>
      <header className="not-in-print relative flex flex-wrap items-center gap-x-8 gap-y-1 border-b border-line py-3">
        <Link
          to={paths.front}
          className="inline-flex min-h-11 items-center gap-2.5 text-lead font-[650] text-soot no-underline"
        >
          <SpyholeMark busy={busy} />
          Spyhole
        </Link>
        <MainNavigation />
      </header>
      <OfflineNotice />
      <main
        ref={main}
        id="main"
        tabIndex={-1}
        className="grow py-6 outline-none sm:py-10 print:py-0"
      >
        <Suspense fallback={<PageComing />}>
          <Outlet />
        </Suspense>
      </main>
      <footer className="not-in-print mt-12 flex flex-wrap items-center justify-between gap-x-8 gap-y-4 border-t border-line py-6 text-small text-soot-2">
        <p className="max-w-measure">
          Notes are members’ own accounts, read by a moderator and not found safe by anyone. Have
          the gas set-up checked by a licensed gas engineer and follow local codes.{' '}
          <Link to={paths.cautions} className="link">
            Cautions
          </Link>
        </p>
        <ThemeSwitch />
      </footer>
      <ScrollRestoration />
    </div>
  );
}
