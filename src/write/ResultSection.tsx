import { CAUSES, TROUBLE_SHORT, TROUBLES } from '#shared/vocabulary/troubles.ts';
import { pieceTroubles } from '#shared/note/note-troubles.ts';
import { LinesAt, ManyOfAt } from './FieldsAt.tsx';
import { FoldedGroup } from './FoldedGroup.tsx';
import { useWriteForm } from './form-context.ts';
import { WriteSection } from './WriteSection.tsx';

/** How the firing went as a whole. */
export function ResultSection() {
  const { fields, change, issuesAt } = useWriteForm();
  const { result } = fields;
  const at = <Name extends keyof typeof result>(name: Name) => ({
    pointer: `/result/${name}`,
    value: result[name],
    onValue: (value: (typeof result)[Name]) =>
      change((now) => ({ ...now, result: { ...now.result, [name]: value } })),
  });
  const saidByPieces = [...new Set(fields.pieces.flatMap(pieceTroubles))];
  return (
    <WriteSection id="result" title="Result of the firing">
      <ManyOfAt
        label="Troubles"
        terms={TROUBLES}
        hint={
          saidByPieces.length === 0
            ? 'None is an answer too: leave all of them open.'
            : `Your rows of pieces say already: ${saidByPieces.map((trouble) => TROUBLE_SHORT[trouble]).join(', ')}.`
        }
        {...at('troubles')}
      />
      <FoldedGroup
        title="Suspected causes"
        filled={result.causes.length}
        of={Object.keys(CAUSES).length}
        asks={issuesAt('/result/causes').length > 0}
      >
        <ManyOfAt label="Causes" terms={CAUSES} {...at('causes')} />
      </FoldedGroup>
      <LinesAt label="What surprised" maxLength={1000} {...at('surprised')} />
      <LinesAt label="What to do next time" maxLength={1000} {...at('nextTime')} />
    </WriteSection>
  );
}
