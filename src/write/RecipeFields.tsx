import type { Recipe } from '#shared/note/pieces.ts';
import {
  AFTER_COVER,
  COMBUSTIBLES,
  CONTAINERS,
  DAMPNESS,
  PLACEMENTS,
  SEALS,
} from '#shared/vocabulary/ware.ts';
import { FieldRow } from '../ui/FieldRow.tsx';
import { IssueList } from '../ui/IssueList.tsx';
import { RowsEditor } from '../ui/RowsEditor.tsx';
import { LineAt, MeasureAt, OneOfAt, YesNoAt } from './FieldsAt.tsx';
import { useWriteForm } from './form-context.ts';
import { PinnedField } from './PinnedField.tsx';

const MOST_COMBUSTIBLES = 8;

interface Props {
  /** `/reduction`, or a piece's own: `/pieces/2/recipe`. */
  readonly pointer: string;
  readonly recipe: Recipe;
  readonly onRecipe: (recipe: Recipe) => void;
  /** A route that covers the ware needs a container and something to burn. */
  readonly covering: boolean;
}

/** What happened after the draw: shared by the firing, or one row's own. */
export function RecipeFields({ pointer, recipe, onRecipe, covering }: Props) {
  const at = <Name extends keyof Recipe>(name: Name) => ({
    pointer: `${pointer}/${name}`,
    value: recipe[name],
    onValue: (value: Recipe[Name]) => onRecipe({ ...recipe, [name]: value }),
  });
  return (
    <>
      <MeasureAt label="Seconds in air" {...at('secondsInAir')} />
      <OneOfAt label="Container" terms={CONTAINERS} required={covering} {...at('container')} />
      <MeasureAt label="Its volume" {...at('containerLitres')} />
      <Combustibles {...{ pointer, recipe, onRecipe }} />
      <YesNoAt label="Lit by the ware" {...at('litByTheWare')} />
      <OneOfAt label="Sealed with" terms={SEALS} {...at('seal')} />
      <MeasureAt label="Times burped" hint="0 if it stayed shut." {...at('burpedTimes')} />
      {recipe.burpedTimes !== null && recipe.burpedTimes > 0 && (
        <MeasureAt label="First burp after" {...at('burpedFirstAfterSeconds')} />
      )}
      <MeasureAt label="Covered for" {...at('minutesCovered')} />
      <OneOfAt label="Then" terms={AFTER_COVER} {...at('then')} />
      {recipe.then !== null && <MeasureAt label="That after" {...at('thenAfterMinutes')} />}
    </>
  );
}

type Combustible = Recipe['combustibles'][number];
type CombustibleRow = Combustible & { readonly id: string };

/** Rows have no name of their own in a note; their place is enough, nothing in them is half kept. */
function asRows(combustibles: readonly Combustible[]): CombustibleRow[] {
  return combustibles.map((combustible, index) => ({ ...combustible, id: String(index) }));
}

function Combustibles({ pointer, recipe, onRecipe }: Omit<Props, 'covering'>) {
  const { issuesAt } = useWriteForm();
  const base = `${pointer}/combustibles`;
  const put = (rows: readonly CombustibleRow[]) =>
    onRecipe({ ...recipe, combustibles: rows.map(({ id: _id, ...combustible }) => combustible) });
  return (
    <PinnedField pointer={base}>
      <div role="group" aria-label="Combustibles" className="space-y-2 py-3">
        <p className="text-small font-[550]">Combustibles</p>
        <IssueList issues={issuesAt(base)} />
        <RowsEditor
          rows={asRows(recipe.combustibles)}
          onRows={put}
          newRow={(): CombustibleRow => ({
            id: String(recipe.combustibles.length),
            kind: 'other',
            other: '',
            litres: null,
            dampness: null,
            placement: null,
          })}
          nameOf={(_row, index) => `Combustible ${String(index + 1)}`}
          most={MOST_COMBUSTIBLES}
          addWords="Add a combustible"
          renderRow={(row, change, index) => {
            const at = <Name extends keyof Combustible>(name: Name) => ({
              pointer: `${base}/${String(index)}/${name}`,
              value: row[name],
              onValue: (value: Combustible[Name]) => change({ ...row, [name]: value }),
            });
            return (
              <FieldRow>
                <OneOfAt
                  label="Kind"
                  terms={COMBUSTIBLES}
                  {...at('kind')}
                  onValue={(kind) => change({ ...row, kind: kind ?? 'other' })}
                />
                {row.kind === 'other' && <LineAt label="Which" maxLength={40} {...at('other')} />}
                <MeasureAt label="Loose, as poured" {...at('litres')} />
                <OneOfAt menu label="Dry or damp" terms={DAMPNESS} {...at('dampness')} />
                <OneOfAt menu label="Where" terms={PLACEMENTS} {...at('placement')} />
              </FieldRow>
            );
          }}
        />
      </div>
    </PinnedField>
  );
}
