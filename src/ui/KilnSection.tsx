import { useId } from 'react';
import { kilnInWords } from './kiln-dimensions.ts';
import type { KilnDimensions } from './kiln-dimensions.ts';
import { KilnPlanDrawing } from './KilnPlanDrawing.tsx';
import { KilnSectionDrawing } from './KilnSectionDrawing.tsx';

interface Props {
  readonly kiln: KilnDimensions;
  /** Overrides the words made from the dimensions. */
  readonly alt?: string;
}

/** A kiln to scale: cut through port and flue, and seen from above with its burner at its angle. */
export function KilnSection({ kiln, alt = kilnInWords(kiln) }: Props) {
  const id = useId();
  return (
    <figure className="whole-in-print">
      <div role="img" aria-label={alt} className="flex flex-wrap items-end gap-x-10 gap-y-6">
        <Hatches id={id} />
        <div className="w-full max-w-[26rem]">
          <KilnSectionDrawing
            kiln={kiln}
            hatch={`url(#${id}-${kiln.wall})`}
            groundHatch={`url(#${id}-ground)`}
          />
          <p aria-hidden="true" className="pt-1 text-note text-soot-2">
            Cut through; measures in mm
          </p>
        </div>
        <div className="w-full max-w-[20rem]">
          <KilnPlanDrawing id={id} kiln={kiln} hatch={`url(#${id}-${kiln.wall})`} />
          <p aria-hidden="true" className="pt-1 text-note text-soot-2">
            From above{kiln.burner ? `, burner at ${kiln.burner.angleDegrees}° to the wall` : ''}
          </p>
        </div>
      </div>
    </figure>
  );
}

/** Fibre as waves, brick as courses, ground as slant strokes. */
function Hatches({ id }: { readonly id: string }) {
  return (
    <svg aria-hidden="true" className="ink-drawing absolute size-0">
      <defs>
        <pattern id={`${id}-fibre`} width="12" height="8" patternUnits="userSpaceOnUse">
          <path className="fill-ash-2" d="M0 0h12v8H0z" />
          <path className="stroke-soot-2" fill="none" d="M0 4q3-4 6 0t6 0" />
        </pattern>
        <pattern id={`${id}-brick`} width="16" height="12" patternUnits="userSpaceOnUse">
          <path className="fill-ash-2" d="M0 0h16v12H0z" />
          <path className="stroke-soot-2" fill="none" d="M0 .5h16M0 6.5h16M4 .5v6M12 6.5v6" />
        </pattern>
        <pattern id={`${id}-ground`} width="7" height="7" patternUnits="userSpaceOnUse">
          <path className="stroke-soot-2" d="M0 7L7 0" />
        </pattern>
      </defs>
    </svg>
  );
}
