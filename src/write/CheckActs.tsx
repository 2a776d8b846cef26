import type { Check } from '#shared/note/checks/check.ts';
import { Button } from '../ui/Button.tsx';
import { TextArea } from '../ui/TextArea.tsx';
import { useWriteForm } from './form-context.ts';
import { answerCheck, takeOffer } from './take-offer.ts';

/** What an author can do about a check on the spot: take its offer, or answer it in a sentence. */
export function CheckActs({ check }: { readonly check: Check }) {
  const { fields, change, editable } = useWriteForm();
  if (!editable) return null;
  const { offer } = check;
  const given = fields.checkAnswers.find(
    ({ code, pointer }) => code === check.code && pointer === check.pointer,
  );
  return (
    <div className="@container text-soot">
      {offer && (
        <p className="-ml-1 pt-1">
          <Button
            kind="quiet"
            label={`${offer.label}: ${check.text}`}
            onClick={() => change((now) => takeOffer(now, offer))}
          >
            {offer.label}
          </Button>
        </p>
      )}
      {check.kind === 'look-again' && (
        <TextArea
          label="Your answer"
          rows={2}
          maxLength={500}
          value={given?.answer ?? ''}
          onValue={(answer) => change((now) => answerCheck(now, check, answer))}
        />
      )}
    </div>
  );
}
