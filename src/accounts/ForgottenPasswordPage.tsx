import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { Button } from '../ui/Button.tsx';
import { Notice } from '../ui/Notice.tsx';
import { TextField } from '../ui/TextField.tsx';
import { askForNewPassword } from './account-mutations.ts';
import { AccountForm } from './AccountForm.tsx';
import { AccountPage } from './AccountPage.tsx';
import { issuesAt } from './form-faults.ts';
import { FormFoot } from './FormFoot.tsx';

/** Sends a link for a new password, and says the same whether or not somebody has the address. */
export function ForgottenPasswordPage() {
  const [email, setEmail] = useState('');
  const asking = useMutation({ mutationFn: askForNewPassword, networkMode: 'always' });
  return (
    <AccountPage
      title="Forgotten password"
      lead="Say your address, and a link for a new password goes to it. Until the link is used, the old password goes on working."
    >
      {asking.isSuccess && (
        <Notice kind="done" appeared>
          {asking.data.message} It works for 30 minutes, and only the newest one does.
        </Notice>
      )}
      <AccountForm
        error={asking.error}
        fields={['/email']}
        onSubmit={() => {
          if (!asking.isPending) asking.mutate({ email: email.trim() });
        }}
      >
        <TextField
          label="E-mail address"
          type="email"
          autoComplete="username"
          required
          value={email}
          onValue={setEmail}
          issues={issuesAt(asking.error, '/email')}
        />
        <FormFoot>
          <Button type="submit" kind="main" busy={asking.isPending}>
            {asking.isSuccess ? 'Send it again' : 'Send the link'}
          </Button>
          <Link to={paths.signIn()} className="link text-small">
            Back to sign in
          </Link>
        </FormFoot>
      </AccountForm>
    </AccountPage>
  );
}
