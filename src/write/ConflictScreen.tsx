import { useEffect, useRef } from 'react';
import type { NoteFields } from '#shared/note/note-fields.ts';
import type { Units } from '#shared/units/units.ts';
import { momentWords } from '../notes/note-words.ts';
import { Button } from '../ui/Button.tsx';
import { DataTable } from '../ui/DataTable.tsx';
import { fieldDifferences } from './field-differences.ts';

interface Props {
  readonly mine: NoteFields;
  readonly theirs: NoteFields;
  readonly theirsAt: string;
  readonly units: Units;
  readonly onSettle: (choice: 'mine' | 'theirs') => void;
}

/** Saved elsewhere meanwhile: both versions, field by field. Nothing is sent until one is chosen. */
export function ConflictScreen({ mine, theirs, theirsAt, units, onSettle }: Props) {
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => heading.current?.focus(), []);
  const differences = fieldDifferences(mine, theirs, units);
  const download = () => {
    const url = URL.createObjectURL(
      new Blob([JSON.stringify(mine, null, 2)], { type: 'application/json' }),
    );
    const link = document.createElement('a');
    link.href = url;
    link.download = 'my-version-of-the-note.json';
    link.click();
    URL.revokeObjectURL(url);
  };
  return (
    <div className="space-y-6">
      <h1 ref={heading} tabIndex={-1} className="text-title outline-none">
        Two versions of this note
      </h1>
      <p className="max-w-measure">
        The note was saved in another tab or on another device on {momentWords(theirsAt)}, after it
        was opened here. Nothing is lost and nothing is sent until you choose. This is what differs:
      </p>
      <DataTable
        caption={
          differences.length === 1
            ? 'One field differs'
            : `${String(differences.length)} fields differ`
        }
        columns={[
          { key: 'label', heading: 'Field', cell: ({ label }) => label },
          { key: 'mine', heading: 'Here', cell: ({ mine: here }) => <Value text={here} /> },
          {
            key: 'theirs',
            heading: 'Saved there',
            cell: ({ theirs: there }) => <Value text={there} />,
          },
        ]}
        rows={differences}
        rowKey={({ pointer }) => pointer}
      />
      <div className="flex flex-wrap gap-3">
        <Button kind="main" onClick={() => onSettle('mine')}>
          Keep mine
        </Button>
        <Button onClick={() => onSettle('theirs')}>Take the other</Button>
        <Button onClick={download}>Download mine</Button>
      </div>
      <p className="max-w-measure text-small text-soot-2">
        “Keep mine” replaces what was saved there by what stands here. “Take the other” drops what
        stands here; download it first if you may want it.
      </p>
    </div>
  );
}

function Value({ text }: { readonly text: string }) {
  if (text === '') return <span className="text-soot-2">blank</span>;
  return <span className="whitespace-pre-line">{text}</span>;
}
