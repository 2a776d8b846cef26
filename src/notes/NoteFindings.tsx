import type { NotePageData } from '#shared/api/notes.ts';
import type { Units } from '#shared/units/units.ts';
import { DisputeActs } from './DisputeActs.tsx';
import { FindingList } from './FindingList.tsx';
import type { RecordOf } from './note-queries.ts';

interface Props {
  readonly page: NotePageData;
  readonly units: Units;
  readonly of: RecordOf;
}

/** The findings of a note; its author may disagree with those that are published. */
export function NoteFindings({ page, units, of }: Props) {
  if (page.findings.length === 0) return null;
  const mayDispute = of === 'published' && page.abilities.dispute;
  return (
    <>
      <h3 className="pt-2 text-body">What was read off it</h3>
      <FindingList
        page={page}
        units={units}
        {...(mayDispute
          ? {
              actOn: (finding, dispute) => (
                <DisputeActs noteId={page.id} finding={finding} dispute={dispute} units={units} />
              ),
            }
          : {})}
      />
    </>
  );
}
