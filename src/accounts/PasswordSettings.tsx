import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { Me } from '#shared/api/accounts.ts';
import { Button } from '../ui/Button.tsx';
import { CheckField } from '../ui/CheckField.tsx';
import { TextField } from '../ui/TextField.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { changeEmail, changePassword } from './account-mutations.ts';
import { issuesAt } from './form-faults.ts';
import { FormFoot } from './FormFoot.tsx';
import { PasswordField } from './PasswordField.tsx';
import { sessionQueries } from './session-queries.ts';
import { SettingsForm } from './SettingsSection.tsx';

/** Another password, given the present one. */
export function PasswordSettings({ me }: { readonly me: Me }) {
  const client = useQueryClient();
  const tell = useMessages();
  const [current, setCurrent] = useState('');
  const [next, setNext] = useState('');
  const [endOtherSessions, setEndOtherSessions] = useState(true);
  const changing = useMutation({
    mutationFn: changePassword,
    networkMode: 'always',
    onSuccess: ({ message }, values) => {
      setCurrent('');
      setNext('');
      tell({
        kind: 'done',
        text: values.endOtherSessions ? `${message} You are signed out everywhere else.` : message,
      });
      // The session has another identifier and another token now.
      return client.invalidateQueries({ queryKey: sessionQueries.all });
    },
  });
  return (
    <SettingsForm
      id="password"
      heading="Password"
      error={changing.error}
      fields={['/current', '/next']}
      onSubmit={() => {
        if (!changing.isPending) changing.mutate({ current, next, endOtherSessions });
      }}
    >
      {/* Password managers look for the account's name in the form. */}
      <input
        type="text"
        autoComplete="username"
        value={me.email}
        readOnly
        tabIndex={-1}
        aria-hidden="true"
        className="hidden"
      />
      <PasswordField
        label="Present password"
        use="present"
        value={current}
        onValue={setCurrent}
        issues={issuesAt(changing.error, '/current')}
      />
      <PasswordField
        label="New password"
        use="new"
        value={next}
        onValue={setNext}
        issues={issuesAt(changing.error, '/next')}
      />
      <FormFoot>
        <CheckField
          label="Sign me out everywhere else"
          checked={endOtherSessions}
          onChecked={setEndOtherSessions}
        />
      </FormFoot>
      <FormFoot>
        <Button type="submit" kind="main" busy={changing.isPending}>
          Change the password
        </Button>
      </FormFoot>
    </SettingsForm>
  );
}

/** Another address: it counts once the link mailed to it was used; the old one is then told. */
export function AddressSettings({ me }: { readonly me: Me }) {
  const tell = useMessages();
  const [email, setEmail] = useState('');
  const [current, setCurrent] = useState('');
  const changing = useMutation({
    mutationFn: changeEmail,
    networkMode: 'always',
    onSuccess: ({ message }) => {
      setEmail('');
      setCurrent('');
      tell({ kind: 'done', text: message });
    },
  });
  return (
    <SettingsForm
      id="address"
      heading="Address"
      lead={
        <>
          Mail goes to <strong className="break-words text-soot">{me.email}</strong>
          {me.emailVerified ? '' : ', which is not confirmed yet'}. A new address counts once the
          link that is sent to it has been used.
        </>
      }
      error={changing.error}
      fields={['/email', '/current']}
      onSubmit={() => {
        if (!changing.isPending) changing.mutate({ email: email.trim(), current });
      }}
    >
      <TextField
        label="New address"
        type="email"
        autoComplete="email"
        required
        value={email}
        onValue={setEmail}
        issues={issuesAt(changing.error, '/email')}
      />
      <PasswordField
        label="Your password"
        use="present"
        value={current}
        onValue={setCurrent}
        issues={issuesAt(changing.error, '/current')}
      />
      <FormFoot>
        <Button type="submit" kind="main" busy={changing.isPending}>
          Change the address
        </Button>
      </FormFoot>
    </SettingsForm>
  );
}
