import { CLOCK_SHAPES } from './clock-shapes.ts';
import { COLUMN_SHAPES } from './column-shapes.ts';
import { DATE_SHAPES } from './date-shapes.ts';
import { LAYOUT_SHAPES } from './layout-shapes.ts';
import type { LoggerShape } from './logger-shape.ts';
import { ODD_SHAPES } from './odd-shapes.ts';

/** Every shape of file a logger may write that is to be read. */
export const ALL_SHAPES: readonly LoggerShape[] = [
  ...LAYOUT_SHAPES,
  ...CLOCK_SHAPES,
  ...DATE_SHAPES,
  ...COLUMN_SHAPES,
  ...ODD_SHAPES,
];
