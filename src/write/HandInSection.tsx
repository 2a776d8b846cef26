import { answerTo, openChecks, type Check } from '#shared/note/checks/check.ts';
import { paths } from '#shared/paths.ts';
import { ProblemError } from '../http/client.ts';
import { Button } from '../ui/Button.tsx';
import { Disclosure } from '../ui/Disclosure.tsx';
import { Icon } from '../ui/Icon.tsx';
import { LinkButton } from '../ui/LinkButton.tsx';
import { Notice } from '../ui/Notice.tsx';
import { CautionsToRead } from './CautionsToRead.tsx';
import { CheckActs } from './CheckActs.tsx';
import { useWriteForm } from './form-context.ts';
import { RemoveNoteButton } from './RemoveNoteButton.tsx';
import type { DraftActs } from './useDraftActs.ts';
import { WriteSection } from './WriteSection.tsx';

interface Props {
  readonly acts: DraftActs;
  readonly emailVerified: boolean;
  readonly onGoTo: (pointer: string) => void;
}

/** What is still open, the cautions, and the way to the desk. */
export function HandInSection({ acts, emailVerified, onGoTo }: Props) {
  const { fields, draft, checks } = useWriteForm();
  const { abilities } = draft;
  const open = openChecks(checks, fields.checkAnswers);
  const asked = checks.filter((check) => check.kind === 'look-again');
  const answered = asked.filter((check) => answerTo(check, fields.checkAnswers) !== null);
  // A check just being answered must not jump out of the list under the typist's hands.
  const listed = checks.filter((check) => check.kind === 'must-mend' || asked.includes(check));
  return (
    <WriteSection
      id="hand-in"
      title="Hand in"
      lead="A moderator reads it before it is published: whether it is complete, consistent, kind and not dangerous."
    >
      <div className="space-y-6">
        <p id="still-open" aria-live="polite" className="font-[600]">
          {openWords(open)}
        </p>
        {listed.length > 0 && (
          <ol className="border-t border-soot-2">
            {listed.map((check) => (
              <OpenCheck
                key={`${check.code} ${check.pointer}`}
                check={check}
                answered={answered.includes(check)}
                onGoTo={onGoTo}
              />
            ))}
          </ol>
        )}
        <CautionsToRead />
        {acts.handIn.isError && (
          <Notice kind="error" heading="Not handed in" appeared>
            <p>{acts.handIn.error.message}</p>
            <ServerErrors error={acts.handIn.error} />
          </Notice>
        )}
        {!emailVerified && (
          <Notice kind="caution" heading="Confirm your mail address first">
            Everything is saved. Open the link in the mail we sent you, then hand the note in.
          </Notice>
        )}
        <div className="flex flex-wrap items-center gap-3">
          <Button
            kind="main"
            busy={acts.handIn.isPending}
            disabled={open.length > 0 || !abilities.handIn}
            describedBy="still-open"
            onClick={() => acts.handIn.mutate()}
          >
            Hand in
          </Button>
          <LinkButton to={paths.preview(draft.id)}>See it as readers would</LinkButton>
          {abilities.remove && <RemoveNoteButton remove={acts.remove} />}
        </div>
      </div>
    </WriteSection>
  );
}

function openWords(open: readonly Check[]): string {
  const mend = open.filter(({ kind }) => kind === 'must-mend').length;
  const again = open.length - mend;
  if (open.length === 0) return 'Nothing is open. The note can be handed in.';
  const parts = [
    mend === 0 ? null : `${String(mend)} to mend`,
    again === 0 ? null : `${String(again)} to look at again`,
  ].filter((part) => part !== null);
  return `Still open: ${parts.join(', ')}.`;
}

function OpenCheck(props: {
  readonly check: Check;
  readonly answered: boolean;
  readonly onGoTo: (pointer: string) => void;
}) {
  const { check, answered, onGoTo } = props;
  return (
    <li className="grid grid-cols-[auto_minmax(0,1fr)] gap-x-2.5 border-b border-line py-2 text-small sm:grid-cols-[auto_minmax(0,42rem)_1fr]">
      <Icon
        name={answered ? 'done' : check.kind}
        className={`mt-0.5 size-4.5 ${answered ? 'text-soot-2' : 'text-caution'}`}
      />
      <div className="min-w-0">
        <p className={answered ? 'text-soot-2' : ''}>
          <strong className="font-[650]">
            {answered ? 'Answered' : check.kind === 'must-mend' ? 'Must mend' : 'Look again'}.
          </strong>{' '}
          {check.text}
        </p>
        <CheckActs check={check} />
      </div>
      <span className="col-start-2 sm:col-start-3 sm:justify-self-end">
        <Button
          kind="quiet"
          label={`Go to it: ${check.text}`}
          onClick={() => onGoTo(check.pointer)}
        >
          Go to it
        </Button>
      </span>
    </li>
  );
}

/** What the server asks that this browser did not see. */
function ServerErrors({ error }: { readonly error: Error }) {
  if (!(error instanceof ProblemError) || !error.problem.errors?.length) return null;
  return (
    <Disclosure summary="What the server says" open>
      <ul className="space-y-1">
        {error.problem.errors.map(({ pointer, detail }) => (
          <li key={`${pointer} ${detail}`}>{detail}</li>
        ))}
      </ul>
    </Disclosure>
  );
}
