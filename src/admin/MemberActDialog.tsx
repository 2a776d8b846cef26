import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { AdminMembers } from '#shared/api/admin.ts';
import { ROLES, type Role } from '#shared/vocabulary/statuses.ts';
import { AccountForm } from '../accounts/AccountForm.tsx';
import { issuesAt, isProblem } from '../accounts/form-faults.ts';
import { Button } from '../ui/Button.tsx';
import { ChoiceField } from '../ui/ChoiceField.tsx';
import { Dialog } from '../ui/Dialog.tsx';
import { optionsOf } from '../ui/options.ts';
import { TextArea } from '../ui/TextArea.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { actOnMember, type MemberAct } from './admin-mutations.ts';
import { adminQueries } from './admin-queries.ts';
import { PasswordAgainDialog } from './PasswordAgainDialog.tsx';

export type AdminMember = AdminMembers['members'][number];
export interface WantedAct {
  readonly kind: MemberAct['kind'];
  readonly member: AdminMember;
}

interface Props {
  readonly wanted: WantedAct | null;
  readonly onClose: () => void;
}

/** Asks for the reason of an act on a member, and for the password where the server wants it. */
export function MemberActDialog({ wanted, onClose }: Props) {
  return (
    <Dialog open={wanted !== null} onClose={onClose} title={wanted ? titleOf(wanted) : ''}>
      {wanted && <ActForm wanted={wanted} onClose={onClose} />}
    </Dialog>
  );
}

function titleOf({ kind, member }: WantedAct): string {
  if (kind === 'role') return `Role of ${member.name}`;
  return member.suspended ? `Let ${member.name} in again?` : `Suspend ${member.name}?`;
}

const MAX_REASON = 500;

function ActForm({
  wanted,
  onClose,
}: {
  readonly wanted: WantedAct;
  readonly onClose: () => void;
}) {
  const { kind, member } = wanted;
  const client = useQueryClient();
  const tell = useMessages();
  const [role, setRole] = useState<Role>(member.role);
  const [reason, setReason] = useState('');
  const acting = useMutation({
    mutationFn: actOnMember,
    networkMode: 'always',
    onSuccess: ({ message }) => {
      tell({ kind: 'done', text: message });
      onClose();
      return client.invalidateQueries({ queryKey: adminQueries.all });
    },
  });
  const unconfirmed = isProblem(acting.error, 'confirm-password');
  const act: MemberAct =
    kind === 'role'
      ? { kind, memberId: member.id, role }
      : { kind, memberId: member.id, suspended: !member.suspended };
  const shuts = act.kind === 'suspended' && act.suspended;
  return (
    <>
      <AccountForm
        error={unconfirmed ? null : acting.error}
        fields={['/reason']}
        onSubmit={() => {
          if (!acting.isPending) acting.mutate({ act, reason });
        }}
      >
        {kind === 'role' ? (
          <>
            <p className="text-small">
              Moderators read what is handed in and decide; admins also do what you do here. The
              member has to sign in again.
            </p>
            <ChoiceField
              label="Role"
              required
              options={optionsOf(ROLES)}
              value={role}
              onValue={(chosen) => chosen && setRole(chosen)}
            />
          </>
        ) : (
          <p className="text-small">
            {shuts
              ? 'They are signed out at once and cannot sign in. What they have published stays.'
              : 'They can sign in again; what they had stays as it was.'}
          </p>
        )}
        <TextArea
          label="Why"
          required
          rows={3}
          maxLength={MAX_REASON}
          value={reason}
          onValue={setReason}
          hint="Kept with the act, for the others who run this site."
          issues={issuesAt(acting.error, '/reason')}
        />
        <div className="flex flex-wrap gap-3 pt-2">
          <Button type="submit" kind={shuts ? 'danger' : 'main'} busy={acting.isPending}>
            {kind === 'role' ? 'Change the role' : shuts ? 'Suspend' : 'Let them in again'}
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </div>
      </AccountForm>
      <PasswordAgainDialog
        open={unconfirmed}
        onClose={() => acting.reset()}
        onConfirmed={() => acting.mutate({ act, reason })}
      />
    </>
  );
}
