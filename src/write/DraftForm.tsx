import { useMemo, useState } from 'react';
import { openChecks } from '#shared/note/checks/check.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { pieceTroubles } from '#shared/note/note-troubles.ts';
import { Notice } from '../ui/Notice.tsx';
import { ChangesSection } from './ChangesSection.tsx';
import { CheckActs } from './CheckActs.tsx';
import { DeskWords } from './DeskWords.tsx';
import type { DraftKeeper } from './draft-keeper.ts';
import { FieldMargin } from './FieldMargin.tsx';
import { findingsBeside } from './finding-places.ts';
import { WriteFormContext, type FormKiln, type WriteForm } from './form-context.ts';
import { goToField } from './go-to-field.ts';
import { FormSlice } from './FormSlice.tsx';
import { HandInSection } from './HandInSection.tsx';
import { KilnChoiceSection } from './KilnChoiceSection.tsx';
import { PiecesSection } from './PiecesSection.tsx';
import { PlanSection } from './PlanSection.tsx';
import { ReadOffList } from './ReadOffList.tsx';
import { RecordSection } from './record/RecordSection.tsx';
import { ReductionSection } from './ReductionSection.tsx';
import { ResultSection } from './ResultSection.tsx';
import type { KeptDraft } from './save-state.ts';
import { isTroubled, SavedLine } from './SavedLine.tsx';
import { SetUpSection } from './SetUpSection.tsx';
import { SpokenFindings } from './SpokenFindings.tsx';
import { StorySection } from './story/StorySection.tsx';
import { StripSoFar } from './StripSoFar.tsx';
import { saidUnder } from './said-under.ts';
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
  /** Saved elsewhere meanwhile: shows the two versions. */
  readonly onSeeBoth: () => void;
}

/** What the sections after the pieces show of them, as texts to compare. */
const routesOf = ({ pieces }: NoteFields): string =>
  pieces.map(({ route, recipe }) => `${String(route)} ${String(recipe === null)}`).join();
const troublesSaid = ({ pieces }: NoteFields): string => pieces.flatMap(pieceTroubles).join();

/** How far the acts at the end of the form have come. */
const progressOf = ({ handIn, remove }: DraftActs): readonly unknown[] => [
  handIn.isPending,
  handIn.error,
  remove.isPending,
  remove.error,
];

/** The whole form of a draft, read while it is typed. */
export function DraftForm({
  kept,
  keeper,
  kilns,
  kiln,
  units,
  emailVerified,
  acts,
  onSeeBoth,
}: Props) {
  const { fields, draft, state } = kept;
  const { reading, stored } = useNoteReading(fields, draft, kiln);
  const [withAllBlanks, setWithAllBlanks] = useState(draft.status !== 'draft');
  const form = useMemo((): WriteForm => {
    const { checks } = reading;
    return {
      fields,
      draft,
      keeper,
      change: keeper.change,
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
  const slice = (prefixes: readonly string[], ...reads: readonly unknown[]) => ({
    form,
    reads,
    said: saidUnder(form, prefixes),
  });
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
          <FormSlice {...slice([])}>
            <DeskWords draft={draft} />
          </FormSlice>
          <FormSlice {...slice([], fields.record, fields.plan, reading.reading, stored)}>
            <StripSoFar stored={stored} />
          </FormSlice>
        </header>
        <WriteContents
          openIn={countBySection(open.map(({ pointer }) => pointer))}
          isLong={isTroubled(state)}
        >
          <SavedLine state={state} onRetry={() => void keeper.flush()} onSeeBoth={onSeeBoth} />
        </WriteContents>
        <SpokenFindings />
        <FormSlice {...slice(['/when'], fields.when)}>
          <WhenSection />
        </FormSlice>
        <FormSlice {...slice(['/kilnId'], fields.kilnId)}>
          <KilnChoiceSection />
        </FormSlice>
        <FormSlice {...slice(['/setUp'], fields.setUp)}>
          <SetUpSection />
        </FormSlice>
        <FormSlice {...slice(['/plan'], fields.plan, reading.reading === null)}>
          <PlanSection />
        </FormSlice>
        <FormSlice
          {...slice(
            ['/record', '/findingDisputes'],
            fields.record,
            fields.findingDisputes,
            fields.plan.targetCelsius,
            reading.reading,
          )}
        >
          <div data-pointer="/record">
            <RecordSection />
            <ReadOffList />
          </div>
        </FormSlice>
        <FormSlice {...slice(['/pieces'], fields.pieces)}>
          <PiecesSection />
        </FormSlice>
        <FormSlice {...slice(['/reduction'], fields.reduction, routesOf(fields))}>
          <ReductionSection />
        </FormSlice>
        <FormSlice {...slice(['/result'], fields.result, troublesSaid(fields))}>
          <ResultSection />
        </FormSlice>
        <FormSlice
          {...slice(
            ['/changes', '/triedNoteId'],
            fields.changes,
            fields.changesNotMeant,
            fields.triedNoteId,
          )}
        >
          <ChangesSection />
        </FormSlice>
        <FormSlice {...slice(['/title', '/story'], fields.title, fields.story)}>
          <StorySection />
        </FormSlice>
        <FormSlice
          form={form}
          reads={[fields.cautionsRead, fields.checkAnswers, ...progressOf(acts)]}
          said={JSON.stringify(form.checks)}
        >
          <HandInSection
            acts={acts}
            emailVerified={emailVerified}
            onGoTo={(pointer) => {
              setWithAllBlanks(true);
              goToField(pointer);
            }}
          />
        </FormSlice>
      </div>
    </WriteFormContext>
  );
}
