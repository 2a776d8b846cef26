import { useMutation, useQueryClient } from '@tanstack/react-query';
import { paths } from '#shared/paths.ts';
import { Button } from '../ui/Button.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Notice } from '../ui/Notice.tsx';
import { confirmAddress } from './account-mutations.ts';
import { AccountPage } from './AccountPage.tsx';
import { isProblem } from './form-faults.ts';
import { FormProblem } from './FormProblem.tsx';
import { sessionQueries } from './session-queries.ts';
import { useLinkToken } from './useLinkToken.ts';
import { useSession } from './useSession.ts';
import { VerifyAddressNotice } from './VerifyAddressNotice.tsx';

/** Confirms an address through a mailed link: opening it changes nothing, the button does. */
export function ConfirmAddressPage() {
  const { token, given } = useLinkToken();
  const { me } = useSession();
  const client = useQueryClient();
  const confirming = useMutation({
    mutationFn: confirmAddress,
    networkMode: 'always',
    onSuccess: () => client.invalidateQueries({ queryKey: sessionQueries.all }),
  });
  const onwards = me ? (
    <LinkButton to={paths.notebook} kind="main">
      Your notebook
    </LinkButton>
  ) : (
    <LinkButton to={paths.signIn(paths.notebook)} kind="main">
      Sign in
    </LinkButton>
  );

  if (confirming.isSuccess) {
    return (
      <AccountPage title="Confirm your address">
        <Notice kind="done" appeared>
          {confirming.data.message} You can hand notes in, and mail from Spyhole comes here.
        </Notice>
        {onwards}
      </AccountPage>
    );
  }
  if (token === null || isProblem(confirming.error, 'link-used')) {
    return (
      <AccountPage title="Confirm your address">
        {me?.emailVerified ? (
          <Notice kind="info">
            The address of your account, <strong className="break-words">{me.email}</strong>, is
            confirmed. {confirming.isError && 'This link has been used or is out of date.'}
          </Notice>
        ) : (
          <Notice
            kind="caution"
            appeared={confirming.isError}
            heading={
              confirming.isError
                ? 'This link has been used or is out of date'
                : given
                  ? 'This link is not whole'
                  : 'This page needs the link from the mail'
            }
          >
            {confirming.isError
              ? 'It works once, for 24 hours, and only the newest of several does.'
              : 'Open the link in the mail itself, or copy all of it into the address bar.'}
            {!me && ' Sign in to have another one sent.'}
          </Notice>
        )}
        {me && !me.emailVerified ? <VerifyAddressNotice /> : onwards}
      </AccountPage>
    );
  }
  return (
    <AccountPage
      title="Confirm your address"
      lead="Confirm that the mail reached you and that you want mail from Spyhole at this address."
    >
      <FormProblem error={confirming.error} fields={[]} />
      <Button kind="main" busy={confirming.isPending} onClick={() => confirming.mutate({ token })}>
        Confirm this address
      </Button>
    </AccountPage>
  );
}
