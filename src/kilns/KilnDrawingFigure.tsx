import type { KilnFields } from '#shared/note/kiln-fields.ts';
import { KilnSection } from '../ui/KilnSection.tsx';
import { kilnDrawing } from './kiln-drawing.ts';

/** The kiln to scale from its description, as far as that goes. */
export function KilnDrawingFigure({ fields }: { readonly fields: KilnFields }) {
  const drawing = kilnDrawing(fields);
  if (!drawing) {
    return (
      <p className="border-y border-dashed border-line py-6 text-small text-soot-2">
        Drawn to scale as soon as shape, inside width and height are there.
      </p>
    );
  }
  return (
    <div className="space-y-2">
      <KilnSection kiln={drawing.dimensions} />
      {drawing.assumed.length > 0 && (
        <p className="text-note text-soot-2">
          Drawn with {drawing.assumed.join(' and ')}, as the description does not say.
        </p>
      )}
    </div>
  );
}
