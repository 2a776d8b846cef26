import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { CaughtMails } from '#shared/api/admin.ts';
import { momentWords } from '../notes/note-words.ts';
import { Disclosure } from '../ui/Disclosure.tsx';
import { EmptyState } from '../ui/EmptyState.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { adminQueries } from './admin-queries.ts';
import { AdminFrame } from './AdminFrame.tsx';
import { ownLinksIn } from './own-links.ts';

/** Mails that were caught instead of sent, when no mail server is set. */
export function AdminMailPage() {
  const mail = useQuery(adminQueries.mail());
  return (
    <AdminFrame
      title="Mail"
      lead="Without a mail server of its own, Spyhole catches its mails on this machine: nobody gets them, and they can be read here."
      query={mail}
    >
      {mail.isPending && <Skeleton words="Mails are being fetched" shape="sheet" count={6} />}
      {mail.isRefetchError && (
        <Notice kind="caution" appeared heading="This is how it was a while ago">
          {mail.error.message}
        </Notice>
      )}
      {mail.data && !mail.data.catching && (
        <EmptyState title="Mails are sent">
          A mail server is set, so nothing is caught here.
        </EmptyState>
      )}
      {mail.data?.catching && mail.data.mails.length === 0 && (
        <EmptyState title="No mails yet">
          The first comes when somebody joins or a note is decided on.
        </EmptyState>
      )}
      {mail.data && mail.data.mails.length > 0 && (
        <ol className="border-t-2 border-soot">
          {mail.data.mails.map((one) => (
            <li key={one.id} className="border-b border-line py-2">
              <Mail mail={one} />
            </li>
          ))}
        </ol>
      )}
    </AdminFrame>
  );
}

function Mail({ mail }: { readonly mail: CaughtMails['mails'][number] }) {
  const links = ownLinksIn(mail.text, window.location.origin);
  return (
    <article className="grid gap-x-8 sm:grid-cols-[15rem_minmax(0,1fr)]">
      <p className="pt-2 text-small text-soot-2">
        <time dateTime={mail.at}>{momentWords(mail.at)}</time>
        <span className="block break-all">to {mail.to}</span>
      </p>
      <Disclosure summary={<span className="break-words">{mail.subject}</span>}>
        <pre className="max-w-measure border-l border-soot-2 bg-ash-2 px-4 py-3 font-reading text-note break-words whitespace-pre-wrap">
          {mail.text}
        </pre>
        {links.map((to) => (
          <Link key={to} to={to} className="link mt-2 block">
            Open its link to {to.replace(/#.*$/, '')}
          </Link>
        ))}
      </Disclosure>
    </article>
  );
}
