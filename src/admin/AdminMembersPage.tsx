import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useSearchParams } from 'react-router-dom';
import { paths } from '#shared/paths.ts';
import { ROLES } from '#shared/vocabulary/statuses.ts';
import { useSession } from '../accounts/useSession.ts';
import { dayWords } from '../notes/note-words.ts';
import { Button } from '../ui/Button.tsx';
import { DataTable, type Column } from '../ui/DataTable.tsx';
import { EmptyState } from '../ui/EmptyState.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Pager } from '../ui/Pager.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { ADMIN_PAGE_SIZE, adminQueries } from './admin-queries.ts';
import { AdminFrame } from './AdminFrame.tsx';
import { MemberActDialog, type AdminMember, type WantedAct } from './MemberActDialog.tsx';
import { pageIn } from './page-in.ts';

/** Members, their roles, and who is shut out. */
export function AdminMembersPage() {
  const [params, setParams] = useSearchParams();
  const { me } = useSession();
  const question = params.get('q') ?? '';
  const page = pageIn(params);
  const list = useQuery({
    ...adminQueries.members(question, page),
    placeholderData: keepPreviousData,
  });
  const [wanted, setWanted] = useState<WantedAct | null>(null);
  return (
    <AdminFrame title="Members" query={list}>
      <MemberSearch
        key={question}
        question={question}
        onAsk={(asked) => setParams(asked === '' ? {} : { q: asked })}
      />
      {list.isPending && <Skeleton words="Members are being fetched" shape="sheet" count={8} />}
      {list.data && list.data.total === 0 && (
        <EmptyState
          title="Nobody found"
          action={<LinkButton to={paths.adminMembers}>All members</LinkButton>}
        >
          Nobody’s name holds “{question}”. An address has to be typed whole.
        </EmptyState>
      )}
      {list.data && list.data.total > 0 && (
        <>
          <DataTable
            caption={
              question === ''
                ? `${String(list.data.total)} members, newest first`
                : `${String(list.data.total)} found for “${question}”`
            }
            columns={columnsFor(me?.id ?? null, setWanted)}
            rows={list.data.members}
            rowKey={({ id }) => id}
          />
          <Pager
            page={page}
            pageSize={ADMIN_PAGE_SIZE}
            total={list.data.total}
            toPage={(to) => {
              const next = new URLSearchParams(params);
              next.set('page', String(to));
              return `?${next.toString()}`;
            }}
            what="members"
          />
        </>
      )}
      <MemberActDialog wanted={wanted} onClose={() => setWanted(null)} />
    </AdminFrame>
  );
}

function MemberSearch({
  question,
  onAsk,
}: {
  readonly question: string;
  readonly onAsk: (question: string) => void;
}) {
  const [typed, setTyped] = useState(question);
  return (
    <search>
      <form
        className="max-w-measure space-y-1"
        onSubmit={(event) => {
          event.preventDefault();
          onAsk(typed.trim());
        }}
      >
        <label htmlFor="member-search" className="text-small font-[550]">
          Part of a name, or a whole address
        </label>
        <span className="flex gap-3">
          <input
            id="member-search"
            type="search"
            className="field-corner min-w-0 grow"
            value={typed}
            maxLength={254}
            autoComplete="off"
            onChange={(event) => setTyped(event.currentTarget.value)}
          />
          <Button type="submit" icon="search">
            Find
          </Button>
        </span>
      </form>
    </search>
  );
}

function columnsFor(
  myId: number | null,
  want: (wanted: WantedAct) => void,
): readonly Column<AdminMember>[] {
  return [
    {
      key: 'name',
      heading: 'Name',
      // Who has not confirmed an address has no page yet.
      cell: (member) =>
        member.emailVerified ? (
          <Link to={paths.member(member.id)} className="link break-words">
            {member.name}
          </Link>
        ) : (
          <span className="break-words">{member.name}</span>
        ),
    },
    {
      key: 'address',
      heading: 'Address',
      cell: ({ emailHint, emailVerified }) => (
        <span className="break-all">
          {emailHint}
          {!emailVerified && (
            <span className="block text-note break-normal text-soot-2">not confirmed</span>
          )}
        </span>
      ),
    },
    {
      key: 'role',
      heading: 'Role',
      cell: ({ role, suspended }) => (
        <>
          {ROLES[role]}
          {suspended && <strong className="block font-[650] text-caution">Suspended</strong>}
        </>
      ),
    },
    { key: 'joined', heading: 'Joined', cell: ({ joinedOn }) => dayWords(joinedOn) },
    { key: 'notes', heading: 'Notes', figures: true, cell: ({ publishedNotes }) => publishedNotes },
    {
      key: 'acts',
      heading: 'Acts',
      cell: (member) =>
        member.id === myId ? (
          <span className="text-soot-2">yourself</span>
        ) : (
          <span className="-ml-1 flex flex-wrap gap-x-3">
            <Button
              kind="quiet"
              label={`Role of ${member.name}`}
              onClick={() => want({ kind: 'role', member })}
            >
              Role
            </Button>
            <Button
              kind="quiet"
              label={`${member.suspended ? 'Let in again' : 'Suspend'}: ${member.name}`}
              onClick={() => want({ kind: 'suspended', member })}
            >
              {member.suspended ? 'Let in again' : 'Suspend'}
            </Button>
          </span>
        ),
    },
  ];
}
