import type { Piece } from '#shared/note/pieces.ts';
import {
  DAMPNESS,
  FORMS,
  GLAZE_FAMILIES,
  LYING,
  PREHEATING,
  ROUTES,
} from '#shared/vocabulary/ware.ts';
import { CheckField } from '../ui/CheckField.tsx';
import { FieldRow } from '../ui/FieldRow.tsx';
import { IssueList } from '../ui/IssueList.tsx';
import { LineAt, MeasureAt, OneOfAt } from './FieldsAt.tsx';
import { FoldedGroup } from './FoldedGroup.tsx';
import { useWriteForm } from './form-context.ts';
import { blankRecipe, isCovering } from './blank-piece.ts';
import { pieceField } from './piece-field.ts';
import type { PieceProps } from './piece-field.ts';
import { PieceResult } from './PieceResult.tsx';
import { PinnedField } from './PinnedField.tsx';
import { RecipeFields } from './RecipeFields.tsx';

const LOADING: readonly (keyof Piece)[] = [
  'dampness',
  'preheating',
  'kilnCelsiusAtLoading',
  'lies',
  'targetCelsius',
  'drawMinute',
  'drawOrder',
];
const BODY: readonly (keyof Piece)[] = ['clay', 'bisqueCone', 'bisqueCelsius', 'glazeName'];

function filledIn(piece: Piece, names: readonly (keyof Piece)[]): number {
  return names.filter((name) => piece[name] !== null && piece[name] !== '').length;
}

/** A row of pieces alike: what they are, how they were loaded, what became of them. */
export function PieceRow(props: PieceProps) {
  const { piece, index, onPiece } = props;
  const { issuesAt, marginAt } = useWriteForm();
  const at = pieceField(props);
  const base = `/pieces/${String(index)}`;
  const asks = (names: readonly (keyof Piece)[]) =>
    names.some((name) => issuesAt(`${base}/${name}`).length > 0);
  return (
    <PinnedField pointer={base}>
      <IssueList issues={issuesAt(base)} />
      {marginAt(base)}
      <FieldRow>
        <OneOfAt label="Form" terms={FORMS} required {...at('form')} />
        <MeasureAt label="How many alike" required {...at('count')} />
        <MeasureAt label="Widest span" {...at('spanMm')} />
        <MeasureAt label="Wall" {...at('wallMm')} />
        <OneOfAt label="Glaze family" terms={GLAZE_FAMILIES} {...at('glazeFamily')} />
      </FieldRow>
      <FoldedGroup
        title="Clay and glaze"
        filled={filledIn(piece, BODY)}
        of={BODY.length}
        asks={asks(BODY)}
      >
        <FieldRow>
          <LineAt label="Glaze" maxLength={60} {...at('glazeName')} />
          <LineAt label="Clay body" maxLength={60} {...at('clay')} />
          <LineAt label="Bisque cone" maxLength={8} {...at('bisqueCone')} />
          <MeasureAt label="or bisque at" {...at('bisqueCelsius')} />
        </FieldRow>
      </FoldedGroup>
      <FoldedGroup
        title="Loading and drawing"
        filled={filledIn(piece, LOADING)}
        of={LOADING.length}
        asks={asks(LOADING)}
      >
        <FieldRow>
          <OneOfAt menu label="Dry or damp" terms={DAMPNESS} {...at('dampness')} />
          <OneOfAt menu label="Put in" terms={PREHEATING} {...at('preheating')} />
          <MeasureAt label="Kiln at loading" {...at('kilnCelsiusAtLoading')} />
          <OneOfAt menu label="Lay" terms={LYING} {...at('lies')} />
          <MeasureAt label="Its own target" {...at('targetCelsius')} />
          <MeasureAt label="Drawn at minute" {...at('drawMinute')} />
          <MeasureAt label="Drawn as number" {...at('drawOrder')} />
        </FieldRow>
      </FoldedGroup>
      <OneOfAt label="After the draw" terms={ROUTES} required {...at('route')} />
      {piece.route !== null && piece.route !== 'air-only' && (
        <div className="@2xl:pl-[11.75rem]">
          <CheckField
            label="This row had a recipe of its own after the draw"
            hint="Else the shared one under “After the draw” holds for it."
            checked={piece.recipe !== null}
            onChecked={(own) => onPiece({ ...piece, recipe: own ? blankRecipe() : null })}
          />
        </div>
      )}
      {piece.recipe && (
        <div className="border-l-2 border-line pl-4">
          <RecipeFields
            pointer={`${base}/recipe`}
            recipe={piece.recipe}
            onRecipe={(recipe) => onPiece({ ...piece, recipe })}
            covering={isCovering(piece.route)}
          />
        </div>
      )}
      <PieceResult {...props} />
    </PinnedField>
  );
}
