import { useQuery } from '@tanstack/react-query';
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
