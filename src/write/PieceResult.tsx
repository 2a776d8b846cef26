import type { Piece } from '#shared/note/pieces.ts';
import {
  BARE_CLAY,
  COLOURS,
  CRACK_NOTICED,
  CRACK_PLACES,
  MELTS,
  SURFACE_FAULTS,
} from '#shared/vocabulary/ware.ts';
import { FieldRow } from '../ui/FieldRow.tsx';
import { IssueList } from '../ui/IssueList.tsx';
import { RowsEditor } from '../ui/RowsEditor.tsx';
import { LinesAt, ManyOfAt, OneOfAt, YesNoAt } from './FieldsAt.tsx';
import { useWriteForm } from './form-context.ts';
import { pieceField } from './piece-field.ts';
import type { PieceProps } from './piece-field.ts';
import { PinnedField } from './PinnedField.tsx';

/** What became of a row of pieces. */
export function PieceResult(props: PieceProps) {
  const { piece, index, onPiece } = props;
  const at = pieceField(props);
  return (
    <>
      <OneOfAt label="Melt" terms={MELTS} required={piece.glazeFamily !== 'none'} {...at('melt')} />
      <OneOfAt label="Colour" terms={COLOURS} {...at('colour')} />
      <OneOfAt label="Bare clay" terms={BARE_CLAY} {...at('bareClay')} />
      <ManyOfAt label="Surface faults" terms={SURFACE_FAULTS} {...at('faults')} />
      <YesNoAt
        label="Cracked"
        required
        {...at('cracked')}
        onValue={(cracked) =>
          onPiece({
            ...piece,
            cracked,
            // One row stands ready to be filled in; those written before are kept.
            cracks:
              cracked === true && piece.cracks.length === 0
                ? [{ place: null, noticed: null }]
                : piece.cracks,
          })
        }
      />
      {piece.cracked === true && <Cracks {...{ piece, index, onPiece }} />}
      <YesNoAt label="Came out whole" required {...at('whole')} />
      <LinesAt label="Remark" maxLength={300} {...at('remark')} />
    </>
  );
}

const MOST_CRACKS = 8;

function Cracks({ piece, index, onPiece }: PieceProps) {
  const { issuesAt } = useWriteForm();
  const base = `/pieces/${String(index)}/cracks`;
  type Crack = Piece['cracks'][number];
  return (
    <PinnedField pointer={base}>
      <div role="group" aria-label="Cracks" className="space-y-2 border-l-2 border-line pl-4">
        <IssueList issues={issuesAt(base)} />
        <RowsEditor
          rows={piece.cracks.map((crack, row) => ({ ...crack, id: String(row) }))}
          onRows={(rows) =>
            onPiece({ ...piece, cracks: rows.map(({ place, noticed }) => ({ place, noticed })) })
          }
          newRow={() => ({ id: String(piece.cracks.length), place: null, noticed: null })}
          nameOf={(_row, row) => `Crack ${String(row + 1)}`}
          most={MOST_CRACKS}
          addWords="Add a crack"
          renderRow={(row, change, at) => {
            const field = <Name extends keyof Crack>(name: Name) => ({
              pointer: `${base}/${String(at)}/${name}`,
              value: row[name],
              onValue: (value: Crack[Name]) => change({ ...row, [name]: value }),
            });
            return (
              <FieldRow>
                <OneOfAt menu label="Where" terms={CRACK_PLACES} {...field('place')} />
                <OneOfAt menu label="Noticed" terms={CRACK_NOTICED} {...field('noticed')} />
              </FieldRow>
            );
          }}
        />
      </div>
    </PinnedField>
  );
}
