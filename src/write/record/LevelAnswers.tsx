import { findingText, type Finding } from '#shared/firing/findings.ts';
import { ChoiceField } from '../../ui/ChoiceField.tsx';
import { optionsOf } from '../../ui/options.ts';
import { useWriteForm } from '../form-context.ts';
import { answerAt, withAnswer } from './level-answers.ts';

const ANSWER_WORDS = { meant: 'Meant', stuck: 'It was stuck' } as const;

/** Level stretches, each with the question only the author can answer: meant, or stuck? */
export function LevelAnswers({ findings }: { readonly findings: readonly Finding[] }) {
  const { fields, change, units, editable } = useWriteForm();
  const { levelAnswers } = fields.record;
  const levels = findings.filter(({ code }) => code === 'stall' || code === 'pause');
  if (levels.length === 0) return null;
  return (
    <div className="space-y-1">
      <h3 className="text-body">Level stretches</h3>
      <ul className="border-t border-soot-2">
        {levels.map((finding) => (
          <li key={finding.fromMinute} className="border-b border-line py-2">
            <p className="text-small font-[600]">{findingText(finding, units)}</p>
            <ChoiceField
              label={`The stretch from minute ${Math.round(finding.fromMinute)}: meant, or stuck?`}
              labelHidden
              value={answerAt(levelAnswers, finding.fromMinute)}
              onValue={(answer) =>
                change((before) => ({
                  ...before,
                  record: {
                    ...before.record,
                    levelAnswers: withAnswer(
                      before.record.levelAnswers,
                      finding.fromMinute,
                      answer,
                    ),
                  },
                }))
              }
              options={optionsOf(ANSWER_WORDS)}
              disabled={!editable}
            />
          </li>
        ))}
      </ul>
      <p className="max-w-measure text-note text-soot-2">
        A stretch that was meant is a pause; one that was not is a stall, and counts as a trouble.
      </p>
    </div>
  );
}
