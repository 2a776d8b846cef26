import { useRef } from 'react';
import { RECORD_LIMITS } from '#shared/record/record-limits.ts';
import { formatFileSize } from '#shared/units/file-size.ts';
import { Button } from '../../ui/Button.tsx';

interface Props {
  readonly onFile: (file: File) => void;
  readonly busy: boolean;
}

/** A logger's file, chosen or dropped anywhere on the page. */
export function ChooseFile({ onFile, busy }: Props) {
  const input = useRef<HTMLInputElement>(null);
  return (
    <div className="space-y-2 border border-dashed border-soot-2 px-4 py-5">
      <input
        ref={input}
        type="file"
        aria-label="Record file"
        className="sr-only"
        tabIndex={-1}
        accept=".csv,.tsv,.txt,.dat,.log,text/csv,text/plain"
        onChange={(event) => {
          const file = event.currentTarget.files?.[0];
          // The same file can be chosen again after mending it.
          event.currentTarget.value = '';
          if (file) onFile(file);
        }}
      />
      <Button busy={busy} onClick={() => input.current?.click()}>
        Choose a CSV file
      </Button>
      <p className="max-w-measure text-small text-soot-2">
        Or drop it anywhere on this page. Any logger’s table of text: CSV, TSV or the like, at most{' '}
        {formatFileSize(RECORD_LIMITS.bytes)} and {RECORD_LIMITS.rows.toLocaleString('en-GB')} rows.
        It is looked at here first and sent when you say so.
      </p>
    </div>
  );
}
