import type { z } from 'zod';
import type { MeasureMeta } from './field-types.ts';
import { kilnFieldsSchema } from './kiln-fields.ts';
import { noteFieldsSchema } from './note-fields.ts';

/** The range asked for in a field, in its stored unit (`''` for plain numbers and counts). */
export interface FieldRange {
  readonly range: readonly [number, number];
  readonly unit: string;
}

interface SchemaDefinition {
  readonly type: string;
  readonly shape?: Readonly<Record<string, z.core.$ZodType>>;
  readonly element?: z.core.$ZodType;
  readonly innerType?: z.core.$ZodType;
}

function isMeasureMeta(value: unknown): value is MeasureMeta {
  if (typeof value !== 'object' || value === null) return false;
  const { range, unit } = value as Partial<Record<keyof MeasureMeta, unknown>>;
  return (
    Array.isArray(range) &&
    range.length === 2 &&
    range.every((bound) => typeof bound === 'number') &&
    typeof unit === 'string'
  );
}

/**
 * Every range declared as metadata on a schema's leaves, by JSON pointer pattern, where `*` stands
 * for any row of a list: `/pieces/*\/spanMm`. Recursive (lazy) parts hold no measures and are left.
 */
export function rangesOf(schema: z.core.$ZodType): ReadonlyMap<string, FieldRange> {
  const ranges = new Map<string, FieldRange>();
  const visit = (node: z.core.$ZodType, pointer: string): void => {
    const meta: unknown = (node as z.ZodType).meta();
    if (isMeasureMeta(meta)) {
      ranges.set(pointer, { range: meta.range, unit: meta.unit });
      return;
    }
    const definition = node._zod.def as SchemaDefinition;
    if (definition.shape) {
      for (const [key, child] of Object.entries(definition.shape)) {
        visit(child, `${pointer}/${key}`);
      }
    } else if (definition.element) {
      visit(definition.element, `${pointer}/*`);
    } else if (definition.innerType) {
      visit(definition.innerType, pointer);
    }
  };
  visit(schema, '');
  return ranges;
}

/** The ranges of a note's fields. */
export const NOTE_RANGES = rangesOf(noteFieldsSchema);
/** The ranges of a kiln's fields. */
export const KILN_RANGES = rangesOf(kilnFieldsSchema);

/** The range of the field a pointer names (`/pieces/2/spanMm`), or null when it has none. */
export function rangeAt(
  pointer: string,
  ranges: ReadonlyMap<string, FieldRange> = NOTE_RANGES,
): FieldRange | null {
  return ranges.get(pointer.replace(/\/\d+(?=\/|$)/g, '/*')) ?? null;
}

export interface OutOfRange extends FieldRange {
  readonly pointer: string;
  readonly value: number;
}

/** Every number in `fields` that lies outside its declared range, in the order of the fields. */
export function outOfRange(
  fields: object,
  ranges: ReadonlyMap<string, FieldRange> = NOTE_RANGES,
): OutOfRange[] {
  const found: OutOfRange[] = [];
  const visit = (value: unknown, pointer: string): void => {
    if (typeof value === 'number') {
      const asked = rangeAt(pointer, ranges);
      if (asked && !(value >= asked.range[0] && value <= asked.range[1])) {
        found.push({ pointer, value, ...asked });
      }
      return;
    }
    if (typeof value !== 'object' || value === null) return;
    for (const [key, child] of Object.entries(value)) visit(child, `${pointer}/${key}`);
  };
  visit(fields, '');
  return found;
}
