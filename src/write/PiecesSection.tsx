import { MAX_PIECES, type Piece } from '#shared/note/pieces.ts';
import { FORMS } from '#shared/vocabulary/ware.ts';
import { IssueList } from '../ui/IssueList.tsx';
import { RowsEditor } from '../ui/RowsEditor.tsx';
import { blankPiece, copyOfPiece } from './blank-piece.ts';
import { useWriteForm } from './form-context.ts';
import { FormSlice } from './FormSlice.tsx';
import { PieceRow } from './PieceRow.tsx';
import { PinnedField } from './PinnedField.tsx';
import { saidUnder } from './said-under.ts';
import { WriteSection } from './WriteSection.tsx';

interface Row {
  readonly id: string;
  readonly piece: Piece;
}

const rowOf = (piece: Piece): Row => ({ id: piece.key, piece });

function nameOf({ piece }: Row, index: number): string {
  const form = piece.form === null ? '' : `: ${FORMS[piece.form].toLowerCase()}`;
  const alike = piece.count !== null && piece.count > 1 ? `, ${String(piece.count)} alike` : '';
  return `Piece row ${String(index + 1)}${form}${alike}`;
}

/** What was in the kiln, and what became of it: a row for each kind of piece. */
export function PiecesSection() {
  const form = useWriteForm();
  const { fields, change, issuesAt, marginAt } = form;
  return (
    <WriteSection
      id="pieces"
      title="Pieces"
      lead="A row stands for pieces alike in everything, the result too. Two cups of which one cracked are two rows."
    >
      <PinnedField pointer="/pieces">
        <IssueList issues={issuesAt('/pieces')} />
        {marginAt('/pieces')}
        <RowsEditor
          rows={fields.pieces.map(rowOf)}
          onRows={(rows) => change((now) => ({ ...now, pieces: rows.map(({ piece }) => piece) }))}
          newRow={() => rowOf(blankPiece())}
          copyOf={({ piece }) => rowOf(copyOfPiece(piece))}
          nameOf={nameOf}
          most={MAX_PIECES}
          addWords="Add a row of pieces"
          renderRow={({ piece }, _put, index) => (
            <FormSlice
              form={form}
              reads={[piece, index]}
              said={saidUnder(form, [`/pieces/${String(index)}`])}
            >
              <PieceRow
                piece={piece}
                index={index}
                // From the newest rows, not from those this row was drawn with.
                onPiece={(next) =>
                  change((now) => ({
                    ...now,
                    pieces: now.pieces.map((each, at) =>
                      at === index && each.key === piece.key ? next : each,
                    ),
                  }))
                }
              />
            </FormSlice>
          )}
        />
      </PinnedField>
    </WriteSection>
  );
}
