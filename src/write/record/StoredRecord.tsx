import type { FiringRecord } from '#shared/api/records.ts';
import { formatDuration } from '#shared/units/duration.ts';
import { FACT_SEPARATOR } from '../../ui/fact-separator.ts';
import { Button } from '../../ui/Button.tsx';
import { BusyMark } from '../../ui/BusyMark.tsx';
import { Notice } from '../../ui/Notice.tsx';
import { SkippedLines } from './SkippedLines.tsx';
import type { useRecordStatus } from './useRecordStatus.ts';

interface Props {
  readonly status: ReturnType<typeof useRecordStatus>;
  readonly editable: boolean;
  /** Fetches its table, to choose columns and units again. */
  readonly onChooseAgain: (record: FiringRecord) => void;
  readonly fetching: boolean;
  readonly onReplace: () => void;
  readonly onRemove: () => void;
}

const SOURCE_WORDS = { file: 'Uploaded', pasted: 'Pasted', typed: 'Typed' } as const;

/** The stored record: being read, read, or failed, with what was taken for granted and skipped. */
export function StoredRecord({ status, editable, ...acts }: Props) {
  const { record } = status;
  if (record === null) {
    return status.status.isError ? (
      <Notice
        kind="error"
        heading="The record could not be fetched"
        action={<Button onClick={() => void status.status.refetch()}>Try again</Button>}
      >
        {status.status.error.message}
      </Notice>
    ) : (
      <BusyMark words="The record is being fetched" />
    );
  }
  const buttons = editable && (
    <>
      {record.choice !== null && (
        <Button
          kind={record.status === 'failed' ? 'main' : 'plain'}
          busy={acts.fetching}
          onClick={() => acts.onChooseAgain(record)}
        >
          Choose columns and units again
        </Button>
      )}
      <Button icon="retry" onClick={acts.onReplace}>
        {record.status === 'failed' ? 'Choose the file again' : 'Replace it'}
      </Button>
      <Button icon="remove" onClick={acts.onRemove}>
        Remove it
      </Button>
    </>
  );
  if (record.status === 'reading') {
    return (
      <div className="space-y-3">
        <BusyMark words={`${record.fileName} is being read`} />
        <p className="max-w-measure text-small text-soot-2">
          This takes a few seconds. Go on writing meanwhile.
        </p>
        <div className="flex flex-wrap gap-3">{buttons}</div>
      </div>
    );
  }
  if (record.status === 'failed') {
    const line = record.error?.line ?? null;
    return (
      <Notice
        kind="error"
        appeared
        heading={`${record.fileName} could not be read${line === null ? '' : `: line ${line}`}`}
        action={buttons}
      >
        {record.error?.message ?? 'No reason was given.'}{' '}
        {record.choice !== null
          ? 'Choose the columns and units again, or mend the file and choose it again.'
          : 'Mend the file, or choose it again to say otherwise how it is read.'}
      </Notice>
    );
  }
  const last = record.strip?.[record.strip.length - 1]?.[0];
  const first = record.strip?.[0]?.[0] ?? 0;
  return (
    <div className="space-y-2">
      <p>
        <span className="font-[650]">{record.fileName}</span>
        <span className="text-soot-2">
          {FACT_SEPARATOR}
          {SOURCE_WORDS[record.source].toLowerCase()}
          {FACT_SEPARATOR}
          {record.count ?? 0} readings
          {last === undefined ? '' : ` over ${formatDuration(last - first)}`}
          {record.unit && record.unit !== 'C'
            ? `${FACT_SEPARATOR}given in ${record.unit === 'K' ? 'kelvin' : '°F'}`
            : ''}
        </span>
      </p>
      {record.assumed.length > 0 && (
        <ul className="max-w-measure text-small">
          {record.assumed.map((words) => (
            <li key={words} className="border-b border-line py-1">
              {words}
            </li>
          ))}
        </ul>
      )}
      <SkippedLines skipped={record.skipped} count={record.skippedCount} />
      <div className="flex flex-wrap gap-3">{buttons}</div>
    </div>
  );
}
