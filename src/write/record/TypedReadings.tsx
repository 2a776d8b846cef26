import type { Reading } from '#shared/firing/types.ts';
import { IssueList } from '../../ui/IssueList.tsx';
import { useWriteForm } from '../form-context.ts';
import { TypedGrid } from './TypedGrid.tsx';
import { countedFrom, type TypedRow } from './typed-rows.ts';

const POINTER = /^\/record\/typedRows\/(\d+)\/(minute|celsius)$/;

/** The typed rows of the draft, with the checks that point into them. */
export function TypedReadings({
  onTooMany,
}: {
  readonly onTooMany: (readings: readonly Reading[]) => void;
}) {
  const { fields, change, units, editable, checks, issuesAt } = useWriteForm();
  const { typedRows } = fields.record;
  const pointers = [...new Set(checks.map(({ pointer }) => pointer))].filter(
    (pointer) => POINTER.test(pointer) && issuesAt(pointer).length > 0,
  );
  const invalid = new Set(
    pointers.map((pointer) => pointer.replace(POINTER, (_, row, column) => `${row}:${column}`)),
  );
  const put = (rows: TypedRow[]): void => {
    change((before) => ({ ...before, record: { ...before.record, typedRows: rows } }));
  };
  if (!editable && typedRows.length === 0) return null;
  return (
    <div className="space-y-3">
      <TypedGrid
        rows={typedRows}
        onRows={put}
        unit={units.temperature}
        disabled={!editable}
        invalid={invalid}
        onTooMany={onTooMany}
        onCountFrom={(minute) =>
          change((before) => ({
            ...before,
            record: {
              ...before.record,
              typedRows: countedFrom(before.record.typedRows, minute),
              marks: before.record.marks.map((mark) => ({
                ...mark,
                minute: Math.round((mark.minute - minute) * 1e4) / 1e4,
              })),
            },
          }))
        }
      />
      <IssueList issues={pointers.flatMap((pointer) => issuesAt(pointer))} />
      {editable && (
        <p className="max-w-measure text-note text-soot-2">
          Minutes, or hours and minutes such as 1:05. Enter goes on; a row with both cells cleared
          goes; two columns pasted into a cell fill the rows below.
        </p>
      )}
    </div>
  );
}
