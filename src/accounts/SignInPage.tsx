import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, Navigate, useSearchParams } from 'react-router-dom';
import { ownPathOnly, paths } from '#shared/paths.ts';
import { Button } from '../ui/Button.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { TextField } from '../ui/TextField.tsx';
import { signIn } from './account-mutations.ts';
import { AccountForm } from './AccountForm.tsx';
import { AccountPage } from './AccountPage.tsx';
import { issuesAt } from './form-faults.ts';
import { FormFoot } from './FormFoot.tsx';
import { PasswordField } from './PasswordField.tsx';
import { enterSession } from './session-cache.ts';
import { sessionQueries } from './session-queries.ts';

/** Signs in, and goes on to where the reader came from: a path of this site, else the front page. */
export function SignInPage() {
  const [params] = useSearchParams();
  const next = ownPathOnly(params.get('next'));
  // Asked anew: a session that has ended meanwhile must not send the reader straight back.
  const session = useQuery({ ...sessionQueries.current(), refetchOnMount: 'always' });
  const me = session.data?.me ?? null;
  if (me && session.isFetchedAfterMount) return <Navigate to={next} replace />;
  if (me) return <Skeleton words="Finding out whether you are signed in" shape="text" count={3} />;
  return <SignInForm cameFrom={next !== paths.front} />;
}

function SignInForm({ cameFrom }: { readonly cameFrom: boolean }) {
  const client = useQueryClient();
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const signingIn = useMutation({
    mutationFn: signIn,
    networkMode: 'always',
    onSuccess: (answer) => enterSession(client, answer),
  });
  const { error } = signingIn;
  return (
    <AccountPage title="Sign in" lead={cameFrom ? 'You go on to where you were.' : undefined}>
      <AccountForm
        error={error}
        fields={['/email', '/password']}
        onSubmit={() => {
          if (!signingIn.isPending) signingIn.mutate({ email, password });
        }}
      >
        <TextField
          label="E-mail address"
          type="email"
          autoComplete="username"
          required
          value={email}
          onValue={setEmail}
          issues={issuesAt(error, '/email')}
        />
        <PasswordField
          label="Password"
          use="present"
          value={password}
          onValue={setPassword}
          issues={issuesAt(error, '/password')}
        />
        <FormFoot>
          <Button type="submit" kind="main" busy={signingIn.isPending}>
            Sign in
          </Button>
          <Link to={paths.forgottenPassword} className="link text-small">
            Forgotten the password?
          </Link>
        </FormFoot>
      </AccountForm>
      <p className="text-small">
        Not a member yet?{' '}
        <Link to={paths.join} className="link">
          Join
        </Link>
        . Reading needs no account.
      </p>
    </AccountPage>
  );
}
