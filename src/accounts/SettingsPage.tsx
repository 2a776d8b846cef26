import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { ProblemPage } from '../http/ProblemPage.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { AccountPage } from './AccountPage.tsx';
import { AddressSettings, PasswordSettings } from './PasswordSettings.tsx';
import { ProfileSettings } from './ProfileSettings.tsx';
import { ReadingSettings } from './ReadingSettings.tsx';
import { sessionQueries } from './session-queries.ts';
import { SessionSettings } from './SessionSettings.tsx';
import { useSession } from './useSession.ts';
import { VerifyAddressNotice } from './VerifyAddressNotice.tsx';

/** A member's own account. */
export function SettingsPage() {
  const { me } = useSession();
  // It is refused to visitors, and its refusal is the page they get.
  const sessions = useQuery(sessionQueries.list());
  if (sessions.isLoadingError) {
    return <ProblemPage error={sessions.error} onRetry={() => void sessions.refetch()} />;
  }
  return (
    <AccountPage title="Settings">
      {me ? (
        // Another member's fields never stay in the form.
        <div key={me.id} className="space-y-10">
          <VerifyAddressNotice />
          <SectionLinks />
          <ProfileSettings me={me} />
          <ReadingSettings me={me} />
          <PasswordSettings me={me} />
          <AddressSettings me={me} />
          <SessionSettings me={me} />
        </div>
      ) : (
        <Skeleton words="Your settings are being fetched" shape="sheet" count={8} />
      )}
    </AccountPage>
  );
}

const SECTIONS = [
  { id: 'your-page', label: 'Your page' },
  { id: 'reading', label: 'Reading and mail' },
  { id: 'password', label: 'Password' },
  { id: 'address', label: 'Address' },
  { id: 'sessions', label: 'Sign out' },
] as const;

/** The way to each part of a long page; signing out is the last of them. */
function SectionLinks() {
  return (
    <nav aria-label="On this page">
      <ul className="flex flex-wrap gap-x-6 text-small">
        {SECTIONS.map(({ id, label }) => (
          <li key={id}>
            <Link to={`#${id}`} className="link inline-flex min-h-8 items-center touch:min-h-11">
              {label}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
