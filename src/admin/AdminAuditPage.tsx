import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router-dom';
import type { Audit } from '#shared/api/admin.ts';
import { paths } from '#shared/paths.ts';
import { momentWords } from '../notes/note-words.ts';
import { DataTable, type Column } from '../ui/DataTable.tsx';
import { EmptyState } from '../ui/EmptyState.tsx';
import { Pager } from '../ui/Pager.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { ADMIN_PAGE_SIZE, adminQueries } from './admin-queries.ts';
import { AdminFrame } from './AdminFrame.tsx';
import { pageIn } from './page-in.ts';

type Entry = Audit['entries'][number];

/** Who did what, to what, and why; entries are added and never changed. */
export function AdminAuditPage() {
  const [params] = useSearchParams();
  const page = pageIn(params);
  const audit = useQuery({ ...adminQueries.audit(page), placeholderData: keepPreviousData });
  return (
    <AdminFrame
      title="Acts"
      lead="What was done to notes, members and roles, newest first. Entries are added, never changed or removed."
      query={audit}
    >
      {audit.isPending && <Skeleton words="The log is being fetched" shape="sheet" count={10} />}
      {audit.data?.total === 0 && <EmptyState title="Nothing has been done yet" />}
      {audit.data && audit.data.total > 0 && (
        <>
          <DataTable
            caption={`${String(audit.data.total)} acts`}
            columns={COLUMNS}
            rows={audit.data.entries}
            rowKey={({ id }) => id}
          />
          <Pager
            page={page}
            pageSize={ADMIN_PAGE_SIZE}
            total={audit.data.total}
            toPage={(to) => `?page=${String(to)}`}
            what="acts"
          />
        </>
      )}
    </AdminFrame>
  );
}

const ACTS: Readonly<Record<string, string>> = {
  'handed-in': 'handed in',
  'taken-back': 'taken back',
  claimed: 'taken from the desk',
  'claim-given-up': 'given back to the desk',
  'sent-back': 'sent back',
  published: 'published',
  declined: 'declined',
  'taken-down': 'taken down',
  'question-removed': 'question removed',
  removed: 'removed',
  'brought-back': 'brought back',
  'role-changed': 'role changed',
  suspended: 'suspended',
  reinstated: 'let in again',
  joined: 'joined',
};

const COLUMNS: readonly Column<Entry>[] = [
  {
    key: 'at',
    heading: 'When',
    cell: ({ at }) => (
      <time dateTime={at} className="font-[400] whitespace-nowrap">
        {momentWords(at)}
      </time>
    ),
  },
  {
    key: 'who',
    heading: 'Who',
    cell: ({ actor }) =>
      actor ? (
        <Link to={paths.member(actor.id)} className="link whitespace-nowrap">
          {actor.name}
        </Link>
      ) : (
        'the command line'
      ),
  },
  {
    key: 'act',
    heading: 'Act',
    cell: ({ act }) => <span className="sm:whitespace-nowrap">{ACTS[act] ?? act}</span>,
  },
  { key: 'target', heading: 'On', cell: ({ target }) => <Target {...target} /> },
  {
    key: 'reason',
    heading: 'Why',
    cell: ({ reason }) => (
      <span className="break-words whitespace-pre-line">{reason === '' ? '–' : reason}</span>
    ),
  },
];

function Target({ kind, id, label }: Entry['target']) {
  // A note that is not published has no title here, and no page for anybody but its author.
  const isNamed = label !== `Note ${String(id)}`;
  const to =
    kind === 'note'
      ? isNamed
        ? paths.note(id, '')
        : null
      : kind === 'member'
        ? paths.member(id)
        : kind === 'kiln'
          ? paths.kiln(id)
          : null;
  return to === null ? (
    <span className="break-words">{label}</span>
  ) : (
    <Link to={to} className="link break-words">
      {label}
    </Link>
  );
}
