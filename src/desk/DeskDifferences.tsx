import { useMemo } from 'react';
import type { DeskNote } from '#shared/api/desk.ts';
import { DataTable } from '../ui/DataTable.tsx';
import { Disclosure } from '../ui/Disclosure.tsx';
import { diffBlocks, storyBlocks } from './block-diff.ts';

/** What is another than in the published version; the first time there is none. */
export function DeskDifferences({ data }: { readonly data: DeskNote }) {
  const { differences, storyBefore } = data;
  if (differences === null) return null;
  const isSame = differences.length === 0 && storyBefore === null;
  return (
    <section aria-labelledby="differences" className="space-y-3">
      <h2 id="differences" className="text-section">
        Changed since published
      </h2>
      {isSame && <p className="text-small text-soot-2">Nothing differs.</p>}
      {differences.length > 0 && (
        <DataTable
          caption="Fields that differ"
          captionHidden
          rows={differences}
          rowKey={({ pointer }) => pointer}
          columns={[
            { key: 'label', heading: 'Field', cell: ({ label }) => label },
            { key: 'before', heading: 'Published', cell: ({ before }) => before || 'blank' },
            { key: 'after', heading: 'Now', cell: ({ after }) => after || 'blank' },
          ]}
        />
      )}
      {storyBefore !== null && <StoryDifference before={storyBefore} after={data.page.storyHtml} />}
    </section>
  );
}

interface StoryProps {
  readonly before: string;
  readonly after: string;
}

function StoryDifference({ before, after }: StoryProps) {
  const blocks = useMemo(
    () => diffBlocks(storyBlocks(before), storyBlocks(after)),
    [before, after],
  );
  const changed = blocks.filter(({ kind }) => kind !== 'same');
  return (
    <div className="space-y-1">
      <h3 className="text-small font-[650]">Story</h3>
      {changed.length === 0 ? (
        <p className="text-small text-soot-2">The words are the same; pictures or layout differ.</p>
      ) : (
        <Disclosure
          open
          summary={`${String(changed.length)} of ${String(blocks.length)} paragraphs`}
        >
          <ul className="space-y-2">
            {changed.map(({ kind, text }, index) => (
              <li key={index} className="border-l-2 border-soot-2 pl-3">
                <span className="block text-note text-soot-2">
                  {kind === 'gone' ? 'Taken out' : 'Put in'}
                </span>
                {kind === 'gone' ? (
                  <del className="text-soot-2">{text}</del>
                ) : (
                  <ins className="no-underline">{text}</ins>
                )}
              </li>
            ))}
          </ul>
        </Disclosure>
      )}
    </div>
  );
}
