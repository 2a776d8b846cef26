import { z } from 'zod';
import { kilnFieldsSchema, type KilnFields } from '#shared/note/kiln-fields.ts';
import { KILN_LABELS } from '#shared/note/kiln-labels.ts';
import { KILN_RANGES, outOfRange } from '#shared/note/ranges.ts';
import type { Units } from '#shared/units/units.ts';
import type { FieldIssue } from '../ui/field-issue.ts';
import { shownUnit } from '../write/measure-units.ts';

/** A kiln of which nothing is said yet. Propane is what most burn; it stands there to be seen. */
export function blankKiln(timeZone: string): KilnFields {
  return { ...kilnFieldsSchema.parse({ name: 'unnamed', fuel: 'propane', timeZone }), name: '' };
}

/** Without what does not belong to such a kiln: a width where it is round, a brick where it is fibre. */
export function tidiedKiln(fields: KilnFields): KilnFields {
  const isRound = fields.shape === 'round';
  const isSquare = fields.shape === 'square';
  return {
    ...fields,
    name: fields.name.trim(),
    insideDiameterMm: isSquare ? null : fields.insideDiameterMm,
    insideWidthMm: isRound ? null : fields.insideWidthMm,
    insideDepthMm: isRound ? null : fields.insideDepthMm,
    fibreThicknessMm: fields.wall === 'brick' ? null : fields.fibreThicknessMm,
    fibreDensityKgM3: fields.wall === 'brick' ? null : fields.fibreDensityKgM3,
    brickThicknessMm: fields.wall === 'fibre' ? null : fields.brickThicknessMm,
  };
}

export type KilnIssues = Readonly<Partial<Record<keyof KilnFields, readonly FieldIssue[]>>>;

const nameIssue = (fields: KilnFields): FieldIssue | null =>
  fields.name.trim() === '' ? { kind: 'must-mend', text: 'Give the kiln a name.' } : null;

/** What must be mended before a kiln can be saved, by field. */
export function kilnIssues(fields: KilnFields, units: Units): KilnIssues {
  const issues: Partial<Record<keyof KilnFields, FieldIssue[]>> = {};
  const unnamed = nameIssue(fields);
  if (unnamed) issues.name = [unnamed];
  for (const { pointer, range, unit } of outOfRange(fields, KILN_RANGES)) {
    const shown = shownUnit(unit, units);
    const bound = (value: number): string => String(Math.round(shown.toShown(value) * 10) / 10);
    issues[pointer.slice(1) as keyof KilnFields] = [
      {
        kind: 'must-mend',
        text: `Outside ${bound(range[0])} to ${bound(range[1])}${shown.unit && `\u00a0${shown.unit}`}.`,
      },
    ];
  }
  return issues;
}

/** Refusals of the server by field: its pointers begin with `/fields/`. */
export function refusedFields(
  errors: readonly { readonly pointer: string; readonly detail: string }[],
): KilnIssues {
  const issues: Partial<Record<keyof KilnFields, FieldIssue[]>> = {};
  for (const { pointer, detail } of errors) {
    const name = pointer.replace(/^\/fields\//, '');
    if (Object.hasOwn(KILN_LABELS, name)) {
      issues[name as keyof KilnFields] = [{ kind: 'must-mend', text: detail }];
    }
  }
  return issues;
}

/** The labels of the fields in which two descriptions differ. */
export function differingLabels(mine: KilnFields, theirs: KilnFields): string[] {
  return (Object.keys(KILN_LABELS) as (keyof KilnFields)[])
    .filter((field) => mine[field] !== theirs[field])
    .map((field) => KILN_LABELS[field]);
}

/** What a stale save is told the server holds. */
export const currentKilnSchema = z.object({ version: z.number(), fields: kilnFieldsSchema });
export type CurrentKiln = z.output<typeof currentKilnSchema>;
