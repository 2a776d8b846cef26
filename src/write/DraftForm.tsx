import { useMemo, useState } from 'react';
import { openChecks } from '#shared/note/checks/check.ts';
import { findingText } from '#shared/firing/findings.ts';
import { Notice } from '../ui/Notice.tsx';
import { ChangesSection } from './ChangesSection.tsx';
import { CheckActs } from './CheckActs.tsx';
import { DeskWords } from './DeskWords.tsx';
import type { DraftKeeper, KeptDraft } from './draft-keeper.ts';
import { FieldMargin } from './FieldMargin.tsx';
import { findingsBeside } from './finding-places.ts';
import { WriteFormContext, type FormKiln, type WriteForm } from './form-context.ts';
import { goToField } from './go-to-field.ts';
import { HandInSection } from './HandInSection.tsx';
import { KilnChoiceSection } from './KilnChoiceSection.tsx';
import { PiecesSection } from './PiecesSection.tsx';
import { PlanSection } from './PlanSection.tsx';
import { RecordSection } from './record/RecordSection.tsx';
import { ReductionSection } from './ReductionSection.tsx';
import { ResultSection } from './ResultSection.tsx';
import { SavedLine } from './SavedLine.tsx';
import { SetUpSection } from './SetUpSection.tsx';
import { SpokenFindings } from './SpokenFindings.tsx';
import { StorySection } from './story/StorySection.tsx';
import { StripSoFar } from './StripSoFar.tsx';
import { settledIssues } from './settled-issues.ts';
import type { DraftActs } from './useDraftActs.ts';
import { useNoteReading } from './useNoteReading.ts';
import { WhenSection } from './WhenSection.tsx';
import { WriteContents } from './WriteContents.tsx';
import { countBySection } from './write-sections.ts';

interface Props {
  readonly kept: KeptDraft;
  readonly keeper: DraftKeeper;
  readonly kilns: WriteForm['kilns'];
  readonly kiln: FormKiln | null;
  readonly units: WriteForm['units'];
  readonly emailVerified: boolean;
  readonly acts: DraftActs;
}

/** The whole form of a draft, read while it is typed. */
export function DraftForm({ kept, keeper, kilns, kiln, units, emailVerified, acts }: Props) {
  const { fields, draft, state } = kept;
  const { reading, stored } = useNoteReading(fields, draft, kiln);
  const [withAllBlanks, setWithAllBlanks] = useState(draft.status !== 'draft');
  const form = useMemo((): WriteForm => {
    const { checks } = reading;
    return {
      fields,
      draft,
      keeper,
      change: (update) => keeper.change(update),
      units,
      editable: draft.abilities.edit,
      kilns,
      kiln,
      reading,
      checks,
      issuesAt: (pointer) =>
        settledIssues(checks, fields, pointer, withAllBlanks).map(({ check, settled }) => ({
          kind: check.kind,
          text: check.text,
          settled,
          action:
            check.offer || check.kind === 'look-again' ? <CheckActs check={check} /> : undefined,
        })),
      marginAt: (pointer) => {
        const findings = findingsBeside(pointer, reading.findings);
        const remarks = draft.remarks.filter((remark) => remark.pointer === pointer);
        if (findings.length === 0 && remarks.length === 0) return undefined;
        return <FieldMargin findings={findings} remarks={remarks} />;
      },
    };
  }, [fields, draft, keeper, units, kilns, kiln, reading, withAllBlanks]);
  const open = openChecks(form.checks, fields.checkAnswers);

  return (
    <WriteFormContext value={form}>
      <div className="space-y-10">
        <header className="space-y-5">
          <h1 className="text-title">{fields.title || 'A new note'}</h1>
          {!emailVerified && (
            <Notice kind="info" heading="Your mail address is not confirmed yet">
              You can write and everything is saved. To hand the note in, first open the link in the
              mail we sent you.
            </Notice>
          )}
          {draft.publishedRevision !== null && (
            <Notice kind="info">
              This is a revision. The published note stays up until this one is published.
            </Notice>
          )}
          <DeskWords draft={draft} />
          <StripSoFar stored={stored} />
        </header>
        <WriteContents openIn={countBySection(open.map(({ pointer }) => pointer))}>
          <SavedLine state={state} onRetry={() => void keeper.flush()} />
        </WriteContents>
        <SpokenFindings />
        <WhenSection />
        <KilnChoiceSection />
        <SetUpSection />
        <PlanSection />
        <div id="section-record" tabIndex={-1} data-pointer="/record" className="scroll-mt-28">
          <RecordSection />
          {reading.findings.length > 0 && (
            <div className="max-w-measure pt-6">
              <h3 className="text-body">What is read off it</h3>
              <ul className="text-small">
                {reading.findings.map((finding) => (
                  <li
                    key={`${finding.code}-${String(finding.fromMinute)}`}
                    className={`border-b border-line py-1.5 ${finding.trouble ? 'font-[600]' : ''}`}
                  >
                    {findingText(finding, units)}
                  </li>
                ))}
              </ul>
            </div>
          )}
        </div>
        <PiecesSection />
        <ReductionSection />
        <ResultSection />
        <ChangesSection />
        <StorySection />
        <HandInSection
          acts={acts}
          emailVerified={emailVerified}
          onGoTo={(pointer) => {
            setWithAllBlanks(true);
            goToField(pointer);
          }}
        />
      </div>
    </WriteFormContext>
  );
}
