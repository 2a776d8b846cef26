import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { paths } from '#shared/paths.ts';
import { Button } from '../ui/Button.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Notice } from '../ui/Notice.tsx';
import { setNewPassword } from './account-mutations.ts';
import { AccountForm } from './AccountForm.tsx';
import { AccountPage } from './AccountPage.tsx';
import { issuesAt, isProblem } from './form-faults.ts';
import { FormFoot } from './FormFoot.tsx';
import { PasswordField } from './PasswordField.tsx';
import { sessionQueries } from './session-queries.ts';
import { useLinkToken } from './useLinkToken.ts';

/** A new password through a mailed link. Opening the page changes nothing; the button does. */
export function NewPasswordPage() {
  const { token, given } = useLinkToken();
  const client = useQueryClient();
  const [password, setPassword] = useState('');
  const setting = useMutation({
    mutationFn: setNewPassword,
    networkMode: 'always',
    onSuccess: () => {
      setPassword('');
      // All sessions of the account have ended, perhaps this browser's too.
      return client.invalidateQueries({ queryKey: sessionQueries.all });
    },
  });

  if (setting.isSuccess) {
    return (
      <AccountPage title="New password">
        <Notice kind="done" appeared>
          {setting.data.message} Every session of yours has ended, in all browsers.
        </Notice>
        <LinkButton to={paths.signIn()} kind="main">
          Sign in
        </LinkButton>
      </AccountPage>
    );
  }
  if (token === null || isProblem(setting.error, 'link-used')) {
    return (
      <AccountPage title="New password">
        <Notice
          kind="caution"
          appeared={setting.isError}
          heading={
            setting.isError
              ? 'This link has been used or is out of date'
              : given
                ? 'This link is not whole'
                : 'This page needs the link from the mail'
          }
        >
          {setting.isError
            ? 'It works once, for 30 minutes, and only the newest of several does. Your password has not changed.'
            : 'Open the link in the mail itself, or copy all of it into the address bar. After loading this page again the link has to be opened once more.'}
        </Notice>
        <LinkButton to={paths.forgottenPassword} kind="main">
          Have a new link sent
        </LinkButton>
      </AccountPage>
    );
  }
  return (
    <AccountPage
      title="New password"
      lead="Once it is set, every session of yours ends and you sign in with the new one."
    >
      <AccountForm
        error={setting.error}
        fields={['/password']}
        onSubmit={() => {
          if (!setting.isPending) setting.mutate({ token, password });
        }}
      >
        <PasswordField
          label="New password"
          use="new"
          value={password}
          onValue={setPassword}
          issues={issuesAt(setting.error, '/password')}
        />
        <FormFoot>
          <Button type="submit" kind="main" busy={setting.isPending}>
            Set the new password
          </Button>
        </FormFoot>
      </AccountForm>
    </AccountPage>
  );
}
