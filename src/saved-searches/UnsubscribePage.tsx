import { useMutation, useQueryClient } from '@tanstack/react-query';
import { doneSchema } from '#shared/api/accounts.ts';
import { paths } from '#shared/paths.ts';
import { AccountPage } from '../accounts/AccountPage.tsx';
import { isProblem } from '../accounts/form-faults.ts';
import { FormProblem } from '../accounts/FormProblem.tsx';
import { sessionQueries } from '../accounts/session-queries.ts';
import { useLinkToken } from '../accounts/useLinkToken.ts';
import { send } from '../http/client.ts';
import { Button } from '../ui/Button.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Notice } from '../ui/Notice.tsx';

const TITLE = 'End mails about saved searches';

/** Ends these mails through the link in one of them: opening it changes nothing, the button does. */
export function UnsubscribePage() {
  const { token, given } = useLinkToken();
  const client = useQueryClient();
  const ending = useMutation({
    mutationFn: (signed: string) =>
      send({ method: 'POST', path: `/api/unsubscribe?token=${signed}`, answer: doneSchema }),
    networkMode: 'always',
    onSuccess: () => client.invalidateQueries({ queryKey: sessionQueries.all }),
  });
  const toSettings = <LinkButton to={`${paths.settings}#reading`}>Your settings</LinkButton>;
  if (ending.isSuccess) {
    return (
      <AccountPage title={TITLE}>
        <Notice kind="done" appeared>
          {ending.data.message} Your searches stay saved; your settings switch the mails on again.
        </Notice>
        {toSettings}
      </AccountPage>
    );
  }
  const isRefused = isProblem(ending.error, 'link-used');
  if (token === null || isRefused) {
    return (
      <AccountPage title={TITLE}>
        <Notice
          kind="caution"
          appeared={isRefused}
          heading={given ? 'This link is not whole' : 'This page needs the link from the mail'}
        >
          Open the link in the mail itself, or sign in and switch these mails off in your settings.
        </Notice>
        {toSettings}
      </AccountPage>
    );
  }
  return (
    <AccountPage
      title={TITLE}
      lead="No more mails about any of your saved searches will come to you. You need not sign in, and the searches stay saved."
    >
      <FormProblem error={ending.error} fields={[]} />
      <Button kind="main" busy={ending.isPending} onClick={() => ending.mutate(token)}>
        End these mails
      </Button>
    </AccountPage>
  );
}
