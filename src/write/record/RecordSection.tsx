import { useState } from 'react';
import type { Reading } from '#shared/firing/types.ts';
import { MAX_TYPED_ROWS } from '#shared/note/plan.ts';
import { RecordError } from '#shared/record/record-error.ts';
import type { RecordChoice } from '#shared/record/record-choice.ts';
import { LookAlikesOfDraft } from '../../look-alikes/LookAlikesOfDraft.tsx';
import { Button } from '../../ui/Button.tsx';
import { IssueList } from '../../ui/IssueList.tsx';
import { Notice } from '../../ui/Notice.tsx';
import { ProgressBar } from '../../ui/ProgressBar.tsx';
import { useMessages } from '../../ui/useMessages.ts';
import { useWriteForm } from '../form-context.ts';
import { PinnedField } from '../PinnedField.tsx';
import { WriteSection } from '../WriteSection.tsx';
import { looksLikeTable, useFileDrop } from '../story/useFileDrop.ts';
import { ChoiceForm } from './ChoiceForm.tsx';
import { ChooseFile } from './ChooseFile.tsx';
import { DraftRecordChart } from './DraftRecordChart.tsx';
import { MarksEditor } from './MarksEditor.tsx';
import { PasteRows } from './PasteRows.tsx';
import { sourceOfFile, sourceOfReadings, type RecordSource } from './record-source.ts';
import { StoredRecord } from './StoredRecord.tsx';
import { TypedReadings } from './TypedReadings.tsx';
import { useKeptTable } from './useKeptTable.ts';
import { useRecordSending } from './useRecordSending.ts';
import { useRecordStatus } from './useRecordStatus.ts';
import { WayChoice, type Way } from './WayChoice.tsx';

/** A table that waits to be confirmed; `again` is the stored record it is to be read anew for. */
interface Candidate {
  readonly source: RecordSource;
  readonly again: number | null;
}

/** The temperature record: typed, pasted or uploaded, its marks, and what it shows. */
export function RecordSection() {
  const { fields, draft, keeper, change, units, editable, issuesAt } = useWriteForm();
  const tell = useMessages();
  const { recordId, typedRows } = fields.record;
  const unit = units.temperature;
  const [way, setWay] = useState<Way>('type');
  const [replacing, setReplacing] = useState(false);
  const [candidate, setCandidate] = useState<Candidate | null>(null);
  const [refused, setRefused] = useState<string | null>(null);
  const [looking, setLooking] = useState(false);
  const kept = useKeptTable(draft.id, keeper);
  const { sending, send, cancel, dismiss } = useRecordSending(draft.id, keeper);
  const status = useRecordStatus(recordId);
  const mayChoose = editable && sending.kind !== 'sending';

  const look = async (file: File): Promise<void> => {
    setLooking(true);
    setRefused(null);
    dismiss();
    try {
      setCandidate({ source: await sourceOfFile(file, fields.plan.targetCelsius), again: null });
    } catch (error) {
      setCandidate(null);
      setRefused(error instanceof RecordError ? error.message : 'This file could not be opened.');
    } finally {
      setLooking(false);
    }
  };
  useFileDrop({
    takes: looksLikeTable,
    disabled: !mayChoose,
    onFiles: ([file]) => {
      if (!file) return;
      setWay('file');
      setReplacing(recordId !== null);
      void look(file);
    },
  });

  const confirm = async (source: RecordSource, choice: RecordChoice, again: number | null) => {
    setCandidate(null);
    setReplacing(false);
    if (await send(source, choice, again)) {
      tell({ kind: 'done', text: 'The record is with the server and is being read.' });
    }
  };
  const takeReadings = (readings: readonly Reading[]): void => {
    if (readings.length > MAX_TYPED_ROWS) {
      const source = sourceOfReadings(readings);
      void confirm(source, source.choice, null);
      return;
    }
    const before = typedRows;
    const put = (rows: typeof before) =>
      change((now) => ({ ...now, record: { ...now.record, typedRows: rows } }));
    put(readings.map(({ minute, celsius }) => ({ minute, celsius })));
    setWay('type');
    tell({
      kind: 'done',
      text: `${readings.length} readings taken over.`,
      ...(before.length > 0 ? { action: { label: 'Undo', onClick: () => put(before) } } : {}),
    });
  };
  const remove = (): void => {
    // What was said of its stretches and findings goes with it.
    const { levelAnswers } = fields.record;
    const { findingDisputes } = fields;
    const put = (record: Partial<typeof fields.record>, disputes: typeof findingDisputes) =>
      change((now) => ({
        ...now,
        record: { ...now.record, ...record },
        findingDisputes: disputes,
      }));
    put({ recordId: null, levelAnswers: [] }, []);
    tell({
      kind: 'done',
      text: 'The record is taken off this note.',
      action: { label: 'Undo', onClick: () => put({ recordId, levelAnswers }, findingDisputes) },
    });
  };

  return (
    <WriteSection
      id="record"
      title="Record"
      lead="Readings of the pyrometer, and what was done when. A note may go without, but then nothing can be read off it."
    >
      <div className="space-y-6">
        <PinnedField pointer="/record">
          <IssueList issues={issuesAt('/record')} />
        </PinnedField>
        {recordId !== null && (
          <StoredRecord
            status={status}
            editable={mayChoose}
            fetching={kept.fetching}
            onChooseAgain={(record) =>
              void kept.fetch(record, (source) => {
                setReplacing(false);
                setCandidate({ source, again: record.id });
              })
            }
            onReplace={() => {
              setReplacing(true);
              setWay('file');
            }}
            onRemove={remove}
          />
        )}
        {editable && (recordId === null || replacing) && sending.kind === 'idle' && (
          <div className="space-y-3">
            <WayChoice
              label={
                recordId === null ? 'How the readings come in' : 'How the new readings come in'
              }
              ways={recordId === null ? ['type', 'paste', 'file'] : ['paste', 'file']}
              way={way}
              onWay={setWay}
            />
            {way === 'paste' && candidate === null && (
              <PasteRows
                unit={unit}
                onReadings={takeReadings}
                onTable={(source) => setCandidate({ source, again: null })}
              />
            )}
            {way === 'file' && candidate === null && (
              <ChooseFile onFile={(file) => void look(file)} busy={looking} />
            )}
            {replacing && (
              <Button
                kind="quiet"
                onClick={() => {
                  setReplacing(false);
                  setCandidate(null);
                }}
              >
                Keep the record as it is
              </Button>
            )}
          </div>
        )}
        {refused !== null && (
          <Notice kind="error" heading="This file cannot be a record" appeared>
            {refused}
          </Notice>
        )}
        {candidate && (
          <ChoiceForm
            source={candidate.source}
            onSource={(source) =>
              setCandidate({
                source,
                // With a line left out it is another table than the server keeps.
                again: source.text === candidate.source.text ? candidate.again : null,
              })
            }
            unit={unit}
            onConfirm={(choice) => void confirm(candidate.source, choice, candidate.again)}
            onCancel={() => setCandidate(null)}
          />
        )}
        {sending.kind === 'sending' && (
          <ProgressBar
            label="The record is being sent"
            done={sending.share}
            of={1}
            cancel={<Button onClick={cancel}>Cancel</Button>}
          />
        )}
        {sending.kind === 'failed' && (
          <Notice
            kind="error"
            heading="The record was not sent"
            appeared
            action={
              <>
                <Button kind="main" icon="retry" onClick={sending.retry}>
                  Try again
                </Button>
                <Button onClick={dismiss}>Cancel</Button>
              </>
            }
          >
            {sending.reason}
          </Notice>
        )}
        {recordId === null && (way === 'type' || !editable) && candidate === null && (
          <TypedReadings onTooMany={takeReadings} />
        )}
        {recordId !== null && typedRows.length > 0 && (
          <p className="max-w-measure text-small text-soot-2">
            {typedRows.length} typed readings are kept as well, and count only without this record.
          </p>
        )}
        {candidate === null && <DraftRecordChart record={status.record} />}
        {candidate === null && <LookAlikesOfDraft draft={draft} units={units} />}
        <PinnedField pointer="/record/marks">
          <MarksEditor />
        </PinnedField>
      </div>
    </WriteSection>
  );
}
