import { isCovering } from './blank-piece.ts';
import { useWriteForm } from './form-context.ts';
import { RecipeFields } from './RecipeFields.tsx';
import { WriteSection } from './WriteSection.tsx';

/** The recipe after the draw that holds for every row without one of its own. */
export function ReductionSection() {
  const { fields, change } = useWriteForm();
  const sharing = fields.pieces.filter(({ recipe }) => recipe === null);
  const own = fields.pieces.length - sharing.length;
  return (
    <WriteSection
      id="reduction"
      title="After the draw"
      lead={
        own === 0
          ? 'Holds for all pieces. Where one went another way, give its row a recipe of its own.'
          : `Holds for all pieces but ${own === 1 ? 'one row' : `${String(own)} rows`} with a recipe of its own.`
      }
    >
      <RecipeFields
        pointer="/reduction"
        recipe={fields.reduction}
        onRecipe={(reduction) => change((now) => ({ ...now, reduction }))}
        covering={sharing.some(({ route }) => isCovering(route))}
      />
    </WriteSection>
  );
}
