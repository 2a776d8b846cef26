import { useMutation } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { Button } from '../ui/Button.tsx';
import { Notice } from '../ui/Notice.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { sendVerificationAgain } from './account-mutations.ts';
import { useSession } from './useSession.ts';

/**
 * For a member whose address is not confirmed: what that keeps them from, and the mail once more.
 * Nothing for everybody else.
 */
export function VerifyAddressNotice() {
  const { me } = useSession();
  const tell = useMessages();
  const sending = useMutation({
    mutationFn: sendVerificationAgain,
    networkMode: 'always',
    onSuccess: ({ message }) => tell({ kind: 'done', text: message }),
  });
  if (!me || me.emailVerified) return null;
  return (
    <Notice
      kind="caution"
      heading="Your address is not confirmed yet"
      action={
        <>
          <Button busy={sending.isPending} onClick={() => sending.mutate()}>
            Send the mail again
          </Button>
          <Link to={`${paths.settings}#address`} className="link self-center text-small">
            Change the address
          </Link>
        </>
      }
    >
      Open the link in the mail to <strong className="break-words">{me.email}</strong>. Until then
      you can write and save, but not hand a note in.
      {sending.isError && (
        <span role="alert" className="mt-2 block font-[650] text-caution">
          It was not sent: {sending.error.message}
        </span>
      )}
      {sending.isSuccess && <span className="mt-2 block">Another mail is on its way.</span>}
    </Notice>
  );
}
