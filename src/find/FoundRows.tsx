import type { Hit } from '#shared/api/search.ts';
import type { Units } from '#shared/units/units.ts';
import { NoteRows } from '../notes/NoteRows.tsx';

interface Props {
  readonly hits: readonly Hit[];
  readonly units: Units;
}

/** The notes found, each with why, and with the passage that matched. */
export function FoundRows({ hits, units }: Props) {
  const byNote = new Map(hits.map((hit) => [hit.note.id, hit]));
  return (
    <NoteRows
      rows={hits.map((hit) => hit.note)}
      units={units}
      under={(row) => {
        const hit = byNote.get(row.id);
        return hit ? <Found hit={hit} /> : null;
      }}
    />
  );
}

function Found({ hit: { why, passage } }: { readonly hit: Hit }) {
  return (
    <>
      {why !== '' && (
        <p className="text-small text-soot-2">
          <span className="font-[600]">Found: </span>
          {why}
        </p>
      )}
      {passage !== null && passage.length > 0 && (
        <p className="font-story text-small">
          {passage.map((piece, index) =>
            piece.hit ? <mark key={index}>{piece.text}</mark> : piece.text,
          )}
        </p>
      )}
    </>
  );
}
