import type { NotePageData } from '#shared/api/notes.ts';
import { formatLength } from '#shared/units/length.ts';
import { formatTemperature } from '#shared/units/temperature.ts';
import type { Units } from '#shared/units/units.ts';
import {
  BARE_CLAY,
  CRACK_NOTICED,
  CRACK_PLACES,
  FORMS,
  GLAZE_FAMILIES,
  MELTS,
  ROUTES,
  SURFACE_FAULTS,
} from '#shared/vocabulary/ware.ts';
import { DataTable } from '../ui/DataTable.tsx';

/** The colour against what was hoped for, in words that stand among others. */
const COLOUR_WORDS = {
  'as-hoped': 'colour as hoped',
  partly: 'colour partly as hoped',
  not: 'colour not as hoped',
} as const;

type Piece = NotePageData['fields']['pieces'][number];

const joined = (parts: readonly (string | null | false)[]): string =>
  parts.filter((part): part is string => typeof part === 'string' && part !== '').join(', ');

function wareWords(piece: Piece, units: Units): string {
  return joined([
    piece.spanMm !== null && `${formatLength(piece.spanMm, units)} across`,
    piece.wallMm !== null && `wall ${formatLength(piece.wallMm, units)}`,
    piece.clay,
    piece.bisqueCelsius !== null &&
      `bisque ${formatTemperature(piece.bisqueCelsius, units.temperature)}`,
    piece.bisqueCone && `bisque cone ${piece.bisqueCone}`,
  ]);
}

function glazeWords(piece: Piece): string {
  return joined([
    piece.glazeName,
    piece.glazeFamily !== null && GLAZE_FAMILIES[piece.glazeFamily].toLowerCase(),
    piece.route !== null && ROUTES[piece.route].toLowerCase(),
  ]);
}

function resultWords(piece: Piece): string {
  return joined([
    piece.melt !== null && MELTS[piece.melt].toLowerCase(),
    piece.colour !== null && COLOUR_WORDS[piece.colour],
    piece.bareClay !== null &&
      piece.bareClay !== 'not-applicable' &&
      `bare clay ${BARE_CLAY[piece.bareClay].toLowerCase()}`,
    ...piece.faults.map((fault) => SURFACE_FAULTS[fault].toLowerCase()),
  ]);
}

function crackWords(piece: Piece): string {
  if (piece.cracked === false) return piece.whole === false ? 'not whole' : 'none';
  if (piece.cracked === null) return 'not said';
  return (
    piece.cracks
      .map(({ place, noticed }) =>
        joined([
          place !== null && CRACK_PLACES[place].toLowerCase(),
          noticed !== null && CRACK_NOTICED[noticed].toLowerCase(),
        ]),
      )
      .join('; ') || 'cracked'
  );
}

/** Each row of pieces with what came of it. */
export function NotePieces({
  pieces,
  units,
}: {
  readonly pieces: readonly Piece[];
  readonly units: Units;
}) {
  if (pieces.length === 0) return null;
  return (
    <section aria-labelledby="pieces" className="space-y-3">
      <h2 id="pieces" className="text-section">
        Pieces
      </h2>
      <DataTable
        caption="Pieces with their result and cracks"
        captionHidden
        rows={pieces}
        rowKey={(piece) => piece.key}
        columns={[
          {
            key: 'form',
            heading: 'Form',
            cell: (piece) =>
              `${piece.count !== null && piece.count > 1 ? `${String(piece.count)}\u00a0×\u00a0` : ''}${piece.form === null ? 'piece' : FORMS[piece.form].toLowerCase()}`,
          },
          { key: 'ware', heading: 'Ware', cell: (piece) => wareWords(piece, units) },
          { key: 'glaze', heading: 'Glaze and route', cell: glazeWords },
          { key: 'result', heading: 'Result', cell: resultWords },
          { key: 'cracks', heading: 'Cracks', cell: crackWords },
          ...(pieces.some(({ remark }) => remark !== '')
            ? [{ key: 'remark', heading: 'Remark', cell: (piece: Piece) => piece.remark }]
            : []),
        ]}
      />
    </section>
  );
}
