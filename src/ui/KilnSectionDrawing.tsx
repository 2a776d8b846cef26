import { DimensionLine } from './DimensionLine.tsx';
import { drawnThicknesses } from './kiln-dimensions.ts';
import type { KilnDimensions } from './kiln-dimensions.ts';

const BURNER_MM = 170;
const BOX = { width: 416, height: 330, left: 12, right: 64, top: 14, bottom: 44 } as const;

interface Props {
  readonly kiln: KilnDimensions;
  readonly hatch: string;
  readonly groundHatch: string;
}

/** The kiln cut through the middle of its port, burner on the left. */
export function KilnSectionDrawing({ kiln, hatch, groundHatch }: Props) {
  const { baseMm, lidMm } = drawnThicknesses(kiln);
  const setback = kiln.burner?.setbackMm ?? 0;
  const burnerRoom = kiln.burner ? Math.max(0, setback) + BURNER_MM : 20;
  const outside = kiln.insideWidthMm + 2 * kiln.wallMm;
  const stand = kiln.standMm ?? 0;
  const tall = stand + baseMm + kiln.insideHeightMm + lidMm;
  const scale = Math.min(
    (BOX.width - BOX.left - BOX.right) / (burnerRoom + outside),
    (BOX.height - BOX.top - BOX.bottom) / tall,
  );
  const drawnWidth = (burnerRoom + outside) * scale;
  const left = BOX.left + (BOX.width - BOX.left - BOX.right - drawnWidth) / 2 + burnerRoom * scale;
  const ground = BOX.height - BOX.bottom;
  /** x from the outside of the left wall, y from the ground up, both mm. */
  const x = (mm: number) => left + mm * scale;
  const y = (mm: number) => ground - mm * scale;
  const block = (fromX: number, toX: number, fromY: number, toY: number) =>
    `M${x(fromX)} ${y(fromY)}H${x(toX)}V${y(toY)}H${x(fromX)}Z`;

  const floor = stand + baseMm;
  const roof = floor + kiln.insideHeightMm;
  const portMm = kiln.port?.openingMm ?? 0;
  const portCentre = floor + (kiln.port?.centreHeightMm ?? portMm);
  const { flue } = kiln;
  const middle = outside / 2;
  const inner = kiln.wallMm;
  const far = kiln.wallMm + kiln.insideWidthMm;

  const wallBlocks = [
    kiln.port
      ? [
          block(0, inner, floor, portCentre - portMm / 2),
          block(0, inner, portCentre + portMm / 2, roof),
        ]
      : [block(0, inner, floor, roof)],
    flue && flue.place !== 'lid'
      ? flue.place === 'wall'
        ? [
            block(far, outside, floor, roof - flue.openingMm * 1.3),
            block(far, outside, roof - flue.openingMm * 0.3, roof),
          ]
        : [block(far, outside, floor + flue.openingMm, roof)]
      : [block(far, outside, floor, roof)],
    flue?.place === 'lid'
      ? [
          block(0, middle - flue.openingMm / 2, roof, roof + lidMm),
          block(middle + flue.openingMm / 2, outside, roof, roof + lidMm),
        ]
      : [block(0, outside, roof, roof + lidMm)],
    [block(0, outside, stand, floor)],
  ].flat();

  const shelfWidth = kiln.insideWidthMm * Math.sqrt(kiln.shelf?.floorShare ?? 0.6);
  const shelfLeft = middle - shelfWidth / 2;
  const tip = -setback;

  return (
    <svg
      viewBox={`0 0 ${BOX.width} ${BOX.height}`}
      className="ink-drawing block h-auto w-full"
      aria-hidden="true"
    >
      <path className="stroke-soot" d={`M4 ${ground}H${BOX.width - 4}`} strokeWidth="1.5" />
      <path fill={groundHatch} d={`M4 ${ground}H${BOX.width - 4}v8H4z`} />
      {stand > 0 && (
        <path
          className="fill-ash-2 stroke-soot-2"
          d={
            block(outside * 0.08, outside * 0.26, 0, stand) +
            block(outside * 0.74, outside * 0.92, 0, stand)
          }
        />
      )}
      {wallBlocks.map((d) => (
        <path key={d} d={d} fill={hatch} className="stroke-soot" strokeWidth="1.5" />
      ))}
      {kiln.shelf && (
        <path
          className="fill-ash stroke-soot"
          strokeWidth="1.25"
          d={
            block(
              shelfLeft,
              shelfLeft + shelfWidth,
              floor + kiln.shelf.postsMm,
              floor + kiln.shelf.postsMm + kiln.shelf.thicknessMm,
            ) +
            (kiln.shelf.postsMm > 0
              ? block(shelfLeft + 14, shelfLeft + 44, floor, floor + kiln.shelf.postsMm) +
                block(
                  shelfLeft + shelfWidth - 44,
                  shelfLeft + shelfWidth - 14,
                  floor,
                  floor + kiln.shelf.postsMm,
                )
              : '')
          }
        />
      )}
      {kiln.burner && (
        <>
          <path
            className="fill-ash stroke-soot"
            strokeWidth="1.5"
            d={
              block(tip - BURNER_MM, tip - 60, portCentre - 11, portCentre + 11) +
              block(tip - 60, tip, portCentre - 20, portCentre + 20)
            }
          />
          <path
            className="stroke-verdigris"
            fill="none"
            strokeWidth="2"
            strokeDasharray="6 4"
            d={`M${x(tip + 8)} ${y(portCentre)}H${x(inner + kiln.insideWidthMm * 0.35)}m-7 -5l7 5-7 5`}
          />
        </>
      )}
      <DimensionLine
        from={{ x: x(inner), y: ground + 24 }}
        to={{ x: x(far), y: ground + 24 }}
        words={`${kiln.insideWidthMm}\u00a0mm`}
      />
      <DimensionLine
        from={{ x: x(outside) + 16, y: y(roof) }}
        to={{ x: x(outside) + 16, y: y(floor) }}
        words={`${kiln.insideHeightMm}`}
      />
      <text
        className="fill-soot-2 font-reading"
        fontSize="12"
        letterSpacing="-0.3"
        x={x(inner) + 6}
        y={y(roof) + 17}
      >
        wall {kiln.wallMm}
      </text>
      {flue?.place === 'lid' && (
        <text
          className="fill-soot-2 font-reading"
          fontSize="12"
          letterSpacing="-0.3"
          textAnchor="end"
          x={x(far) - 6}
          y={y(roof) + 17}
        >
          flue {flue.openingMm}
        </text>
      )}
    </svg>
  );
}
