import { useState } from 'react';
import { BusyMark } from '../ui/BusyMark.tsx';
import { Button } from '../ui/Button.tsx';
import { CautionNote } from '../ui/CautionNote.tsx';
import { Chip } from '../ui/Chip.tsx';
import { CrackleRule } from '../ui/CrackleRule.tsx';
import { DataTable } from '../ui/DataTable.tsx';
import { Dialog } from '../ui/Dialog.tsx';
import { EmptyState } from '../ui/EmptyState.tsx';
import { IntervalBar } from '../ui/IntervalBar.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Notice } from '../ui/Notice.tsx';
import { Pager } from '../ui/Pager.tsx';
import { ProgressBar } from '../ui/ProgressBar.tsx';
import { ShareScale } from '../ui/ShareScale.tsx';
import { Skeleton } from '../ui/Skeleton.tsx';
import { useMessages } from '../ui/useMessages.ts';
import { Bench } from './Bench.tsx';
import { RowsExample } from './RowsExample.tsx';

const PIECES = [
  {
    id: 1,
    form: 'Bowl',
    count: 2,
    span: '14\u00a0cm',
    wall: '6\u00a0mm',
    result: 'whole, as hoped',
  },
  {
    id: 2,
    form: 'Flat plate',
    count: 1,
    span: '31\u00a0cm',
    wall: '8\u00a0mm',
    result: 'cracked through the base',
  },
  {
    id: 3,
    form: 'Cup',
    count: 4,
    span: '8\u00a0cm',
    wall: '4\u00a0mm',
    result: 'one chipped in handling',
  },
];

export function PageBench() {
  const tell = useMessages();
  const [open, setOpen] = useState(false);
  return (
    <>
      <Bench title="Notices">
        <Notice kind="info" heading="Read, not safe">
          Published means that somebody read this note, not that it is safe to follow.
        </Notice>
        <Notice kind="done">Kept at 16:42. Two pictures are still on their way.</Notice>
        <Notice kind="caution" heading="The record was typed in °F?">
          1850 is more than any raku kiln; 1850 °F is 1010 °C.
        </Notice>
        <Notice kind="error" heading="Not kept" action={<Button icon="retry">Try again</Button>}>
          The connection was lost. What you wrote is safe in this browser.
        </Notice>
        <CautionNote>
          <p>
            Outdoors only; carbon monoxide has no smell. If the flame goes out: gas off, open the
            kiln, let it air before another try.
          </p>
        </CautionNote>
        <div className="flex flex-wrap gap-3">
          <Button onClick={() => tell({ kind: 'done', text: 'Note handed in.' })}>
            Tell good news
          </Button>
          <Button
            onClick={() =>
              tell({
                kind: 'error',
                text: 'The picture was not taken in: it is over 20 MB.',
                action: { label: 'Try another', onClick: () => undefined },
              })
            }
          >
            Tell bad news
          </Button>
          <Button onClick={() => setOpen(true)}>Open a dialog</Button>
          <LinkButton to="/" icon="on">
            A link as a button
          </LinkButton>
          <LinkButton to="/" kind="main">
            Write up a firing
          </LinkButton>
        </div>
        <Dialog
          open={open}
          onClose={() => setOpen(false)}
          title="Sign out with unsent work?"
          actions={
            <>
              <Button kind="main">Download it</Button>
              <Button kind="danger" icon="remove">
                Clear it and sign out
              </Button>
              <Button onClick={() => setOpen(false)}>Stay</Button>
            </>
          }
        >
          <p>Two drafts of yours are on this device only. Signing out clears them.</p>
        </Dialog>
      </Bench>
      <Bench title="Chips, progress, waiting">
        <p className="flex flex-wrap items-center gap-2">
          <span className="text-small text-soot-2">Read as</span>
          <Chip onEdit={() => undefined} onRemove={() => undefined} removeLabel="Remove stall">
            stall
          </Chip>
          <Chip
            onEdit={() => undefined}
            onRemove={() => undefined}
            removeLabel="Remove near 704 °C"
          >
            near 704 °C ± 30
          </Chip>
          <Chip>flat plate</Chip>
        </p>
        <ProgressBar
          label="Taking in pictures"
          done={4}
          of={11}
          words="4 of 11"
          cancel={<Button>Stop</Button>}
        />
        <ProgressBar label="Reading the record" done={0} of={100} />
        <BusyMark words="Looking for look-alikes" />
        <Skeleton words="The strip is being drawn" shape="strip" />
        <Skeleton words="Notes are being fetched" shape="rows" count={2} />
        <div className="grid gap-10 sm:grid-cols-2">
          <Skeleton words="The sheet is being fetched" shape="sheet" />
          <Skeleton words="The story is being fetched" shape="text" count={6} />
        </div>
      </Bench>
      <Bench title="Nothing here">
        <EmptyState
          title="No note says that yet"
          headingLevel={3}
          action={
            <>
              <Button>Without “flat plate”: 14 notes</Button>
              <Button kind="quiet">Without “near 704 °C”: 3 notes</Button>
            </>
          }
        >
          <p>Nobody has written up a stall near 704 °C with a flat plate in the kiln.</p>
        </EmptyState>
        <CrackleRule />
      </Bench>
      <Bench title="Tables and shares">
        <DataTable
          caption="Pieces in this firing"
          rows={PIECES}
          rowKey={(piece) => piece.id}
          columns={[
            { key: 'form', heading: 'Form', cell: (piece) => piece.form },
            { key: 'count', heading: 'Count', cell: (piece) => piece.count, figures: true },
            { key: 'span', heading: 'Widest span', cell: (piece) => piece.span, figures: true },
            { key: 'wall', heading: 'Wall', cell: (piece) => piece.wall, figures: true },
            { key: 'result', heading: 'Result', cell: (piece) => piece.result },
          ]}
        />
        <Pager page={2} pageSize={20} total={183} what="notes" toPage={(page) => `?page=${page}`} />
        <div className="border-t-2 border-soot">
          <ShareScale heading="Stall gone in the next firing" />
          <IntervalBar
            label="No change named"
            count={2}
            of={8}
            interval={{ low: 0.07, high: 0.59 }}
            aside="6 members"
          />
          <IntervalBar
            label="Floor insulated"
            count={7}
            of={9}
            interval={{ low: 0.45, high: 0.94 }}
            against={{ share: 0.25, label: 'no change named' }}
            aside="7 members"
          />
          <IntervalBar
            label="Burner swept round the wall"
            count={11}
            of={11}
            interval={{ low: 0.74, high: 1 }}
            against={{ share: 0.25, label: 'no change named' }}
          />
          <IntervalBar label="Lighter shelf" count={2} of={3} interval={null} aside="2 members" />
        </div>
      </Bench>
      <Bench title="Rows that are edited">
        <RowsExample />
      </Bench>
      <Bench title="Story">
        <article className="story">
          <h3>What the slab did</h3>
          <p>
            The slab under the kiln was too hot to keep a hand on. That was the clue I walked past
            all afternoon: everything I put in at the port was{' '}
            <mark>leaving through the floor</mark>.
          </p>
          <ul>
            <li>two courses of soft brick,</li>
            <li>an offcut of blanket between them and the body,</li>
          </ul>
          <blockquote>“If you can cook on the stand, you are heating the garden.”</blockquote>
          <p>
            I shut down to a low flame, lifted the body with a friend on the other handle, and slid
            them beneath it. See <a href="#story">the firing before</a>.
          </p>
        </article>
      </Bench>
    </>
  );
}
