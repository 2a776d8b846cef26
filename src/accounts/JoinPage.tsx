import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { Button } from '../ui/Button.tsx';
import { CheckField } from '../ui/CheckField.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Notice } from '../ui/Notice.tsx';
import { TextField } from '../ui/TextField.tsx';
import { join } from './account-mutations.ts';
import { AccountForm } from './AccountForm.tsx';
import { AccountPage } from './AccountPage.tsx';
import { issuesAt } from './form-faults.ts';
import { FormFoot } from './FormFoot.tsx';
import { HouseRules } from './HouseRules.tsx';
import { PasswordField } from './PasswordField.tsx';
import { useSession } from './useSession.ts';

const FIELDS = ['/name', '/email', '/password', '/agreed'];

/** Makes an account. Whether an address has one already is told by mail only, to its owner. */
export function JoinPage() {
  const { me } = useSession();
  const [name, setName] = useState('');
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const [agreed, setAgreed] = useState(false);
  const joining = useMutation({
    mutationFn: join,
    networkMode: 'always',
    onSuccess: () => setPassword(''),
  });
  const { error } = joining;

  if (me) {
    return (
      <AccountPage title="You have joined already" lead={`You are signed in as ${me.name}.`}>
        <LinkButton to={paths.notebook} kind="main">
          Your notebook
        </LinkButton>
      </AccountPage>
    );
  }
  if (joining.isSuccess) return <LookIntoYourMail email={joining.variables.email} />;
  return (
    <AccountPage
      title="Join"
      lead="Members write notes of their firings and keep their kilns here. Reading needs no account."
    >
      <AccountForm
        error={error}
        fields={FIELDS}
        onSubmit={() => {
          if (!joining.isPending) joining.mutate({ name, email: email.trim(), password, agreed });
        }}
      >
        <TextField
          label="Name"
          autoComplete="name"
          required
          value={name}
          onValue={setName}
          hint="As it stands over your notes. Your own or another one; everybody sees it."
          issues={issuesAt(error, '/name')}
        />
        <TextField
          label="E-mail address"
          type="email"
          autoComplete="email"
          required
          value={email}
          onValue={setEmail}
          hint="Nobody sees it. A link that is sent there has to be opened before a note can be handed in."
          issues={issuesAt(error, '/email')}
        />
        <PasswordField
          label="Password"
          use="new"
          value={password}
          onValue={setPassword}
          issues={issuesAt(error, '/password')}
        />
        <HouseRules />
        <div className="@2xl:pl-[11.75rem]">
          <CheckField
            label="I agree to the house rules, and to others reading and quoting my published notes under the licence"
            required
            checked={agreed}
            onChecked={setAgreed}
            issues={
              issuesAt(error, '/agreed').length > 0 && !agreed
                ? [{ kind: 'must-mend', text: 'Joining needs your agreement to both.' }]
                : []
            }
          />
        </div>
        <FormFoot>
          <Button type="submit" kind="main" busy={joining.isPending}>
            Join
          </Button>
          <Link to={paths.signIn()} className="link text-small">
            I have an account
          </Link>
        </FormFoot>
      </AccountForm>
    </AccountPage>
  );
}

function LookIntoYourMail({ email }: { readonly email: string }) {
  return (
    <AccountPage title="Look into your mail">
      <Notice kind="done" appeared>
        A mail has gone to <strong className="break-words">{email}</strong>. The link in it confirms
        the address; it works for 24 hours.
      </Notice>
      <p className="max-w-measure text-small text-soot-2">
        You can sign in and write at once; the address has to be confirmed before you hand a note
        in. No mail? Look among the unwanted ones, then sign in and have it sent again.
      </p>
      <LinkButton to={paths.signIn(paths.notebook)} kind="main">
        Sign in
      </LinkButton>
    </AccountPage>
  );
}
