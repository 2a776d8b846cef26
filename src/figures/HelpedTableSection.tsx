import type { WhatHelped, WhatHelpedRow } from '#shared/api/figures.ts';
import { TROUBLE_SHORT } from '#shared/vocabulary/troubles.ts';
import { IntervalBar } from '../ui/IntervalBar.tsx';
import { Reading } from '../ui/Reading.tsx';
import { ShareScale } from '../ui/ShareScale.tsx';
import { ChangeCaution } from './ChangeCaution.tsx';
import {
  rowAsides,
  rowSentence,
  rowWords,
  SOURCE_WORDS,
  START_WORDS,
  type HelpedTable,
} from './helped-words.ts';
import { NotesBehind } from './NotesBehind.tsx';
import { LeftOut } from './LeftOut.tsx';

interface Props {
  readonly helped: WhatHelped;
  readonly table: HelpedTable;
}

const memberWords = (members: number): string =>
  members === 1 ? '1 member' : `${String(members)} members`;

/** One start class and one source: no change named first, then the changes by their evidence. */
export function HelpedTableSection({ helped, table }: Props) {
  const id = `${table.startClass}-${table.source}`;
  const reference = table.ranked.find(({ change }) => change === null);
  return (
    <section aria-labelledby={id} className="space-y-4">
      <div className="space-y-1">
        <h2 id={id} className="text-section">
          {START_WORDS[table.startClass]}, {SOURCE_WORDS[table.source]}
        </h2>
        <p className="text-small text-soot-2">
          <Reading>{String(table.pairs)}</Reading> firings with it have a next firing of the same
          kiln that compares.
        </p>
      </div>
      {table.pairs > 0 && (
        <div>
          <ShareScale heading="Tried next, and how often it was then gone" />
          <ul>
            {table.ranked.map((row) => (
              <Row
                key={row.change ?? 'none'}
                row={row}
                reference={reference ?? null}
                helped={helped}
              />
            ))}
          </ul>
        </div>
      )}
      {table.tooFew.length > 0 && <TooFew helped={helped} rows={table.tooFew} />}
      <LeftOut reasons={table.leftOut} />
    </section>
  );
}

interface RowProps {
  readonly row: WhatHelpedRow;
  readonly reference: WhatHelpedRow | null;
  readonly helped: WhatHelped;
}

function Row({ row, reference, helped }: RowProps) {
  const asides = rowAsides(row);
  const isReference = row.change === null;
  return (
    <li className="border-b border-line pb-3 [&>div:first-child]:border-b-0">
      <IntervalBar
        label={rowWords(row)}
        count={row.gone}
        of={row.firings}
        interval={row.interval}
        aside={memberWords(row.members)}
        against={
          isReference || reference?.share == null
            ? null
            : { share: reference.share, label: 'no change named' }
        }
      />
      <div className="space-y-1.5">
        <p className="max-w-measure text-small">
          {rowSentence(row, TROUBLE_SHORT[helped.trouble])}
        </p>
        {asides.length > 0 && (
          <p className="flex flex-wrap gap-x-6 text-note text-soot-2">
            {asides.map((aside) => (
              <span key={aside} className="first-letter:uppercase">
                {aside}
              </span>
            ))}
          </p>
        )}
        <ChangeCaution caution={row.caution} />
        <NotesBehind noteIds={row.noteIds} notes={helped.notes} of={rowWords(row)} />
      </div>
    </li>
  );
}

/** Changes tried so seldom that a share would mislead: counts alone. */
function TooFew({ helped, rows }: { readonly helped: WhatHelped; readonly rows: WhatHelpedRow[] }) {
  return (
    <div className="space-y-2">
      <h3 className="text-small font-[650]">Too few to say</h3>
      <p className="max-w-measure text-small text-soot-2">
        Fewer than five firings, or than three members: a share would only mislead.
      </p>
      <ul className="border-t border-line text-small">
        {rows.map((row) => (
          <li key={row.change} className="space-y-1 border-b border-line py-2">
            <p className="flex flex-wrap gap-x-4">
              <span className="font-[550]">{rowWords(row)}</span>
              <span className="text-soot-2">
                gone in <Reading>{`${String(row.gone)} of ${String(row.firings)}`}</Reading>,{' '}
                {memberWords(row.members)}
              </span>
            </p>
            <ChangeCaution caution={row.caution} />
            <NotesBehind noteIds={row.noteIds} notes={helped.notes} of={rowWords(row)} />
          </li>
        ))}
      </ul>
    </div>
  );
}
