import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { confirmPassword } from '../accounts/account-mutations.ts';
import { AccountForm } from '../accounts/AccountForm.tsx';
import { issuesAt } from '../accounts/form-faults.ts';
import { PasswordField } from '../accounts/PasswordField.tsx';
import { Button } from '../ui/Button.tsx';
import { Dialog } from '../ui/Dialog.tsx';

interface Props {
  readonly open: boolean;
  readonly onClose: () => void;
  /** The server takes the act now. */
  readonly onConfirmed: () => void;
}

/** Asked before acts that hurt, when the password was not typed within the last ten minutes. */
export function PasswordAgainDialog({ open, onClose, onConfirmed }: Props) {
  return (
    <Dialog open={open} onClose={onClose} title="Type your password again">
      <PasswordAgainForm onClose={onClose} onConfirmed={onConfirmed} />
    </Dialog>
  );
}

function PasswordAgainForm({ onClose, onConfirmed }: Omit<Props, 'open'>) {
  const [password, setPassword] = useState('');
  const confirming = useMutation({
    mutationFn: confirmPassword,
    networkMode: 'always',
    onSuccess: onConfirmed,
  });
  return (
    <AccountForm
      error={confirming.error}
      fields={['/password']}
      onSubmit={() => {
        if (!confirming.isPending) confirming.mutate({ password });
      }}
    >
      <p>So that nobody does this at a screen you have left. It holds for ten minutes.</p>
      <PasswordField
        label="Your password"
        use="present"
        value={password}
        onValue={setPassword}
        issues={issuesAt(confirming.error, '/password')}
      />
      <div className="flex flex-wrap gap-3 pt-2">
        <Button type="submit" kind="main" busy={confirming.isPending}>
          Go on
        </Button>
        <Button onClick={onClose}>Leave it</Button>
      </div>
    </AccountForm>
  );
}
